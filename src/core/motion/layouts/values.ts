import type { Heading } from '../heading.ts';
import { cellOf, type Table } from '../table.ts';
import { components } from './components.ts';
import { blankLines, looseFigures, oddRows } from './faults.ts';
import type { Layout, Series } from './layout.ts';

/** One value a line, or rows of values read across and then down; the interval is asked for unless words tell it. */
export const values: Layout = {
  id: 'values',
  name: 'values, one a line or in rows',
  recognise: (table) => (table.rows > 0 ? 0.1 : 0),
  read: (table, heading, answers) => {
    const column = components(table, heading, 0, answers);
    if (column !== null) return column;
    const told = heading.count?.value === table.values.length;
    const faults = [...looseFigures(table, answers), ...(told ? [] : oddRows(table, 0, answers))];
    return { ...acrossThenDown(table, heading), faults };
  },
};

/** All values of a table, row by row. */
export function acrossThenDown(table: Table, heading: Heading): Series {
  const { interval, count, unit } = heading;
  return {
    values: table.values.slice(),
    cellOf: (i) => cellOf(table, i),
    interval,
    count,
    unit,
    firstRow: 0,
    facts: [],
    faults: [],
    warnings: blankLines(table),
    mends: [],
  };
}
