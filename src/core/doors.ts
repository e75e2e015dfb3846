/**
 * The doors of the core: what the worker, the batch command and the tests come in by. Nobody inside core imports this file.
 */
import { type March, march, startMarch } from './dynamics/march.ts';
import { problemOf } from './dynamics/problem.ts';
import type { Run, RunCase, Want } from './dynamics/run.ts';
import { type PreparedFrame, prepareFrame } from './frame/prepare.ts';

export { runAtAutoStep } from './dynamics/runAtAutoStep.ts';
export { stepErrorOf } from './dynamics/stepError.ts';
export { type PreparedFrame, prepareFrame } from './frame/prepare.ts';
export { measuresOf } from './motion/measures.ts';
export { readRecord } from './motion/read.ts';
export { spectrumOf } from './spectrum/spectrum.ts';
export type RunUnderWay = March;

/** A run to be marched in slices. @throws RangeError on a case that `caseOf` would have refused */
export function startRun(prepared: PreparedFrame, runCase: RunCase, want: Want): RunUnderWay {
  return startMarch(problemOf(prepared, runCase), runCase.analysis.method, want);
}

/** The whole run at once: for the batch command and the tests. @throws RangeError on a case that `caseOf` would have refused */
export function runCase(runCase: RunCase, want: Want): Run {
  const prepared = prepareFrame(runCase.frame);
  if (!prepared.ok) throw new RangeError(`frame: ${prepared.faults[0].message}`);
  return march(problemOf(prepared.value, runCase), runCase.analysis.method, want);
}
