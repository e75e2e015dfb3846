import type { PreparedFrame } from '../frame/prepare.ts';
import { groundAtSteps, stepCount } from './ground.ts';
import { type Method, methodOf } from './methods.ts';
import type { RunCase } from './run.ts';
import { stabilityFault, stepOf } from './steps.ts';

/** One march: a prepared frame, the ground at each step, a scheme. Immutable; all scratch lives in the workspace. */
export interface Problem {
  readonly prepared: PreparedFrame;
  readonly method: Method;
  /** [s] */
  readonly step: number;
  readonly steps: number;
  /** Scaled ground acceleration at each step, length steps + 1 [m/s2]. */
  readonly ground: Float64Array;
  /** Drift at which the run is stopped, length storeys [m]; Infinity where it is not (linear without P-Delta). */
  readonly stopDrift: Float64Array;
  /** First step of the last fundamental period of the run. */
  readonly residualFrom: number;
  /** No storey yields or has a damper, and C is tridiagonal or modal: each step is one solve with one matrix. */
  readonly linear: boolean;
}

/** @throws RangeError for a step or scheme that a validated case does not have */
export function problemOf(prepared: PreparedFrame, { analysis, motion }: RunCase): Problem {
  const method = methodOf(analysis.method);
  const step = stepOf(analysis.step, motion.interval);
  if (!step.ok) throw new RangeError(`step: ${step.faults[0].message}`);
  const { size, parts } = step.value;
  const unstable = stabilityFault(prepared, analysis.method, size);
  if (unstable) throw new RangeError(`step: ${unstable.message}`);
  if (motion.acceleration.length < 2)
    throw new RangeError(`motion: ${motion.acceleration.length} samples, expected at least 2`);
  const steps = stepCount(motion.acceleration.length, parts, size, analysis.tail);
  const { frame, arrays, modes } = prepared;
  const yields = frame.storeys.some(({ law }) => law.kind !== 'elastic');
  const damped = frame.storeys.some(({ damper }) => damper !== undefined && damper.coefficient > 0);
  const slab = prepared.damping.kind === 'banded' && prepared.damping.against === 'isolator';
  const stop = frame.pDelta || yields ? analysis.stopDrift : Number.POSITIVE_INFINITY;
  return {
    prepared,
    method,
    step: size,
    steps,
    ground: groundAtSteps(motion.acceleration, motion.scale, parts, steps),
    stopDrift: arrays.height.map((h, i) => (i === 0 && arrays.isolated ? isolatorStop(prepared) : stop * h)),
    residualFrom: Math.max(0, steps - Math.round(modes[0].period / size)),
    linear: !yields && !damped && !slab,
  };
}

/**
 * Drift from which no force of an isolator's law can bring it back [m]: where P-Delta, (P / h) x, has grown to the post-yield
 * line (1 - r) Fy + r k x, r the hardening. Infinity where hardening gives at least as much as P-Delta takes. A drift ratio would stop it
 * where it works: an isolator's row is low and its displacement is what it is for.
 * Source: statics; published check F2 on the post-yield branch.
 */
function isolatorStop({ frame, arrays }: PreparedFrame): number {
  const [{ law }] = frame.storeys;
  if (law.kind === 'elastic') return Number.POSITIVE_INFINITY;
  const more = arrays.gravityAbove[0] / arrays.height[0] - law.hardening * arrays.stiffness[0];
  return more > 0 ? ((1 - law.hardening) * law.strength) / more : Number.POSITIVE_INFINITY;
}
