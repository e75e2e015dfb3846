/**
 * Exact recurrence of an oscillator u'' + 2 z w u' + w^2 u = -ag with ag linear over a step h:
 *   u' = a11 u + a12 v + b11 ag + b12 ag',   v' = a21 u + a22 v + b21 ag + b22 ag'.
 * Source: Nigam and Jennings (1969), Bull. Seism. Soc. Am. 59, 909-922; published check K8. Where w h is small the closed forms
 * lose figures to cancellation, so there the series of the matrix exponential is summed instead.
 */
export interface Recurrence {
  readonly a11: number;
  readonly a12: number;
  readonly a21: number;
  readonly a22: number;
  readonly b11: number;
  readonly b12: number;
  readonly b21: number;
  readonly b22: number;
}

/** Under this w h the series is used: its terms fall as (w h)^k / k!. */
const SMALL = 0.3;

/** @throws RangeError unless w > 0, h > 0 and 0 <= z < 1 */
export function recurrence(w: number, z: number, h: number): Recurrence {
  if (!(w > 0 && h > 0)) throw new RangeError(`recurrence: w ${w}, h ${h}, expected both above 0`);
  if (!(z >= 0 && z < 1)) throw new RangeError(`recurrence: damping ${z}, expected 0 to below 1`);
  return w * h < SMALL ? bySeries(w, z, h) : closed(w, z, h);
}

function closed(w: number, z: number, h: number): Recurrence {
  const root = Math.sqrt(1 - z * z);
  const wd = w * root;
  const e = Math.exp(-z * w * h);
  const s = Math.sin(wd * h);
  const c = Math.cos(wd * h);
  const w2 = w * w;
  const a11 = e * ((z / root) * s + c);
  const a12 = (e * s) / wd;
  const a21 = (-w / root) * e * s;
  const a22 = e * (c - (z / root) * s);
  const p = (2 * z * z - 1) / (w2 * h);
  const q = (2 * z) / (w2 * w * h);
  const b11 = e * ((p + z / w) * (s / wd) + (q + 1 / w2) * c) - q;
  const b12 = -e * (p * (s / wd) + q * c) - 1 / w2 + q;
  const b21 = e * ((p + z / w) * (c - (z / root) * s) - (q + 1 / w2) * (wd * s + z * w * c)) + 1 / (w2 * h);
  const b22 = -e * (p * (c - (z / root) * s) - q * (wd * s + z * w * c)) - 1 / (w2 * h);
  return { a11, a12, a21, a22, b11, b12, b21, b22 };
}

/** exp(A h) of the state (u, v, -ag, -slope) by its series: 16 terms leave (0.3)^16 / 16!, far below rounding. */
function bySeries(w: number, z: number, h: number): Recurrence {
  const columns = [
    [1, 0, 0, 0],
    [0, 1, 0, 0],
    [0, 0, 1, 0],
    [0, 0, 0, 1],
  ].map((start) => {
    let term = start;
    const sum = [...start];
    for (let k = 1; k <= 16; k++) {
      const [u, v, p, s] = term;
      const g = h / k;
      term = [g * v, g * (-w * w * u - 2 * z * w * v + p), g * s, 0];
      for (let i = 0; i < 4; i++) sum[i] += term[i];
    }
    return sum;
  });
  const [[a11, a21], [a12, a22], [p1, p2], [s1, s2]] = columns;
  // p = -ag at the start, s = -(ag' - ag) / h.
  return { a11, a12, a21, a22, b11: s1 / h - p1, b12: -s1 / h, b21: s2 / h - p2, b22: -s2 / h };
}
