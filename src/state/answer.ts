import { envelopeOf } from '../core/checks/envelope.ts';
import { stepLimit, stepOf } from '../core/dynamics/steps.ts';
import type { Case } from '../document/case.ts';
import type { Answers, MotionRun } from './answers.ts';
import type { Question } from './question.ts';

/** The whole answer to a question whose runs are all in. */
export function answersOf(
  { key, case: from }: Question,
  runs: readonly MotionRun[],
  _stepErrors: Readonly<Record<string, number>> | null,
  took: number,
  at: number = Date.now(),
): Answers {
  const envelope = envelopeOf(runs, from.limits, from.leftOut);
  const { modes } = from.prepared;
  return { key, case: from, modes, runs, envelope, cautions: [], step: stepFacts(from), took, at };
}

function stepFacts({ analysis, motions, prepared: { modes } }: Case): Answers['step'] {
  const sizes = motions.map(({ interval }) => stepOf(analysis.step, interval)).map((s) => (s.ok ? s.value.size : 0));
  const size = Math.max(...sizes);
  const shortestPeriod = modes[modes.length - 1].period;
  return { size, shortestPeriod, overShortest: size / shortestPeriod, limit: stepLimit(modes, analysis.method) };
}
