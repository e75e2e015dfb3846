import type { Said } from '../heading.ts';
import { cellOf, type Table } from '../table.ts';
import { components } from './components.ts';
import { looseFigures, oddRows } from './faults.ts';
import { type Layout, rowLength } from './layout.ts';
import { acrossThenDown } from './values.ts';

/**
 * A heading that gives count or interval, in words (`NPTS= 4000, DT= .0100 SEC`, `1559 points at equal spacing of 0.02 sec`) or
 * as bare figures (`4000 .01`), then rows of values read across and then down.
 */
export const countAndInterval: Layout = {
  id: 'count-and-interval',
  name: 'count and interval, then rows of values',
  recognise: (table, heading) => {
    if (heading.interval !== null || heading.count !== null) return 0.5;
    return table.rows > 0 && bareHeading(table) !== null ? 0.5 : 0;
  },
  read: (table, heading, answers) => {
    const bare = heading.interval === null && heading.count === null ? bareHeading(table) : null;
    const firstRow = bare?.rows ?? 0;
    const said = { ...heading, interval: bare?.interval ?? heading.interval, count: bare?.count ?? heading.count };
    const column = components(table, said, firstRow, answers);
    if (column !== null) return column;
    const from = table.rowStart[firstRow];
    const series = acrossThenDown(table, said);
    const values = series.values.subarray(from);
    const told = said.count?.value === values.length;
    return {
      ...series,
      values,
      cellOf: (i) => cellOf(table, i + from),
      firstRow,
      faults: told ? [] : [...(bare ? [] : looseFigures(table, answers)), ...oddRows(table, firstRow, answers)],
    };
  },
};

/** A smaller number is no count that stands alone. Own figure. */
const LEAST_COUNT = 20;

interface BareHeading {
  readonly count: Said<number>;
  /** Null: the count stands alone. */
  readonly interval: Said<number> | null;
  /** Rows of the table that are this heading. */
  readonly rows: number;
}

/**
 * Count and interval as bare figures: a line of the two above the rows, or the table's own first row or first two values
 * where the values that follow are exactly that many.
 */
function bareHeading(table: Table): BareHeading | null {
  const { above, values, rows, rowLine } = table;
  const last = above.at(-1);
  if (last && last.values.length === 2) {
    const [count, interval] = last.values;
    if (fits(count, interval) && Math.abs(values.length - count) <= 0.1 * count + table.columns) {
      return { count: bare(count, last.line), interval: bare(interval, last.line), rows: 0 };
    }
  }
  // A count alone is taken for one only where it is right: the first sample may be a whole number too.
  const alone = rowLength(table, 0) === 1 && Number.isInteger(values[0]) && values[0] >= LEAST_COUNT;
  if (alone && values.length - 1 === values[0]) return { count: bare(values[0], rowLine[0]), interval: null, rows: 1 };
  const headRows =
    rowLength(table, 0) === 2 ? 1 : rowLength(table, 0) === 1 && rows > 2 && rowLength(table, 1) === 1 ? 2 : 0;
  if (headRows === 0 || !fits(values[0], values[1]) || values.length - 2 !== values[0]) return null;
  return { count: bare(values[0], rowLine[0]), interval: bare(values[1], rowLine[headRows - 1]), rows: headRows };
}

function fits(count: number, interval: number): boolean {
  return Number.isInteger(count) && count >= 2 && interval > 0 && interval < 1;
}

function bare(value: number, line: number): Said<number> {
  return { value, line, span: [0, 0] };
}
