import { singularPairs } from '../linalg/singular.ts';
import type { FrameArrays } from './matrices.ts';

/** Modal properties of a frame; mode 1 has the longest period. */
export interface Mode {
  /** [s] */
  readonly period: number;
  /** Circular frequency [rad/s] */
  readonly frequency: number;
  /** Floor 1 first, 1 at the roof, length = storeys. */
  readonly shape: Float64Array;
  /** Participation factor of the shape above [-]. */
  readonly participation: number;
  /** [kg] */
  readonly effectiveMass: number;
  /** Share of the total mass [-]. */
  readonly effectiveMassRatio: number;
  /** Height at which the mode's base shear gives its base overturning [m]; may be negative. */
  readonly effectiveHeight: number;
}

/** A shape whose roof moves less than this share of its largest floor is scaled to that floor instead (no division by ~0). */
const STILL_ROOF = 1e-9;

/**
 * All modes of K phi = omega^2 M phi with the net storey stiffness (initial less P-Delta), longest period first. With
 * K = B^T diag(k) B, B the drift matrix, they are the singular pairs of diag(sqrt k) B M^-1/2.
 *
 * Participation L / M_n with L = sum m phi, effective mass L^2 / M_n, effective height sum(h m phi) / L.
 * Source: Chopra, Dynamics of Structures, sections 10.1 to 10.4 and 13.2 (from memory).
 *
 * @throws RangeError where a net stiffness or a mass is not above 0 and finite
 */
export function modesOf(arrays: FrameArrays): Mode[] {
  const { n, mass, netStiffness, height } = arrays;
  const root = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    if (!(netStiffness[i] > 0 && mass[i] > 0)) {
      throw new RangeError(
        `modesOf: storey ${i} has net stiffness ${netStiffness[i]} and mass ${mass[i]}, expected both above 0`,
      );
    }
    const k = Math.sqrt(netStiffness[i]);
    root[i * n + i] = k / Math.sqrt(mass[i]);
    if (i > 0) root[i * n + i - 1] = -k / Math.sqrt(mass[i - 1]);
  }
  const { values, vectors } = singularPairs(root, n);
  const totalMass = mass.reduce((sum, m) => sum + m, 0);
  const modes: Mode[] = [];
  for (let r = 0; r < n; r++) {
    const shape = new Float64Array(n);
    let largest = 0;
    for (let i = 0; i < n; i++) {
      shape[i] = vectors[r * n + i] / Math.sqrt(mass[i]);
      if (Math.abs(shape[i]) > Math.abs(largest)) largest = shape[i];
    }
    const roof = shape[n - 1];
    const scale = 1 / (Math.abs(roof) > STILL_ROOF * Math.abs(largest) ? roof : largest);
    let [excitation, modalMass, moment, level] = [0, 0, 0, 0];
    for (let i = 0; i < n; i++) {
      shape[i] *= scale;
      level += height[i];
      excitation += mass[i] * shape[i];
      modalMass += mass[i] * shape[i] * shape[i];
      moment += level * mass[i] * shape[i];
    }
    const effectiveMass = (excitation * excitation) / modalMass;
    modes.push({
      period: (2 * Math.PI) / values[r],
      frequency: values[r],
      shape,
      participation: excitation / modalMass,
      effectiveMass,
      effectiveMassRatio: effectiveMass / totalMass,
      effectiveHeight: moment / excitation,
    });
  }
  return modes;
}
