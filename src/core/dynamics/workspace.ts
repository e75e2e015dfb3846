import { assembleTridiagonal } from '../frame/matrices.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import { factorTridiagonal } from '../linalg/tridiagonal.ts';
import { nonlinearWorkspace } from './nonlinearWorkspace.ts';
import type { Problem } from './problem.ts';
import { FIELD, SUM } from './record.ts';
import { type FullMatrix, type Scheme, stepTo } from './stepping.ts';

/** All scratch of one march, made once: the only thing a step may write. */
export interface Workspace {
  /** n records, see record.ts. */
  readonly records: Float64Array;
  readonly sums: Float64Array;
  /** Marches from step `from` to step `to`; returns the last step done. */
  readonly advance: (from: number, to: number) => number;
}

/** @throws RangeError where the step's matrix is not positive definite at the start (a validated case always is) */
export function workspace(problem: Problem): Workspace {
  return problem.linear ? linearWorkspace(problem) : nonlinearWorkspace(problem);
}

/** With the step's matrix where damping is full; null where it is banded. */
export function linearWorkspace(problem: Problem): Workspace & { readonly matrix: FullMatrix | null } {
  const { prepared, method, step, ground, stopDrift, residualFrom } = problem;
  const { n, mass, stiffness, netStiffness, height } = prepared.arrays;
  const { am, af, beta, gamma } = method;
  const records = new Float64Array(n * FIELD.STRIDE);
  for (let i = 0; i < n; i++) {
    const at = i * FIELD.STRIDE;
    records[at + FIELD.MASS] = mass[i];
    records[at + FIELD.PER_MASS] = 1 / mass[i];
    records[at + FIELD.STIFFNESS] = netStiffness[i];
    records[at + FIELD.LEVER] = stiffness[i] * height[i];
    records[at + FIELD.STOP] = stopDrift[i];
    records[at + FIELD.DRIFT_LEAST] = Number.POSITIVE_INFINITY;
    records[at + FIELD.DRIFT_MOST] = Number.NEGATIVE_INFINITY;
    // At rest, M a = -M ag at t = 0.
    records[at + FIELD.A] = -ground[0];
  }
  const system: StepMatrix = {
    onMass: 1 - am,
    onDamping: (1 - af) * gamma * step,
    onStiffness: (1 - af) * beta * step * step,
  };
  const { damping } = prepared;
  let matrix: FullMatrix | null = null;
  if (damping.kind === 'banded') setFactors(records, prepared, damping.floor, damping.storey, system);
  else matrix = setFull(records, prepared, damping.ratios, system, -ground[0]);
  const scheme: Scheme = { am, af, beta, gamma, h: step };
  const sums = new Float64Array(SUM.SUMS);
  const advance = (from: number, to: number) =>
    stepTo(records, matrix, n, ground, scheme, sums, residualFrom, from, to);
  return { records, sums, matrix, advance };
}

/** Factors on M, C and K in the matrix that a step solves with. */
interface StepMatrix {
  readonly onMass: number;
  readonly onDamping: number;
  readonly onStiffness: number;
}

function setFactors(
  records: Float64Array,
  { arrays }: PreparedFrame,
  floorDashpot: Float64Array,
  storeyDashpot: Float64Array,
  { onMass, onDamping, onStiffness }: StepMatrix,
): void {
  const storey = arrays.netStiffness.map((k, i) => onStiffness * k + onDamping * storeyDashpot[i]);
  const floor = arrays.mass.map((m, i) => onMass * m + onDamping * floorDashpot[i]);
  const { diagonal, off } = assembleTridiagonal(storey, floor);
  const factors = factorTridiagonal(diagonal, off);
  if ('row' in factors)
    throw new RangeError(`march: the step's matrix is not positive definite at storey ${factors.row}`);
  for (let i = 0; i < arrays.n; i++) {
    const at = i * FIELD.STRIDE;
    records[at + FIELD.FLOOR_DASHPOT] = floorDashpot[i];
    records[at + FIELD.STOREY_DASHPOT] = storeyDashpot[i];
    records[at + FIELD.MULTIPLIER] = factors.multiplier[i];
    records[at + FIELD.PER_PIVOT] = factors.pivotInverse[i];
  }
}

/**
 * Modal damping is diagonal in the modes, and so is the step's matrix: its inverse is sum phi phi^T / (phi^T FIELD.A phi). C a at
 * the start, where a is `uniform` on every floor, is found the same way.
 */
function setFull(
  records: Float64Array,
  { arrays, modes }: PreparedFrame,
  ratios: Float64Array,
  { onMass, onDamping, onStiffness }: StepMatrix,
  uniform: number,
): FullMatrix {
  const { n, mass } = arrays;
  const inverse = new Float64Array(n * n);
  modes.forEach(({ shape, frequency, participation }, r) => {
    let modalMass = 0;
    for (let i = 0; i < n; i++) modalMass += mass[i] * shape[i] * shape[i];
    const rate = 2 * ratios[r] * frequency;
    const share = 1 / (modalMass * (onMass + onDamping * rate + onStiffness * frequency * frequency));
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) inverse[i * n + j] += share * shape[i] * shape[j];
      records[i * FIELD.STRIDE + FIELD.DAMPING_RATE] += rate * participation * uniform * mass[i] * shape[i];
    }
  });
  return { inverse, side: new Float64Array(n) };
}
