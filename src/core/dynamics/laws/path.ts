import type { Law } from '../../frame/frame.ts';
import { FIELD } from '../record.ts';
import { commitOf, setLaw, trialOf } from './laws.ts';

/**
 * Force along a path of drifts, walked from the virgin state at zero drift; straight between the drifts, which may lie as far apart as one
 * likes.
 *
 * @param stiffness initial stiffness [N/m], > 0
 * @param drifts [m]
 * @returns the force at each drift [N]
 */
export function lawPath(law: Law, stiffness: number, drifts: Float64Array): Float64Array {
  const w = new Float64Array(FIELD.STRIDE);
  setLaw(w, 0, law, stiffness);
  return drifts.map((drift) => {
    w[FIELD.TRIAL_DRIFT] = drift;
    trialOf(w, 0);
    commitOf(w, 0);
    return w[FIELD.FORCE];
  });
}

/** A loop to draw: drift [m] and force [N], point by point. */
export interface Loop {
  readonly drift: Float64Array;
  readonly force: Float64Array;
}

/** Points a yield drift in a picture, and at most so many from one turn to the next. */
const POINTS_A_YIELD_DRIFT = 40;
const MOST_POINTS_A_LEG = 400;

/**
 * The first loading up to the ductility: half of the backbone (the other half is its mirror image).
 *
 * @param ductility end of the path over the yield drift, > 0; an elastic law has none, 1 m stands in for it
 */
export function backbone(law: Law, stiffness: number, ductility: number): Loop {
  return loop(law, stiffness, [ductility]);
}

/**
 * Growing cycles from rest: to half of the ductility and to its negative, to the whole both ways, and up once more, so that a picture
 * shows backbone, unloading and reloading of the law.
 */
export function typicalCycle(law: Law, stiffness: number, ductility: number): Loop {
  return loop(law, stiffness, [ductility / 2, -ductility / 2, ductility, -ductility, ductility]);
}

/** Walks from zero over the turns, given in yield drifts; each leg in equal parts, so that no turn is left out. */
function loop(law: Law, stiffness: number, turns: readonly number[]): Loop {
  const yieldDrift = law.kind === 'elastic' ? 1 : law.strength / stiffness;
  const drifts = [0];
  let from = 0;
  for (const to of turns) {
    const parts = Math.min(Math.max(Math.ceil(Math.abs(to - from) * POINTS_A_YIELD_DRIFT), 1), MOST_POINTS_A_LEG);
    for (let i = 1; i <= parts; i++) drifts.push((from + ((to - from) * i) / parts) * yieldDrift);
    from = to;
  }
  const drift = Float64Array.from(drifts);
  return { drift, force: lawPath(law, stiffness, drift) };
}
