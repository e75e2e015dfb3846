import { type AxisUnit, axisUnitOf } from '../../core/units/axisUnit.ts';
import type { System } from '../../core/units/quantities.ts';
import type { Loop } from './loop.ts';
import { MARGIN, type Size } from './template.ts';

/** The axes of a loop: where a value stands [px from the plot's corner]. */
export interface LoopAxes {
  readonly size: Size;
  readonly drift: AxisUnit;
  readonly force: AxisUnit;
  readonly endX: number;
  readonly endY: number;
  readonly x: (drift: number) => number;
  readonly y: (force: number) => number;
}

/** A limit further out than so many times the largest drift is not drawn. */
const FAR = 3;

export function loopAxes(loop: Loop, size: Size, system: System): LoopAxes {
  const drift = axisUnitOf('drift', system, loop.peakDrift);
  const force = axisUnitOf('force', system, loop.peakForce);
  const limit = loop.limit <= FAR * loop.peakDrift ? loop.limit : 0;
  const endX = 1.12 * (Math.max(drift.onAxis(loop.peakDrift), drift.onAxis(limit)) || 1);
  const endY = 1.12 * (force.onAxis(loop.peakForce) || 1);
  const across = size.width - MARGIN.l - MARGIN.r;
  const up = size.height - MARGIN.t - MARGIN.b;
  return {
    size,
    drift,
    force,
    endX,
    endY,
    x: (value) => MARGIN.l + (0.5 + drift.onAxis(value) / (2 * endX)) * across,
    y: (value) => MARGIN.t + (0.5 - force.onAxis(value) / (2 * endY)) * up,
  };
}

/** Half a pixel on either axis, in SI. */
export function reachOf({ x, y }: LoopAxes): { readonly x: number; readonly y: number } {
  return { x: 0.5 / (x(1) - x(0)), y: 0.5 / (y(0) - y(1)) };
}
