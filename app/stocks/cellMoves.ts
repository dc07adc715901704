/** Keys that take the text of a cell, and where they go then. */
export const CELL_MOVES: Readonly<Record<string, { plain: 'down' | 'right'; shift: 'up' | 'left' }>> = {
  Enter: { plain: 'down', shift: 'up' },
  Tab: { plain: 'right', shift: 'left' },
};
