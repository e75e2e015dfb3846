import { never } from '../fault.ts';
import { rayleighFactors } from './damping.ts';
import type { Damping } from './frame.ts';
import type { Mode } from './modes.ts';

/**
 * Ratio of critical damping that a description gives a mode of any period, for a frame that it damps as a whole (an isolator
 * row is left out of it, so the modes of an isolated frame stand off this curve).
 *
 * C = a0 M + a1 K gives zeta(T) = a0 T / (4 pi) + pi a1 / T; stiffness-proportional damping is the same with a0 = 0.
 * Source: Chopra, Dynamics of Structures, section 11.4.1 (from memory), with w = 2 pi / T.
 *
 * @param modes    of the frame, longest period first: the description names its modes by number
 * @param periods  [s], each > 0
 * @returns        ratios [-], one a period; null for modal damping, which says nothing between the modes
 * @throws RangeError where the description names a mode that is not there
 */
export function dampingCurve(
  damping: Damping,
  modes: readonly Mode[],
  periods: ArrayLike<number>,
): Float64Array | null {
  const factors = factorsOf(damping, modes);
  if (factors === null) return null;
  const { a0, a1 } = factors;
  return Float64Array.from(periods, (period) => (a0 * period) / (4 * Math.PI) + (Math.PI * a1) / period);
}

/** The ratios that a description asks for [-], each once, in its own order. */
export function wantedRatios(damping: Damping): readonly number[] {
  switch (damping.kind) {
    case 'none':
      return [];
    case 'stiffness-proportional':
      return [damping.ratio];
    case 'rayleigh':
    case 'modal':
      return [...new Set(damping.ratios)];
    default:
      return never(damping);
  }
}

function factorsOf(damping: Damping, modes: readonly Mode[]): { readonly a0: number; readonly a1: number } | null {
  switch (damping.kind) {
    case 'none':
      return { a0: 0, a1: 0 };
    case 'modal':
      return null;
    case 'stiffness-proportional':
      return { a0: 0, a1: (2 * damping.ratio) / frequencyOf(modes, damping.mode) };
    case 'rayleigh': {
      const [first, second] = damping.modes;
      return rayleighFactors(frequencyOf(modes, first), frequencyOf(modes, second), damping.ratios);
    }
    default:
      return never(damping);
  }
}

function frequencyOf(modes: readonly Mode[], number: number): number {
  const mode = modes[number - 1];
  if (mode === undefined) throw new RangeError(`dampingCurve: mode ${number}, expected 1 to ${modes.length}`);
  return mode.frequency;
}
