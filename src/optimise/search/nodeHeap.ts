/** A change of a column's bounds on the way to a node; linked towards the root. */
export interface BoundChange {
  column: number;
  lower: number;
  upper: number;
  parent?: BoundChange;
}

/** An open part of the search: bounds so far, an interval of KV100 [mm²/s] where one is searched. */
export interface SearchNode {
  /** Proven lower bound of the cost in this part. */
  bound: number;
  depth: number;
  changes?: BoundChange;
  kv100?: { from: number; to: number };
}

function before(a: SearchNode, b: SearchNode): boolean {
  return a.bound < b.bound || (a.bound === b.bound && a.depth > b.depth);
}

/** Open nodes, least bound first. */
export class NodeHeap {
  readonly #nodes: SearchNode[] = [];

  get leastBound(): number {
    return this.#nodes.length > 0 ? this.#nodes[0].bound : Infinity;
  }

  push(node: SearchNode): void {
    const nodes = this.#nodes;
    let place = nodes.push(node) - 1;
    while (place > 0) {
      const parent = (place - 1) >> 1;
      if (!before(nodes[place], nodes[parent])) break;
      [nodes[place], nodes[parent]] = [nodes[parent], nodes[place]];
      place = parent;
    }
  }

  pop(): SearchNode | undefined {
    const nodes = this.#nodes;
    const top = nodes[0];
    const last = nodes.pop();
    if (last === undefined || nodes.length === 0) return top;
    nodes[0] = last;
    let place = 0;
    for (;;) {
      const left = 2 * place + 1;
      const right = left + 1;
      let least = place;
      if (left < nodes.length && before(nodes[left], nodes[least])) least = left;
      if (right < nodes.length && before(nodes[right], nodes[least])) least = right;
      if (least === place) return top;
      [nodes[place], nodes[least]] = [nodes[least], nodes[place]];
      place = least;
    }
  }
}
