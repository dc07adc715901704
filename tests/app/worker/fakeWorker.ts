import type { EngineKind } from '../../../app/worker/createWorker';
import type { FromWorker, ToWorker, WorkerLike } from '../../../app/worker/protocol';
import type { Told } from '../../../app/worker/questions';
import type { BlendOutcome, Order } from '../../../src';

/** A worker that says only what the test makes it say. */
export class FakeWorker implements WorkerLike {
  onmessage: WorkerLike['onmessage'] = null;
  onerror: WorkerLike['onerror'] = null;
  onmessageerror: WorkerLike['onmessageerror'] = null;
  readonly heard: ToWorker[] = [];
  terminated = false;

  constructor(readonly kind: EngineKind) {}

  postMessage(message: ToWorker): void {
    this.heard.push(message);
  }

  terminate(): void {
    this.terminated = true;
  }

  say(message: FromWorker): void {
    this.onmessage?.(new MessageEvent('message', { data: message }));
  }

  crash(message: string): void {
    this.onerror?.(new ErrorEvent('error', { message, cancelable: true }));
  }

  /** The orders it was asked to solve. */
  get asked(): Extract<ToWorker, { kind: 'solve' }>[] {
    return this.heard.filter((message) => message.kind === 'solve');
  }

  /** The questions it was asked. */
  get questions(): Extract<ToWorker, { kind: 'ask' }>[] {
    return this.heard.filter((message) => message.kind === 'ask');
  }

  /** Answers the latest question. */
  tell(told: Told): void {
    this.say({ kind: 'told', id: this.questions.at(-1)?.id ?? Number.NaN, told });
  }

  /** Answers the latest order. */
  answer(costPerTonne: number, stopped: BlendOutcome['stopped'] = 'finished'): void {
    const id = this.asked.at(-1)?.id ?? Number.NaN;
    this.say({ kind: 'outcome', id, outcome: outcomeOf(costPerTonne, stopped) });
  }
}

/** What is told of a recipe: nothing, after so many solves. */
export const explanationOf = (solves: number): Told => ({
  kind: 'recipe',
  value: { limits: [], entries: [], used: [], stopped: 'finished', solves },
});

export function outcomeOf(costPerTonne: number, stopped: BlendOutcome['stopped'] = 'finished'): BlendOutcome {
  return {
    stopped,
    proof: { kind: stopped === 'finished' ? 'least cost' : 'none' },
    recipe: [{ stockId: 'a', massFraction: 1 }],
    costPerTonne,
    checks: [],
    leftOut: [],
    cautions: [],
    problems: [],
    work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
  };
}

/** An order that can be told from others by its batch size. */
export const orderOf = (batchTonnes: number): Order => ({ stocks: [], limits: [], batchTonnes });

/** Makes fake workers and keeps them for the test. */
export class FakeWorkers {
  readonly made: FakeWorker[] = [];
  readonly create = (kind: EngineKind): FakeWorker => {
    const worker = new FakeWorker(kind);
    this.made.push(worker);
    return worker;
  };

  get last(): FakeWorker {
    const worker = this.made.at(-1);
    if (!worker) throw new Error('No worker was made yet.');
    return worker;
  }
}
