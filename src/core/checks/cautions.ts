import { methodOf, spectralRadiusAtInfinity } from '../dynamics/methods.ts';
import type { Analysis, Run } from '../dynamics/run.ts';
import { stepOf } from '../dynamics/steps.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import { printQuantity, printRatio } from '../units/quantities.ts';
import { type Envelope, MOTIONS_FOR_MEAN } from './envelope.ts';
import type { Limits } from './limits.ts';
import { endingWords } from './verdict.ts';
import { countWord, worded as measureWord } from './wording.ts';

/** What the screen and the note print under Cautions: subject, fact, number. */
export interface Caution {
  /** Stable name, e.g. `limit-exceeded`. */
  readonly code: string;
  /** The sentence, with numbers, without a full stop. */
  readonly text: string;
  /** Where a click on it goes. */
  readonly cause:
    | { readonly kind: 'storey'; readonly storey: number }
    | { readonly kind: 'motion'; readonly motion: string }
    | { readonly kind: 'analysis' }
    | { readonly kind: 'damping' }
    | { readonly kind: 'limit' };
}

export interface CautionInput {
  readonly envelope: Envelope;
  readonly limits: Limits;
  readonly analysis: Analysis;
  readonly prepared: PreparedFrame;
  readonly runs: readonly { readonly motion: string; readonly run: Run }[];
  /** The used motions, in the order of the runs; `lastOverPeak` where the samples are at hand. */
  readonly motions: readonly { readonly name: string; readonly interval: number; readonly lastOverPeak?: number }[];
  /** Step error a motion; null while it is not known. */
  readonly stepErrors: Readonly<Record<string, number>> | null;
}

/** Drift in a storey over that of the storey above from which it is said to gather. Source: ASCE/SEI 7-16 12.3.2.2, exception 1 (130 %). */
const GATHERS = 1.3;
/** Step error and energy imbalance that are looked at; the first is the aim of the project-file page, the second common practice. */
const STEP_ERROR = 0.01;
const IMBALANCE = 0.01;
/** Steps a period under which a mode is poorly followed, and the mass that must be covered. Common practice; project-file page. */
const STEPS_A_PERIOD = 20;
const MASS_COVERED = 0.95;
/** Share of its peak by which a storey may still move when the run ends. Source: project-file page. */
const STILL_MOVING = 0.05;
/** Share of the peak above which a last sample is cut off. Source: project-file page. */
const CUT_OFF = 0.01;
/** Sampling interval from which the lost high frequencies are said. Nyquist: 1 / (2 x interval). */
const COARSE_INTERVAL = 0.02;

const percent = (value: number, decimals: number) => printQuantity(value, 'percent', 'si', decimals);

/** All cautions: exceeded, failed, soft storey, numerics, motions, in that order. */
export function cautionsOf(input: CautionInput): Caution[] {
  return [...limitCautions(input), ...storeyCautions(input), ...stepCautions(input), ...motionCautions(input)];
}

function limitCautions({ envelope, limits, runs }: CautionInput): Caution[] {
  const out: Caution[] = [];
  const { ratio, measure, factor, drift } = envelope;
  if (ratio && drift) {
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
    const alone = runs.filter(({ run }) => run.storeys.peakDriftRatio.some((d) => factor * d > limits.drift)).length;
    if (over.length === 0 && alone > 0 && measure !== 'max') {
      out.push({
        code: 'met-on-the-mean-only',
        text: `Limit met on the ${measureWord(measure)} of ${runs.length}; ${countWord(alone)} ${alone === 1 ? 'motion exceeds' : 'motions exceed'} it alone`,
        cause: { kind: 'limit' },
      });
    }
  }
  for (const { motion, run } of runs) {
    if (run.ending)
      out.push({
        code: 'did-not-finish',
        text: `${motion} did not finish: ${endingWords(run)}`,
        cause: { kind: 'motion', motion },
      });
  }
  if (measure !== 'max' && runs.length > 0 && runs.length < MOTIONS_FOR_MEAN) {
    const text = `${measureWord(measure) === 'mean' ? 'Mean' : 'Median'} of ${runs.length}: EN 1998-1 4.3.3.4.3(3) takes the largest below ${MOTIONS_FOR_MEAN} motions`;
    out.push({ code: 'few-motions', text, cause: { kind: 'limit' } });
  }
  if (envelope.leftOut.length > 0) {
    const names = envelope.leftOut.join(', ');
    out.push({
      code: 'left-out',
      text: `Left out of the suite: ${names}`,
      cause: { kind: 'motion', motion: envelope.leftOut[0] },
    });
  }
  if (limits.source.trim() === '') {
    const text = `Limit ${percent(limits.drift, 2)} % has no source: type the clause and the earthquake level that it comes from`;
    out.push({ code: 'limit-without-source', text, cause: { kind: 'limit' } });
  }
  return out;
}

function storeyCautions({ envelope, runs, analysis, prepared }: CautionInput): Caution[] {
  const out: Caution[] = [];
  const { drift, measure } = envelope;
  if (drift) {
    const value = drift[measure];
    let [worst, at] = [GATHERS, -1];
    for (let i = 0; i + 1 < value.length; i++) {
      const over = value[i] / value[i + 1];
      if (over > worst) [worst, at] = [over, i];
    }
    // Towards the roof drifts fall by themselves: only a storey that is among the most strained is said to gather drift.
    if (at >= 0 && value[at] >= 0.9 * Math.max(...value)) {
      const text = `Drift gathers in storey ${at + 1}: ${printQuantity(worst, 'ratio', 'si', 1)} times the storey above`;
      out.push({ code: 'drift-gathers', text, cause: { kind: 'storey', storey: at } });
    }
  }
  for (const { motion, run } of runs) {
    const moving = indices(
      run.storeys.peakDrift.length,
      (i) => run.storeys.residualSway[i] > STILL_MOVING * run.storeys.peakDrift[i],
    );
    if (run.ending === null && moving.length > 0) {
      const share = Math.max(...moving.map((i) => run.storeys.residualSway[i] / run.storeys.peakDrift[i]));
      const text = `${motion}: the frame still moves by ${percent(share, 0)} % of its peak drift at the end; a longer tail gives a truer residual drift`;
      out.push({ code: 'still-moving', text, cause: { kind: 'analysis' } });
      break;
    }
  }
  if (!prepared.frame.pDelta) {
    const far = runs.find(({ run }) => run.storeys.peakDriftRatio.some((d) => d > analysis.stopDrift));
    if (far) {
      const text = `${far.motion}: drift passes ${percent(analysis.stopDrift, 0)} %; a linear frame without P-Delta says nothing there`;
      out.push({ code: 'beyond-linear', text, cause: { kind: 'motion', motion: far.motion } });
    }
  }
  return out;
}

function stepCautions({ stepErrors, runs, analysis, prepared, motions }: CautionInput): Caution[] {
  const out: Caution[] = [];
  const cause = { kind: 'analysis' } as const;
  if (stepErrors) {
    const [motion, error] = Object.entries(stepErrors).reduce((a, b) => (b[1] > a[1] ? b : a), ['', 0]);
    if (error > STEP_ERROR)
      out.push({ code: 'step-error', text: `Step error ${percent(error, 1)} % in ${motion}: halve the step`, cause });
  }
  const imbalance = Math.max(0, ...runs.map(({ run }) => run.energy.imbalance));
  if (imbalance > IMBALANCE)
    out.push({ code: 'imbalance', text: `Energy imbalance ${percent(imbalance, 1)} %: halve the step`, cause });
  const size = Math.max(
    0,
    ...motions.map(({ interval }) => stepOf(analysis.step, interval)).map((s) => (s.ok ? s.value.size : 0)),
  );
  let covered = 0;
  for (const [r, { period, effectiveMassRatio }] of prepared.modes.entries()) {
    if (size > 0 && period / size < STEPS_A_PERIOD) {
      const text = `Mode ${r + 1} has ${printQuantity(period / size, 'ratio', 'si', 0)} steps a period; ${STEPS_A_PERIOD} are common practice for a mode that counts`;
      out.push({ code: 'few-steps-a-period', text, cause });
      break;
    }
    covered += effectiveMassRatio;
    if (covered >= MASS_COVERED) break;
  }
  const method = methodOf(analysis.method);
  if (method.order === 1)
    out.push({
      code: 'first-order',
      text: `${method.name} is first order only: its error halves with the step, no faster`,
      cause,
    });
  if (spectralRadiusAtInfinity(method) === 0 && prepared.modes.length > 1) {
    out.push({
      code: 'strong-dissipation',
      text: `${method.name} removes high modes within a step: read floor accelerations with care`,
      cause,
    });
  }
  return out;
}

function motionCautions({ motions }: CautionInput): Caution[] {
  const out: Caution[] = [];
  for (const { name, interval, lastOverPeak } of motions) {
    const cause = { kind: 'motion', motion: name } as const;
    if (interval >= COARSE_INTERVAL) {
      const text = `${name} is sampled at ${printQuantity(interval, 'time', 'si', 3)} s: nothing above ${printQuantity(0.5 / interval, 'frequency', 'si', 0)} Hz is in it`;
      out.push({ code: 'coarse-interval', text, cause });
    }
    if (lastOverPeak !== undefined && lastOverPeak > CUT_OFF) {
      const text = `${name} ends at ${percent(lastOverPeak, 0)} % of its peak: it is taken to fall to zero over one interval`;
      out.push({ code: 'cut-off', text, cause });
    }
  }
  return out;
}

function indices(length: number, holds: (i: number) => boolean): number[] {
  return Array.from({ length }, (_, i) => i).filter(holds);
}
