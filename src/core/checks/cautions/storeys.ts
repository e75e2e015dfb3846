import { printQuantity } from '../../units/quantities.ts';
import { type Caution, type CautionInput, firstChecked, indices, percent } from './caution.ts';

/** Drift in a storey over that of the storey above from which it is said to gather. Source: ASCE/SEI 7-16 12.3.2.2, exception 1 (130 %). */
const GATHERS = 1.3;
/** Towards the roof drifts fall by themselves: only a storey with this share of the largest is said to gather drift. Own figure. */
const AMONG_THE_LARGEST = 0.9;
/** Share of its peak by which a storey may still move when the run ends. Source: project-file page. */
const STILL_MOVING = 0.05;

/** Drift that gathers, frames that still move at the end, and drifts that the model does not reach. */
export function storeyCautions(input: CautionInput): Caution[] {
  return [...softening(input), ...isolator(input), ...gathering(input), ...moving(input), ...beyondLinear(input)];
}

/**
 * A storey whose post-yield stiffness is less than P-Delta takes comes down once it yields: h < P / (k h). Statics of a storey;
 * published check F2 on the post-yield branch.
 */
function softening({ prepared: { frame, arrays } }: CautionInput): Caution[] {
  const down = indices(frame.storeys.length, (i) => {
    const { law } = frame.storeys[i];
    return law.kind !== 'elastic' && law.hardening * arrays.stiffness[i] < arrays.gravityAbove[i] / arrays.height[i];
  });
  if (down.length === 0) return [];
  const share = (i: number) => arrays.gravityAbove[i] / (arrays.height[i] * arrays.stiffness[i]);
  const worst = down.reduce((at, i) => (share(i) > share(at) ? i : at));
  const { law } = frame.storeys[worst];
  const hardening = law.kind === 'elastic' ? 0 : law.hardening;
  const others = down.length > 1 ? `, and ${down.length - 1} more` : '';
  const text = `Storey ${worst + 1}${others}: past yield P-Delta takes more than hardening gives, P/(k h) ${percent(share(worst), 1)} against ${percent(hardening, 1)}`;
  return [{ code: 'softens-past-yield', text, cause: { kind: 'storey', storey: worst } }];
}

/** An isolator that nothing is compared with, and one that nothing damps (it is left out of Rayleigh damping; project-file page, Roles). */
function isolator({ prepared: { frame }, limits }: CautionInput): Caution[] {
  const [first] = frame.storeys;
  if (first?.role !== 'isolator') return [];
  const cause = { kind: 'storey', storey: 0 } as const;
  const out: Caution[] = [];
  if (limits.isolator === undefined) {
    const text = 'Isolator displacement is compared with nothing: no limit is typed';
    out.push({ code: 'isolator-without-limit', text, cause });
  }
  const damped = first.law.kind !== 'elastic' || (first.damper?.coefficient ?? 0) > 0 || frame.damping.kind === 'modal';
  if (!damped) {
    const text =
      'Nothing damps the isolator: its law is elastic, it has no damper, and damping of the frame leaves it out';
    out.push({ code: 'isolator-undamped', text, cause });
  }
  return out;
}

function gathering({ envelope: { drift, measure }, prepared }: CautionInput): Caution[] {
  if (!drift) return [];
  const from = firstChecked(prepared.frame);
  const value = drift[measure];
  let [worst, at] = [GATHERS, -1];
  for (let i = from; i + 1 < value.length; i++) {
    const over = value[i] / value[i + 1];
    if (over > worst) [worst, at] = [over, i];
  }
  if (at < 0 || value[at] < AMONG_THE_LARGEST * Math.max(...value.subarray(from))) return [];
  const text = `Drift gathers in storey ${at + 1}: ${printQuantity(worst, 'ratio', 'si', 1)} times the storey above`;
  return [{ code: 'drift-gathers', text, cause: { kind: 'storey', storey: at } }];
}

function moving({ runs }: CautionInput): Caution[] {
  for (const { motion, run } of runs) {
    if (run.ending) continue;
    const { residualSway, peakDrift } = run.storeys;
    const moves = indices(peakDrift.length, (i) => residualSway[i] > STILL_MOVING * peakDrift[i]);
    if (moves.length === 0) continue;
    const share = Math.max(...moves.map((i) => residualSway[i] / peakDrift[i]));
    const text = `${motion}: the frame still moves by ${percent(share, 0)} of its peak drift at the end; a longer tail gives a truer residual drift`;
    return [{ code: 'still-moving', text, cause: { kind: 'analysis' } }];
  }
  return [];
}

/** A linear run without P-Delta is not stopped at the stop drift. Source: project-file page. */
function beyondLinear({ runs, analysis: { stopDrift }, prepared: { frame } }: CautionInput): Caution[] {
  if (frame.pDelta || frame.storeys.some(({ law }) => law.kind !== 'elastic')) return [];
  const from = firstChecked(frame);
  for (const { motion, run } of runs) {
    const storey = run.storeys.peakDriftRatio.findIndex((d, i) => i >= from && d > stopDrift);
    if (storey < 0) continue;
    const text = `${motion}: drift of storey ${storey + 1} is over ${percent(stopDrift, 0)}; a linear frame without P-Delta says nothing there`;
    return [{ code: 'beyond-linear', text, cause: { kind: 'motion', motion } }];
  }
  return [];
}
