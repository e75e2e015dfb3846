import { FIELD } from '../record.ts';
import type { LawBehaviour } from './law.ts';

const { K, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT } = FIELD;

/** Linear elastic: force = K x drift, all of its work is recoverable. */
export const elastic: LawBehaviour = { begin: () => undefined, trial, commit, recoverable };

export function trial(w: Float64Array, at: number): void {
  w[at + TRIAL_FORCE] = w[at + K] * w[at + TRIAL_DRIFT];
  w[at + TANGENT] = w[at + K];
}

export function commit(w: Float64Array, at: number): void {
  const d = w[at + TRIAL_DRIFT];
  w[at + WORK] += 0.5 * (w[at + FORCE] + w[at + TRIAL_FORCE]) * (d - w[at + DRIFT]);
  w[at + DRIFT] = d;
  w[at + FORCE] = w[at + TRIAL_FORCE];
}

function recoverable(w: Float64Array, at: number, out: number): void {
  w[out] = 0.5 * w[at + FORCE] * w[at + DRIFT];
}
