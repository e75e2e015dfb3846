import type { ReportSource } from '../source.ts';
import { roofFirst, type Table } from '../table.ts';
import { statisticColumns } from './statisticColumns.ts';
import { levelsOf, storeyColumns } from './storeyColumns.ts';

/** What the floor on top of each storey answers to the suite. */
export function floorResponse({ prepared, envelope }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const n = storeys.length;
  const { motions, displacement, acceleration } = envelope;
  return {
    id: 'floor-response',
    title: 'Floor response of the suite',
    columns: [
      ...storeyColumns(storeys),
      { key: 'level', name: 'Level of the floor on top', quantity: 'length', values: roofFirst(levelsOf(storeys), n) },
      ...statisticColumns('displacement', 'peak displacement', 'displacement', displacement, n, motions),
      ...statisticColumns('acceleration', 'peak total acceleration', 'acceleration', acceleration, n, motions),
    ],
  };
}
