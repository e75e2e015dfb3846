import type { AxisUnit } from '../../core/units/axisUnit.ts';

/** Where the lines and numbers of an axis stand, in the units of the axis. */
export interface Ticks {
  readonly at: readonly number[];
  /** Decimals that all of them need. */
  readonly decimals: number;
}

/** The words of a number of an axis: zero is 0. */
export function tickWords(unit: AxisUnit, { decimals }: Ticks): (tick: number) => string {
  return (tick) => unit.printTick(tick, tick === 0 ? 0 : decimals);
}

const NICE = [1, 2, 5, 10];

/** The nice step (1, 2, 5 times a power of ten) nearest above a length. */
export function niceStep(length: number): number {
  const power = 10 ** Math.floor(Math.log10(length));
  const rest = length / power;
  return (NICE.find((step) => rest <= step * 1.0000001) ?? 10) * power;
}

/** Numbers at nice places between two ends, at most about `most` of them. */
export function ticksBetween(from: number, to: number, most: number): Ticks {
  const length = to - from;
  if (!(length > 0) || !Number.isFinite(length)) return { at: [], decimals: 0 };
  const step = niceStep(length / most);
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  const at = Array.from({ length: last - first + 1 }, (_, i) => (first + i) * step + 0);
  return { at, decimals: decimalsOf(step) };
}

/** An axis about zero: one number near the largest value on either side, room beyond it. */
export function evenAxis(largest: number): { readonly end: number; readonly ticks: Ticks } {
  if (!(largest > 0) || !Number.isFinite(largest)) return { end: 1, ticks: { at: [-1, 0, 1], decimals: 0 } };
  const power = 10 ** Math.floor(Math.log10(largest));
  const rest = largest / power;
  const near = [1, 2, 3, 4, 5, 6, 8, 10].filter((step) => step <= 1.08 * rest).at(-1) ?? 1;
  const tick = near * power;
  return { end: 1.18 * Math.max(largest, tick), ticks: { at: [-tick, 0, tick], decimals: decimalsOf(tick) } };
}

/** An axis from zero up. */
export function risingAxis(largest: number, most: number): { readonly end: number; readonly ticks: Ticks } {
  if (!(largest > 0) || !Number.isFinite(largest)) return { end: 1, ticks: { at: [0, 1], decimals: 0 } };
  const end = 1.06 * largest;
  return { end, ticks: ticksBetween(0, end, most) };
}

function decimalsOf(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}
