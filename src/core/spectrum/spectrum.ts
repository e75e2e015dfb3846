import { largestDisplacement } from './largest.ts';

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
 * Up to this share of the interval a period counts as 0: the oscillator is the ground, whose peak is the pseudo-acceleration. What
 * it would swing about the ground's line is below 4 / (w interval) of the peak a sample, 1e-9, even if every sample adds to it. A
 * motion whose first sample is not 0 begins with a jump, about which a short period swings however short it is; that ends here.
 */
const RIGID = 1e-9;

/**
 * Largest response of damped oscillators to a motion, between samples too (within 1e-4, see `largestDisplacement`), followed for
 * one period after the motion has fallen to zero, one interval after its last sample. The piecewise-linear motion is integrated
 * exactly: there is no error from a step.
 *
 * @param motion   samples [m/s2], at least one; interval [s]
 * @param damping  ratio of critical, 0 to below 1
 * @param periods  [s], 0 or above, in any order; at 0 displacement and pseudo-velocity are 0 and the pseudo-acceleration is
 *                 the peak of the motion
 * @throws RangeError for an empty motion, an interval, damping or period out of range
 * Source: Nigam and Jennings (1969), Bull. Seism. Soc. Am. 59, 909-922 (from memory).
 */
export function spectrumOf(
  motion: { readonly interval: number; readonly acceleration: Float64Array },
  damping: number,
  periods: Float64Array | readonly number[],
): Spectrum {
  const { interval, acceleration } = motion;
  if (acceleration.length === 0) throw new RangeError('spectrum: a motion of 0 samples, expected 1 or more');
  if (!(interval > 0 && Number.isFinite(interval)))
    throw new RangeError(`spectrum: interval ${interval}, expected above 0`);
  if (!(damping >= 0 && damping < 1)) throw new RangeError(`spectrum: damping ${damping}, expected 0 to below 1`);
  for (const period of periods) {
    if (!(period >= 0 && Number.isFinite(period)))
      throw new RangeError(`spectrum: period ${period}, expected 0 or above`);
  }
  const n = periods.length;
  const out: Spectrum = {
    periods: Float64Array.from(periods),
    displacement: new Float64Array(n),
    pseudoVelocity: new Float64Array(n),
    pseudoAcceleration: new Float64Array(n),
  };
  const peak = acceleration.reduce((largest, a) => Math.max(largest, Math.abs(a)), 0);
  for (let i = 0; i < n; i++) {
    const period = periods[i];
    if (period <= RIGID * interval) {
      const inverse = period / (2 * Math.PI);
      out.displacement[i] = peak * inverse * inverse;
      out.pseudoVelocity[i] = peak * inverse;
      out.pseudoAcceleration[i] = peak;
      continue;
    }
    const w = (2 * Math.PI) / period;
    const largest = largestDisplacement(acceleration, interval, w, damping);
    out.displacement[i] = largest;
    out.pseudoVelocity[i] = w * largest;
    out.pseudoAcceleration[i] = w * w * largest;
  }
  return out;
}
