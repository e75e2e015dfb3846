import { assembleTridiagonal } from '../frame/matrices.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import type { TridiagonalFactors } from '../linalg/tridiagonal.ts';
import { factorTridiagonal } from '../linalg/tridiagonal.ts';
import type { Problem } from './problem.ts';

/** Places in `Workspace.sums`: what a slice of the march hands to the next one. Energies are doubled there. */
export const SUM = {
  input: 0,
  damping: 1,
  kinetic: 2,
  strain: 3,
  largestGap: 4,
  largestInput: 5,
  stopped: 6,
  length: 7,
} as const;

/**
 * All scratch of one march, made once: the only thing a step may write. Symbols as in Method: u v a at the last step,
 * relative to the ground [m, m/s, m/s2]. Arrays have one entry a storey, ground up.
 */
export interface Workspace {
  readonly u: Float64Array;
  readonly v: Float64Array;
  readonly a: Float64Array;
  /** Right-hand side, then the part-solved one. */
  readonly rhs: Float64Array;
  /** The next a, for full matrices. */
  readonly next: Float64Array;
  /** Damping force on each floor, C v [N]. */
  readonly fd: Float64Array;
  /** Total floor acceleration at the last step [m/s2]. */
  readonly total: Float64Array;
  readonly system: System;
  /** Scalars between slices, see SUM. */
  readonly sums: Float64Array;
  readonly peaks: Peaks;
}

/** The matrix of the step, (1 - am) M + (1 - af) (gamma h C + beta h^2 K), ready to solve with. */
export type System =
  | {
      readonly kind: 'banded';
      readonly factors: TridiagonalFactors;
      readonly floor: Float64Array;
      readonly storey: Float64Array;
    }
  | {
      readonly kind: 'full';
      /** Its inverse, row-major, n x n. */
      readonly inverse: Float64Array;
      /** C a, carried from step to step [N/s]. */
      readonly ca: Float64Array;
    };

/** Largest magnitudes so far, one entry a storey or floor. */
export interface Peaks {
  readonly drift: Float64Array;
  /** Step at which it was reached. */
  readonly driftAt: Float64Array;
  readonly overturning: Float64Array;
  readonly displacement: Float64Array;
  readonly velocity: Float64Array;
  readonly acceleration: Float64Array;
}

export function workspace(problem: Problem): Workspace {
  const { n } = problem.prepared.arrays;
  const make = () => new Float64Array(n);
  return {
    u: make(),
    v: make(),
    a: startingAcceleration(problem),
    rhs: make(),
    next: make(),
    fd: make(),
    total: make(),
    system: systemOf(problem),
    sums: new Float64Array(SUM.length),
    peaks: {
      drift: make(),
      driftAt: make(),
      overturning: make(),
      displacement: make(),
      velocity: make(),
      acceleration: make(),
    },
  };
}

/** At rest, M a = -M ag at t = 0. */
function startingAcceleration({ prepared, ground }: Problem): Float64Array {
  return new Float64Array(prepared.arrays.n).fill(-ground[0]);
}

function systemOf({ prepared, method, step, ground }: Problem): System {
  const { arrays, damping } = prepared;
  const { am, af, beta, gamma } = method;
  const onMass = 1 - am;
  const onDamping = (1 - af) * gamma * step;
  const onStiffness = (1 - af) * beta * step * step;
  if (damping.kind === 'banded') {
    const storey = arrays.netStiffness.map((k, i) => onStiffness * k + onDamping * damping.storey[i]);
    const floor = arrays.mass.map((m, i) => onMass * m + onDamping * damping.floor[i]);
    const { diagonal, off } = assembleTridiagonal(storey, floor);
    const factors = factorTridiagonal(diagonal, off);
    if ('row' in factors)
      throw new RangeError(`march: the step's matrix is not positive definite at storey ${factors.row}`);
    return { kind: 'banded', factors, floor: damping.floor, storey: damping.storey };
  }
  return modalSystem(prepared, damping.ratios, onMass, onDamping, onStiffness, -ground[0]);
}

/**
 * Modal damping is diagonal in the modes, and so is the step's matrix A: its inverse is sum phi phi^T / (phi^T A phi), made
 * once, so that a step is one product with it. C a at the start, a = `uniform` on every floor, is found the same way.
 */
function modalSystem(
  { arrays, modes }: PreparedFrame,
  ratios: Float64Array,
  onMass: number,
  onDamping: number,
  onStiffness: number,
  uniform: number,
): System {
  const { n, mass } = arrays;
  const inverse = new Float64Array(n * n);
  const ca = new Float64Array(n);
  modes.forEach(({ shape, frequency, participation }, r) => {
    let modalMass = 0;
    for (let i = 0; i < n; i++) modalMass += mass[i] * shape[i] * shape[i];
    const damping = 2 * ratios[r] * frequency;
    const share = 1 / (modalMass * (onMass + onDamping * damping + onStiffness * frequency * frequency));
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) inverse[i * n + j] += share * shape[i] * shape[j];
      ca[i] += damping * participation * uniform * mass[i] * shape[i];
    }
  });
  return { kind: 'full', inverse, ca };
}
