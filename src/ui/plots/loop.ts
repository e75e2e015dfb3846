import type { ShownRun } from './useShownRun.ts';

/** Drift and shear of one storey over time, in SI; entry j belongs to j x interval. */
export interface Loop {
  readonly drift: Float64Array;
  readonly shear: Float64Array;
  readonly interval: number;
  readonly peakDrift: number;
  readonly peakForce: number;
  /** Drift at the limit [m]. */
  readonly limit: number;
}

export function loopOf({ run, storey, heights, answers }: ShownRun): Loop | null {
  const { histories } = run;
  if (histories === null || storey < 0) return null;
  const { count, displacement } = histories;
  const row = (rows: Float64Array, at: number) => rows.subarray(at * count, (at + 1) * count);
  const own = row(displacement, storey);
  const below = storey === 0 ? null : row(displacement, storey - 1);
  const { limit, factor } = answers.envelope;
  return {
    drift: below === null ? own : own.map((value, j) => value - below[j]),
    shear: row(histories.shear, storey),
    interval: run.step * histories.every,
    peakDrift: run.storeys.peakDrift[storey],
    peakForce: run.storeys.peakShear[storey],
    limit: (limit / factor) * heights[storey],
  };
}
