import type { PreparedFrame } from '../frame/prepare.ts';
import { autoStep, leastParts, mostParts } from './autoStep.ts';
import { autoStepWords } from './autoStepWords.ts';
import { march } from './march.ts';
import { problemOf } from './problem.ts';
import type { Run, RunCase, Want } from './run.ts';

/** A run at the step that halving came to. */
export interface AutoRun {
  readonly run: Run;
  /** interval / step. */
  readonly parts: number;
  /** null where the run ended early. */
  readonly stepError: number | null;
  /** False: the most parts that are tried were not enough. */
  readonly converged: boolean;
  /** In words, why this step. */
  readonly why: string;
}

/** The whole search for a step at once, for the batch command and the tests; the step of the case itself is not looked at. */
export function runAtAutoStep(prepared: PreparedFrame, runCase: RunCase, want: Want): AutoRun {
  const { analysis, motion } = runCase;
  const { interval, acceleration } = motion;
  const least = leastParts(prepared, analysis.method, interval);
  const most = Math.max(least.parts, mostParts(acceleration.length, interval, analysis.tail));
  const at = (parts: number, histories: boolean): Run => {
    const one: RunCase = { ...runCase, analysis: { ...analysis, step: { parts } } };
    return march(problemOf(prepared, one), analysis.method, { histories });
  };
  const runs = new Map<number, Run>();
  for (;;) {
    const found = autoStep(least.parts, most, (parts) => runs.get(parts), least.enough);
    if (found.kind === 'ask') {
      runs.set(found.parts, at(found.parts, false));
      continue;
    }
    const { parts, stepError, converged } = found;
    const run = want.histories ? at(parts, true) : found.run;
    return { run, parts, stepError, converged, why: autoStepWords(parts, interval, least, converged) };
  }
}
