import type { Statistic } from '../../checks/statistic.ts';
import type { Quantity } from '../../units/quantities.ts';
import { type Column, roofFirst } from '../table.ts';

/** A statistic of values that are divided by something of each storey, such as its height. */
export function dividedBy(statistic: Statistic | null, by: readonly number[]): Statistic | null {
  if (statistic === null) return null;
  const divided = (values: Float64Array) => values.map((value, i) => value / by[i]);
  const { mean, median, max, governing } = statistic;
  return { mean: divided(mean), median: divided(median), max: divided(max), governing };
}

/** Mean, median, largest and governing motion of one answer of the suite, roof first. `name` begins with a small letter. */
export function statisticColumns(
  key: string,
  name: string,
  quantity: Quantity,
  statistic: Statistic | null,
  n: number,
  motions: readonly string[],
): Column[] {
  const governing = roofFirst(statistic?.governing, n);
  return [
    { key: `${key}Mean`, name: `Mean ${name}`, quantity, values: roofFirst(statistic?.mean, n) },
    { key: `${key}Median`, name: `Median ${name}`, quantity, values: roofFirst(statistic?.median, n) },
    { key: `${key}Max`, name: `Largest ${name}`, quantity, values: roofFirst(statistic?.max, n) },
    {
      key: `${key}Governing`,
      name: `Motion of largest ${name}`,
      quantity: 'text',
      values: governing.map((index) => (typeof index === 'number' ? motions[index] : null)),
    },
  ];
}
