import { largestBetween } from './between.ts';
import { type Recurrence, recurrence } from './recurrence.ts';

/** Steps that a period has at least: see `largestBetween` for what follows from it. */
const STEPS_A_PERIOD = 36;

/**
 * Largest |relative displacement| of one oscillator under a motion, from rest, between samples too, to one period after the
 * motion has fallen to zero (one interval after its last sample). Within 1e-4, mostly far better.
 *
 * Long periods take one step a sample; where that leaves a period fewer than 36 steps the interval is split. Where more than two
 * damped cycles fall in an interval, only its first and last are followed, with one exact step between: u is a straight line and
 * a fading sinusoid there, so values at equal phase of successive cycles are a convex sequence wherever the sinusoid adds to the
 * line, and the largest of a convex sequence is its first or its last.
 *
 * @param ag        ground acceleration at the samples [m/s2], at least one
 * @param interval  [s]
 * @param w         circular frequency [rad/s], > 0 and below 1e10 / interval
 * @param z         damping ratio, 0 to below 1
 * @returns         [m]
 */
export function largestDisplacement(ag: Float64Array, interval: number, w: number, z: number): number {
  const period = (2 * Math.PI) / w;
  const parts = Math.max(1, Math.ceil((STEPS_A_PERIOD * interval) / period));
  // A damped cycle, or as long as it takes the sinusoid to fade by e^-40, below the last figure.
  const cycle = Math.ceil(STEPS_A_PERIOD * Math.min(1 / Math.sqrt(1 - z * z), 40 / (2 * Math.PI * z)));
  if (parts <= 2 * cycle) return march(ag, interval, w, z, interval / parts, parts, null);
  const h = period / STEPS_A_PERIOD;
  return march(ag, interval, w, z, h, 2 * cycle + 1, recurrence(w, z, interval - 2 * cycle * h));
}

/**
 * A step is looked into where the hull of its cubic (the Bezier points u0, u0 + h v0 / 3, u1 - h v1 / 3, u1, between which it
 * lies) reaches this share of the largest value so far. The share is how far the cubic may fall short of u, in the worst case of
 * `largestBetween`'s space (0.13 % without damping and w h z beside that, at w h = pi / 18), with a little to spare.
 */
function shareWatched(w: number, z: number, h: number): number {
  return 1 - 1.1 * w * h * z - (w * h * w * h) / 20;
}

/** Marches with each interval in so many steps: all of them h, or all but the middle one, which is the leap. */
function march(
  ag: Float64Array,
  interval: number,
  w: number,
  z: number,
  h: number,
  steps: number,
  leap: Recurrence | null,
): number {
  const { a11, a12, a21, a22, b11, b12, b21, b22 } = recurrence(w, z, h);
  const leapAt = leap === null ? 0 : (steps + 1) / 2;
  const share = shareWatched(w, z, h);
  const third = h / 3;
  const [c, k] = [2 * z * w, w * w];
  let [u, v, largest, near] = [0, 0, 0, 0];
  let g = ag[0];
  for (let i = 1; i <= ag.length; i++) {
    const from = g;
    const to = i < ag.length ? ag[i] : 0;
    const slope = (to - from) / interval;
    for (let step = 1; step <= steps; step++) {
      const t = step < leapAt ? step * h : interval - (steps - step) * h;
      const gn = step === steps ? to : from + slope * t;
      if (leap !== null && step === leapAt) {
        const before = u;
        u = leap.a11 * u + leap.a12 * v + (leap.b11 * g + leap.b12 * gn);
        v = leap.a21 * before + leap.a22 * v + (leap.b21 * g + leap.b22 * gn);
        g = gn;
        continue;
      }
      // The ground's share on its own: it does not wait for the step before.
      const un = a11 * u + a12 * v + (b11 * g + b12 * gn);
      const vn = a21 * u + a22 * v + (b21 * g + b22 * gn);
      if (Math.abs(un) > near || Math.abs(u + third * v) > near || Math.abs(un - third * vn) > near) {
        const between = largestBetween(u, v, -g - c * v - k * u, un, vn, -gn - c * vn - k * un, h);
        largest = Math.max(largest, Math.abs(un), between);
        near = share * largest;
      }
      u = un;
      v = vn;
      g = gn;
    }
  }
  return Math.max(largest, largestFree(w, z, u, v));
}

/** Largest |u| in one period of free vibration from u, v: where the velocity is first zero, or at the period's end if that is later. */
function largestFree(w: number, z: number, u: number, v: number): number {
  const root = Math.sqrt(1 - z * z);
  const wd = w * root;
  // u(t) = e^(-z w t) (u cos wd t + b sin wd t), without slope where tan wd t = v / ((w^2 u + z w v) / wd).
  const b = (v + z * w * u) / wd;
  let phase = Math.atan2(v, (w * w * u + z * w * v) / wd);
  if (phase < 0) phase += Math.PI;
  phase = Math.min(phase, 2 * Math.PI * root);
  return Math.abs(Math.exp((-z / root) * phase) * (u * Math.cos(phase) + b * Math.sin(phase)));
}
