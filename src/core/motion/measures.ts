import { STANDARD_GRAVITY } from '../units/constants.ts';
import type { MotionMeasures } from './reading.ts';

/**
 * Measures of a motion as read: acceleration is the broken line through the samples, integrated from rest with no correction.
 * Peaks of velocity and displacement are the true ones, between samples too. Arias intensity pi / (2 g) times the integral of
 * a^2, exact for the broken line; the 5 to 95 % duration by linear interpolation of that integral between samples.
 * Source: Arias (1970), in Seismic Design for Nuclear Power Plants, MIT Press; Trifunac and Brady (1975), Bull. Seism. Soc. Am.
 * 65, 581-626.
 *
 * @param motion  at least one sample [m/s2], interval [s]
 */
export function measuresOf(motion: { readonly interval: number; readonly acceleration: Float64Array }): MotionMeasures {
  const { interval: h, acceleration } = motion;
  const n = acceleration.length;
  let [a, v, d] = [acceleration[0], 0, 0];
  let [peakAcceleration, peakAt, peakVelocity, peakDisplacement, total] = [Math.abs(a), 0, 0, 0, 0];
  for (let i = 1; i < n; i++) {
    // The steps of velocityOf and displacementOf, without arrays as long as the record.
    const an = acceleration[i];
    const vn = v + (h / 2) * (a + an);
    const dn = d + h * v + ((h * h) / 6) * (2 * a + an);
    total += squared(a, an, h);
    if (Math.abs(an) > peakAcceleration) {
      peakAcceleration = Math.abs(an);
      peakAt = i;
    }
    peakVelocity = Math.max(peakVelocity, Math.abs(vn));
    peakDisplacement = Math.max(peakDisplacement, Math.abs(dn));
    if (a * an < 0) peakVelocity = Math.max(peakVelocity, Math.abs(v + (a * a * h) / (2 * (a - an))));
    if (a * an < 0 || v * vn < 0) peakDisplacement = Math.max(peakDisplacement, displacementBetween(a, an, v, d, h));
    a = an;
    v = vn;
    d = dn;
  }
  const [start5to95, end] = timesAt(acceleration, h, 0.05 * total, 0.95 * total);
  return {
    peakAcceleration,
    peakAccelerationTime: peakAt * h,
    peakVelocity,
    peakDisplacement,
    endVelocity: v,
    ariasIntensity: (Math.PI / (2 * STANDARD_GRAVITY)) * total,
    start5to95,
    duration5to95: end - start5to95,
  };
}

/** Integral of the square of a straight line from a0 to a1 over h. */
function squared(a0: number, a1: number, h: number): number {
  return (h / 3) * (a0 * a0 + a0 * a1 + a1 * a1);
}

/** Largest |displacement| where the velocity, a parabola, is zero within an interval; 0 where it is nowhere zero. */
function displacementBetween(a0: number, a1: number, v0: number, d0: number, h: number): number {
  const slope = (a1 - a0) / h;
  const discriminant = a0 * a0 - 2 * slope * v0;
  if (!(discriminant >= 0)) return 0;
  // Roots without cancellation.
  const q = a0 >= 0 ? -a0 - Math.sqrt(discriminant) : -a0 + Math.sqrt(discriminant);
  const at = (t: number) => (t > 0 && t < h ? Math.abs(d0 + v0 * t + (a0 * t * t) / 2 + (slope * t ** 3) / 6) : 0);
  return Math.max(at(q / slope), at((2 * v0) / q));
}

/** When the integral of the squared acceleration reaches two values, the smaller first [s]. */
function timesAt(a: Float64Array, h: number, first: number, second: number): [number, number] {
  const times: [number, number] = [0, 0];
  let sum = 0;
  let next = 0;
  for (let i = 1; i < a.length && next < 2; i++) {
    const more = squared(a[i - 1], a[i], h);
    while (next < 2 && more > 0 && sum + more >= (next === 0 ? first : second)) {
      times[next] = (i - 1 + Math.max(0, (next === 0 ? first : second) - sum) / more) * h;
      next++;
    }
    sum += more;
  }
  return times;
}
