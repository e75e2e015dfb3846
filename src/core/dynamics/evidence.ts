import type { PreparedFrame } from '../frame/prepare.ts';
import { methodOf } from './methods.ts';
import { type Accuracy, modeAccuracy } from './modeAccuracy.ts';
import type { Run } from './run.ts';
import { type PeakErrors, peakErrorsOf } from './stepError.ts';

/** How far the numbers of one run can be trusted. */
export interface Evidence {
  /** [s] */
  readonly step: number;
  /** interval / step, whole. */
  readonly parts: number;
  /** How `step: "auto"` came to it; null where the step was typed. */
  readonly auto: {
    /** "4 parts of the interval of 0.01 s, the first with a step error under 1 %" */
    readonly why: string;
    /** False: the most parts that are tried were not enough; null while the run at half the step is out. */
    readonly converged: boolean | null;
  } | null;
  /** Estimated error of the peak drifts [-]; null while it is not known, and where the run ended early. */
  readonly stepError: number | null;
  /** The same of the other peaks; null while the run at half the step is out, and where either ended early. */
  readonly peakErrors: PeakErrors | null;
  /** [-] */
  readonly imbalance: number;
  /** Mean number of solves a step, and most of one step. */
  readonly solvesAStep: number;
  readonly mostSolves: number;
  /** Times that a step was halved because it did not converge. */
  readonly halvings: number;
  /** [s] */
  readonly shortestPeriod: number;
  /** Shortest period / step [-]. */
  readonly stepsInShortest: number;
  /** What scheme and step make of each mode of the initial stiffness, longest period first. */
  readonly modes: readonly Accuracy[];
}

/**
 * @param interval   of the motion [s]
 * @param stepError  null where it is not known
 * @param auto       how the step was chosen; null where it was typed
 * @param half       the run at half the step; null while it is out
 */
export function evidenceOf(
  { modes, dampingRatios }: PreparedFrame,
  run: Run,
  interval: number,
  stepError: number | null,
  auto: Evidence['auto'] = null,
  half: Run | null = null,
): Evidence {
  const { step, marching, energy } = run;
  const method = methodOf(run.method);
  const shortestPeriod = modes[modes.length - 1].period;
  const done = run.ending ? Math.max(1, Math.round(run.ending.time / step)) : Math.max(1, run.steps);
  return {
    step,
    parts: Math.round(interval / step),
    auto,
    stepError,
    peakErrors: half && !half.ending && !run.ending ? peakErrorsOf(run, half) : null,
    imbalance: energy.imbalance,
    solvesAStep: marching.solves / done,
    mostSolves: marching.mostSolves,
    halvings: marching.halvings,
    shortestPeriod,
    stepsInShortest: shortestPeriod / step,
    modes: modes.map(({ frequency }, r) => modeAccuracy(method, frequency, dampingRatios[r], step)),
  };
}
