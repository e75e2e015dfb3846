import type { Heading } from '../heading.ts';
import type { RecordAnswers, RecordFault } from '../reading.ts';
import type { Table } from '../table.ts';
import { oddRows } from './faults.ts';
import { LEAVE_OUT, rowLength, type Series } from './layout.ts';

/** Columns beside each other that may be components, and rows that tell. Own figures. */
const MOST_COLUMNS = 12;
const LEAST_ROWS = 20;
/** Rows that are looked at. */
const PROBE = 5000;
/**
 * A record read across has neighbours on the row: they differ less than values of the same column, which lie a row apart
 * (mean square: 3 times less in rows of 2, 8 times in rows of 8, in the 1940 record; white noise: as much). Below this share
 * it is the other way round. Own figure.
 */
const SMOOTHER = 0.8;

/**
 * Rows of a few values may be the components of a motion side by side, and no row read across: asked where the columns go on
 * more smoothly than the rows, or where the stated count is that of the rows. Until it is settled the first column is shown.
 *
 * @param firstRow  first row of values
 * @returns null where the rows are read across
 */
export function components(table: Table, heading: Heading, firstRow: number, answers: RecordAnswers): Series | null {
  const { columns, rows, rowLine } = table;
  if (columns < 2 || columns > MOST_COLUMNS || rows - firstRow < LEAST_ROWS) return null;
  const stated = heading.count?.value ?? null;
  if (stated === table.values.length - table.rowStart[firstRow]) return null;
  const counted = stated === rows - firstRow;
  if (!counted && (answers.layout !== undefined || !(smoothness(table, firstRow) < SMOOTHER))) return null;
  const choice = answers.mends?.components?.choice;
  if (choice === 'across') return null;
  const line = rowLine[firstRow];
  const chosen = Array.from({ length: columns }, (_, k) => k).find((k) => choice === `column-${k + 1}`);
  const series = oneColumn(table, heading, chosen ?? 0, firstRow);
  if (chosen !== undefined) {
    const mend = { line, was: `${columns} columns`, is: `column ${chosen + 1}`, why: 'one component was chosen' };
    return { ...series, faults: oddRows(table, firstRow, answers, 'longer'), mends: [mend] };
  }
  const fault: RecordFault = {
    id: 'components',
    code: 'components',
    where: `line ${line}`,
    line,
    message: counted
      ? `${stated} values are stated and there are as many rows of ${columns}: they may be components side by side`
      : `the ${columns} columns go on more smoothly than the rows: they may be components side by side`,
    mend: 'Choose a column, or read the rows across',
    choices: [
      ...Array.from({ length: columns }, (_, k) => ({ id: `column-${k + 1}`, label: `Read column ${k + 1}` })),
      { id: 'across', label: `Read the ${columns} values of a row one after the other` },
      LEAVE_OUT,
    ],
  };
  return { ...series, faults: [fault] };
}

function oneColumn(table: Table, { interval, count, unit }: Heading, column: number, firstRow: number): Series {
  const { rows, rowStart, values } = table;
  const out = new Float64Array(rows - firstRow);
  for (let r = firstRow; r < rows; r++) {
    out[r - firstRow] = column < rowLength(table, r) ? values[rowStart[r] + column] : Number.NaN;
  }
  const none = { facts: [], faults: [], warnings: [], mends: [] };
  return { values: out, cellOf: (i) => ({ row: firstRow + i, column }), interval, count, unit, firstRow, ...none };
}

/** Mean square step down the columns over that along the rows. */
function smoothness({ values, rowStart, rows, columns }: Table, firstRow: number): number {
  let [down, along] = [0, 0];
  for (let r = firstRow; r + 1 < Math.min(rows, firstRow + PROBE); r++) {
    const [at, next] = [rowStart[r], rowStart[r + 1]];
    if (next - at !== columns || rowStart[r + 2] - next !== columns) continue;
    for (let k = 0; k < columns; k++) {
      const below = values[next + k] - values[at + k];
      const beside = values[at + k + 1] - values[at + k];
      if (Number.isNaN(below) || Number.isNaN(beside)) continue;
      down += below * below;
      along += beside * beside;
    }
  }
  return along > 0 ? down / along : Number.NaN;
}
