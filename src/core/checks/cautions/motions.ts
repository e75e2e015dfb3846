import { printQuantity } from '../../units/quantities.ts';
import { type Caution, type CautionInput, percent } from './caution.ts';

/** Share of the peak above which a last sample is cut off. Source: project-file page. */
const CUT_OFF = 0.01;
/** Sampling interval from which the lost high frequencies are said. Nyquist: 1 / (2 x interval). */
const COARSE_INTERVAL = 0.02;

/** What the records themselves leave open. */
export function motionCautions({ motions }: CautionInput): Caution[] {
  const out: Caution[] = [];
  for (const { name, interval, lastOverPeak } of motions) {
    const cause = { kind: 'motion', motion: name } as const;
    if (interval >= COARSE_INTERVAL) {
      const text = `${name} is sampled at ${printQuantity(interval, 'time', 'si', 3)} s: nothing above ${printQuantity(0.5 / interval, 'frequency', 'si', 0)} Hz is in it`;
      out.push({ code: 'coarse-interval', text, cause });
    }
    if (lastOverPeak !== undefined && lastOverPeak > CUT_OFF) {
      const text = `${name} ends at ${percent(lastOverPeak, 0)} of its peak: it is taken to fall to zero over one interval`;
      out.push({ code: 'cut-off', text, cause });
    }
  }
  return out;
}
