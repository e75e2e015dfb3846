import type { Table } from '../table.ts';
import { type Layout, rowLength } from './layout.ts';

/**
 * A heading that gives count and interval, in words (`NPTS= 4000, DT= .0100 SEC`, `1559 points at equal spacing of 0.02 sec`) or
 * as a first line of two bare figures (`4000 .01`), then rows of values read across and then down.
 */
export const countAndInterval: Layout = {
  id: 'count-and-interval',
  name: 'count and interval, then rows of values',
  recognise(table, heading) {
    if (bareHeading(table)) return 0.8;
    return heading.interval !== null && heading.count !== null ? 0.7 : 0;
  },
  read(table, heading) {
    const bare = heading.interval !== null && heading.count !== null ? null : bareHeading(table);
    const from = bare ? table.rowStart[1] : 0;
    return {
      values: table.values.slice(from),
      placeOf: (i) => i + from,
      interval: bare ? bare.interval : heading.interval,
      count: bare ? bare.count : heading.count,
      firstRow: bare ? 1 : 0,
      faults: [],
      warnings: [],
    };
  },
};

/** A first row of exactly a whole count and an interval below 1 s, where the values that follow are about that many. */
function bareHeading(table: Table): { readonly count: number; readonly interval: number } | null {
  if (table.rows < 2 || rowLength(table, 0) !== 2) return null;
  const [count, interval] = table.values;
  const following = table.values.length - 2;
  if (!(Number.isInteger(count) && count >= 2 && interval > 0 && interval < 1)) return null;
  return Math.abs(following - count) <= 0.1 * count + 8 ? { count, interval } : null;
}
