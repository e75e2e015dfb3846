import type { Fault, Result } from '../fault.ts';
import { type DampingMatrix, dampingMatrix, modalDampingRatios } from './damping.ts';
import type { Frame } from './frame.ts';
import { type FrameArrays, frameArrays } from './matrices.ts';
import { type Mode, modesOf } from './modes.ts';
import { stiffeningOf } from './stiffening.ts';

/** Everything a run needs of the frame that does not depend on the motion: made once, used for each motion. */
export interface PreparedFrame {
  readonly frame: Frame;
  readonly arrays: FrameArrays;
  readonly modes: readonly Mode[];
  readonly damping: DampingMatrix;
  /** Ratio of critical damping of each mode [-]. */
  readonly dampingRatios: Float64Array;
  /** How much stiffer than at its start a storey can get, see stiffening.ts [-]. */
  readonly stiffening: number;
}

/**
 * Modes, matrices and damping of a frame whose numbers have been validated, or why it cannot stand: a storey unstable
 * under gravity (k - P / h not above 0; sufficient and necessary storey by storey, published check F2), or damping that
 * comes out negative in a mode.
 */
export function prepareFrame(frame: Frame): Result<PreparedFrame> {
  const arrays = frameArrays(frame);
  const faults: Fault[] = [];
  for (let i = 0; i < arrays.n; i++) {
    if (!(arrays.netStiffness[i] > 0)) {
      // A ratio, so that the sentence holds in whatever units are shown.
      const share = arrays.gravityAbove[i] / (arrays.height[i] * arrays.stiffness[i]);
      const isolator = i === 0 && arrays.isolated;
      faults.push({
        code: 'unstable-under-gravity',
        where: `frame.storeys[${i}].stiffness`,
        message: `storey ${i + 1} is unstable under gravity: P/(k h), the load above it over stiffness x height, is ${share.toPrecision(3)} and must stay under 1`,
        mend: isolator
          ? 'Make the isolator stiffer or its row taller (h is the height over which the load leans), lighten what stands above it, or turn P-Delta off'
          : 'Make the storey stiffer, lighten what stands above it, or turn P-Delta off',
      });
    }
  }
  if (faults.length > 0) return { ok: false, faults };
  const modes = modesOf(arrays);
  const damping = dampingMatrix(frame.damping, arrays, modes);
  const dampingRatios = modalDampingRatios(damping, arrays, modes);
  const negative = dampingRatios.findIndex((ratio) => ratio < -1e-12);
  if (negative >= 0) {
    const fault: Fault = {
      code: 'negative-damping',
      where: 'frame.damping.ratios',
      message: `mode ${negative + 1} comes out damped by ${(100 * dampingRatios[negative]).toFixed(2)} %: damping below zero feeds energy in`,
      mend: 'Choose ratios, or modes, for which no mode falls below zero',
    };
    return { ok: false, faults: [fault] };
  }
  const stiffening = stiffeningOf(
    frame.storeys.map(({ law }) => law),
    arrays,
  );
  return { ok: true, value: { frame, arrays, modes, damping, dampingRatios, stiffening } };
}
