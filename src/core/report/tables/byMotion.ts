import type { Run } from '../../dynamics/run.ts';
import type { Quantity } from '../../units/quantities.ts';
import type { ReportSource } from '../source.ts';
import { type Cell, type Column, roofFirst, type Table } from '../table.ts';
import { storeyColumns } from './storeyColumns.ts';

/** What each storey answers to each motion: a block of rows a motion, roof first. Peaks of a run that ended early count so far. */
export function storeyResponseByMotion(source: ReportSource): Table {
  const { factor } = source.envelope;
  const answer = answersOf(source);
  return {
    id: 'storey-response-by-motion',
    title: 'Storey response to each motion',
    columns: [
      ...headColumns(source),
      answer('peakDrift', 'Peak drift', 'drift', ({ storeys }) => storeys.peakDrift),
      answer('peakDriftRatio', 'Peak drift ratio', 'percent', ({ storeys }) => storeys.peakDriftRatio),
      answer('comparedDriftRatio', 'Drift ratio compared', 'percent', ({ storeys }) =>
        storeys.peakDriftRatio.map((value) => factor * value),
      ),
      answer('peakTime', 'Time of peak drift', 'time', ({ storeys }) => storeys.peakTime),
      answer('residualDrift', 'Residual drift', 'drift', ({ storeys }) => storeys.residualDrift),
      answer('peakShear', 'Peak shear', 'force', ({ storeys }) => storeys.peakShear),
      answer('peakOverturning', 'Peak overturning', 'moment', ({ storeys }) => storeys.peakOverturning),
      answer('dissipated', 'Dissipated energy', 'energy', ({ storeys }) => storeys.dissipated),
    ],
  };
}

/** What the floor on top of each storey answers to each motion: a block of rows a motion, roof first. */
export function floorResponseByMotion(source: ReportSource): Table {
  const answer = answersOf(source);
  return {
    id: 'floor-response-by-motion',
    title: 'Floor response to each motion',
    columns: [
      ...headColumns(source),
      answer('peakDisplacement', 'Peak displacement', 'displacement', ({ floors }) => floors.peakDisplacement),
      answer('peakVelocity', 'Peak velocity', 'velocity', ({ floors }) => floors.peakVelocity),
      answer('peakAcceleration', 'Peak total acceleration', 'acceleration', ({ floors }) => floors.peakAcceleration),
    ],
  };
}

/** Motion, whether its run came to its end, storey and name, on every row: each row can be read alone. */
function headColumns({ prepared, runs }: ReportSource): Column[] {
  const { storeys } = prepared.frame;
  const block = (of: (run: (typeof runs)[number]) => Cell) => runs.flatMap((run) => storeys.map(() => of(run)));
  return [
    { key: 'motion', name: 'Motion', quantity: 'text', values: block(({ motion }) => motion) },
    {
      key: 'completed',
      name: 'Run completed',
      quantity: 'text',
      values: block(({ run }) => (run.ending === null ? 'yes' : 'no')),
    },
    ...storeyColumns(storeys).map((column) => ({ ...column, values: runs.flatMap(() => column.values) })),
  ];
}

function answersOf({ prepared, runs }: ReportSource) {
  const n = prepared.arrays.n;
  return (key: string, name: string, quantity: Quantity, pick: (run: Run) => Float64Array): Column => ({
    key,
    name,
    quantity,
    values: runs.flatMap(({ run }) => roofFirst(pick(run), n)),
  });
}
