import { modesThatMatter } from '../../dynamics/autoStep.ts';
import type { Damping } from '../../frame/frame.ts';
import { printQuantity } from '../../units/quantities.ts';
import { type Caution, type CautionInput, firstChecked, percent } from './caution.ts';

/** A mode that matters is looked at from so many times the ratio wanted, and under so many. Source: the brief of this tool; common concern. */
const TWICE = 2;
const HALF = 0.5;
/**
 * Share of the peak base shear that damping may carry while a storey is past yield. Own figure: that Rayleigh damping on the
 * initial stiffness carries forces that no part of the building has is the concern of Hall (2006), Earthq. Eng. Struct. Dyn. 35,
 * 525-545, and Charney (2008), J. Struct. Eng. 134, 581-592 (from memory); neither gives a limit.
 */
const SHARE_OF_SHEAR = 0.2;

/** Modes damped by far more or less than was wanted, and damping that carries what yielding storeys do not. */
export function dampingCautions(input: CautionInput): Caution[] {
  return [...ratioCautions(input), ...forceCautions(input)];
}

function ratioCautions({ prepared: { frame, modes, dampingRatios } }: CautionInput): Caution[] {
  const wanted = wantedRatios(frame.damping);
  if (wanted === null) return [];
  const [low, high] = wanted;
  // The first mode of an isolated frame is the isolator's: its own damper and law damp it.
  const from = firstChecked(frame);
  let [worst, at] = [1, -1];
  for (let r = from; r < modesThatMatter(modes); r++) {
    const ratio = dampingRatios[r];
    const over = ratio > TWICE * high ? ratio / high : ratio < HALF * low ? low / Math.max(ratio, 1e-9) : 1;
    if (over > worst) [worst, at] = [over, r];
  }
  if (at < 0) return [];
  const ratio = dampingRatios[at];
  const many = ratio > high;
  const times = printQuantity(ratio / (many ? high : low), 'ratio', 'si', many ? 1 : 2);
  const text = `Mode ${at + 1} is damped by ${percent(ratio, 1)}, ${times} times the ${percent(many ? high : low, 1)} wanted`;
  return [{ code: 'damping-off', text, cause: { kind: 'damping' } }];
}

/** Least and largest ratio that was asked for; null where each mode gets what is asked of it, or nothing is. */
function wantedRatios(damping: Damping): readonly [number, number] | null {
  if (damping.kind === 'rayleigh') {
    const [low, high] = [Math.min(...damping.ratios), Math.max(...damping.ratios)];
    return low > 0 ? [low, high] : null;
  }
  if (damping.kind === 'stiffness-proportional') return damping.ratio > 0 ? [damping.ratio, damping.ratio] : null;
  return null;
}

function forceCautions({ runs, prepared: { frame } }: CautionInput): Caution[] {
  const { damping } = frame;
  if (damping.kind === 'rayleigh' && damping.stiffness === 'tangent') return [];
  let [worst, who] = [SHARE_OF_SHEAR, ''];
  for (const { motion, run } of runs) {
    const share = run.base.peakDampingForce / run.storeys.peakShear[0];
    if (share > worst) [worst, who] = [share, motion];
  }
  if (who === '') return [];
  const compare = damping.kind === 'rayleigh' ? 'damping on the tangent stiffness' : 'less damping';
  const text = `Damping on the initial stiffness carries up to ${percent(worst, 0)} of the peak base shear while storeys are past yield, in ${who}: compare with ${compare}`;
  return [{ code: 'damping-carries-shear', text, cause: { kind: 'damping' } }];
}
