/**
 * Largest |u| inside a step, from displacement, velocity and acceleration at its ends: the instants where the cubic through u and
 * v has no slope, and there the quintic through u, v and a.
 *
 * How true that is: inside a step the ground is a straight line, so u lies in the space of 1, t and the two free vibrations. Over
 * every u of that space, w h <= pi / 18 and any damping under 1, the quintic is off by at most 9e-5 of max|u| over the step (worst
 * case, by linear programming over the space; 1e-5 up to 5 % damping, and under 1e-9 for free vibration alone). The
 * instant is off by little too, and counts squared.
 *
 * @param h  length of the step [s]
 * @returns  0 where the cubic has no extreme inside the step
 */
export function largestBetween(
  u0: number,
  v0: number,
  a0: number,
  u1: number,
  v1: number,
  a1: number,
  h: number,
): number {
  // Cubic u0 + s (p + s (b + s c)), s = t / h: its slope is p + 2 b s + 3 c s^2.
  const p = h * v0;
  const d = u1 - u0;
  const b = 3 * d - 2 * p - h * v1;
  const c = p + h * v1 - 2 * d;
  const discriminant = b * b - 3 * p * c;
  if (!(discriminant >= 0)) return 0;
  const root = b >= 0 ? -b - Math.sqrt(discriminant) : -b + Math.sqrt(discriminant);
  // What the cubic's curvature lacks at the two ends.
  const lack0 = h * h * a0 - 2 * b;
  const lack1 = h * h * a1 - 2 * b - 6 * c;
  let largest = 0;
  for (let k = 0; k < 2; k++) {
    const s = k === 0 ? p / root : root / (3 * c);
    if (!(s > 0 && s < 1)) continue;
    const r = s * (1 - s);
    const u = Math.abs(u0 + s * (p + s * (b + s * c)) + ((r * r) / 2) * ((1 - s) * lack0 + s * lack1));
    if (u > largest) largest = u;
  }
  return largest;
}
