import type { PreparedFrame } from '../../src/core/frame/prepare.ts';

/**
 * Exact response of an elastic, classically damped frame to a piecewise-linear ground acceleration, at `parts` instants an
 * interval, by modes and the matrix exponential of each mode: the limit that every scheme must approach. Independent of the
 * march. Source: Chopra, Dynamics of Structures, sections 5.2 and 12.4 (from memory).
 *
 * @returns floor displacements, storey-major, storeys x count
 */
export function exactDisplacements(
  { arrays, modes, dampingRatios }: PreparedFrame,
  acceleration: Float64Array,
  interval: number,
  parts: number,
): Float64Array {
  const { n } = arrays;
  const count = (acceleration.length - 1) * parts + 1;
  const h = interval / parts;
  const out = new Float64Array(n * count);
  modes.forEach(({ frequency: w, shape, participation }, r) => {
    const e = exponential(w, dampingRatios[r], h);
    let [q, v] = [0, 0];
    for (let j = 1; j < count; j++) {
      const sample = Math.floor((j - 1) / parts);
      const part = (j - 1) % parts;
      const slope = (acceleration[sample + 1] - acceleration[sample]) / interval;
      const p = -(acceleration[sample] + slope * part * h);
      const s = -slope;
      const next = e[0] * q + e[1] * v + e[2] * p + e[3] * s;
      v = e[4] * q + e[5] * v + e[6] * p + e[7] * s;
      q = next;
      for (let i = 0; i < n; i++) out[i * count + j] += participation * shape[i] * q;
    }
  });
  return out;
}

/** Rows for q and v of exp(A h), A of the state (q, v, p, s) with q'' + 2 z w q' + w^2 q = p + s t, by scaling and squaring of a series. */
export function exponential(w: number, z: number, h: number): number[] {
  const a = [0, 1, 0, 0, -w * w, -2 * z * w, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0];
  const squarings = Math.max(0, Math.ceil(Math.log2(Math.max(w * h, 1e-3))) + 6);
  const scaled = a.map((x) => (x * h) / 2 ** squarings);
  let term = [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1];
  let sum = term.slice();
  for (let k = 1; k <= 12; k++) {
    term = product(term, scaled).map((x) => x / k);
    sum = sum.map((x, i) => x + term[i]);
  }
  for (let k = 0; k < squarings; k++) sum = product(sum, sum);
  return sum.slice(0, 8);
}

function product(a: readonly number[], b: readonly number[]): number[] {
  return Array.from({ length: 16 }, (_, at) => {
    const [row, column] = [at >> 2, at & 3];
    return [0, 1, 2, 3].reduce((s, k) => s + a[row * 4 + k] * b[k * 4 + column], 0);
  });
}
