import { fullDamping } from '../frame/damping.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import { BILINEAR, numberOf, setLaw } from './laws/laws.ts';
import type { FullWork, NonlinearWork } from './nonlinearWork.ts';
import type { Problem } from './problem.ts';
import { FIELD, NOW, SUM } from './record.ts';
import { freshDamperLine, refactor } from './stepMatrix.ts';
import type { Workspace } from './workspace.ts';
import { yieldTo } from './yielding.ts';

/** A law may be off its line by so much of the largest base shear that the motion can ask for, mass x ground acceleration. Own choice: well under what is printed. */
const FORCE_TOLERANCE = 1e-12;
/** Steepest line of a damper, as a multiple of mass / step. Own choice: stands for stick, and keeps the step's matrix well conditioned. */
const STICK = 1e4;

/** @throws RangeError where the step's matrix is not positive definite (a validated case never is) */
export function nonlinearWorkspace(problem: Problem): Workspace {
  const { prepared, method, step, ground, stopDrift, residualFrom } = problem;
  const { n, mass, stiffness, height, gravityAbove } = prepared.arrays;
  const { am, af, beta, gamma } = method;
  const { STRIDE } = FIELD;
  const w = new Float64Array(n * STRIDE);
  const wholeMass = mass.reduce((sum, m) => sum + m, 0);
  let strongest = 0;
  for (const ag of ground) if (Math.abs(ag) > strongest) strongest = Math.abs(ag);
  const { damping } = prepared;
  prepared.frame.storeys.forEach((storey, i) => {
    const at = i * STRIDE;
    w[at + FIELD.MASS] = mass[i];
    w[at + FIELD.PER_MASS] = 1 / mass[i];
    w[at + FIELD.HEIGHT] = height[i];
    w[at + FIELD.P_OVER_H] = gravityAbove[i] / height[i];
    w[at + FIELD.STOP] = stopDrift[i];
    w[at + FIELD.DRIFT_LEAST] = Number.POSITIVE_INFINITY;
    w[at + FIELD.DRIFT_MOST] = Number.NEGATIVE_INFINITY;
    // At rest, M a = -M ag at t = 0.
    w[at + FIELD.A] = -ground[0];
    setLaw(w, at, storey.law, stiffness[i]);
    w[at + FIELD.SLOPE] = stiffness[i];
    w[at + FIELD.TANGENT] = stiffness[i];
    w[at + FIELD.FORCE_TOLERANCE] = FORCE_TOLERANCE * wholeMass * strongest;
    w[at + FIELD.DAMPER] = storey.damper?.coefficient ?? 0;
    w[at + FIELD.EXPONENT] = storey.damper?.exponent ?? 1;
    w[at + FIELD.STICK] = (STICK * wholeMass) / step;
    // At rest no velocity has been reached yet: the scale is what one step can bring, or nothing would count as met.
    w[at + FIELD.PEAK_RATE] = step * strongest;
    freshDamperLine(w, at);
    if (damping.kind === 'full') return;
    w[at + FIELD.STOREY_DASHPOT] = damping.storey[i];
    w[at + FIELD.TANGENT_FACTOR] = prepared.arrays.isolated && i === 0 ? 0 : damping.tangentFactor;
    if (damping.against === 'ground') w[at + FIELD.FLOOR_DASHPOT] = damping.floor[i];
  });
  const sums = new Float64Array(SUM.SUMS);
  sums[SUM.CULPRIT] = -1;
  const now = new Float64Array(NOW.NOWS);
  now.set([am, af, beta, gamma, step]);
  const work: NonlinearWork = {
    n,
    w,
    now,
    h: step,
    smooth: prepared.frame.storeys.some(({ law, damper }) => numberOf(law) > BILINEAR || damper !== undefined),
    full: fullWork(prepared, w, -ground[0]),
    sums,
    holds: new Uint8Array(1),
  };
  if (!refactor(work, 0)) throw new RangeError("march: the step's matrix is not positive definite");
  return { records: w, sums, advance: (from, to) => yieldTo(work, ground, residualFrom, from, to) };
}

/** For damping that is not tridiagonal: C, and the inverse of the step's matrix; C a at the start, a being `uniform`. */
function fullWork({ arrays, modes, damping }: PreparedFrame, w: Float64Array, uniform: number): FullWork | null {
  if (damping.kind === 'banded' && damping.against === 'ground') return null;
  const { n } = arrays;
  const c = fullDamping(damping, arrays, modes);
  for (let i = 0; i < n; i++) {
    let sum = 0;
    for (let j = 0; j < n; j++) sum += c[i * n + j];
    w[i * FIELD.STRIDE + FIELD.DAMPING_RATE] = sum * uniform;
  }
  const scratch = () => new Float64Array(n);
  return {
    damping: c,
    inverse: new Float64Array(n * n),
    side: scratch(),
    column: scratch(),
    updates: new Int32Array(1),
  };
}
