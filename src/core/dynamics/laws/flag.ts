import { FIELD } from '../record.ts';
import type { LawBehaviour } from './law.ts';

const { K, K_YIELD, STRENGTH, LAW_P, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT } = FIELD;
/** Constants that begin() derives: yield drift and the fork's [m]; the forces of upper and lower line produced to zero drift [N]. */
const { LAW_A: YIELD_DRIFT, LAW_B: FORK, LAW_C: UPPER, LAW_D: LOWER } = FIELD;

/**
 * Flag-shaped (re-centring). On either side the force lies between an upper line, elastic to the strength and then of slope K_YIELD, and a lower
 * one that runs LAW_P x strength below it and meets the elastic line at the fork; between them it moves at the initial stiffness. Its
 * state is where it is: DRIFT and FORCE.
 *
 * Going one way only the line ahead can bind, and it is nowhere steeper than the initial stiffness: the force after any increment is the
 * lesser of the elastic line and the line ahead. Both ways are one code, in coordinates turned so that the increment is positive. An
 * increment of zero length takes the tangent of going on away from zero force.
 *
 * Source: Christopoulos, Filiatrault and Folz (2002), Earthquake Eng. Struct. Dyn. 31, 1131-1150 (from memory); the height of
 * the flag as the project-file page gives it.
 */
export const flag: LawBehaviour = { begin, trial, commit, recoverable };

function begin(w: Float64Array, at: number): void {
  const strength = w[at + STRENGTH];
  const yieldDrift = strength / w[at + K];
  const rest = 1 - w[at + K_YIELD] / w[at + K];
  w[at + YIELD_DRIFT] = yieldDrift;
  // At the largest ratio, 1 - hardening, the fork is at zero drift; rounding must not take it past, nor a hardening that rounds to 1.
  w[at + FORK] = rest > 0 ? Math.max(0, yieldDrift * (1 - w[at + LAW_P] / rest)) : yieldDrift;
  w[at + UPPER] = rest * strength;
  w[at + LOWER] = Math.max(0, (rest - w[at + LAW_P]) * strength);
}

export function trial(w: Float64Array, at: number): void {
  const d0 = w[at + DRIFT];
  const f0 = w[at + FORCE];
  const d = w[at + TRIAL_DRIFT];
  const k = w[at + K];
  const h = w[at + K_YIELD];
  const way = d > d0 ? 1 : d < d0 ? -1 : f0 < 0 ? -1 : 1;
  const x = way * d;
  let ahead = k * x;
  let slope = k;
  if (x >= w[at + YIELD_DRIFT]) {
    ahead = h * x + w[at + UPPER];
    slope = h;
  } else if (x < -w[at + FORK]) {
    ahead = h * x - w[at + LOWER];
    slope = h;
  }
  const elastic = way * (f0 + k * (d - d0));
  const inside = elastic < ahead;
  w[at + TRIAL_FORCE] = way * (inside ? elastic : ahead);
  w[at + TANGENT] = inside ? k : slope;
}

/** Walks the pieces: elastic to the line ahead, along a lower line to the fork, elastic to the yield drift, along an upper line. */
export function commit(w: Float64Array, at: number): void {
  const d0 = w[at + DRIFT];
  const d1 = w[at + TRIAL_DRIFT];
  const f1 = w[at + TRIAL_FORCE];
  const k = w[at + K];
  const h = w[at + K_YIELD];
  const way = d1 > d0 ? 1 : -1;
  const x0 = way * d0;
  const x1 = way * d1;
  const from = way * w[at + FORCE];
  // The elastic path's force at zero drift: above zero it comes from a flag behind, else it goes to the upper line.
  const offset = from - k * x0;
  const meeting = k > h ? ((offset > 0 ? -w[at + LOWER] : w[at + UPPER]) - offset) / (k - h) : x1;
  const fork = -w[at + FORK];
  const yieldDrift = w[at + YIELD_DRIFT];
  // Where the pieces end, in order; a piece that is not on the way has no length.
  const atLine = meeting < x0 ? x0 : Math.min(meeting, x1);
  const atFork = fork < atLine ? atLine : Math.min(fork, x1);
  const atYield = yieldDrift < atFork ? atFork : Math.min(yieldDrift, x1);
  const lineForce = from + k * (atLine - x0);
  const forkForce = atFork > atLine ? h * atFork - w[at + LOWER] : lineForce;
  const yieldForce = atYield > atFork ? k * atYield : forkForce;
  const work =
    (from + lineForce) * (atLine - x0) +
    (lineForce + forkForce) * (atFork - atLine) +
    (forkForce + yieldForce) * (atYield - atFork) +
    (yieldForce + way * f1) * (x1 - atYield);
  w[at + WORK] += 0.5 * work;
  w[at + DRIFT] = d1;
  w[at + FORCE] = f1;
}

/** The area under the unloading path: at the initial stiffness to the lower line, along it to the fork, elastic to zero. */
function recoverable(w: Float64Array, at: number, out: number): void {
  const d = Math.abs(w[at + DRIFT]);
  const f = Math.abs(w[at + FORCE]);
  const k = w[at + K];
  const offset = f - k * d;
  const meeting = (w[at + LOWER] - offset) / (k - w[at + K_YIELD]);
  const fork = w[at + FORK];
  if (!(meeting > fork)) {
    w[out] = (0.5 * f * f) / k;
    return;
  }
  const end = Math.min(meeting, d);
  const endForce = f - k * (d - end);
  w[out] = 0.5 * ((f + endForce) * (d - end) + (endForce + k * fork) * (end - fork) + k * fork * fork);
}
