/** A stretch of the time axis [s]. */
export type TimeRange = readonly [number, number];

/** Nothing shorter is shown [s]. */
const SHORTEST = 0.1;

/** The stretch shown: what was chosen, inside of the whole, or the whole. */
export function shownRange(range: TimeRange | null, end: number): TimeRange {
  if (range === null) return [0, end];
  const length = Math.min(end, range[1] - range[0]);
  const from = Math.min(Math.max(0, range[0]), end - length);
  return [from, from + length];
}

/**
 * A stretch with the time `about` held where it stands; null once the whole is shown again.
 *
 * @param factor  length of the new stretch over that of the old one
 */
export function zoomed(range: TimeRange, about: number, factor: number, end: number): TimeRange | null {
  const length = Math.max(SHORTEST, (range[1] - range[0]) * factor);
  if (length >= end) return null;
  const share = (about - range[0]) / (range[1] - range[0]);
  const from = Math.min(Math.max(0, about - share * length), end - length);
  return [from, from + length];
}

/** The stretch moved along by a time, as far as the axis goes. */
export function moved(range: TimeRange, by: number, end: number): TimeRange {
  const from = Math.min(Math.max(0, range[0] + by), end - (range[1] - range[0]));
  return [from, from + range[1] - range[0]];
}

/** The stretch turned on so far that it holds a time. */
export function following(range: TimeRange, time: number, end: number): TimeRange {
  if (time >= range[0] && time <= range[1]) return range;
  return moved(range, time - range[0] - 0.1 * (range[1] - range[0]), end);
}
