/** A block as spreadsheets put it on the clipboard: rows of cells, tabs between, quoted where a cell holds a tab or a new line. */
export function readBlock(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let cell = '';
  let quoted = false;
  const endCell = () => {
    row.push(cell.trim());
    cell = '';
  };
  const endRow = () => {
    endCell();
    rows.push(row);
    row = [];
  };
  const plain = text.replace(/\r\n?/g, '\n');
  for (let at = 0; at < plain.length; at += 1) {
    const sign = plain[at];
    if (quoted) {
      if (sign === '"' && plain[at + 1] === '"') {
        cell += '"';
        at += 1;
      } else if (sign === '"') quoted = false;
      else cell += sign === '\n' ? ' ' : sign;
    } else if (sign === '"' && cell === '' && isQuotedCell(plain, at)) quoted = true;
    else if (sign === '\t') endCell();
    else if (sign === '\n') endRow();
    else cell += sign;
  }
  endRow();
  return rows.filter((cells) => cells.some((entry) => entry !== ''));
}

/** A quotation mark opens a quoted cell only where another one ends it before a tab, a new line or the end. */
function isQuotedCell(text: string, at: number): boolean {
  return /^"(?:[^"]|"")*"(?=[\t\n]|$)/.test(text.slice(at));
}

/** More than one cell: not a text to be put into the cell being edited. */
export function isBlock(text: string): boolean {
  return /[\t\n\r]/.test(text.replace(/[\r\n]+$/, ''));
}
