import { useMemo } from 'react';

/** What the strip marks of a motion, as stored. */
export interface MotionFacts {
  /** Signed value of largest magnitude [m/s2], and when [s]. */
  readonly peak: number;
  readonly peakTime: number;
  /** When 5 and 95 % of the Arias intensity have come [s]; null where the motion is still. */
  readonly strong: { readonly from: number; readonly to: number } | null;
}

const known = new WeakMap<Float64Array, MotionFacts>();

export function motionFacts(samples: Float64Array, interval: number): MotionFacts {
  const found = known.get(samples);
  if (found !== undefined) return found;
  let at = 0;
  let total = 0;
  for (let i = 0; i < samples.length; i++) {
    if (Math.abs(samples[i]) > Math.abs(samples[at])) at = i;
    total += samples[i] * samples[i];
  }
  let [sum, from, to] = [0, 0, 0];
  for (let i = 0; i < samples.length; i++) {
    sum += samples[i] * samples[i];
    if (sum < 0.05 * total) from = i + 1;
    if (sum < 0.95 * total) to = i + 1;
  }
  const facts = {
    peak: samples[at] ?? 0,
    peakTime: at * interval,
    strong: total > 0 ? { from: from * interval, to: to * interval } : null,
  };
  known.set(samples, facts);
  return facts;
}

export function useMotionFacts(samples: Float64Array | null, interval: number): MotionFacts | null {
  return useMemo(() => (samples === null ? null : motionFacts(samples, interval)), [samples, interval]);
}
