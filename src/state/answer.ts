import { cautionsOf } from '../core/checks/cautions.ts';
import { envelopeOf } from '../core/checks/envelope.ts';
import { evidenceSentence } from '../core/checks/evidenceSentence.ts';
import { type Evidence, evidenceOf } from '../core/dynamics/evidence.ts';
import type { Run } from '../core/dynamics/run.ts';
import { stepLimit } from '../core/dynamics/steps.ts';
import type { Case } from '../document/case.ts';
import type { Answers } from './answers.ts';
import type { Question } from './question.ts';

/** One run of an answer, and what is known behind it. */
export interface FoundRun {
  readonly motion: string;
  readonly run: Run;
  /** null while it is not known, and where there is none. */
  readonly stepError: number | null;
  /** The run at half the step, once it is in. */
  readonly half: Run | null;
  readonly auto: Evidence['auto'];
}

/** What an answer is made from, beside the question: all its runs, and what is known behind them. */
export interface Found {
  readonly runs: readonly FoundRun[];
  /** Samples of a motion by digest, for what is said of the record itself. */
  readonly samplesOf: (digest: string) => Float64Array | undefined;
  /** [ms] of computing, and when it was done [ms since 1970]. */
  readonly took: number;
  readonly at: number;
}

/** The whole answer to a question whose runs are all in. */
export function answersOf({ key, case: from }: Question, { runs: found, samplesOf, took, at }: Found): Answers {
  const { limits, analysis, prepared, leftOut, frame } = from;
  const runs = found.map(({ motion, run }) => ({ motion, run }));
  const envelope = envelopeOf(runs, limits, leftOut, frame);
  const motions = from.motions.map(({ name, interval, samples }) => {
    const values = samplesOf(samples);
    return { name, interval, ...(values ? { lastOverPeak: lastOverPeak(values) } : {}) };
  });
  const evidence = found.map(({ run, stepError, auto, half }, i) =>
    evidenceOf(prepared, run, motions[i].interval, stepError, auto, half),
  );
  const cautions = cautionsOf({
    envelope,
    limits,
    analysis,
    prepared,
    runs,
    motions,
    stepErrors: stepErrorsOf(found),
    halves: found.flatMap(({ motion, half }) => (half ? [{ motion, run: half }] : [])),
  });
  return {
    key,
    case: from,
    modes: prepared.modes,
    runs,
    envelope,
    cautions,
    evidence: Object.fromEntries(found.map(({ motion }, i) => [motion, evidence[i]])),
    evidenceSentence: evidenceSentence(evidence),
    step: stepFacts(runs, from),
    took,
    at,
  };
}

/** Step error a motion, once each that came to its end at this step and at half of it has one; null until then. */
export function stepErrorsOf(runs: readonly FoundRun[]): Readonly<Record<string, number>> | null {
  if (runs.some(({ run, half }) => !run.ending && !half)) return null;
  return Object.fromEntries(runs.flatMap(({ motion, stepError }) => (stepError === null ? [] : [[motion, stepError]])));
}

function stepFacts(runs: Answers['runs'], { analysis, prepared }: Case): Answers['step'] {
  const { modes } = prepared;
  const size = Math.max(...runs.map(({ run }) => run.step));
  const shortestPeriod = modes[modes.length - 1].period;
  return { size, shortestPeriod, overShortest: size / shortestPeriod, limit: stepLimit(prepared, analysis.method) };
}

/** Records do not change: their share is looked up at each keystroke, computed once. */
const shares = new WeakMap<Float64Array, number>();

/** Magnitude of the last sample over that of the largest [-]; 0 for a record of zeros. */
function lastOverPeak(samples: Float64Array): number {
  const known = shares.get(samples);
  if (known !== undefined) return known;
  let peak = 0;
  for (let i = 0; i < samples.length; i++) peak = Math.max(peak, Math.abs(samples[i]));
  const share = peak > 0 ? Math.abs(samples[samples.length - 1]) / peak : 0;
  shares.set(samples, share);
  return share;
}
