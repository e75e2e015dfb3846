import { printRatio } from '../../units/quantities.ts';
import { MOTIONS_FOR_MEAN } from '../envelope.ts';
import { endingWords } from '../verdict.ts';
import { countWord, worded as measureWord } from '../wording.ts';
import { type Caution, type CautionInput, firstChecked, indices, percent } from './caution.ts';

/** Limits that are exceeded, motions that did not finish, and what the comparison stands on. */
export function limitCautions(input: CautionInput): Caution[] {
  return [...exceeded(input), ...unfinished(input), ...comparison(input)];
}

function exceeded({ envelope, limits, runs, prepared }: CautionInput): Caution[] {
  const { ratio, measure, factor, isolator } = envelope;
  if (!ratio) return [];
  const out: Caution[] = [];
  const over = indices(ratio.length, (i) => ratio[i] > 1).sort((a, b) => ratio[b] - ratio[a]);
  if (over.length > 0) {
    const list = over.map((i) => `storey ${i + 1}, ${printRatio(ratio[i])}`);
    const shown = list.length > 4 ? `${list.slice(0, 4).join('; ')}; and ${list.length - 4} more` : list.join('; ');
    out.push({
      code: 'limit-exceeded',
      text: `Limit exceeded: ${shown}`,
      cause: { kind: 'storey', storey: over[0] },
    });
  }
  if (isolator?.ratio && isolator.ratio > 1) {
    const text = `Limit exceeded: displacement of the isolator, ${printRatio(isolator.ratio)}`;
    out.push({ code: 'isolator-limit-exceeded', text, cause: { kind: 'storey', storey: 0 } });
  }
  const from = firstChecked(prepared.frame);
  const passes = (drifts: Float64Array) => drifts.some((d, i) => i >= from && factor * d > limits.drift);
  const alone = runs.filter(({ run }) => passes(run.storeys.peakDriftRatio)).length;
  if (over.length === 0 && alone > 0 && measure !== 'max') {
    out.push({
      code: 'met-on-the-mean-only',
      text: `Limit met on the ${measureWord(measure)} of ${runs.length}; ${countWord(alone)} ${alone === 1 ? 'motion exceeds' : 'motions exceed'} it alone`,
      cause: { kind: 'limit' },
    });
  }
  return out;
}

function unfinished({ runs }: CautionInput): Caution[] {
  return runs.flatMap(({ motion, run }): Caution[] => {
    if (run.ending === null) return [];
    const text = `${motion} did not finish: ${endingWords(run)}`;
    return [{ code: 'did-not-finish', text, cause: { kind: 'motion', motion } }];
  });
}

function comparison({ envelope, limits, runs }: CautionInput): Caution[] {
  const out: Caution[] = [];
  const { measure, leftOut } = envelope;
  if (measure !== 'max' && runs.length > 0 && runs.length < MOTIONS_FOR_MEAN) {
    const text = `${measureWord(measure) === 'mean' ? 'Mean' : 'Median'} of ${runs.length}: EN 1998-1 4.3.3.4.3(3) takes the largest below ${MOTIONS_FOR_MEAN} motions`;
    out.push({ code: 'few-motions', text, cause: { kind: 'limit' } });
  }
  if (leftOut.length > 0) {
    const text = `Left out of the suite: ${leftOut.join(', ')}`;
    out.push({ code: 'left-out', text, cause: { kind: 'motion', motion: leftOut[0] } });
  }
  if (limits.source.trim() === '') {
    const text = `Limit ${percent(limits.drift, 2)} has no source: type the clause and the earthquake level that it comes from`;
    out.push({ code: 'limit-without-source', text, cause: { kind: 'limit' } });
  }
  return out;
}
