/** One statistic of the suite, per storey or floor, ground up. */
export interface Statistic {
  readonly mean: Float64Array;
  readonly median: Float64Array;
  readonly max: Float64Array;
  /** Index of the run with the largest value (the first of equals). */
  readonly governing: Int32Array;
}

export type Measure = 'mean' | 'median' | 'max';

/**
 * Mean, median and largest over the runs. The median of an even number is the mean of the middle two.
 *
 * @param rows  one row a run, each of the same length, finite values; at least one row
 */
export function statisticOf(rows: readonly Float64Array[]): Statistic {
  const length = rows[0].length;
  const mean = new Float64Array(length);
  const median = new Float64Array(length);
  const max = new Float64Array(length);
  const governing = new Int32Array(length);
  const sorted = new Float64Array(rows.length);
  for (let i = 0; i < length; i++) {
    let sum = 0;
    for (let r = 0; r < rows.length; r++) {
      const value = rows[r][i];
      sorted[r] = value;
      sum += value;
      if (value > rows[governing[i]][i]) governing[i] = r;
    }
    sorted.sort();
    const half = rows.length >> 1;
    mean[i] = sum / rows.length;
    median[i] = rows.length % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
    max[i] = sorted[rows.length - 1];
    // The rounding of a sum must not lift the mean over the largest.
    mean[i] = Math.min(max[i], Math.max(sorted[0], mean[i]));
  }
  return { mean, median, max, governing };
}
