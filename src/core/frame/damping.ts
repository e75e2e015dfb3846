import { never } from '../fault.ts';
import type { Damping } from './frame.ts';
import type { FrameArrays } from './matrices.ts';
import type { Mode } from './modes.ts';

/**
 * The viscous damping of a frame, in the form that the march can use.
 * banded: dashpots of the floors (`floor`) to the ground, or above an isolator to the floor on it (`against`), and between
 * floors (`storey`) [N s/m], length n each; against the ground, C is tridiagonal. `tangentFactor`: a1 of Rayleigh damping on the
 * tangent stiffness [s], `storey` then being its value at the initial one; 0 else.
 * full: one ratio a mode, C = M (sum 2 zeta w / M_n phi phi^T) M, kept as the ratios.
 */
export type DampingMatrix =
  | {
      readonly kind: 'banded';
      readonly floor: Float64Array;
      readonly storey: Float64Array;
      readonly against: 'ground' | 'isolator';
      readonly tangentFactor: number;
    }
  | { readonly kind: 'full'; readonly ratios: Float64Array };

/**
 * Damping of a frame from its description; `modes` are those it vibrates in (initial stiffness less P-Delta), and the
 * stiffness in C is that same one. An isolator row is left out: it has no dashpot, and the floors above are damped by their
 * velocity relative to the floor on it, so that mass-proportional damping does not act on the isolator's displacement (own
 * reading of the project-file page, "its own damper and law damp it").
 *
 * Rayleigh: C = a0 M + a1 K with a0 / (2 w) + a1 w / 2 = zeta at two modes. Source: Rayleigh (1877), as in Chopra, Dynamics
 * of Structures, section 11.4.1. Modal: section 11.4.3. (Both from memory.)
 * @throws RangeError where a mode does not exist or the two are the same (a document is checked before it comes here)
 */
export function dampingMatrix(damping: Damping, arrays: FrameArrays, modes: readonly Mode[]): DampingMatrix {
  const { mass, netStiffness, isolated } = arrays;
  const banded = (a0: number, a1: number, tangentFactor = 0): DampingMatrix => ({
    kind: 'banded',
    floor: mass.map((m, i) => (isolated && i === 0 ? 0 : a0 * m)),
    storey: netStiffness.map((k, i) => (isolated && i === 0 ? 0 : a1 * k)),
    against: isolated ? 'isolator' : 'ground',
    tangentFactor,
  });
  switch (damping.kind) {
    case 'none':
      return banded(0, 0);
    case 'rayleigh': {
      const { a0, a1 } = rayleighFactors(
        modeAt(modes, damping.modes[0]).frequency,
        modeAt(modes, damping.modes[1]).frequency,
        damping.ratios,
      );
      return banded(a0, a1, damping.stiffness === 'tangent' ? a1 : 0);
    }
    case 'stiffness-proportional': {
      return banded(0, (2 * damping.ratio) / modeAt(modes, damping.mode).frequency);
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
  const { floor, storey, against } = matrix;
  return Float64Array.from(modes, ({ shape, frequency }) => {
    let [work, modalMass] = [0, 0];
    for (let i = 0; i < arrays.n; i++) {
      const drift = shape[i] - (i > 0 ? shape[i - 1] : 0);
      const sway = shape[i] - (against === 'isolator' ? shape[0] : 0);
      work += floor[i] * sway * sway + storey[i] * drift * drift;
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

/**
 * C as a full matrix, row-major n x n [N s/m]: of modal damping all of it, of banded damping the floors' part alone (the
 * dashpots between floors are apart, in `storey`).
 */
export function fullDamping(damping: DampingMatrix, { n, mass }: FrameArrays, modes: readonly Mode[]): Float64Array {
  const c = new Float64Array(n * n);
  if (damping.kind === 'banded') {
    for (let i = 0; i < n; i++) {
      c[i * n + i] += damping.floor[i];
      if (damping.against === 'ground' || i === 0) continue;
      c[0] += damping.floor[i];
      c[i] -= damping.floor[i];
      c[i * n] -= damping.floor[i];
    }
    return c;
  }
  modes.forEach(({ shape, frequency }, r) => {
    let modalMass = 0;
    for (let i = 0; i < n; i++) modalMass += mass[i] * shape[i] * shape[i];
    const rate = (2 * damping.ratios[r] * frequency) / modalMass;
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) c[i * n + j] += rate * mass[i] * shape[i] * mass[j] * shape[j];
    }
  });
  return c;
}
