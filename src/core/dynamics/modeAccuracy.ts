import type { Method } from './methods.ts';

/** What a scheme and a step make of one mode, beside what the equations of motion ask for. */
export interface Accuracy {
  /** Steps in the mode's natural period [-]. */
  readonly stepsAPeriod: number;
  /**
   * Period in the computation / true period - 1 [-]; null where the mode does not swing: the step is too coarse for
   * it, or it is damped by its critical damping or more.
   */
  readonly periodElongation: number | null;
  /** Share of the amplitude that the scheme takes away in a cycle [-], physical damping apart; negative where it adds; null as above. */
  readonly amplitudeDecay: number | null;
  /** The same as a ratio of critical damping, on top of the physical one [-]; null as above. */
  readonly addedDamping: number | null;
}

/**
 * Period elongation and amplitude decay of a free vibration u'' + 2 zeta w u' + w^2 u = 0 under a scheme, from the complex pair of
 * the 3 x 3 amplification matrix A of (u, h v, h^2 a). With B = A - 1 and p the row that gives h^2 a(n+1), B has the invariants
 *   I1 = beta pu + gamma pv + pa - 1,  I2 = -(gamma + 1/2) pu - pv,  I3 = pu,
 * free of cancellation at small steps. One root of it is real and below 0; the other two are the mode: 1 + mu = r exp(i W), a
 * vibration of frequency W / h whose amplitude is multiplied by r a step. Where all three are real it does not swing.
 * Source: Hughes, The Finite Element Method, sections 9.1 and 9.2 (algorithmic damping ratio, period elongation); Chung and
 * Hulbert (1993) for the family (all from memory).
 *
 * @param frequency  natural circular frequency [rad/s], > 0
 * @param ratio      physical damping ratio [-], >= 0
 * @param step       [s], > 0
 */
export function modeAccuracy(
  { am, af, beta, gamma }: Method,
  frequency: number,
  ratio: number,
  step: number,
): Accuracy {
  const w = frequency * step;
  const [k, c] = [w * w, 2 * ratio * w];
  const d = 1 - am + (1 - af) * (c * gamma + k * beta);
  const pu = -k / d;
  const pv = -(c + k * (1 - af)) / d;
  const pa = -(am + (1 - af) * (c * (1 - gamma) + k * (0.5 - beta))) / d;
  const trace = beta * pu + gamma * pv + pa - 1;
  const real = negativeRoot(trace, -(gamma + 0.5) * pu - pv, pu);
  const half = (trace - real) / 2;
  const product = pu / real;
  const imaginary = Math.sqrt(product - half * half);
  const stepsAPeriod = (2 * Math.PI) / w;
  const none = { stepsAPeriod, periodElongation: null, amplitudeDecay: null, addedDamping: null };
  if (!(imaginary > 0 && ratio < 1)) return none;
  const angle = Math.atan2(imaginary, 1 + half);
  const growth = 0.5 * Math.log1p(2 * half + product);
  const swing = Math.sqrt(1 - ratio * ratio);
  return {
    stepsAPeriod,
    periodElongation: (swing * w) / angle - 1,
    amplitudeDecay: -Math.expm1(2 * Math.PI * (growth / angle + ratio / swing)),
    addedDamping: -growth / Math.hypot(angle, growth) - ratio,
  };
}

/** The real root below 0 of x^3 - a x^2 + b x - c for c < 0 (there the cubic is above 0 at 0 and below it far to the left). */
function negativeRoot(a: number, b: number, c: number): number {
  let [low, high] = [-(1 + Math.max(Math.abs(a), Math.abs(b), Math.abs(c))), 0];
  let x = -1;
  for (let i = 0; i < 100; i++) {
    const value = ((x - a) * x + b) * x - c;
    if (value === 0) return x;
    if (value < 0) low = x;
    else high = x;
    const slope = (3 * x - 2 * a) * x + b;
    const newton = x - value / slope;
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (next === x) return x;
    x = next;
  }
  return x;
}
