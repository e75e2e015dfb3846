/** Heights of the storey rows [px]: to scale, so that up is height. */
export interface Rows {
  /** Row height of each storey, from the ground up. */
  readonly heights: readonly number[];
  /** Distance of each storey's top from the roof line, from the ground up. */
  readonly tops: readonly number[];
  readonly total: number;
  /** [px/m] */
  readonly scale: number;
  /** False where a row had to be made higher than its storey. */
  readonly toScale: boolean;
}

const LEAST_SCALE = 8;
const LARGEST_SCALE = 14;
/** A row is never under this. */
const LEAST_ROW = 20;
/** A row of bearings is drawn and named, however low they are. */
const BEARING_ROW = 36;
/** Height drawn for a storey whose own is not typed yet, where no other storey has one [m]. */
const UNTYPED_HEIGHT = 3.6;

/**
 * @param heights  storey heights from the ground up, null where not typed or not readable [m]
 * @param free     height the building may take [px]
 * @param isolated the first storey is an isolator
 *
 * A building that would not fit at 8 px/m is drawn smaller for as long as no row gets under 20 px, so that a tall one is
 * seen whole; from there on rows keep 20 px and the sheet scrolls.
 */
export function rowsOf(heights: readonly (number | null)[], free: number, isolated = false): Rows {
  const known = heights.filter((height): height is number => height !== null && height > 0 && Number.isFinite(height));
  const usual = known.length > 0 ? known.reduce((sum, height) => sum + height, 0) / known.length : UNTYPED_HEIGHT;
  const drawn = heights.map((height) => (height !== null && height > 0 && Number.isFinite(height) ? height : usual));
  const metres = drawn.reduce((sum, height) => sum + height, 0);
  const fitting = metres > 0 ? free / metres : LARGEST_SCALE;
  const lowest = Math.min(...(isolated && drawn.length > 1 ? drawn.slice(1) : drawn));
  const least = Math.min(LEAST_SCALE, LEAST_ROW / lowest);
  const scale = Math.min(LARGEST_SCALE, Math.max(fitting, least));
  const squeezed = fitting < least;
  const used = squeezed ? fitting : scale;

  let level = 0;
  let edge = 0;
  let toScale = true;
  const sizes = drawn.map((height, storey) => {
    const smallest = isolated && storey === 0 ? BEARING_ROW : LEAST_ROW;
    level += height;
    const next = Math.round(level * used);
    const size = squeezed ? Math.max(smallest, Math.round(height * used)) : next - edge;
    edge = next;
    if (size >= smallest) {
      if (squeezed && size !== Math.round(height * used)) toScale = false;
      return size;
    }
    toScale = false;
    return smallest;
  });
  const total = sizes.reduce((sum, size) => sum + size, 0);
  let below = 0;
  const tops = sizes.map((size) => {
    below += size;
    return total - below;
  });
  return { heights: sizes, tops, total, scale: used, toScale };
}
