import { displacementOf, velocityOf } from './integrals.ts';

/** A ground motion of our own making. */
export interface SyntheticOptions {
  /** Whole, 0 to 2^32 - 1: the same seed gives the same bits. */
  readonly seed: number;
  /** [s] */
  readonly interval: number;
  /** [s] */
  readonly duration: number;
  /** Largest |acceleration| [m/s2]. */
  readonly peak: number;
  /** Frequency [Hz] and damping of the ground filter: about 1 Hz soft, 3 Hz stiff. */
  readonly groundFrequency: number;
  readonly groundDamping: number;
  /** Frequency below which motion is taken out [Hz]. */
  readonly lowCut: number;
  /** Envelope: rises as t^2 to `strongFrom`, is 1 to `strongTo`, then fades with time constant `fade` [s]. */
  readonly strongFrom: number;
  readonly strongTo: number;
  readonly fade: number;
}

/**
 * White noise under an envelope of the kind of Jennings, Housner and Tsai, through the ground filter of Kanai and Tajimi and the
 * low-cut filter of Clough and Penzien, with what is left of velocity and displacement at the end brought to zero, scaled to
 * the peak. The envelope stands before the filters: behind them it would put back the slow motion that the low cut took out.
 * Only sums, products and quotients, so that every machine makes the same bits.
 *
 * Source: Kanai (1957) and Tajimi (1960); Clough and Penzien, Dynamics of Structures, section 23-3 (number from memory);
 * Jennings, Housner and Tsai (1968), Simulated Earthquake Motions, Caltech (from memory).
 * @returns samples [m/s2], the first at t = 0
 */
export function syntheticMotion(options: SyntheticOptions): Float64Array {
  const { interval: h, duration, peak, strongFrom, strongTo, fade } = options;
  const count = Math.round(duration / h) + 1;
  const uniform = uniforms(options.seed);
  const ground = filter('total', options.groundFrequency, options.groundDamping, h);
  const lowCut = filter('relative', options.lowCut, 0.7, h);
  const out = new Float64Array(count);
  let decay = 1;
  for (let i = 0; i < count; i++) {
    const t = i * h;
    if (t > strongTo) decay *= 1 - h / fade;
    const envelope = t < strongFrom ? (t / strongFrom) * (t / strongFrom) : decay;
    // The sum of twelve uniforms less six: mean 0, variance 1.
    let noise = -6;
    for (let k = 0; k < 12; k++) noise += uniform();
    out[i] = lowCut(ground(envelope * noise));
  }
  settle(out, h);
  let largest = 0;
  for (let i = 0; i < count; i++) largest = Math.max(largest, Math.abs(out[i]));
  for (let i = 0; i < count; i++) out[i] *= peak / largest;
  return out;
}

/** A damped oscillator under ground acceleration, marched by average acceleration (Newmark 1959): its total or relative acceleration. */
function filter(gives: 'total' | 'relative', frequency: number, damping: number, h: number): (ag: number) => number {
  const w = 2 * Math.PI * frequency;
  const [c, k] = [2 * damping * w, w * w];
  const divisor = 1 + (h / 2) * c + ((h * h) / 4) * k;
  let [u, v, a] = [0, 0, 0];
  return (ag) => {
    const uStar = u + h * v + ((h * h) / 4) * a;
    const vStar = v + (h / 2) * a;
    a = (-ag - c * vStar - k * uStar) / divisor;
    v = vStar + (h / 2) * a;
    u = uStar + ((h * h) / 4) * a;
    return gives === 'total' ? a + ag : a;
  };
}

/** Takes two smooth shapes off the acceleration so that velocity and displacement end at zero. */
function settle(a: Float64Array, h: number): void {
  const last = a.length - 1;
  const shapes = [0, 1].map((order) =>
    Float64Array.from(a, (_, i) => {
      const s = i / last;
      return s * s * (1 - s) * (1 - s) * (order === 0 ? 1 : 1 - 2 * s);
    }),
  );
  const ends = (x: Float64Array) => {
    const v = velocityOf(x, h);
    return [v[last], displacementOf(x, v, h)[last]];
  };
  const [[v0, d0], [v1, d1], [v, d]] = [ends(shapes[0]), ends(shapes[1]), ends(a)];
  const determinant = v0 * d1 - v1 * d0;
  const [c0, c1] = [(v * d1 - v1 * d) / determinant, (v0 * d - v * d0) / determinant];
  for (let i = 0; i <= last; i++) a[i] -= c0 * shapes[0][i] + c1 * shapes[1][i];
}

/** Uniform numbers in [0, 1) from a 32-bit state: the mulberry32 generator, in the public domain. */
function uniforms(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
