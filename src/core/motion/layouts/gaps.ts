/** Values that are missing before a row. */
export interface Gap {
  readonly row: number;
  readonly missing: number;
}

/**
 * Values with gaps filled on the straight line between the neighbours: the motion is that line anyway.
 *
 * @param values  one a row
 * @returns the values, and the row that each stands on (a filled one: the row after its gap). Neighbours are the nearest
 * values that are numbers; where one side has none, the other one's value is held.
 */
export function fillGaps(values: Float64Array, gaps: readonly Gap[]): { values: Float64Array; rowOf: Int32Array } {
  const length = values.length + gaps.reduce((sum, { missing }) => sum + missing, 0);
  const out = new Float64Array(length);
  const rowOf = new Int32Array(length);
  let [filled, next] = [0, 0];
  for (let row = 0; row < values.length; row++) {
    if (gaps[next]?.row === row) {
      const { missing } = gaps[next++];
      const [before, after] = [numberFrom(values, row - 1, -1), numberFrom(values, row, 1)];
      const from = before ?? after ?? 0;
      const to = after ?? from;
      for (let k = 1; k <= missing; k++) {
        rowOf[filled] = row;
        out[filled++] = from + ((to - from) * k) / (missing + 1);
      }
    }
    rowOf[filled] = row;
    out[filled++] = values[row];
  }
  return { values: out, rowOf };
}

function numberFrom(values: Float64Array, at: number, step: 1 | -1): number | null {
  for (let i = at; i >= 0 && i < values.length; i += step) if (!Number.isNaN(values[i])) return values[i];
  return null;
}
