import type { Mode } from '../frame/modes.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import { methodOf } from './methods.ts';
import { type Accuracy, modeAccuracy } from './modeAccuracy.ts';
import type { Ending, MethodChoice, Run } from './run.ts';
import { stepLimit } from './steps.ts';

/** Schemes that are set side by side until the reader chooses others. Sources: methods.ts. */
export const BENCH_METHODS: readonly MethodChoice[] = [
  { kind: 'newmark', beta: 1 / 4, gamma: 1 / 2 },
  { kind: 'newmark', beta: 1 / 6, gamma: 1 / 2 },
  { kind: 'central-difference' },
  { kind: 'generalized-alpha', spectralRadius: 0.8 },
  { kind: 'generalized-alpha', spectralRadius: 0.5 },
  { kind: 'generalized-alpha', spectralRadius: 0 },
  { kind: 'hht', alpha: -0.1 },
];
export const BENCH_PARTS: readonly number[] = [1, 2, 4, 8];
/** The run that errors are measured against: average acceleration, so many times finer than the finest row. */
const FINER = 4;

/** One scheme at one step. */
export interface BenchEntry {
  readonly method: MethodChoice;
  readonly parts: number;
}

/** What is known of an entry before it runs. */
export interface BenchPlan extends BenchEntry {
  /** The scheme in words. */
  readonly name: string;
  /** [s] */
  readonly step: number;
  /** Largest stable step in this frame [s]; null: any. An entry beyond it is not run. */
  readonly limit: number | null;
  readonly stable: boolean;
  /** What scheme and step make of the first and of the highest mode. */
  readonly first: Accuracy;
  readonly highest: Accuracy;
}

/** What came of an entry. */
export interface BenchResult {
  /** Largest error of a peak drift / largest peak drift of the reference [-]; null where one of the two ended early. */
  readonly error: number | null;
  /** The same of a floor's peak total acceleration [-]. */
  readonly accelerationError: number | null;
  /** Solves of the step's equations, all steps together. */
  readonly solves: number;
  /** Time that the march took [ms]. */
  readonly took: number;
  readonly imbalance: number;
  readonly ending: Ending | null;
}

/** Every scheme at every step, scheme by scheme, coarsest step first. */
export function benchPlan(
  frame: PreparedFrame,
  interval: number,
  methods: readonly MethodChoice[],
  parts: readonly number[],
): BenchPlan[] {
  const { modes, dampingRatios } = frame;
  const last = modes.length - 1;
  return methods.flatMap((choice) =>
    parts.map((n): BenchPlan => {
      const method = methodOf(choice);
      const step = interval / n;
      const limit = stepLimit(frame, choice);
      const accuracy = (mode: Mode, r: number) => modeAccuracy(method, mode.frequency, dampingRatios[r], step);
      return {
        method: choice,
        parts: n,
        name: method.name,
        step,
        limit,
        stable: limit === null || step <= limit,
        first: accuracy(modes[0], 0),
        highest: accuracy(modes[last], last),
      };
    }),
  );
}

/** The entry that the others are measured against. */
export function benchReference(parts: readonly number[]): BenchEntry {
  return { method: BENCH_METHODS[0], parts: FINER * Math.max(1, ...parts) };
}

export function benchResult(run: Run, reference: Run, took: number): BenchResult {
  const whole = run.ending === null && reference.ending === null;
  return {
    error: whole ? worst(run.storeys.peakDrift, reference.storeys.peakDrift) : null,
    accelerationError: whole ? worst(run.floors.peakAcceleration, reference.floors.peakAcceleration) : null,
    solves: run.marching.solves,
    took,
    imbalance: run.energy.imbalance,
    ending: run.ending,
  };
}

/** Largest difference over the largest value of the reference [-]; 0 for nothing but zeros. */
function worst(values: Float64Array, reference: Float64Array): number {
  let [difference, largest] = [0, 0];
  for (let i = 0; i < values.length; i++) {
    difference = Math.max(difference, Math.abs(values[i] - reference[i]));
    largest = Math.max(largest, Math.abs(reference[i]));
  }
  return largest > 0 ? difference / largest : 0;
}
