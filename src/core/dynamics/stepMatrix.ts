import { invertPositive } from '../linalg/inverse.ts';
import { FIELD } from './record.ts';
import type { FullWork } from './yielding.ts';

const { MASS, FLOOR_DASHPOT, STOREY_DASHPOT, SLOPE, P_OVER_H, DAMPER_SLOPE, COUPLING, STRIDE } = FIELD;

/** Rank-one updates after which the inverse is made afresh, so that rounding does not gather. Own choice. */
const FRESH_AFTER = 200;

/**
 * The inverse of the step's matrix where damping is full: onMass M + onDamping C + the storeys' couplings, afresh.
 * @returns false where it is not positive definite
 */
export function invertInto(full: FullWork, w: Float64Array, n: number, onMass: number, onDamping: number): boolean {
  const { inverse, damping, updates } = full;
  for (let i = 0; i < n * n; i++) inverse[i] = onDamping * damping[i];
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    const coupling = w[p + COUPLING];
    inverse[i * n + i] += onMass * w[p + MASS] + onDamping * w[p + FLOOR_DASHPOT] + coupling;
    if (i === 0) continue;
    inverse[(i - 1) * n + i - 1] += coupling;
    inverse[(i - 1) * n + i] -= coupling;
    inverse[i * n + i - 1] -= coupling;
  }
  updates[0] = 0;
  return invertPositive(inverse, n);
}

/**
 * Brings the inverse up to the lines as they stand: a storey whose coupling changed by e is e b b^T more in the matrix, b = 1 at
 * its floor and -1 at the one below. Source: Sherman and Morrison (1950), Ann. Math. Stat. 21, 124-127 (from memory).
 *
 * @param onStiffness, onDamping, onMass  factors on tangents, dashpots and masses in the step's matrix
 * @returns false where the matrix is no longer positive definite
 */
export function shiftInverse(
  full: FullWork,
  w: Float64Array,
  n: number,
  onStiffness: number,
  onDamping: number,
  onMass: number,
): boolean {
  const { inverse, column, updates } = full;
  let afresh = false;
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    const coupling =
      onStiffness * (w[p + SLOPE] - w[p + P_OVER_H]) + onDamping * (w[p + STOREY_DASHPOT] + w[p + DAMPER_SLOPE]);
    const more = coupling - w[p + COUPLING];
    if (more === 0) continue;
    w[p + COUPLING] = coupling;
    updates[0]++;
    if (updates[0] > FRESH_AFTER) afresh = true;
    if (afresh) continue;
    const row = i * n;
    for (let c = 0; c < n; c++) column[c] = inverse[row + c] - (i > 0 ? inverse[row - n + c] : 0);
    const share = 1 + more * (column[i] - (i > 0 ? column[i - 1] : 0));
    if (!(share > 0)) return false;
    const factor = more / share;
    for (let r = 0, at = 0; r < n; r++) {
      const scaled = factor * column[r];
      for (let c = 0; c < n; c++, at++) inverse[at] -= scaled * column[c];
    }
  }
  return afresh ? invertInto(full, w, n, onMass, onDamping) : true;
}
