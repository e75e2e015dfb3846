import { LAWS } from './laws/laws.ts';
import { FIELD } from './record.ts';

const { P_OVER_H, LAW, DRIFT, WORK, DAMPER_WORK, RHS, STRIDE } = FIELD;

/** Where the storeys' work has gone, as the records of a nonlinear frame stand [J]; zeros for a linear one. */
export interface StoreyEnergies {
  /** Recoverable part of all laws, and the P-Delta potential -(P / h) drift^2 / 2. */
  readonly strain: number;
  readonly dampers: number;
  readonly hysteretic: number;
  /** Work of the restoring force that is not recoverable, length n. */
  readonly dissipated: Float64Array;
}

/** Definitions: the project-file page. The place RHS of a record is used as scratch. */
export function storeyEnergies(w: Float64Array, n: number): StoreyEnergies {
  const dissipated = new Float64Array(n);
  let [strain, dampers, hysteretic] = [0, 0, 0];
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    const recoverable = recoverableOf(w, p);
    dissipated[i] = w[p + WORK] - recoverable;
    strain += recoverable - 0.5 * w[p + P_OVER_H] * w[p + DRIFT] ** 2;
    dampers += w[p + DAMPER_WORK];
    hysteretic += dissipated[i];
  }
  return { strain, dampers, hysteretic, dissipated };
}

/** Energy that unloading the storey would give back [J]. */
export function recoverableOf(w: Float64Array, at: number): number {
  LAWS[w[at + LAW]].recoverable(w, at, at + RHS);
  return w[at + RHS];
}
