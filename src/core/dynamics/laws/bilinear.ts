import { FIELD } from '../record.ts';
import type { LawBehaviour } from './law.ts';

const { K, K_YIELD, STRENGTH, LAW_A, LAW_B, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT } = FIELD;

/**
 * Bilinear with kinematic hardening: elastic between two parallel lines of slope K_YIELD, +-(1 - h) Fy + K_YIELD x; without
 * hardening elastic-perfectly plastic. Its state is where it is: DRIFT and FORCE; LAW_A holds the lines' offset (1 - h) Fy,
 * LAW_B 1 / (K - K_YIELD).
 * Source: Prager (1956), J. Appl. Mech. 23, 493-496 (kinematic hardening); in this form Chopra, Dynamics of Structures, section
 * 7.1 (both from memory).
 */
export const bilinear: LawBehaviour = { begin, trial, commit, recoverable };

function begin(w: Float64Array, at: number): void {
  w[at + LAW_A] = w[at + STRENGTH] * (1 - w[at + K_YIELD] / w[at + K]);
  w[at + LAW_B] = 1 / (w[at + K] - w[at + K_YIELD]);
}

export function trial(w: Float64Array, at: number): void {
  const d = w[at + TRIAL_DRIFT];
  const k = w[at + K];
  const h = w[at + K_YIELD];
  const elastic = w[at + FORCE] + k * (d - w[at + DRIFT]);
  const upper = h * d + w[at + LAW_A];
  const lower = h * d - w[at + LAW_A];
  const inside = elastic <= upper && elastic >= lower;
  w[at + TRIAL_FORCE] = inside ? elastic : elastic > upper ? upper : lower;
  w[at + TANGENT] = inside ? k : h;
}

/** The path is elastic as far as the line that bounds it, then along that line: with the chord's trapezoid goes the triangle beside it. */
export function commit(w: Float64Array, at: number): void {
  const f0 = w[at + FORCE];
  const f1 = w[at + TRIAL_FORCE];
  const step = w[at + TRIAL_DRIFT] - w[at + DRIFT];
  // What the elastic part rose by above the line's slope, (K - K_YIELD) x its drift.
  const above = f1 - f0 - w[at + K_YIELD] * step;
  w[at + WORK] += 0.5 * ((f0 + f1) * step + above * (step - above * w[at + LAW_B]));
  w[at + DRIFT] = w[at + TRIAL_DRIFT];
  w[at + FORCE] = f1;
}

/**
 * f^2 / (2 k). Source: the project-file page. With hardening it leaves out what the lines' offset holds back, h k / 2 (x - f/k)^2 / (1 - h),
 * given off as the storey goes back along a line, so that work less this energy may fall there.
 */
function recoverable(w: Float64Array, at: number, out: number): void {
  w[out] = (0.5 * w[at + FORCE] * w[at + FORCE]) / w[at + K];
}
