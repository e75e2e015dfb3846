import type { Run } from '../dynamics/run.ts';
import type { Limits } from './limits.ts';
import { type Measure, type Statistic, statisticOf } from './statistic.ts';

/** From so many motions on the mean of the suite is compared, below it the largest. Source: EN 1998-1:2004 4.3.3.4.3(3). */
export const MOTIONS_FOR_MEAN = 7;

/** The suite's answer. Where a used motion did not run to its end, every statistic is null. */
export interface Envelope {
  /** Names of the motions that went in, in document order. */
  readonly motions: readonly string[];
  /** Names left out by `used: false`. */
  readonly leftOut: readonly string[];
  /** Names of used motions that did not run to their end. */
  readonly incomplete: readonly string[];
  /** The statistic that is compared with the limit. */
  readonly measure: Measure;
  readonly factor: number;
  /** Allowable storey drift ratio [-]. */
  readonly limit: number;
  /** Computed drift ratio, before the factor [-]. */
  readonly drift: Statistic | null;
  /** factor x measure / limit per storey [-]. */
  readonly ratio: Float64Array | null;
  /** [N] */
  readonly shear: Statistic | null;
  /** [N m] */
  readonly overturning: Statistic | null;
  /** Of magnitudes [m]. */
  readonly residualDrift: Statistic | null;
  /** Relative to the ground [m]. */
  readonly displacement: Statistic | null;
  /** Total [m/s2]. */
  readonly acceleration: Statistic | null;
  /** Storey with the largest ratio, -1 while there is none. */
  readonly governingStorey: number;
}

/** Mean, median, largest and governing motion of every answer, and the drift against its limit. */
export function envelopeOf(
  runs: readonly { readonly motion: string; readonly run: Run }[],
  limits: Limits,
  leftOut: readonly string[],
): Envelope {
  const incomplete = runs.filter(({ run }) => run.ending !== null).map(({ motion }) => motion);
  const measure = limits.measure ?? (runs.length >= MOTIONS_FOR_MEAN ? 'mean' : 'max');
  const factor = limits.factor ?? 1;
  const of = (pick: (run: Run) => Float64Array) =>
    runs.length > 0 && incomplete.length === 0 ? statisticOf(runs.map(({ run }) => pick(run))) : null;
  const drift = of((run) => run.storeys.peakDriftRatio);
  const ratio = drift ? drift[measure].map((value) => (factor * value) / limits.drift) : null;
  return {
    motions: runs.map(({ motion }) => motion),
    leftOut,
    incomplete,
    measure,
    factor,
    limit: limits.drift,
    drift,
    ratio,
    shear: of((run) => run.storeys.peakShear),
    overturning: of((run) => run.storeys.peakOverturning),
    residualDrift: of((run) => run.storeys.residualDrift.map(Math.abs)),
    displacement: of((run) => run.floors.peakDisplacement),
    acceleration: of((run) => run.floors.peakAcceleration),
    governingStorey: ratio ? ratio.indexOf(Math.max(...ratio)) : -1,
  };
}
