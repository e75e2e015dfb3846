import { STANDARD_GRAVITY } from '../units/constants.ts';
import { displacementOf, velocityOf } from './integrals.ts';
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
  const { interval: h, acceleration: a } = motion;
  const n = a.length;
  const v = velocityOf(a, h);
  const d = displacementOf(a, v, h);
  const square = new Float64Array(n);
  let [peakAcceleration, peakAt, peakVelocity, peakDisplacement] = [0, 0, 0, 0];
  for (let i = 0; i < n; i++) {
    if (Math.abs(a[i]) > peakAcceleration) [peakAcceleration, peakAt] = [Math.abs(a[i]), i];
    peakVelocity = Math.max(peakVelocity, Math.abs(v[i]));
    peakDisplacement = Math.max(peakDisplacement, Math.abs(d[i]));
    if (i === 0) continue;
    square[i] = square[i - 1] + (h / 3) * (a[i - 1] * a[i - 1] + a[i - 1] * a[i] + a[i] * a[i]);
    peakVelocity = Math.max(peakVelocity, velocityBetween(a[i - 1], a[i], v[i - 1], h));
    if (v[i - 1] * v[i] < 0)
      peakDisplacement = Math.max(peakDisplacement, displacementBetween(a[i - 1], a[i], v[i - 1], d[i - 1], h));
  }
  const total = square[n - 1];
  const start5to95 = timeAt(square, 0.05 * total, h);
  return {
    peakAcceleration,
    peakAccelerationTime: peakAt * h,
    peakVelocity,
    peakDisplacement,
    endVelocity: v[n - 1],
    ariasIntensity: (Math.PI / (2 * STANDARD_GRAVITY)) * total,
    start5to95,
    duration5to95: timeAt(square, 0.95 * total, h) - start5to95,
  };
}

/** Largest |velocity| where the acceleration crosses zero within an interval; 0 where it does not. */
function velocityBetween(a0: number, a1: number, v0: number, h: number): number {
  if (a0 * a1 >= 0) return 0;
  const t = (a0 / (a0 - a1)) * h;
  return Math.abs(v0 + (a0 * t) / 2);
}

/** |displacement| where the velocity crosses zero within an interval, by bisection of the parabola. */
function displacementBetween(a0: number, a1: number, v0: number, d0: number, h: number): number {
  const slope = (a1 - a0) / h;
  const velocity = (t: number) => v0 + a0 * t + (slope * t * t) / 2;
  let [from, to] = [0, h];
  for (let i = 0; i < 60; i++) {
    const middle = (from + to) / 2;
    if (velocity(middle) * v0 > 0) from = middle;
    else to = middle;
  }
  return Math.abs(d0 + v0 * from + (a0 * from * from) / 2 + (slope * from ** 3) / 6);
}

function timeAt(sum: Float64Array, value: number, h: number): number {
  for (let i = 1; i < sum.length; i++) {
    if (sum[i] >= value && sum[i] > sum[i - 1])
      return (i - 1 + Math.max(0, value - sum[i - 1]) / (sum[i] - sum[i - 1])) * h;
  }
  return 0;
}
