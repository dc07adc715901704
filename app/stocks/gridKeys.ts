/** A cell of the table by its place. */
export interface Place {
  row: number;
  column: number;
}

export interface GridSize {
  rows: number;
  columns: number;
}

/** What a key asks of the table while no cell is being typed in. */
export type GridAction =
  | { kind: 'move'; to: Place }
  | { kind: 'edit'; text?: string }
  | { kind: 'clear' }
  | { kind: 'toggle' };

interface Key {
  key: string;
  ctrlKey: boolean;
  metaKey: boolean;
  altKey: boolean;
}

const PAGE = 10;

export function clampPlace({ row, column }: Place, { rows, columns }: GridSize): Place {
  return {
    row: Math.max(0, Math.min(rows - 1, row)),
    column: Math.max(0, Math.min(columns - 1, column)),
  };
}

export function gridAction(event: Key, place: Place, size: GridSize): GridAction | undefined {
  const mod = event.ctrlKey || event.metaKey;
  const to = moveOf(event.key, place, size, mod);
  if (to) return { kind: 'move', to: clampPlace(to, size) };
  if (mod || event.altKey) return undefined;
  if (event.key === 'Enter' || event.key === 'F2') return { kind: 'edit' };
  if (event.key === 'Delete' || event.key === 'Backspace') return { kind: 'clear' };
  if (event.key === ' ') return { kind: 'toggle' };
  // A key of one character is what it types.
  return [...event.key].length === 1 ? { kind: 'edit', text: event.key } : undefined;
}

function moveOf(key: string, { row, column }: Place, { rows, columns }: GridSize, mod: boolean): Place | undefined {
  switch (key) {
    case 'ArrowUp':
      return { row: mod ? 0 : row - 1, column };
    case 'ArrowDown':
      return { row: mod ? rows - 1 : row + 1, column };
    case 'ArrowLeft':
      return { row, column: mod ? 0 : column - 1 };
    case 'ArrowRight':
      return { row, column: mod ? columns - 1 : column + 1 };
    case 'Home':
      return { row: mod ? 0 : row, column: 0 };
    case 'End':
      return { row: mod ? rows - 1 : row, column: columns - 1 };
    case 'PageUp':
      return { row: row - PAGE, column };
    case 'PageDown':
      return { row: row + PAGE, column };
    default:
      return undefined;
  }
}
