/** Rectangular blocks as spreadsheets put them on the clipboard: rows by line, cells by tab, quotes where a cell needs them. */
export function parseBlock(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let cell = '';
  let quoted = false;
  for (let at = 0; at < text.length; at++) {
    const sign = text[at];
    if (quoted) {
      if (sign !== '"') cell += sign;
      else if (text[at + 1] === '"') {
        cell += '"';
        at++;
      } else quoted = false;
    } else if (sign === '"' && cell === '') quoted = true;
    else if (sign === '\t') {
      row.push(cell.trim());
      cell = '';
    } else if (sign === '\n') {
      rows.push([...row, cell.trim()]);
      row = [];
      cell = '';
    } else if (sign !== '\r') cell += sign;
  }
  if (cell !== '' || row.length > 0) rows.push([...row, cell.trim()]);
  while (rows.length > 0 && rows[rows.length - 1]?.every((entry) => entry === '')) rows.pop();
  return rows;
}

export function writeBlock(rows: readonly (readonly string[])[]): string {
  const quote = (cell: string) => (/["\t\n\r]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);
  return rows.map((row) => row.map(quote).join('\t')).join('\n');
}
