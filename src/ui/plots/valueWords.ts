import type { AxisUnit } from '../../core/units/axisUnit.ts';

/** A small value shows so many more decimals than the axis it stands on. */
const FINER = 2;

/** A value with its unit, to the decimals of its axis; one that would read 0 with as many more as show its first figure, or 0. */
export function valueWords(unit: AxisUnit, value: number): string {
  const size = Math.abs(unit.onAxis(value));
  let { decimals } = unit;
  const most = decimals + FINER;
  while (decimals < most && size < 0.5 * 10 ** -decimals) decimals++;
  if (size < 0.5 * 10 ** -decimals) return `0 ${unit.unit}`;
  return `${unit.print(value, decimals)} ${unit.unit}`;
}
