import type { Run } from '../dynamics/run.ts';
import type { Column, Table } from './table.ts';

/**
 * Histories of one run as a table, one row a kept step (each step, unless the run was so long that only each k-th was
 * kept: `run.histories.every`). Storeys and floors are numbered from the ground. Damper forces (a part of the shear) and yielding
 * (1: past yield) stand there for frames that yield or have dampers.
 * @throws RangeError where the run kept none
 */
export function historiesTable(motion: string, run: Run): Table {
  const { histories, step } = run;
  if (histories === null)
    throw new RangeError(`histories of ${motion}: none were kept, expected a run that wants them`);
  const { count, every, ground, energy, nonlinear } = histories;
  const n = histories.displacement.length / count;
  const rows = (key: string, name: string, quantity: Column['quantity'], values: Float64Array | Uint8Array): Column[] =>
    Array.from({ length: n }, (_, i) => ({
      key: `${key}${i + 1}`,
      name: `${name} ${i + 1}`,
      quantity,
      values: Array.from(values.subarray(i * count, (i + 1) * count)),
    }));
  const energies: Column[] = (['input', 'kinetic', 'strain', 'damping', 'dampers', 'hysteretic'] as const).map(
    (key) => ({
      key,
      name: `Energy, ${key}`,
      quantity: 'energy',
      values: Array.from(energy[key]),
    }),
  );
  return {
    id: 'histories',
    title: `Histories under ${motion}`,
    columns: [
      {
        key: 'time',
        name: 'Time',
        quantity: 'time',
        values: Array.from({ length: count }, (_, j) => decimal(j * every * step)),
      },
      { key: 'ground', name: 'Ground acceleration', quantity: 'acceleration', values: Array.from(ground) },
      ...rows('displacement', 'Displacement of floor', 'displacement', histories.displacement),
      ...rows('shear', 'Shear of storey', 'force', histories.shear),
      ...(nonlinear === null
        ? []
        : [
            ...rows('damperForce', 'Damper force of storey', 'force', nonlinear.damper),
            ...rows('yielding', 'Past yield, storey', 'count', nonlinear.yielding),
          ]),
      ...rows('acceleration', 'Total acceleration of floor', 'acceleration', histories.acceleration),
      ...energies,
    ],
  };
}

/** Without the last bits that a product of decimals gets wrong: 0.03 and not 0.030000000000000002. */
function decimal(seconds: number): number {
  return Number(seconds.toPrecision(14));
}
