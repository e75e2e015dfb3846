import type { Run } from '../dynamics/run.ts';
import type { Limits } from './limits.ts';

/** One statistic of the suite, per storey or floor, ground up. NaN arrays never occur: incomplete suites have null. */
export interface Statistic {
  readonly mean: Float64Array;
  readonly median: Float64Array;
  readonly max: Float64Array;
  /** Index into `motions` of the run with the largest value. */
  readonly governing: Int32Array;
}

export type Measure = 'mean' | 'median' | 'max';

/** The suite's answer. */
export interface Envelope {
  /** Names of the motions that went in, in document order. */
  readonly motions: readonly string[];
  /** Names left out by `used: false`. */
  readonly leftOut: readonly string[];
  /** Names of used motions that did not run to their end; not empty: every statistic is null. */
  readonly incomplete: readonly string[];
  /** The statistic that is compared with the limit. */
  readonly measure: Measure;
  readonly factor: number;
  readonly limit: number;
  /** Drift ratio [-]. */
  readonly drift: Statistic | null;
  /** factor x measure / limit per storey [-]. */
  readonly ratio: Float64Array | null;
  readonly shear: Statistic | null;
  readonly overturning: Statistic | null;
  /** Of magnitudes [m]. */
  readonly residualDrift: Statistic | null;
  readonly displacement: Statistic | null;
  readonly acceleration: Statistic | null;
  /** Storey with the largest ratio, -1 while there is none. */
  readonly governingStorey: number;
}

export declare function envelopeOf(
  runs: readonly { readonly motion: string; readonly run: Run }[],
  heights: Float64Array,
  limits: Limits,
  leftOut: readonly string[],
): Envelope;
