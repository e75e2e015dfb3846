import { AIM, modesThatMatter, STEPS_A_PERIOD } from '../../dynamics/autoStep.ts';
import { methodOf, spectralRadiusAtInfinity } from '../../dynamics/methods.ts';
import type { Analysis } from '../../dynamics/run.ts';
import { printQuantity } from '../../units/quantities.ts';
import { IMBALANCE } from '../evidenceSentence.ts';
import { endingWords } from '../verdict.ts';
import { type Caution, type CautionInput, percent } from './caution.ts';

const CAUSE = { kind: 'analysis' } as const;

/** What the step and the scheme leave over. */
export function stepCautions(input: CautionInput): Caution[] {
  return [...errors(input), ...periods(input), ...scheme(input.analysis, input.prepared.modes.length)];
}

function errors({ stepErrors, runs, halves = [], analysis }: CautionInput): Caution[] {
  const out: Caution[] = [];
  const say = (code: string, text: string) => out.push({ code, text, cause: CAUSE });
  const mend = analysis.step === 'auto' ? 'type a shorter step' : 'halve the step';
  const finished = new Set(runs.filter(({ run }) => run.ending === null).map(({ motion }) => motion));
  for (const { motion, run } of halves) {
    if (run.ending && finished.has(motion))
      say('half-step-ended', `${motion} does not finish at half the step, ${endingWords(run)}: ${mend}`);
  }
  const [error, inMotion] = worstOf(Object.entries(stepErrors ?? {}));
  if (error >= AIM) say('step-error', `Step error ${percent(error, 1)} in ${inMotion}: ${mend}`);
  const [imbalance, of] = worstOf(runs.map(({ motion, run }) => [motion, run.energy.imbalance]));
  if (imbalance > IMBALANCE) say('imbalance', `Energy imbalance ${percent(imbalance, 1)} in ${of}: ${mend}`);
  const [halvings, where] = worstOf(runs.map(({ motion, run }) => [motion, run.marching.halvings]));
  if (halvings > 0) {
    const times = halvings === 1 ? 'once' : `${printQuantity(halvings, 'count', 'si')} times`;
    say('step-halved', `Step halved ${times} where it did not converge, in ${where}`);
  }
  return out;
}

function periods({ runs, prepared: { modes } }: CautionInput): Caution[] {
  const size = Math.max(0, ...runs.map(({ run }) => run.step));
  for (const [r, { period }] of modes.slice(0, modesThatMatter(modes)).entries()) {
    if (!(size > 0 && period / size < STEPS_A_PERIOD)) continue;
    const text = `Mode ${r + 1} has ${printQuantity(period / size, 'ratio', 'si', 0)} steps a period; ${STEPS_A_PERIOD} are common practice for a mode that counts`;
    return [{ code: 'few-steps-a-period', text, cause: CAUSE }];
  }
  return [];
}

function scheme(analysis: Analysis, modes: number): Caution[] {
  const out: Caution[] = [];
  const method = methodOf(analysis.method);
  if (method.order === 1) {
    const text = `${method.name} is first order only: its error halves with the step, no faster`;
    out.push({ code: 'first-order', text, cause: CAUSE });
  }
  if (spectralRadiusAtInfinity(method) === 0 && modes > 1) {
    const text = `${method.name} removes high modes within a step: read floor accelerations with care`;
    out.push({ code: 'strong-dissipation', text, cause: CAUSE });
  }
  return out;
}

function worstOf(entries: readonly (readonly [string, number])[]): readonly [number, string] {
  let [worst, who] = [0, ''];
  for (const [motion, value] of entries) if (value > worst) [worst, who] = [value, motion];
  return [worst, who];
}
