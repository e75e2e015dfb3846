import { describe, expect, test } from 'vitest';
import type { Law } from '../../src/core/frame/frame.ts';
import { harmonic, histories, largest, oneStorey } from '../support/oneStorey.ts';

// Energy that a storey takes in a cycle of steady amplitude X: closed forms, yield drift y = Fy / k, force at X
// F = Fy + h k (X - y). Sources: bilinear 4 (1 - h) Fy (X - y), flag 2 r Fy (X - y), peak-oriented 2 F (X - F / k) as areas of
// their loops; Bouc-Wen (Wen 1976, from memory) with beta = gamma: unloading along slope k, then z = 1 - exp(-s) for
// exponent 1 and z = tanh(s) for 2, s = distance / y from z = 0, so that the largest z solves zm = z(2 X / y - zm).
const STRENGTH = 500;
const STIFFNESS = 1e4;
const HARDENING = 0.2;
const Y = STRENGTH / STIFFNESS;

function forceAt(X: number): number {
  return STRENGTH + HARDENING * STIFFNESS * (X - Y);
}

/** z rises from -zm to zero on a straight line of slope 1 / y, then along `rise`, whose integral is `area`. */
function boucWenCycle(X: number, rise: (s: number) => number, area: (s: number) => number): number {
  let zm = 0.5;
  for (let i = 0; i < 200; i++) zm = rise((2 * X) / Y - zm);
  return (1 - HARDENING) * STRENGTH * 2 * Y * (area((2 * X) / Y - zm) - (zm * zm) / 2);
}

const strength = STRENGTH;
const hardening = HARDENING;
const bouc = { kind: 'bouc-wen', strength, hardening, beta: 0.5, gamma: 0.5 } as const;
const CYCLES: readonly (readonly [string, Law, (X: number) => number])[] = [
  ['bilinear', { kind: 'bilinear', strength, hardening }, (X) => 4 * (1 - hardening) * strength * (X - Y)],
  ['flag', { kind: 'flag', strength, hardening, ratio: 0.6 }, (X) => 2 * 0.6 * strength * (X - Y)],
  [
    'peak-oriented',
    { kind: 'peak-oriented', strength, hardening },
    (X) => 2 * forceAt(X) * (X - forceAt(X) / STIFFNESS),
  ],
  [
    'Bouc-Wen, exponent 1',
    { ...bouc, exponent: 1 },
    (X) =>
      boucWenCycle(
        X,
        (s) => 1 - Math.exp(-s),
        (s) => s - 1 + Math.exp(-s),
      ),
  ],
  ['Bouc-Wen, exponent 2', { ...bouc, exponent: 2 }, (X) => boucWenCycle(X, Math.tanh, (s) => Math.log(Math.cosh(s)))],
];

describe('hysteretic energy of a cycle under a slow harmonic', () => {
  test.each(CYCLES)('%s', (_, law, closed) => {
    // Forces reach 1.5 Fy; the motion is 40 times slower than the frame softened by yielding, so that the drift follows it.
    const mass = 1;
    const w = Math.sqrt((hardening * STIFFNESS) / mass) / 40;
    const cycle = 1000;
    const interval = (2 * Math.PI) / w / cycle;
    const ground = harmonic((1.5 * STRENGTH) / mass, w, interval, 9 * cycle + 1, 4 * cycle * interval);
    const damping = { kind: 'modal', ratios: [0.05] } as const;
    const frame = oneStorey({ mass, stiffness: STIFFNESS, law, damping });
    const { histories: h, energy } = histories(frame, ground, interval, { step: { parts: 4 } });
    const steps = 4 * cycle;
    const last = h.count - 1;
    const X = largest(h.displacement, last - steps, last + 1);
    expect(X / Y).toBeGreaterThan(3);
    // Steady: the cycle before had the same amplitude.
    expect(Math.abs(largest(h.displacement, last - 2 * steps, last - steps) / X - 1)).toBeLessThan(2e-3);
    const taken = h.energy.hysteretic[last] - h.energy.hysteretic[last - steps];
    expect(Math.abs(taken / closed(X) - 1), `${taken} J, ${closed(X)} J`).toBeLessThan(5e-3);
    expect(energy.imbalance).toBeLessThan(0.01);
  });
});
