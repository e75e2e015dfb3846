import type { Run } from '../dynamics/run.ts';
import type { Frame } from '../frame/frame.ts';
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
  /** factor x measure / limit per storey [-]; NaN for an isolator, whose displacement has a limit of its own. */
  readonly ratio: Float64Array | null;
  /** [N] */
  readonly shear: Statistic | null;
  /** [N m] */
  readonly overturning: Statistic | null;
  /** Peak drift / yield drift [-]; NaN for elastic storeys. */
  readonly ductility: Statistic | null;
  /** Of magnitudes [m]. */
  readonly residualDrift: Statistic | null;
  /** Relative to the ground [m]. */
  readonly displacement: Statistic | null;
  /** Total [m/s2]. */
  readonly acceleration: Statistic | null;
  /** Storey with the largest ratio, -1 while there is none. */
  readonly governingStorey: number;
  /** The isolator under the frame; null where there is none. */
  readonly isolator: {
    /** Displacement that it may reach [m]; null: not compared. */
    readonly limit: number | null;
    /** measure of its displacement / limit [-], without the factor on storey drifts; null while either is not there. */
    readonly ratio: number | null;
  } | null;
}

/**
 * Mean, median, largest and governing motion of every answer, the drift against its limit, and an isolator's displacement against
 * its own.
 */
export function envelopeOf(
  runs: readonly { readonly motion: string; readonly run: Run }[],
  limits: Limits,
  leftOut: readonly string[],
  { storeys }: Pick<Frame, 'storeys'>,
): Envelope {
  const incomplete = runs.filter(({ run }) => run.ending !== null).map(({ motion }) => motion);
  const measure = limits.measure ?? (runs.length >= MOTIONS_FOR_MEAN ? 'mean' : 'max');
  const factor = limits.factor ?? 1;
  const of = (pick: (run: Run) => Float64Array) =>
    runs.length > 0 && incomplete.length === 0 ? statisticOf(runs.map(({ run }) => pick(run))) : null;
  const drift = of((run) => run.storeys.peakDriftRatio);
  const isolated = storeys[0]?.role === 'isolator';
  const ratio =
    drift?.[measure].map((value, i) => (isolated && i === 0 ? Number.NaN : (factor * value) / limits.drift)) ?? null;
  const displacement = of((run) => run.floors.peakDisplacement);
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
    ductility: of((run) => run.storeys.ductility),
    residualDrift: of((run) => run.storeys.residualDrift.map(Math.abs)),
    displacement,
    acceleration: of((run) => run.floors.peakAcceleration),
    governingStorey: ratio ? largestOf(ratio) : -1,
    isolator: isolated ? isolatorOf(limits.isolator, displacement?.[measure][0]) : null,
  };
}

/** The isolator is the first storey: what its floor moves relative to the ground is its own displacement. */
function isolatorOf(limit: number | undefined, displacement: number | undefined): Envelope['isolator'] {
  if (limit === undefined) return { limit: null, ratio: null };
  return { limit, ratio: displacement === undefined ? null : displacement / limit };
}

/** Place of the largest value, NaN passed over; -1 where there is none. */
function largestOf(values: Float64Array): number {
  let at = -1;
  for (let i = 0; i < values.length; i++) {
    if (!Number.isNaN(values[i]) && (at < 0 || values[i] > values[at])) at = i;
  }
  return at;
}
