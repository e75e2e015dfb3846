import { leastParts, MOST_PARTS, MOST_STEPS } from '../core/dynamics/autoStep.ts';
import type { Analysis } from '../core/dynamics/run.ts';
import { stabilityFault, stepOf } from '../core/dynamics/steps.ts';
import type { Fault } from '../core/fault.ts';
import type { PreparedFrame } from '../core/frame/prepare.ts';
import type { MotionEntry } from './project.ts';

type Timed = Pick<MotionEntry, 'name' | 'interval' | 'count'>;

/**
 * What is wrong with the step for the motions alone: no whole part of an interval, or more steps than a run can hold. A step that
 * is chosen by halving is tried at the whole interval and at half of it at least.
 */
export function partFaults(motions: readonly Timed[], { step, tail }: Analysis): Fault[] {
  return once(motions, (motion) => {
    if (step === 'auto') return countFaults(motion, 2, tail);
    const fitted = stepOf(step, motion.interval);
    return fitted.ok ? countFaults(motion, fitted.value.parts, tail) : fitted.faults;
  });
}

/** Where the step, or the shortest that halving comes to, is beyond the stability limit of the scheme in this frame. */
export function stabilityFaults(
  motions: readonly Timed[],
  { step, method, tail }: Analysis,
  prepared: PreparedFrame,
): Fault[] {
  return once(motions, (motion) => {
    const { interval } = motion;
    if (step === 'auto') {
      const unstable = stabilityFault(prepared, method, interval / MOST_PARTS);
      if (unstable !== null) {
        const message = `halving stops at ${MOST_PARTS} parts of the interval, and ${unstable.message}`;
        return [{ ...unstable, message, mend: 'Take a scheme that is stable at any step, or type a shorter step' }];
      }
      return countFaults(motion, 2 * leastParts(prepared, method, interval).parts, tail);
    }
    const fitted = stepOf(step, interval);
    const unstable = fitted.ok ? stabilityFault(prepared, method, fitted.value.size) : null;
    return unstable === null ? [] : [unstable];
  });
}

function countFaults({ interval, count }: Timed, parts: number, tail: number): Fault[] {
  const during = (count - 1) * parts;
  if (during + (tail * parts) / interval <= MOST_STEPS) return [];
  const where = during > MOST_STEPS ? 'analysis.step' : 'analysis.tail';
  const message = `makes more than ${MOST_STEPS / 1e6} million steps of one run`;
  const mend = during > MOST_STEPS ? 'Take a longer step' : 'Take a shorter time after the record';
  return [{ code: 'too-many-steps', where, message, mend }];
}

/** Each fault once, with the motions it comes from. */
function once(motions: readonly Timed[], faultsOf: (motion: Timed) => readonly Fault[]): Fault[] {
  const found = new Map<string, { readonly fault: Fault; readonly names: string[] }>();
  for (const motion of motions) {
    for (const fault of faultsOf(motion)) {
      const known = found.get(fault.message);
      if (known) known.names.push(motion.name);
      else found.set(fault.message, { fault, names: [motion.name] });
    }
  }
  return Array.from(found.values(), ({ fault, names }) =>
    motions.length > 1 ? { ...fault, message: `${fault.message} (${names.join(', ')})` } : fault,
  );
}
