import { FIELD } from '../record.ts';
import type { LawBehaviour } from './law.ts';

const { K, K_YIELD, STRENGTH, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT } = FIELD;
/** Largest drift so far each way, and the zero-force drift of the line that is active on the present side [m]. */
const { LAW_A: MOST, LAW_B: LEAST, LAW_C: ORIGIN } = FIELD;
/** Constants that begin() derives: yield drift [m] and 1 - hardening. */
const { LAW_P: YIELD_DRIFT, LAW_Q: REST } = FIELD;

/**
 * Peak-oriented (stiffness falling with the excursions). The envelope is bilinear. From the drift where the force went through
 * zero, its origin, the storey aims straight at the largest excursion so far of the side that it enters, and goes on along the
 * envelope from there; before the first yield of a side the aim is its yield point. It unloads at the initial stiffness, and comes
 * back after a partial unloading along the same straight to the branch that it left.
 *
 * Going one way only the branch ahead can bind, and no branch is steeper than the initial stiffness (an origin always lies between the
 * zeros of the unloading lines from the two peaks: `originOf`). So the force after any increment is the lesser of the elastic line and the
 * branch, and where the increment takes the force through zero, the new branch. Both ways are one code, in coordinates turned so
 * that the increment is positive.
 *
 * Force exactly zero counts as fully unloaded: either way from there the storey aims anew. An increment of zero length takes the tangent
 * of going on away from zero force.
 *
 * Source: Clough and Johnston (1966), Proc. Japan Earthquake Engineering Symposium, 227-232; the return to the branch after a
 * partial unloading: Mahin and Bertero (1976), J. Struct. Div. ASCE 102 (both from memory).
 */
export const peakOriented: LawBehaviour = { begin, trial, commit, recoverable };

function begin(w: Float64Array, at: number): void {
  const yieldDrift = w[at + STRENGTH] / w[at + K];
  w[at + YIELD_DRIFT] = yieldDrift;
  w[at + REST] = 1 - w[at + K_YIELD] / w[at + K];
  w[at + MOST] = yieldDrift;
  w[at + LEAST] = -yieldDrift;
  w[at + ORIGIN] = 0;
}

export function trial(w: Float64Array, at: number): void {
  const d0 = w[at + DRIFT];
  const f0 = w[at + FORCE];
  const d = w[at + TRIAL_DRIFT];
  const k = w[at + K];
  const elastic = f0 + k * (d - d0);
  const way = d > d0 ? 1 : d < d0 ? -1 : f0 < 0 ? -1 : 1;
  const from = way * f0;
  if (from < 0 && way * elastic <= 0) {
    w[at + TRIAL_FORCE] = elastic;
    w[at + TANGENT] = k;
    return;
  }
  const x = way * d;
  const peak = way > 0 ? w[at + MOST] : -w[at + LEAST];
  const h = w[at + K_YIELD];
  let slope = h;
  let branch = w[at + STRENGTH] + h * (x - w[at + YIELD_DRIFT]);
  if (x < peak) {
    const origin = originOf(w, at, way);
    slope = (w[at + STRENGTH] + h * (peak - w[at + YIELD_DRIFT])) / (peak - origin);
    branch = slope * (x - origin);
  }
  const inside = way * elastic < branch;
  w[at + TRIAL_FORCE] = inside ? elastic : way * branch;
  w[at + TANGENT] = inside ? k : slope;
}

/** Walks the pieces: to zero force or to the branch at the initial stiffness, along the branch to the peak, along the envelope. */
export function commit(w: Float64Array, at: number): void {
  const d0 = w[at + DRIFT];
  const f0 = w[at + FORCE];
  const d1 = w[at + TRIAL_DRIFT];
  const f1 = w[at + TRIAL_FORCE];
  const k = w[at + K];
  const way = d1 > d0 ? 1 : d1 < d0 ? -1 : f0 < 0 ? -1 : 1;
  const from = way * f0;
  if (from < 0 && way * (f0 + k * (d1 - d0)) <= 0) {
    w[at + WORK] += 0.5 * (f0 + f1) * (d1 - d0);
    w[at + DRIFT] = d1;
    w[at + FORCE] = f1;
    return;
  }
  const x0 = way * d0;
  const x1 = way * d1;
  const peak = way > 0 ? w[at + MOST] : -w[at + LEAST];
  const peakForce = w[at + STRENGTH] + w[at + K_YIELD] * (peak - w[at + YIELD_DRIFT]);
  const origin = originOf(w, at, way);
  const slope = peakForce / (peak - origin);
  let x = origin;
  let force = 0;
  let work = 0.5 * from * (origin - x0);
  if (from > 0) {
    // Where the two lines coincide any meeting point gives the same work.
    const meeting = k > slope ? (k * x0 - from - slope * origin) / (k - slope) : x0;
    x = Math.min(Math.max(meeting, x0), Math.max(peak, x0), x1);
    force = from + k * (x - x0);
    work = 0.5 * (from + force) * (x - x0);
  }
  if (x < peak) {
    const end = Math.min(x1, peak);
    const endForce = x1 < peak ? way * f1 : peakForce;
    work += 0.5 * (force + endForce) * (end - x);
    x = end;
    force = endForce;
  }
  work += 0.5 * (force + way * f1) * (x1 - x);
  w[at + WORK] += work;
  w[at + DRIFT] = d1;
  w[at + FORCE] = f1;
  w[at + ORIGIN] = way * origin;
  if (x1 > peak) w[at + (way > 0 ? MOST : LEAST)] = d1;
}

/** f^2 / (2 k). Source: the project-file page. */
function recoverable(w: Float64Array, at: number, out: number): void {
  w[out] = (0.5 * w[at + FORCE] * w[at + FORCE]) / w[at + K];
}

/**
 * Origin of the branch ahead, turned: the active one where the force already points that way, else where the force will be zero. It is
 * held between the zeros of the unloading lines from the two peaks, where it lies but for rounding: a branch then is never steeper
 * than the initial stiffness, and its aim never falls together with its origin.
 */
function originOf(w: Float64Array, at: number, way: number): number {
  const ahead = w[at + REST] * ((way > 0 ? w[at + MOST] : -w[at + LEAST]) - w[at + YIELD_DRIFT]);
  const behind = -w[at + REST] * ((way > 0 ? -w[at + LEAST] : w[at + MOST]) - w[at + YIELD_DRIFT]);
  const force = w[at + FORCE];
  const origin = way * (way * force > 0 ? w[at + ORIGIN] : w[at + DRIFT] - force / w[at + K]);
  return origin > ahead ? ahead : Math.max(origin, behind);
}
