import type { HeadingLine, Table } from '../table.ts';
import { type UnitFound, unitsIn } from '../unitWords.ts';

/** What stands over the columns of a table: the cells of the heading lines just above it, joined a column. */
export interface ColumnName {
  readonly name: string;
  readonly line: number | null;
  readonly unit: UnitFound | null;
}

/** Lines of column names: the names, and their units under them. */
const NAME_LINES = 2;

export function columnNames({ heading, columns }: Table): ColumnName[] {
  const names = Array.from({ length: columns }, (): ColumnName => ({ name: '', line: null, unit: null }));
  const written = heading.filter(({ text }) => /[A-Za-z]/.test(text)).slice(-NAME_LINES);
  for (const { line, text } of written) {
    const cells = cellsOf(text, columns);
    if (cells === null) continue;
    cells.forEach((cell, k) => {
      const units = unitsIn(cell, line);
      const bare = /^\W*g\W*$/i.test(cell) && units.length === 0;
      const unit: UnitFound | null = bare
        ? { value: 'g', written: 'g', line, span: [0, 0], weight: 2 }
        : (units.sort((a, b) => b.weight - a.weight)[0] ?? null);
      const at = text.indexOf(unit?.written ?? cell);
      const placed = unit && { ...unit, span: [Math.max(0, at), Math.max(0, at) + unit.written.length] as const };
      names[k] = {
        name: `${names[k].name} ${cell}`.trim(),
        line: names[k].line ?? line,
        unit: placed ?? names[k].unit,
      };
    });
  }
  return names;
}

/** A heading line as so many cells; null where no way of splitting it gives as many. */
function cellsOf(text: HeadingLine['text'], columns: number): string[] | null {
  const bare = text.replace(/^[\s#%!/]+/, '').trim();
  const joined = bare.replace(/\s+(?=[([])/g, '\u00a0');
  for (const [from, splitter] of [
    [bare, /[;\t]/],
    [bare, /,/],
    [bare, / {2,}|\t/],
    [joined, /[ \t]+/],
  ] as const) {
    const cells = from.split(splitter).map((cell) => cell.replace(/["\u00a0]/g, ' ').trim());
    if (cells.at(-1) === '' && cells.length === columns + 1) cells.pop();
    if (cells.length === columns && cells.every((cell) => cell !== '')) return cells;
  }
  return null;
}
