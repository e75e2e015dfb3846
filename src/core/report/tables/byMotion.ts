import type { Run } from '../../dynamics/run.ts';
import type { Quantity } from '../../units/quantities.ts';
import { type ReportSource, yields } from '../source.ts';
import { type Cell, type Column, roofFirst, type Table } from '../table.ts';
import { storeyColumns } from './storeyColumns.ts';

/** What each storey answers to each motion: a block of rows a motion, roof first. Peaks of a run that ended early count so far. */
export function storeyResponseByMotion(source: ReportSource): Table {
  const { factor, isolator } = source.envelope;
  const { storeys } = source.prepared.frame;
  const answer = answersOf(source);
  const compared = (ratio: number, i: number) => (i === 0 && isolator !== null ? Number.NaN : factor * ratio);
  return {
    id: 'storey-response-by-motion',
    title: 'Storey response to each motion',
    columns: [
      ...headColumns(source),
      answer('peakDrift', 'Peak drift', 'drift', (run) => run.storeys.peakDrift),
      answer('peakDriftRatio', 'Peak drift ratio', 'percent', (run) => run.storeys.peakDriftRatio),
      answer('comparedDriftRatio', 'Drift ratio compared', 'percent', (run) =>
        run.storeys.peakDriftRatio.map(compared),
      ),
      answer('peakTime', 'Time of peak drift', 'time', (run) => run.storeys.peakTime),
      ...(storeys.some(yields)
        ? [
            answer('ductility', 'Ductility', 'ratio', (run) => run.storeys.ductility),
            answer('firstYield', 'Time of first yield', 'time', (run) => run.storeys.firstYield),
          ]
        : []),
      { ...answer('residualDrift', 'Residual drift', 'drift', (run) => run.storeys.residualDrift), decimals: 1 },
      answer('residualDriftRatio', 'Residual drift ratio', 'percent', (run) =>
        run.storeys.residualDrift.map((drift, i) => drift / storeys[i].height),
      ),
      answer('peakShear', 'Peak shear', 'force', (run) => run.storeys.peakShear),
      answer('peakOverturning', 'Peak overturning', 'moment', (run) => run.storeys.peakOverturning),
      answer('dissipated', 'Dissipated energy', 'energy', (run) => run.storeys.dissipated),
      ...(storeys.some(({ damper }) => damper !== undefined)
        ? [answer('damperWork', 'Energy of the damper', 'energy', (run) => run.storeys.damperWork)]
        : []),
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
