import { FIELD } from './record.ts';

const {
  DAMPER,
  EXPONENT,
  TRIAL_RATE,
  TRIAL_DAMPER,
  DAMPER_INTERCEPT,
  DAMPER_SLOPE,
  STICK,
  FORCE_TOLERANCE,
  PEAK_RATE,
} = FIELD;

/** A velocity is as good as met when it is missed by so small a share of the largest one. Own choice, as tight as doubles allow in comfort. */
const RATE_TOLERANCE = 1e-11;

/**
 * The viscous storey damper F = c |v|^a sgn(v) within the iteration of a step. The solve takes it as a straight line, force =
 * DAMPER_INTERCEPT + DAMPER_SLOPE x rate; this sets DAMPER_INTERCEPT and DAMPER_SLOPE for the next solve where the line's
 * force at TRIAL_RATE is off the curve, and TRIAL_DAMPER where it is not.
 *
 * For a < 1 the curve stands upright at v = 0, where the tangent at v is of no use: a solve that ends beyond the curve (more
 * force than the curve has at that velocity) goes on with the tangent at its velocity, one that ends short of it with the
 * tangent at its force, v = sgn(F) (|F| / c)^(1/a), one on the wrong side with the steep line STICK through the origin. On the
 * concave side each of these closes in on the solution from one side, so the iteration holds near zero velocity as well. For
 * the same reason a pair counts as on the curve when either its force or its velocity is.
 * Source: the curve, Soong and Constantinou (1994), Passive and Active Structural Vibration Control (from memory); the choice
 * of tangents is our own.
 *
 * @returns 0 where the trial is on the curve, 1 where the line was changed
 */
export function damperTrial(w: Float64Array, at: number): number {
  const v = w[at + TRIAL_RATE];
  const c = w[at + DAMPER];
  const a = w[at + EXPONENT];
  const line = w[at + DAMPER_INTERCEPT] + w[at + DAMPER_SLOPE] * v;
  if (a === 1 || c === 0) {
    w[at + TRIAL_DAMPER] = c * v;
    return 0;
  }
  const speed = Math.abs(v);
  const size = c * speed ** a;
  const curve = v < 0 ? -size : size;
  if (Math.abs(line - curve) <= w[at + FORCE_TOLERANCE]) {
    w[at + TRIAL_DAMPER] = line;
    return 0;
  }
  if (a > 1) {
    const slope = speed > 0 ? (a * size) / speed : 0;
    w[at + DAMPER_SLOPE] = slope;
    w[at + DAMPER_INTERCEPT] = curve - slope * v;
    return 1;
  }
  const pull = Math.abs(line);
  const met = (pull / c) ** (1 / a);
  const velocity = line < 0 ? -met : met;
  if (Math.abs(velocity - v) <= RATE_TOLERANCE * w[at + PEAK_RATE]) {
    w[at + TRIAL_DAMPER] = line;
    return 0;
  }
  const stick = w[at + STICK];
  if (line * v <= 0) {
    w[at + DAMPER_SLOPE] = stick;
    w[at + DAMPER_INTERCEPT] = 0;
  } else if (pull > size) {
    const slope = Math.min(stick, (a * size) / speed);
    w[at + DAMPER_SLOPE] = slope;
    w[at + DAMPER_INTERCEPT] = curve - slope * v;
  } else {
    const slope = Math.min(stick, (a * pull) / met);
    w[at + DAMPER_SLOPE] = slope;
    w[at + DAMPER_INTERCEPT] = line - slope * velocity;
  }
  return 1;
}
