import type { Fault, Result } from '../fault.ts';
import type { Swaying } from '../frame/stiffening.ts';
import { methodOf, stabilityLimit } from './methods.ts';
import type { MethodChoice, StepChoice } from './run.ts';

/** How far interval / step may be from a whole number, relatively: the rounding of typed decimals, no more. */
const WHOLE = 1e-6;

/** A step that fits an interval. */
export interface Step {
  /** [s] */
  readonly size: number;
  /** interval / size, a whole number >= 1. */
  readonly parts: number;
}

/**
 * The step of a motion: a typed step must be a whole part of the interval (fault `not-a-part` with the nearest ones named);
 * `parts` divides it. `auto` names a search (autoStep.ts) and no step: a run is asked with the parts that it came to.
 */
export function stepOf(step: StepChoice, interval: number): Result<Step> {
  if (step === 'auto') {
    return refused(
      'not-chosen-yet',
      'a step chosen by halving ("auto") is known once it was searched',
      'Ask the run with parts of the interval',
    );
  }
  if (typeof step === 'object') {
    const { parts } = step;
    if (Number.isInteger(parts) && parts >= 1) return { ok: true, value: { size: interval / parts, parts } };
    return refused(
      'not-a-whole-number',
      `${parts} parts of the interval is no whole number from 1 on`,
      'Type 1, 2, 4 or another whole number',
    );
  }
  if (!(step > 0 && Number.isFinite(step))) {
    return refused(
      'not-positive',
      `a step of ${step} s is not above 0`,
      `Type ${short(interval)} s or a whole part of it`,
    );
  }
  const ratio = interval / step;
  const parts = Math.round(ratio);
  if (parts >= 1 && Math.abs(ratio - parts) <= WHOLE * ratio)
    return { ok: true, value: { size: interval / parts, parts } };
  const fewer = Math.max(1, Math.floor(ratio));
  const more = Math.max(1, Math.ceil(ratio));
  const nearest = fewer === more ? short(interval / fewer) : `${short(interval / fewer)} or ${short(interval / more)}`;
  return refused(
    'not-a-part',
    `a step of ${short(step)} s is no whole part of the interval of ${short(interval)} s`,
    `Take ${nearest} s`,
  );
}

/** Fault where the step passes the scheme's stability limit for the highest mode; the limit in seconds is in it. */
export function stabilityFault(frame: Swaying, choice: MethodChoice, step: number): Fault | null {
  const limit = stepLimit(frame, choice);
  if (limit === null || step <= limit) return null;
  return {
    code: 'beyond-stability-limit',
    where: 'analysis.step',
    message: `a step of ${short(step)} s is beyond the stability limit of ${short(limit)} s of ${methodOf(choice).name} for this frame`,
    mend: `Take a step under ${short(limit)} s, or a scheme that is stable at any step`,
  };
}

/** Largest stable step [s] of a scheme for a frame, on the stiffest branches that it has; null where any step is stable. */
export function stepLimit({ modes, stiffening }: Swaying, choice: MethodChoice): number | null {
  const limit = stabilityLimit(methodOf(choice));
  return Number.isFinite(limit) ? limit / (modes[modes.length - 1].frequency * Math.sqrt(stiffening)) : null;
}

function short(seconds: number): string {
  return String(Number(seconds.toPrecision(4)));
}

function refused(code: string, message: string, mend: string): Result<Step> {
  return { ok: false, faults: [{ code, where: 'analysis.step', message, mend }] };
}
