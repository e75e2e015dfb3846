import { STANDARD_GRAVITY } from '../units/constants.ts';
import type { Frame } from './frame.ts';

/**
 * The frame's numbers as flat arrays, ground up, length n each. The mass matrix is diagonal (`mass`); the stiffness matrix
 * is tridiagonal: K[i][i] = k[i] + k[i+1], K[i][i-1] = -k[i], with k the storey stiffness. P-Delta has the same pattern
 * with -(gravity above) / height in the place of k, so it is taken off storey by storey.
 * Source: Chopra, Dynamics of Structures, sections 9.1 and 9.2 (shear building); geometric stiffness of a storey: Wilson,
 * Three-Dimensional Static and Dynamic Analysis of Structures, chapter 11 (both from memory).
 */
export interface FrameArrays {
  readonly n: number;
  /** [m] */
  readonly height: Float64Array;
  /** [kg] */
  readonly mass: Float64Array;
  /** Initial storey stiffness [N/m]. */
  readonly stiffness: Float64Array;
  /** Gravity load carried by each storey, all floors from its top up [N]; zeros without P-Delta. */
  readonly gravityAbove: Float64Array;
  /** Storey stiffness less P-Delta, k - P / h [N/m]: what the frame vibrates with. */
  readonly netStiffness: Float64Array;
  /** The first storey is an isolator. */
  readonly isolated: boolean;
}

export function frameArrays(frame: Frame): FrameArrays {
  const { storeys } = frame;
  const n = storeys.length;
  const height = Float64Array.from(storeys, (s) => s.height);
  const mass = Float64Array.from(storeys, (s) => s.mass);
  const stiffness = Float64Array.from(storeys, (s) => s.stiffness);
  const gravityAbove = new Float64Array(n);
  const netStiffness = Float64Array.from(stiffness);
  if (frame.pDelta) {
    let above = 0;
    for (let i = n - 1; i >= 0; i--) {
      above += storeys[i].gravity ?? storeys[i].mass * STANDARD_GRAVITY;
      gravityAbove[i] = above;
      netStiffness[i] = stiffness[i] - above / height[i];
    }
  }
  return { n, height, mass, stiffness, gravityAbove, netStiffness, isolated: storeys[0]?.role === 'isolator' };
}

/**
 * Diagonal and off-diagonal of the tridiagonal matrix that storey values k (springs or dashpots between floors) and floor
 * values m (to the ground) make: A[i][i] = m[i] + k[i] + k[i+1], A[i][i-1] = -k[i].
 *
 * @param storey  length n
 * @param floor   length n
 */
export function assembleTridiagonal(
  storey: Float64Array,
  floor: Float64Array,
): { readonly diagonal: Float64Array; readonly off: Float64Array } {
  const n = storey.length;
  const diagonal = new Float64Array(n);
  const off = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    diagonal[i] = floor[i] + storey[i] + (i + 1 < n ? storey[i + 1] : 0);
    off[i] = i > 0 ? -storey[i] : 0;
  }
  return { diagonal, off };
}
