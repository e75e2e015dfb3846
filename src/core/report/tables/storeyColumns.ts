import type { Storey } from '../../frame/frame.ts';
import { type Column, roofFirst } from '../table.ts';

/** Number and name of each storey, roof first; storeys are counted from 1 at the ground. */
export function storeyColumns(storeys: readonly Storey[]): Column[] {
  const n = storeys.length;
  return [
    {
      key: 'storey',
      name: 'Storey',
      quantity: 'count',
      values: roofFirst(
        storeys.map((_, i) => i + 1),
        n,
      ),
    },
    { key: 'name', name: 'Name', quantity: 'text', values: storeys.map(({ name }) => name).reverse() },
  ];
}

/** Level of the floor on top of each storey above the ground [m], ground up. */
export function levelsOf(storeys: readonly Storey[]): number[] {
  let level = 0;
  return storeys.map(({ height }) => {
    level += height;
    return level;
  });
}
