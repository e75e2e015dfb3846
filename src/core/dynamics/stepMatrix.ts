import { invertPositive } from '../linalg/inverse.ts';
import type { FullWork, NonlinearWork } from './nonlinearWork.ts';
import { FIELD, NOW } from './record.ts';

const { MASS, FLOOR_DASHPOT, STOREY_DASHPOT, MULTIPLIER, PER_PIVOT, INTERCEPT, SLOPE, P_OVER_H, STRIDE } = FIELD;
const { K, TANGENT, DRIFT, FORCE, DAMPER, EXPONENT, STICK } = FIELD;
const { DAMPER_INTERCEPT, DAMPER_SLOPE, LINE, LINE_DRIFT, LINE_RATE, COUPLING } = FIELD;
const { AM, AF, BETA, GAMMA, H } = NOW;

/** Rank-one updates after which the inverse is made afresh, so that rounding does not gather. Own choice. */
const FRESH_AFTER = 200;
/** An update that leaves less of the determinant than this cancels figures (a damper that comes loose): made afresh instead. Own choice. */
const CANCELS = 0.1;

/**
 * The step's matrix from row `from` up, from the lines as they stand; false where it is not positive definite, which `holds`
 * keeps until the next time.
 */
export function refactor(work: NonlinearWork, from: number): boolean {
  const { n, w, now, full, holds } = work;
  const wf = 1 - now[AF];
  const b0 = wf * now[BETA] * now[H] * now[H];
  const g0 = wf * now[GAMMA] * now[H];
  const onMass = 1 - now[AM];
  holds[0] = 0;
  for (let p = from * STRIDE; p < n * STRIDE; p += STRIDE) {
    gatherLine(w, p);
    w[p + COUPLING] = b0 * w[p + LINE_DRIFT] + g0 * w[p + LINE_RATE];
  }
  if (full !== null) {
    if (!invertInto(work, full)) return false;
    holds[0] = 1;
    return true;
  }
  const top = (n - 1) * STRIDE;
  for (let p = from * STRIDE; p <= top; p += STRIDE) {
    const here = w[p + COUPLING];
    const above = p < top ? w[p + STRIDE + COUPLING] : 0;
    const multiplier = p > 0 ? -here * w[p - STRIDE + PER_PIVOT] : 0;
    const pivot = onMass * w[p + MASS] + g0 * w[p + FLOOR_DASHPOT] + here + above + multiplier * here;
    if (!(pivot > 0)) return false;
    w[p + MULTIPLIER] = multiplier;
    w[p + PER_PIVOT] = 1 / pivot;
  }
  holds[0] = 1;
  return true;
}

/** After a step that did not converge: lines that start from where the storeys stand, at their initial stiffness. */
export function freshLines({ n, w }: NonlinearWork): void {
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    w[p + SLOPE] = w[p + K];
    w[p + TANGENT] = w[p + K];
    w[p + INTERCEPT] = w[p + FORCE] - w[p + K] * w[p + DRIFT];
    freshDamperLine(w, p);
  }
}

/** As a damper starts at rest: with an exponent under 1 it sticks, else on its tangent at zero velocity. */
export function freshDamperLine(w: Float64Array, p: number): void {
  const a = w[p + EXPONENT];
  w[p + DAMPER_INTERCEPT] = 0;
  w[p + DAMPER_SLOPE] = w[p + DAMPER] === 0 ? 0 : a === 1 ? w[p + DAMPER] : a < 1 ? w[p + STICK] : 0;
}

/** What a storey carries while it is on its lines, law, P-Delta, dashpot and damper together: LINE + LINE_DRIFT x drift + LINE_RATE x its rate. */
function gatherLine(w: Float64Array, p: number): void {
  w[p + LINE] = w[p + INTERCEPT] + w[p + DAMPER_INTERCEPT];
  w[p + LINE_DRIFT] = w[p + SLOPE] - w[p + P_OVER_H];
  w[p + LINE_RATE] = w[p + STOREY_DASHPOT] + w[p + DAMPER_SLOPE];
}

/** The matrix again after the lines changed from storey `lowest` up; false where it is no longer positive definite. */
export function renew(work: NonlinearWork, lowest: number): boolean {
  if (work.full === null) return refactor(work, lowest > 0 ? lowest - 1 : 0);
  const shifted = shiftInverse(work, work.full);
  work.holds[0] = shifted ? 1 : 0;
  return shifted;
}

/** The inverse of the step's matrix where damping is full, afresh, from the couplings as they stand. */
function invertInto({ n, w, now }: NonlinearWork, { inverse, damping, updates }: FullWork): boolean {
  const onMass = 1 - now[AM];
  const onDamping = (1 - now[AF]) * now[GAMMA] * now[H];
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
 * @returns false where the matrix is no longer positive definite
 */
function shiftInverse(work: NonlinearWork, full: FullWork): boolean {
  const { n, w, now } = work;
  const { inverse, column, updates } = full;
  const wf = 1 - now[AF];
  const b0 = wf * now[BETA] * now[H] * now[H];
  const g0 = wf * now[GAMMA] * now[H];
  let afresh = false;
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    gatherLine(w, p);
    const coupling = b0 * w[p + LINE_DRIFT] + g0 * w[p + LINE_RATE];
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
    if (share < CANCELS) {
      afresh = true;
      continue;
    }
    const factor = more / share;
    for (let r = 0, at = 0; r < n; r++) {
      const scaled = factor * column[r];
      for (let c = 0; c < n; c++, at++) inverse[at] -= scaled * column[c];
    }
  }
  return afresh ? invertInto(work, full) : true;
}
