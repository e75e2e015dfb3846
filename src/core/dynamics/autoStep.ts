import type { Mode } from '../frame/modes.ts';
import type { Swaying } from '../frame/stiffening.ts';
import type { MethodChoice, Run } from './run.ts';
import { stepErrorOf } from './stepError.ts';
import { stepLimit } from './steps.ts';

/** The parts of an interval that `step: "auto"` tries, in this order, and the step error that it aims at. Source: project-file page. */
export const MOST_PARTS = 64;
export const AIM = 0.01;
/** Steps a period for each mode needed for so much of the mass. Common practice; project-file page. */
export const STEPS_A_PERIOD = 20;
export const MASS_COVERED = 0.95;
/** Two endings are alike only where their times differ by no more than this share. Own figure. */
const SAME_TIME = 0.05;
/** Steps of one run: the ground motion at each of them takes 160 MB. */
export const MOST_STEPS = 2e7;

/** The first number of parts that may be tried at all, and what asked for it. */
export interface LeastParts {
  readonly parts: number;
  readonly why:
    | { readonly kind: 'interval' }
    | { readonly kind: 'steps-a-period'; readonly mode: number }
    | { readonly kind: 'stability'; readonly limit: number };
  /** False where MOST_PARTS are fewer than it takes. */
  readonly enough: boolean;
}

/** Number of modes, from the first, that together hold MASS_COVERED of the mass. */
export function modesThatMatter(modes: readonly Mode[]): number {
  let covered = 0;
  for (const [r, { effectiveMassRatio }] of modes.entries()) {
    covered += effectiveMassRatio;
    if (covered >= MASS_COVERED) return r + 1;
  }
  return modes.length;
}

/** Where the search for a step begins: the first of 1, 2, 4 ... MOST_PARTS that keeps steps a period and the stability limit. */
export function leastParts(frame: Swaying, choice: MethodChoice, interval: number): LeastParts {
  const { modes } = frame;
  const mode = modesThatMatter(modes);
  const bySteps = (STEPS_A_PERIOD * interval) / modes[mode - 1].period;
  const limit = stepLimit(frame, choice);
  const byLimit = limit === null ? 0 : interval / limit;
  const wanted = Math.max(1, bySteps, byLimit);
  let parts = 1;
  while (parts < wanted && parts < MOST_PARTS) parts *= 2;
  const enough = parts >= wanted;
  if (limit !== null && byLimit > 1 && byLimit >= bySteps) return { parts, why: { kind: 'stability', limit }, enough };
  return { parts, why: bySteps > 1 ? { kind: 'steps-a-period', mode } : { kind: 'interval' }, enough };
}

/** MOST_PARTS, or fewer where the run at half the step would not be held: samples x 2 x parts must stay under MOST_STEPS. */
export function mostParts(samples: number, interval: number, tail: number): number {
  let parts = MOST_PARTS;
  while (parts > 1 && 2 * parts * (samples + tail / interval) > MOST_STEPS) parts /= 2;
  return parts;
}

/** How far the search for a step has come: a run is missing, or it is over. */
export type AutoStep =
  | { readonly kind: 'ask'; readonly parts: number }
  | {
      readonly kind: 'settled';
      readonly parts: number;
      readonly run: Run;
      /** null: the run ended early, at this step as at half of it. */
      readonly stepError: number | null;
      /** False: the most parts that are tried were not enough. */
      readonly converged: boolean;
    };

/**
 * The halving rule: from `first` on, the first number of parts whose run is confirmed by the one at half the step. Each run at
 * half the step is the next candidate, so none is wasted.
 *
 * @param most   the most parts that are tried (`mostParts`)
 * @param runAt  the run at so many parts of the interval; undefined where it has not been run
 * @param enough  as LeastParts: false where no number of parts keeps steps a period or the stability limit
 */
export function autoStep(
  first: number,
  most: number,
  runAt: (parts: number) => Run | undefined,
  enough = true,
): AutoStep {
  for (let parts = first; ; parts *= 2) {
    const run = runAt(parts);
    if (!run) return { kind: 'ask', parts };
    const half = runAt(2 * parts);
    if (!half) return { kind: 'ask', parts: 2 * parts };
    const converged = confirms(run, half);
    if (converged || parts >= most)
      return { kind: 'settled', parts, run, stepError: errorBetween(run, half), converged: converged && enough };
  }
}

/** Step error of a run; null where it or its half-step run ended early. */
export function errorBetween(run: Run, half: Run): number | null {
  return run.ending || half.ending ? null : stepErrorOf(run, half);
}

/** Whether the run at half the step confirms a run: both came to their end with a small step error, or both ended alike. */
export function confirms(run: Run, half: Run): boolean {
  if (run.ending && half.ending) {
    const [a, b] = [run.ending, half.ending];
    const near = Math.abs(a.time - b.time) <= SAME_TIME * Math.max(a.time, b.time) + run.step;
    return a.status === b.status && a.storey === b.storey && near;
  }
  const error = errorBetween(run, half);
  return error !== null && error < AIM;
}
