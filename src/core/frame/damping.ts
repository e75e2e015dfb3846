import { never } from '../fault.ts';
import type { Damping } from './frame.ts';
import type { FrameArrays } from './matrices.ts';
import type { Mode } from './modes.ts';

/**
 * The viscous damping of a frame, in the form that the march can use.
 * banded: dashpots to the ground (`floor`) and between floors (`storey`) [N s/m], length n each, so that C is tridiagonal.
 * full: one ratio a mode, C = M (sum 2 zeta w / M_n phi phi^T) M, kept as the ratios.
 */
export type DampingMatrix =
  | { readonly kind: 'banded'; readonly floor: Float64Array; readonly storey: Float64Array }
  | { readonly kind: 'full'; readonly ratios: Float64Array };

/**
 * Damping of a frame from its description; `modes` are those it vibrates in (initial stiffness less P-Delta), and the
 * stiffness in C is that same one.
 *
 * Rayleigh: C = a0 M + a1 K with a0 / (2 w) + a1 w / 2 = zeta at two modes. Source: Rayleigh (1877), as in Chopra, Dynamics
 * of Structures, section 11.4.1. Modal: section 11.4.3. (Both from memory.)
 * @throws RangeError where a mode does not exist or the two are the same (a document is checked before it comes here)
 */
export function dampingMatrix(damping: Damping, arrays: FrameArrays, modes: readonly Mode[]): DampingMatrix {
  const { n, mass, netStiffness } = arrays;
  switch (damping.kind) {
    case 'none':
      return { kind: 'banded', floor: new Float64Array(n), storey: new Float64Array(n) };
    case 'rayleigh': {
      const { a0, a1 } = rayleighFactors(
        modeAt(modes, damping.modes[0]).frequency,
        modeAt(modes, damping.modes[1]).frequency,
        damping.ratios,
      );
      return { kind: 'banded', floor: mass.map((m) => a0 * m), storey: netStiffness.map((k) => a1 * k) };
    }
    case 'stiffness-proportional': {
      const a1 = (2 * damping.ratio) / modeAt(modes, damping.mode).frequency;
      return { kind: 'banded', floor: new Float64Array(n), storey: netStiffness.map((k) => a1 * k) };
    }
    case 'modal': {
      const { ratios } = damping;
      return { kind: 'full', ratios: Float64Array.from(modes, (_, r) => ratios[Math.min(r, ratios.length - 1)]) };
    }
    default:
      return never(damping);
  }
}

/** a0 [1/s] and a1 [s] of C = a0 M + a1 K from two frequencies [rad/s] and the ratios wanted there. */
export function rayleighFactors(wi: number, wj: number, ratios: readonly [number, number]): { a0: number; a1: number } {
  if (!(wi > 0 && wj > 0 && wi !== wj))
    throw new RangeError(`rayleighFactors: frequencies ${wi} and ${wj}, expected two different ones above 0`);
  const a1 = (2 * (ratios[1] * wj - ratios[0] * wi)) / (wj * wj - wi * wi);
  return { a0: 2 * ratios[0] * wi - a1 * wi * wi, a1 };
}

/** Ratio of critical damping that each mode really gets: phi^T C phi / (2 w M_n), length = modes. */
export function modalDampingRatios(matrix: DampingMatrix, arrays: FrameArrays, modes: readonly Mode[]): Float64Array {
  if (matrix.kind === 'full') return matrix.ratios;
  const { floor, storey } = matrix;
  return Float64Array.from(modes, ({ shape, frequency }) => {
    let [work, modalMass] = [0, 0];
    for (let i = 0; i < arrays.n; i++) {
      const drift = shape[i] - (i > 0 ? shape[i - 1] : 0);
      work += floor[i] * shape[i] * shape[i] + storey[i] * drift * drift;
      modalMass += arrays.mass[i] * shape[i] * shape[i];
    }
    return work / (2 * frequency * modalMass);
  });
}

function modeAt(modes: readonly Mode[], number: number): Mode {
  const mode = modes[number - 1];
  if (mode === undefined) throw new RangeError(`damping: mode ${number}, expected 1 to ${modes.length}`);
  return mode;
}
