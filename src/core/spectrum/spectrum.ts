import { recurrence } from './recurrence.ts';

/** Response spectrum of one motion; arrays have one entry a period. */
export interface Spectrum {
  /** [s] */
  readonly periods: Float64Array;
  /** Largest relative displacement [m]. */
  readonly displacement: Float64Array;
  /** w times that [m/s]. */
  readonly pseudoVelocity: Float64Array;
  /** w^2 times that [m/s2]; the peak ground acceleration at period 0. */
  readonly pseudoAcceleration: Float64Array;
}

/**
 * The step is split so that a period has at least this many parts. Between steps the displacement is then taken as the cubic
 * through u and v at both ends, whose error is at most h^4 max|u''''| / 384. With h = T / 20, w h = 0.314: (w h)^4 / 384 =
 * 2.5e-5 of the peak for the free part; the forced part is slower. So a largest value is true within 1e-4.
 */
const PARTS_A_PERIOD = 20;

/**
 * An interval is split into at most so many parts: an oscillator stiffer than that (a period under a hundredth of the interval)
 * follows the ground, and what it swings about it, 2 / (w x interval) of the peak at most, is then only partly seen.
 */
const MOST_PARTS = 2000;

/**
 * Largest response of damped oscillators to a motion, between samples too, followed for one period after the motion has fallen
 * to zero (one interval after its last sample). Exact piecewise-linear recurrence: no error from the step.
 *
 * @param motion   samples [m/s2], interval [s]
 * @param damping  ratio of critical, 0 to below 1
 * @param periods  [s], 0 or above; at 0 displacement and pseudo-velocity are 0 and pseudo-acceleration is the peak of the motion
 * @throws RangeError for damping or a period out of range
 * Source: Nigam and Jennings (1969), see recurrence.ts.
 */
export function spectrumOf(
  motion: { readonly interval: number; readonly acceleration: Float64Array },
  damping: number,
  periods: Float64Array | readonly number[],
): Spectrum {
  if (!(damping >= 0 && damping < 1)) throw new RangeError(`spectrum: damping ${damping}, expected 0 to below 1`);
  const n = periods.length;
  const out: Spectrum = {
    periods: Float64Array.from(periods),
    displacement: new Float64Array(n),
    pseudoVelocity: new Float64Array(n),
    pseudoAcceleration: new Float64Array(n),
  };
  for (let i = 0; i < n; i++) {
    const period = periods[i];
    if (!(period >= 0 && Number.isFinite(period)))
      throw new RangeError(`spectrum: period ${period}, expected 0 or above`);
    if (period === 0) {
      let peak = 0;
      for (const a of motion.acceleration) peak = Math.max(peak, Math.abs(a));
      out.pseudoAcceleration[i] = peak;
      continue;
    }
    const w = (2 * Math.PI) / period;
    const largest = largestDisplacement(motion.acceleration, motion.interval, w, damping);
    out.displacement[i] = largest;
    out.pseudoVelocity[i] = w * largest;
    out.pseudoAcceleration[i] = w * w * largest;
  }
  return out;
}

function largestDisplacement(ag: Float64Array, interval: number, w: number, z: number): number {
  const period = (2 * Math.PI) / w;
  const parts = Math.min(MOST_PARTS, Math.max(1, Math.ceil((PARTS_A_PERIOD * interval) / period)));
  const h = interval / parts;
  const { a11, a12, a21, a22, b11, b12, b21, b22 } = recurrence(w, z, h);
  const last = ag.length;
  let u = 0;
  let v = 0;
  let largest = 0;
  for (let i = 0; i < last; i++) {
    const from = ag[i];
    const rise = ((i + 1 < last ? ag[i + 1] : 0) - from) / parts;
    let g = from;
    for (let k = 1; k <= parts; k++) {
      const gn = k === parts ? from + rise * parts : from + rise * k;
      const un = a11 * u + a12 * v + b11 * g + b12 * gn;
      const vn = a21 * u + a22 * v + b21 * g + b22 * gn;
      const size = un < 0 ? -un : un;
      if (size > largest) largest = size;
      if (v * vn < 0) {
        const between = extremeBetween(u, v, un, vn, h);
        if (between > largest) largest = between;
      }
      u = un;
      v = vn;
      g = gn;
    }
  }
  return Math.max(largest, freeVibrationPeak(u, v, w, z));
}

/** Largest |u| of the cubic through u0, v0, u1, v1 where its slope is zero within the step. */
function extremeBetween(u0: number, v0: number, u1: number, v1: number, h: number): number {
  const d = (u1 - u0) / h;
  const a = 3 * (v0 + v1 - 2 * d);
  const b = 2 * (3 * d - 2 * v0 - v1);
  // Slope of the cubic: a s^2 + b s + v0 = 0, s = t / h in (0, 1); the root in the stable form.
  const root = Math.sqrt(Math.max(0, b * b - 4 * a * v0));
  const q = -0.5 * (b + (b >= 0 ? root : -root));
  let s = q === 0 ? 0.5 : v0 / q;
  if (!(s >= 0 && s <= 1)) s = a === 0 ? 0.5 : q / a;
  if (!(s >= 0 && s <= 1)) return 0;
  return Math.abs(u0 + h * s * (v0 + s * (b / 2 + (s * a) / 3)));
}

/** Largest |u| within one period of free vibration from u, v: the closed form at the first two instants where v = 0. */
function freeVibrationPeak(u: number, v: number, w: number, z: number): number {
  const wd = w * Math.sqrt(1 - z * z);
  const b = (v + z * w * u) / wd;
  // u(t) = e^(-z w t) (u cos + b sin); u' = 0 where tan(wd t) = v / ((u w^2 + z w v) / wd).
  let t = Math.atan2(v, (u * w * w + z * w * v) / wd) / wd;
  const half = Math.PI / wd;
  while (t < 0) t += half;
  let largest = 0;
  for (let k = 0; k < 2; k++, t += half) {
    largest = Math.max(largest, Math.abs(Math.exp(-z * w * t) * (u * Math.cos(wd * t) + b * Math.sin(wd * t))));
  }
  return largest;
}
