import { FIELD } from '../record.ts';
import type { LawBehaviour } from './law.ts';

const { K, K_YIELD, STRENGTH, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT } = FIELD;
const { LAW_P: EXPONENT, LAW_Q: BETA, LAW_R: GAMMA } = FIELD;
/** z; of the last trial: its z, and the part of its drift over the yield drift that went on unloading to z = 0. */
const { LAW_A: Z, LAW_B: TRIAL_Z, LAW_C: UNLOADING } = FIELD;
/** The exponent where it is whole and small enough for sums of powers, else 0. */
const { LAW_D: WHOLE } = FIELD;

/** Three-point Gauss-Legendre on [0, 1]: exact to the fifth degree. Source: Abramowitz and Stegun, table 25.4 (from memory). */
const NODE_1 = 0.5 - 0.5 * Math.sqrt(0.6);
const NODE_3 = 0.5 + 0.5 * Math.sqrt(0.6);
const OUTER = 5 / 18;
const MIDDLE = 8 / 18;

/**
 * Bouc-Wen: F = K_YIELD x + (1 - h) Fy z, z in [-1, 1]. z depends on the path alone: over y = |drift| / yield drift, in the direction of
 * the drift s and with u = s z,
 *
 *   loading (u >= 0)    du/dy = 1 - u^n,
 *   unloading (u < 0)   du/dy = 1 + (beta - gamma) |u|^n        (beta + gamma = 1).
 *
 * An update of its own, one formula for any increment, that keeps |z| <= 1 and rises with the increment whatever its size:
 *
 * - Loading in q = -ln(1 - u): dq/dy = G(u) = (1 - u^n) / (1 - u) = 1 + u + ... + u^(n-1), between 1 and n and rising with q. Classical
 *   Runge-Kutta of order 4 in q: a mean of slopes between 1 and n, each of them rising with y. (In z itself it leaves [-1, 1] at
 *   increments of about three yield drifts.) Exact for n = 1. Within the stages exp(-q) is 1 / (its Taylor polynomial of degree 4), which
 *   falls from 1 to 0 as it does, keeps the order, and is faster.
 * - Unloading as a quadrature, y = integral of du / (1 + (beta - gamma) |u|^n), solved for the end: no stage can fall past zero, and the y at
 *   which zero is reached, from where the rest loads, comes without a search. Straight, and in closed form, for beta = gamma.
 *
 * The tangent differentiates these formulas themselves. trial() leaves z and the part unloaded in LAW_B and LAW_C, for commit().
 *
 * Source: Wen (1976), J. Eng. Mech. Div. ASCE 102, 249-263 (from memory); the update is our own.
 */
export const boucWen: LawBehaviour = { begin, trial, commit, recoverable };

function begin(w: Float64Array, at: number): void {
  const n = w[at + EXPONENT];
  w[at + WHOLE] = Number.isInteger(n) && n <= 8 ? n : 0;
  w[at + Z] = 0;
  w[at + TRIAL_Z] = 0;
  w[at + UNLOADING] = 0;
}

export function trial(w: Float64Array, at: number): void {
  const step = w[at + TRIAL_DRIFT] - w[at + DRIFT];
  const way = step > 0 ? 1 : step < 0 ? -1 : w[at + Z] < 0 ? -1 : 1;
  const k = w[at + K];
  const kYield = w[at + K_YIELD];
  const y = (way * step * k) / w[at + STRENGTH];
  w[at + TRIAL_Z] = w[at + Z];
  w[at + UNLOADING] = 0;
  let slope = 1;
  if (way * w[at + Z] < 0) {
    if (w[at + BETA] === w[at + GAMMA]) {
      const room = -way * w[at + Z];
      w[at + UNLOADING] = Math.min(y, room);
      w[at + TRIAL_Z] = y < room ? way * (y - room) : 0;
    } else {
      unload(w, at, way);
      slope = w[at + TANGENT];
    }
  }
  const rest = y - w[at + UNLOADING];
  if (way * w[at + TRIAL_Z] >= 0) {
    // Four slopes G of Runge-Kutta and, beside each, its derivative by y; dG/dq = G - n u^(n-1).
    const n = w[at + EXPONENT];
    const whole = w[at + WHOLE];
    const start = way * w[at + TRIAL_Z];
    const room = 1 - start;
    let left = room;
    let g = 0;
    let gRate = 0;
    let sum = 0;
    let sumRate = 0;
    for (let stage = 0; stage < 4; stage++) {
      let rate = 0;
      if (stage > 0) {
        const part = stage < 3 ? 0.5 : 1;
        const q = part * rest * g;
        const cubic = 1 + q * (1 + q * (1 / 2 + q * (1 / 6)));
        const perQuartic = 1 / (cubic + (q * q * q * q) / 24);
        left = room * perQuartic;
        rate = part * (g + rest * gRate) * cubic * perQuartic;
      }
      const u = 1 - left;
      let power = 1;
      if (whole > 0) {
        g = 1;
        for (let j = 1; j < whole; j++) {
          power *= u;
          g += power;
        }
      } else {
        // 1 - u^n from what is left to 1, so that nothing cancels near it.
        const gap = -Math.expm1(n * Math.log1p(-left));
        g = left > 0 ? gap / left : n;
        power = u > 0 ? (1 - gap) / u : 0;
      }
      gRate = (g - n * power) * rate;
      const weight = stage === 0 || stage === 3 ? 1 / 6 : 1 / 3;
      sum += weight * g;
      sumRate += weight * gRate;
    }
    const gain = Math.expm1(-rest * sum);
    w[at + TRIAL_Z] = way * (start - room * gain);
    slope = room * (1 + gain) * (sum + rest * sumRate);
  }
  w[at + TRIAL_FORCE] = kYield * w[at + TRIAL_DRIFT] + (1 - kYield / k) * w[at + STRENGTH] * w[at + TRIAL_Z];
  w[at + TANGENT] = kYield + (k - kYield) * slope;
}

/**
 * Unloading for beta > gamma: finds the part L of |z| that is gone after y, y = L x mean of 1 / (1 + c u^n) at the nodes, by Newton
 * between y and |z|, halving where it would leave them. Writes TRIAL_Z, UNLOADING, and d|z|/dy to TANGENT.
 */
function unload(w: Float64Array, at: number, way: number): void {
  const n = w[at + EXPONENT];
  const c = w[at + BETA] - w[at + GAMMA];
  const start = -way * w[at + Z];
  const y = (way * (w[at + TRIAL_DRIFT] - w[at + DRIFT]) * w[at + K]) / w[at + STRENGTH];
  let low = y;
  let high = start;
  let part = start;
  // The first pass measures the whole way to zero; where y reaches as far there is nothing to solve.
  for (let pass = 0; pass < 60; pass++) {
    let mean = 0;
    let rate = 0;
    for (let i = 0; i < 3; i++) {
      const node = i === 0 ? NODE_1 : i === 1 ? 0.5 : NODE_3;
      const weight = i === 1 ? MIDDLE : OUTER;
      const u = start - part * node;
      const power = c * u ** (n - 1);
      const g = 1 / (1 + power * u);
      mean += weight * g;
      rate += weight * g * (1 + part * node * n * power * g);
    }
    const gap = part * mean - y;
    w[at + TANGENT] = 1 / rate;
    if (pass === 0 && gap <= 0) {
      w[at + TRIAL_Z] = 0;
      w[at + UNLOADING] = part * mean;
      return;
    }
    const move = gap / rate;
    if (Math.abs(move) <= 4e-16 * start) break;
    if (gap > 0) high = part;
    else low = part;
    const next = part - move;
    part = next >= low && next <= high ? next : 0.5 * (low + high);
  }
  w[at + TRIAL_Z] = way * (part - start);
  w[at + UNLOADING] = y;
}

/**
 * Work exact in the two parts' own terms, with quadratures that stay within their bounds for any increment: z dy is u du /
 * (1 + c |u|^n) while unloading, and dy - du / G(u) while loading.
 */
export function commit(w: Float64Array, at: number): void {
  const d0 = w[at + DRIFT];
  const d1 = w[at + TRIAL_DRIFT];
  const k = w[at + K];
  const kYield = w[at + K_YIELD];
  const way = d1 > d0 ? 1 : -1;
  const yieldDrift = w[at + STRENGTH] / k;
  const from = way * w[at + Z];
  const to = way * w[at + TRIAL_Z];
  let integral = 0;
  if (from < 0) {
    const c = w[at + BETA] - w[at + GAMMA];
    const part = Math.min(to, 0) - from;
    if (c === 0) integral = part * (from + 0.5 * part);
    else {
      const n = w[at + EXPONENT];
      for (let i = 0; i < 3; i++) {
        const u = from + part * (i === 0 ? NODE_1 : i === 1 ? 0.5 : NODE_3);
        integral += ((i === 1 ? MIDDLE : OUTER) * part * u) / (1 + c * (-u) ** n);
      }
    }
  }
  if (to > 0) {
    const n = w[at + EXPONENT];
    const whole = w[at + WHOLE];
    const start = Math.max(from, 0);
    const part = to - start;
    integral += (way * (d1 - d0)) / yieldDrift - w[at + UNLOADING];
    for (let i = 0; i < 3; i++) {
      const u = start + part * (i === 0 ? NODE_1 : i === 1 ? 0.5 : NODE_3);
      let g = 1;
      if (whole > 0) {
        let power = 1;
        for (let j = 1; j < whole; j++) {
          power *= u;
          g += power;
        }
      } else g = u < 1 ? -Math.expm1(n * Math.log(u)) / (1 - u) : n;
      integral -= ((i === 1 ? MIDDLE : OUTER) * part) / g;
    }
  }
  w[at + WORK] += 0.5 * kYield * (d0 + d1) * (d1 - d0) + (1 - kYield / k) * w[at + STRENGTH] * yieldDrift * integral;
  w[at + Z] = w[at + TRIAL_Z];
  w[at + DRIFT] = d1;
  w[at + FORCE] = w[at + TRIAL_FORCE];
}

/** f^2 / (2 k): unloading is straight at the initial stiffness for beta = gamma, and at least as steep otherwise. */
function recoverable(w: Float64Array, at: number, out: number): void {
  w[out] = (0.5 * w[at + FORCE] * w[at + FORCE]) / w[at + K];
}
