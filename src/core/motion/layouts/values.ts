import type { Layout } from './layout.ts';

/** One value a line, or rows of fixed width that are read across and then down; the interval is asked for unless words tell it. */
export const values: Layout = {
  id: 'values',
  name: 'values, one a line or in rows',
  recognise: (table) => (table.rows > 0 ? 0.2 : 0),
  read: (table, heading) => ({
    values: table.values.slice(),
    placeOf: (i) => i,
    interval: heading.interval,
    count: heading.count,
    firstRow: 0,
    faults: [],
    warnings: [],
  }),
};
