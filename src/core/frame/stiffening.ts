import type { Law } from './frame.ts';
import type { FrameArrays } from './matrices.ts';
import type { Mode } from './modes.ts';

/** What a stability limit depends on: a prepared frame, or its modes and how much stiffer than in them it can get. */
export interface Swaying {
  readonly modes: readonly Mode[];
  /** Largest ratio of a storey's stiffness less P-Delta, on any of its branches, to that of its start [-], >= 1. */
  readonly stiffening: number;
}

/**
 * How much stiffer than at its start a storey can get. Only Bouc-Wen with beta > 1/2 does: it unloads from |z| = 1 at
 * (h + 2 beta (1 - h)) k, from z' = (k / Fy) x' (1 + (beta - gamma) |z|^n) with beta + gamma = 1. By Rayleigh's quotient no frequency of the frame
 * grows by more than the square root of this ratio.
 */
export function stiffeningOf(laws: readonly Law[], { stiffness, netStiffness }: FrameArrays): number {
  return laws.reduce((most, law, i) => {
    if (law.kind !== 'bouc-wen') return most;
    const gain = (1 - law.hardening) * (2 * law.beta - 1) * stiffness[i];
    return Math.max(most, 1 + gain / netStiffness[i]);
  }, 1);
}
