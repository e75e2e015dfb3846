/** A linear axis from zero: where it ends and where its lines and numbers stand, in display units. */
export interface Axis {
  readonly end: number;
  /** Distance of the numbered lines. */
  readonly major: number;
  /** Distance of all lines. */
  readonly minor: number;
}

function niceAbove(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  const rest = value / power;
  return (rest <= 1.0000001 ? 1 : rest <= 2.0000001 ? 2 : rest <= 5.0000001 ? 5 : 10) * power;
}

/** The axis that holds `largest`, with about `numbers` numbered lines. */
export function axisFor(largest: number, numbers: number): Axis {
  if (!(largest > 0) || !Number.isFinite(largest)) return { end: 1, major: 1, minor: 0.5 };
  const major = niceAbove(largest / numbers);
  const minor = major / 2;
  return { end: Math.max(minor, Math.ceil(largest / minor - 1e-9) * minor), major, minor };
}

/** Values of the lines of an axis, `step` apart, zero left out. */
export function linesOf(axis: Axis, step: number): number[] {
  const count = Math.floor(axis.end / step + 1e-9);
  return Array.from({ length: count }, (_, index) => (index + 1) * step);
}
