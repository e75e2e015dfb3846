import { MOST_PARTS } from '../core/dynamics/autoStep.ts';
import type { Analysis, StepChoice } from '../core/dynamics/run.ts';
import { stabilityFault, stepOf } from '../core/dynamics/steps.ts';
import type { Fault } from '../core/fault.ts';
import type { PreparedFrame } from '../core/frame/prepare.ts';
import type { MotionEntry } from './project.ts';

/** Steps of one run: the ground motion at each of them takes 160 MB. */
const MOST_STEPS = 2e7;

type Timed = Pick<MotionEntry, 'name' | 'interval' | 'count'>;

/**
 * What is wrong with the step for the motions alone: no whole part of an interval, or more steps than a run can hold. A step that
 * is chosen by halving begins at the whole interval.
 */
export function partFaults(motions: readonly Timed[], { step, tail }: Analysis): Fault[] {
  return once(motions, ({ interval, count }) => {
    const fitted = stepOf(chosen(step, 1), interval);
    if (!fitted.ok) return fitted.faults;
    const { size, parts } = fitted.value;
    const during = (count - 1) * parts;
    if (during + tail / size <= MOST_STEPS) return [];
    const where = during > MOST_STEPS ? 'analysis.step' : 'analysis.tail';
    const message = `makes more than ${MOST_STEPS / 1e6} million steps of one run`;
    const mend = during > MOST_STEPS ? 'Take a longer step' : 'Take a shorter time after the record';
    return [{ code: 'too-many-steps', where, message, mend }];
  });
}

/** Where the step, or the shortest that halving comes to, is beyond the stability limit of the scheme in this frame. */
export function stabilityFaults(
  motions: readonly Timed[],
  { step, method }: Analysis,
  { modes }: PreparedFrame,
): Fault[] {
  return once(motions, ({ interval }) => {
    const fitted = stepOf(chosen(step, MOST_PARTS), interval);
    const unstable = fitted.ok ? stabilityFault(modes, method, fitted.value.size) : null;
    return unstable === null ? [] : [unstable];
  });
}

function chosen(step: StepChoice, parts: number): Exclude<StepChoice, 'auto'> {
  return step === 'auto' ? { parts } : step;
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
