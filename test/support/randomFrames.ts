import type { Damping, Frame, Law, Storey } from '../../src/core/frame/frame.ts';

/** A drawn frame and the ground that it is shaken by. */
export interface Drawn {
  readonly frame: Frame;
  /** [s] */
  readonly interval: number;
  /** [m/s2] */
  readonly acceleration: Float64Array;
}

const KINDS = ['elastic', 'bilinear', 'peak-oriented', 'bouc-wen', 'flag'] as const;

/**
 * Frames of 1 to 4 storeys with first periods of 0.15 to 1.5 s, each law in turn, from elastic to a ductility of about 10; some with
 * P-Delta, some with dampers; under band-limited noise of 3 s that rises and fades.
 */
export function drawFrames(count: number, seed: number): Drawn[] {
  const draw = uniform(seed);
  return Array.from({ length: count }, (_, i) => drawn(KINDS[i % KINDS.length], draw));
}

function drawn(kind: (typeof KINDS)[number], draw: () => number): Drawn {
  const between = (from: number, to: number) => from + (to - from) * draw();
  const logarithmic = (from: number, to: number) => from * (to / from) ** draw();
  const n = 1 + Math.floor(4 * draw());
  const acceleration = noiseThatFades(150, draw);
  const peak = Math.max(...acceleration.map(Math.abs));
  const stiffness = logarithmic(5e7, 5e8);
  // Of n equal storeys, omega1 = 2 sqrt(k/m) sin(pi / (2 (2 n + 1))).
  const frequency = (2 * Math.PI) / logarithmic(0.15, 1.5);
  const mass = stiffness * ((2 * Math.sin(Math.PI / (4 * n + 2))) / frequency) ** 2;
  const storeys = Array.from({ length: n }, (_, i): Storey => {
    const strength = peak * mass * (n - i) * logarithmic(0.3, 1.5);
    const damper = draw() < 0.2 ? { coefficient: 0.01 * stiffness, exponent: between(0.3, 1) } : null;
    return {
      name: `Storey ${i + 1}`,
      height: 3.5,
      mass: mass * between(0.8, 1.2),
      stiffness: stiffness * (1 - (0.5 * i) / n) * between(0.8, 1.2),
      law: lawOf(kind, strength, between(0, 0.2), draw),
      ...(damper ? { damper } : {}),
    };
  });
  const rayleigh: Damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] };
  const damping: Damping = n > 1 && draw() < 0.5 ? rayleigh : { kind: 'modal', ratios: [0.03] };
  return { frame: { storeys, damping, pDelta: draw() < 0.3 }, interval: 0.02, acceleration };
}

function lawOf(kind: (typeof KINDS)[number], strength: number, hardening: number, draw: () => number): Law {
  switch (kind) {
    case 'elastic':
      return { kind };
    case 'bouc-wen':
      return { kind, strength, hardening, exponent: 1 + 3 * draw(), beta: 0.5, gamma: 0.5 };
    case 'flag':
      return { kind, strength, hardening, ratio: 0.7 * draw() };
    default:
      return { kind, strength, hardening };
  }
}

/** Noise through two first-order filters, under an envelope that rises over 15 % and fades from the middle on. */
function noiseThatFades(count: number, draw: () => number): Float64Array {
  let [once, twice] = [0, 0];
  return Float64Array.from({ length: count }, (_, i) => {
    once = 0.7 * once + (2 * draw() - 1);
    twice = 0.5 * twice + once;
    const rise = Math.min(1, i / (0.15 * count));
    return 1.2 * twice * rise * Math.exp(-Math.max(0, i - 0.5 * count) / (0.15 * count));
  });
}

/** Numbers from 0 to 1. Linear congruential, Numerical Recipes' constants. */
function uniform(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}
