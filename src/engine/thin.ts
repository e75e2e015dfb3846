/** Points that keep the extremes: each stretch of the series gives its smallest and largest value, in the order they occur. */
const STRETCHES = 600;

/** Instants of the thinned series [s]: begin and middle of each stretch. */
export function thinTimes(count: number, interval: number): Float64Array {
  const stretches = Math.min(STRETCHES, Math.ceil(count / 2));
  return Float64Array.from({ length: 2 * stretches }, (_, i) => ((i * count) / (2 * stretches)) * interval);
}

/** The series at those instants; same length as `thinTimes`. */
export function thin(series: Float64Array): Float64Array {
  const count = series.length;
  const stretches = Math.min(STRETCHES, Math.ceil(count / 2));
  const out = new Float64Array(2 * stretches);
  for (let s = 0; s < stretches; s++) {
    const from = Math.floor((s * count) / stretches);
    const to = Math.max(from + 1, Math.floor(((s + 1) * count) / stretches));
    let [low, high] = [from, from];
    for (let i = from + 1; i < to; i++) {
      if (series[i] < series[low]) low = i;
      if (series[i] > series[high]) high = i;
    }
    out[2 * s] = series[Math.min(low, high)];
    out[2 * s + 1] = series[Math.max(low, high)];
  }
  return out;
}
