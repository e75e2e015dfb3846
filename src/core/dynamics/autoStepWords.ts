import { never } from '../fault.ts';
import { printQuantity } from '../units/quantities.ts';
import { AIM, type LeastParts, STEPS_A_PERIOD } from './autoStep.ts';

/**
 * Why a step chosen by halving is what it is, in words without a full stop.
 *
 * @param parts      of the interval [s] that it came to
 * @param least      where the search began
 * @param converged  false: no step that is tried is fine enough; null: the run at half the step is still out
 */
export function autoStepWords(parts: number, interval: number, least: LeastParts, converged: boolean | null): string {
  const what = `${parts === 1 ? 'the whole' : `${parts} parts of the`} interval of ${seconds(interval)} s`;
  const aim = `${printQuantity(AIM, 'percent', 'si', 0)} %`;
  if (!least.enough) return `${what}, the most parts that are tried: fewer than it takes for ${reason(least)}`;
  if (converged === null) return `${what}, to be confirmed at half the step`;
  if (!converged) return `${what}, the most parts that are tried: the step error is not under ${aim}`;
  if (parts > least.parts) return `${what}, the first with a step error under ${aim}`;
  return least.why.kind === 'interval' ? `${what}, its step error is under ${aim}` : `${what}, for ${reason(least)}`;
}

function reason({ why }: LeastParts): string {
  switch (why.kind) {
    case 'interval':
      return 'the interval itself';
    case 'steps-a-period':
      return `${STEPS_A_PERIOD} steps in the period of mode ${why.mode}`;
    case 'stability':
      return `the stability limit of ${seconds(why.limit)} s`;
    default:
      return never(why);
  }
}

function seconds(value: number): string {
  return String(Number(value.toPrecision(4)));
}
