/**
 * Which entries of an evenly sampled history to draw: of each pixel column the smallest and the largest, in the order in
 * which they come, so that no peak is lost; all of them where they are no more than that.
 *
 * @param values   the history
 * @param from     first entry wanted
 * @param to       one past the last entry wanted
 * @param columns  pixel columns they are drawn into
 * @returns        rising indices, at most 2 x columns of them
 */
export function thinned(values: Float64Array, from: number, to: number, columns: number): Int32Array {
  const start = Math.max(0, from);
  const count = Math.max(0, Math.min(values.length, to) - start);
  if (count <= 2 * columns) return Int32Array.from({ length: count }, (_, i) => start + i);
  const out = new Int32Array(2 * columns);
  let kept = 0;
  for (let column = 0; column < columns; column++) {
    const first = start + Math.floor((column * count) / columns);
    const end = start + Math.floor(((column + 1) * count) / columns);
    let least = first;
    let most = first;
    for (let i = first + 1; i < end; i++) {
      if (values[i] < values[least]) least = i;
      else if (values[i] > values[most]) most = i;
    }
    out[kept++] = Math.min(least, most);
    if (least !== most) out[kept++] = Math.max(least, most);
  }
  return out.subarray(0, kept);
}

/** A path of more points than this cannot be told from one thinned further, and would hold up the page. */
const MOST_POINTS = 8000;

/**
 * Which points of a path in the plane to draw: those further than a distance from the last one that was kept, and the last. A
 * path that keeps more than MOST_POINTS is thinned with a wider distance until it does not.
 *
 * @param x, y   of equal length
 * @param reach  least distance along x and along y, in the units of each, that shows
 */
export function thinnedPath(
  x: Float64Array,
  y: Float64Array,
  reach: { readonly x: number; readonly y: number },
): Int32Array {
  for (let wide = 1; ; wide *= 4) {
    const kept = pathBy(x, y, wide * reach.x, wide * reach.y);
    if (kept.length <= MOST_POINTS || !(reach.x > 0 && reach.y > 0)) return kept;
  }
}

function pathBy(x: Float64Array, y: Float64Array, reachX: number, reachY: number): Int32Array {
  const out = new Int32Array(x.length);
  let kept = 0;
  let last = -1;
  for (let i = 0; i < x.length; i++) {
    const far = last < 0 || Math.abs(x[i] - x[last]) >= reachX || Math.abs(y[i] - y[last]) >= reachY;
    if (!far && i < x.length - 1) continue;
    out[kept++] = i;
    last = i;
  }
  return out.subarray(0, kept);
}
