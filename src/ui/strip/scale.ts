import { type Ticks, ticksBetween } from '../plots/ticks.ts';
import type { TimeRange } from './timeRange.ts';

/** From a time to its pixel column on the axis and back. */
export interface TimeScale {
  readonly range: TimeRange;
  readonly width: number;
  readonly ticks: Ticks;
  readonly x: (time: number) => number;
  readonly time: (x: number) => number;
}

/** Room that one number of the axis takes [px]. */
const NUMBER = 84;

export function timeScale(range: TimeRange, width: number): TimeScale {
  const [from, to] = range;
  const length = to - from;
  return {
    range,
    width,
    ticks: ticksBetween(from, to, Math.max(2, width / NUMBER)),
    x: (time) => ((time - from) / length) * width,
    time: (x) => from + (x / width) * length,
  };
}
