import type { Run } from '../../src/core/dynamics/run.ts';
import type { Damper, Damping, Frame, Law } from '../../src/core/frame/frame.ts';
import { type RunOptions, run } from './frames.ts';

export interface OneStorey {
  readonly mass: number;
  readonly stiffness: number;
  readonly law?: Law;
  readonly damping?: Damping;
  readonly damper?: Damper;
  /** Gravity [N] for P-Delta; absent: none. */
  readonly gravity?: number;
}

/** A frame of one storey of height 3. */
export function oneStorey({ mass, stiffness, law, damping, damper, gravity }: OneStorey): Frame {
  const storey = { name: 'Storey', height: 3, mass, stiffness, law: law ?? { kind: 'elastic' as const } };
  return {
    storeys: [{ ...storey, ...(damper ? { damper } : {}), ...(gravity !== undefined ? { gravity } : {}) }],
    damping: damping ?? { kind: 'none' },
    pDelta: gravity !== undefined,
  };
}

/** A run with its histories, never stopped. */
export function histories(frame: Frame, acceleration: Float64Array, interval: number, options: RunOptions = {}) {
  const result: Run = run(frame, acceleration, interval, { stopDrift: 1e9, ...options, histories: true });
  if (result.histories === null || result.ending !== null) throw new Error(`ended: ${result.ending?.status}`);
  return { ...result, histories: result.histories };
}

/** amplitude x sin(w t) for so many samples, from rest by a cosine rise over the first `rise` seconds. */
export function harmonic(amplitude: number, w: number, interval: number, count: number, rise: number): Float64Array {
  return Float64Array.from({ length: count }, (_, i) => {
    const t = i * interval;
    const share = t < rise ? (1 - Math.cos((Math.PI * t) / rise)) / 2 : 1;
    return amplitude * share * Math.sin(w * t);
  });
}

/** Largest magnitude of x[from ... to - 1]. */
export function largest(x: Float64Array, from: number, to: number): number {
  return x.subarray(from, to).reduce((most, value) => Math.max(most, Math.abs(value)), 0);
}
