import { governingRow } from '../../core/checks/governingRow.ts';
import { residualRatios } from '../../core/checks/residualRatio.ts';
import { type Measure, statisticOf } from '../../core/checks/statistic.ts';
import {
  printQuantity,
  printRatio,
  type Quantity,
  type System,
  toDisplay,
  unitOf,
} from '../../core/units/quantities.ts';
import type { Answers, MotionRun } from '../../state/results.ts';
import { samplesOf } from '../../state/samples.ts';

/** What the sheet draws and prints of an answer, in display units; storeys from the ground up. */
export interface AnswerRows {
  readonly storeys: number;
  readonly measure: Measure;
  readonly over: readonly boolean[];
  readonly governing: number;
  /** Drift that is compared [%]; null while a motion is not finished. */
  readonly drift: readonly number[] | null;
  readonly limit: number;
  /** Of each motion: name and compared drift a storey [%]. */
  readonly motions: readonly MotionDrift[];
  /** [display force] */
  readonly shear: readonly number[] | null;
  /** Total floor acceleration [g], floor 1 first. */
  readonly acceleration: readonly number[] | null;
  /** Peak ground acceleration as scaled [g]: of the suite, and of each motion by name; null where samples are missing. */
  readonly ground: { readonly suite: number; readonly motions: Readonly<Record<string, number>> } | null;
  /** Storey strengths on the axis of shear [display force], null for elastic storeys. */
  readonly strengths: readonly (number | null)[];
  /** The isolator under the frame in words, and whether its displacement exceeds its own limit; null where there is none. */
  readonly isolator: { readonly words: string; readonly ratio: string; readonly over: boolean } | null;
  readonly print: {
    readonly drift: readonly string[];
    readonly ratio: readonly string[];
    readonly ductility: readonly string[];
    readonly residual: readonly string[];
    readonly shear: readonly string[];
    readonly acceleration: readonly string[];
  };
  /** Runs that did not reach their end. */
  readonly failed: readonly Failed[];
}

export interface Failed {
  readonly motion: string;
  /** From 0; -1 where no single storey is to blame. */
  readonly storey: number;
  /** [s] */
  readonly time: number;
  /** "unstable in", or how else it ended. */
  readonly how: string;
}

export interface MotionDrift {
  readonly motion: string;
  readonly drift: readonly number[];
  readonly acceleration: readonly number[];
  /** False where the run ended early: its ticks are how far it came. */
  readonly finished: boolean;
}

/** Drifts of runs as the axis shows them: times the factor of the limit, so that bar, tick and limit compare. */
export function motionDrifts(runs: readonly MotionRun[], factor: number, system: System): MotionDrift[] {
  return runs.map(({ motion, run }) => ({
    motion,
    drift: Array.from(run.storeys.peakDriftRatio, (value) => toDisplay(factor * value, 'percent', system)),
    acceleration: Array.from(run.floors.peakAcceleration, (value) => toDisplay(value, 'acceleration', system)),
    finished: run.ending === null,
  }));
}

export function answerRowsOf(answers: Answers, system: System): AnswerRows {
  const { envelope, runs } = answers;
  const { measure, ratio, limit } = envelope;
  const storeys = answers.case.frame.storeys.length;
  const none = Array.from({ length: storeys }, () => 'none');
  const print = (values: Float64Array | null | undefined, quantity: Quantity, decimals: number) =>
    values === undefined || values === null
      ? none
      : Array.from(values, (value) => printQuantity(value, quantity, system, decimals));
  const shown = (values: Float64Array | undefined, quantity: 'percent' | 'force' | 'acceleration') =>
    values === undefined ? null : Array.from(values, (value) => toDisplay(value, quantity, system));
  const isolator = isolatorOf(answers, system);
  /** An isolator has no drift ratio of its own to show: its displacement stands in the row. */
  const withIsolator = (printed: readonly string[], own: string) =>
    isolator === null ? printed : [own, ...printed.slice(1)];
  const compared = ratio?.map((value) => value * limit);
  const shear = envelope.shear?.[measure];
  const acceleration = envelope.acceleration?.[measure];
  return {
    storeys,
    measure,
    over: Array.from({ length: storeys }, (_, storey) =>
      storey === 0 && isolator !== null ? isolator.over : (ratio?.[storey] ?? 0) > 1,
    ),
    governing: governingRow(envelope),
    drift: shown(compared, 'percent'),
    limit: toDisplay(limit, 'percent', system),
    motions: motionDrifts(runs, envelope.factor, system),
    strengths: answers.case.frame.storeys.map(({ law }) =>
      law.kind === 'elastic' ? null : toDisplay(law.strength, 'force', system),
    ),
    isolator,
    shear: shown(shear, 'force'),
    acceleration: shown(acceleration, 'acceleration'),
    ground: groundOf(answers, system),
    print: {
      drift: withIsolator(print(compared, 'percent', 2), ''),
      ratio: withIsolator(ratio === null ? none : Array.from(ratio, printRatio), isolator?.ratio ?? ''),
      ductility: print(envelope.ductility?.[measure], 'ratio', 1),
      residual: withIsolator(print(residualRatios(envelope, answers.case.frame), 'percent', 2), ''),
      shear: print(shear, 'force', 0),
      acceleration: print(acceleration, 'acceleration', 2),
    },
    failed: runs.flatMap(({ motion, run }) =>
      run.ending === null
        ? []
        : [{ motion, storey: run.ending.storey, time: run.ending.time, how: HOW[run.ending.status] }],
    ),
  };
}

const HOW = {
  collapsed: 'unstable in',
  diverged: 'no numbers in',
  'not-converged': 'no balance in',
  cancelled: 'stopped in',
} as const;

/** "displacement 212 mm, limit 350 mm" */
function isolatorOf({ envelope }: Answers, system: System): AnswerRows['isolator'] {
  const { isolator, displacement, measure } = envelope;
  if (isolator === null) return null;
  const say = (value: number) => `${printQuantity(value, 'displacement', system)} ${unitOf('displacement', system)}`;
  const moved = displacement?.[measure][0];
  const words = moved === undefined ? 'displacement' : `displacement ${say(moved)}`;
  if (isolator.limit === null) return { words: `${words}, no limit typed`, ratio: 'none', over: false };
  const ratio = isolator.ratio === null ? 'none' : printRatio(isolator.ratio);
  return { words: `${words}, limit ${say(isolator.limit)}`, ratio, over: (isolator.ratio ?? 0) > 1 };
}

const peaks = new WeakMap<Float64Array, number>();

function peakOf(samples: Float64Array): number {
  const known = peaks.get(samples);
  if (known !== undefined) return known;
  let peak = 0;
  for (const value of samples) peak = Math.max(peak, Math.abs(value));
  peaks.set(samples, peak);
  return peak;
}

/** Where the acceleration profile meets the ground: the same statistic as the floors, of the scaled records. */
function groundOf(answers: Answers, system: System): AnswerRows['ground'] {
  const motions: Record<string, number> = {};
  const all: Float64Array[] = [];
  for (const { name, samples, scale } of answers.case.motions) {
    const kept = samplesOf(samples);
    if (kept === undefined) return null;
    const peak = Math.abs(scale) * peakOf(kept);
    all.push(Float64Array.of(peak));
    motions[name] = toDisplay(peak, 'acceleration', system);
  }
  if (all.length === 0) return null;
  const suite = statisticOf(all)[answers.envelope.measure][0] ?? 0;
  return { suite: toDisplay(suite, 'acceleration', system), motions };
}
