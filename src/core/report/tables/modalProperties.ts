import type { ReportSource } from '../source.ts';
import { type Column, roofFirst, type Table } from '../table.ts';
import { storeyColumns } from './storeyColumns.ts';

/** Modes, longest period first: those of the initial stiffness, less P-Delta where that is on. */
export function modalProperties({ prepared }: ReportSource): Table {
  const { modes, dampingRatios } = prepared;
  let sum = 0;
  const cumulative = modes.map(({ effectiveMassRatio }) => {
    sum += effectiveMassRatio;
    return sum;
  });
  return {
    id: 'modal-properties',
    title: 'Modal properties',
    columns: [
      { key: 'mode', name: 'Mode', quantity: 'count', values: modes.map((_, r) => r + 1) },
      { key: 'period', name: 'Period', quantity: 'time', values: modes.map(({ period }) => period) },
      { key: 'frequency', name: 'Frequency', quantity: 'frequency', values: modes.map(({ period }) => 1 / period) },
      { key: 'damping', name: 'Damping ratio', quantity: 'percent', values: [...dampingRatios] },
      {
        key: 'participation',
        name: 'Participation factor',
        quantity: 'ratio',
        values: modes.map(({ participation }) => participation),
      },
      {
        key: 'effectiveMass',
        name: 'Effective weight',
        quantity: 'weight',
        values: modes.map(({ effectiveMass }) => effectiveMass),
      },
      {
        key: 'effectiveMassRatio',
        name: 'Share of total mass',
        quantity: 'percent',
        values: modes.map(({ effectiveMassRatio }) => effectiveMassRatio),
      },
      { key: 'cumulativeMassRatio', name: 'Share so far', quantity: 'percent', values: cumulative },
      {
        key: 'effectiveHeight',
        name: 'Effective height',
        quantity: 'length',
        values: modes.map(({ effectiveHeight }) => effectiveHeight),
      },
    ],
  };
}

/** Mode shapes, 1 at the roof; roof first. */
export function modeShapes({ prepared }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const shapes: Column[] = prepared.modes.map(({ shape }, r) => ({
    key: `mode${r + 1}`,
    name: `Mode ${r + 1}`,
    quantity: 'ratio',
    values: roofFirst(shape, storeys.length),
  }));
  return { id: 'mode-shapes', title: 'Mode shapes', columns: [...storeyColumns(storeys), ...shapes] };
}
