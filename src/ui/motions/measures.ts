import { useMemo } from 'react';
import { measuresOf } from '../../core/motion/measures.ts';
import type { MotionMeasures } from '../../core/motion/reading.ts';

const known = new WeakMap<Float64Array, MotionMeasures>();

/** Those that were worked out already. */
export function knownMeasures(samples: Float64Array): MotionMeasures | undefined {
  return known.get(samples);
}

/** Measures of a motion as stored, worked out once: samples are never changed in place. */
export function measuresOfSamples(samples: Float64Array, interval: number): MotionMeasures {
  const found = known.get(samples);
  if (found !== undefined) return found;
  const measures = measuresOf({ interval, acceleration: samples });
  known.set(samples, measures);
  return measures;
}

export function useMeasures(samples: Float64Array | null, interval: number): MotionMeasures | null {
  return useMemo(() => (samples === null ? null : measuresOfSamples(samples, interval)), [samples, interval]);
}
