import { cautionsOf } from '../core/checks/cautions.ts';
import { envelopeOf } from '../core/checks/envelope.ts';
import { evidenceSentence } from '../core/checks/evidenceSentence.ts';
import { evidenceOf } from '../core/dynamics/evidence.ts';
import { stepLimit, stepOf } from '../core/dynamics/steps.ts';
import type { Case } from '../document/case.ts';
import type { Answers, MotionRun } from './answers.ts';
import type { Question } from './question.ts';

/** What an answer is made from, beside the question: all its runs, and what is known behind them. */
export interface Found {
  readonly runs: readonly MotionRun[];
  readonly stepErrors: Readonly<Record<string, number>> | null;
  /** Samples of a motion by digest, for what is said of the record itself. */
  readonly samplesOf: (digest: string) => Float64Array | undefined;
  /** [ms] of computing, and when it was done [ms since 1970]. */
  readonly took: number;
  readonly at: number;
}

/** The whole answer to a question whose runs are all in. */
export function answersOf({ key, case: from }: Question, { runs, stepErrors, samplesOf, took, at }: Found): Answers {
  const { limits, analysis, prepared, leftOut } = from;
  const envelope = envelopeOf(runs, limits, leftOut, from.frame);
  const motions = from.motions.map(({ name, interval, samples }) => {
    const values = samplesOf(samples);
    return { name, interval, ...(values ? { lastOverPeak: lastOverPeak(values) } : {}) };
  });
  const cautions = cautionsOf({ envelope, limits, analysis, prepared, runs, motions, stepErrors });
  const evidence = Object.fromEntries(
    runs.map(({ motion, run }, i) => {
      const error = stepErrors?.[motion] ?? null;
      return [motion, evidenceOf(prepared, run, motions[i].interval, error)];
    }),
  );
  const sentence = evidenceSentence(Object.values(evidence));
  const { modes } = prepared;
  const step = stepFacts(from);
  return { key, case: from, modes, runs, envelope, cautions, evidence, evidenceSentence: sentence, step, took, at };
}

function stepFacts({ analysis, motions, prepared: { modes } }: Case): Answers['step'] {
  const sizes = motions.map(({ interval }) => stepOf(analysis.step, interval)).map((s) => (s.ok ? s.value.size : 0));
  const size = Math.max(...sizes);
  const shortestPeriod = modes[modes.length - 1].period;
  return { size, shortestPeriod, overShortest: size / shortestPeriod, limit: stepLimit(modes, analysis.method) };
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
