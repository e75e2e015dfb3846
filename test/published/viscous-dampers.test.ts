import { describe, expect, test } from 'vitest';
import { harmonic, histories, largest, oneStorey } from '../support/oneStorey.ts';

// Work of a damper F = c |v|^a sgn(v) in a cycle u = X sin(w t): lambda c w^a X^(1 + a), with
// lambda = 2^(2 + a) Gamma(1 + a / 2)^2 / Gamma(2 + a). Soong and Constantinou (1994), Passive and Active Structural Vibration
// Control; FEMA 274 tabulates lambda (both from memory): 3.5, 3.1 and 2.9 for 0.5, 1 and 1.5.
describe('a damper in a storey in steady state', () => {
  test.each([
    [0.3, 3.674571925],
    [0.5, 3.496076739],
    [1, Math.PI],
    [1.5, 2.875536563],
  ])('exponent %d: lambda %d', (a, lambda) => {
    const mass = 1000;
    const w = 2 * Math.PI;
    const X = 0.05;
    // At resonance the damper's work is that of the ground, pi m A X, so A follows from the amplitude wanted; 3 % of critical.
    const amplitude = 2 * 0.03 * w * w * X;
    const coefficient = (Math.PI * mass * amplitude * X) / (lambda * w ** a * X ** (1 + a));
    const frame = oneStorey({ mass, stiffness: mass * w * w, damper: { coefficient, exponent: a } });
    // What is left of the beginning dies away with a x 3 % of critical.
    const cycles = 30 + Math.ceil(45 / a);
    const cycle = 50;
    const parts = 8;
    const interval = 1 / cycle;
    const ground = harmonic(amplitude, w, interval, cycles * cycle + 1, 8);
    const { histories: h, storeys, energy } = histories(frame, ground, interval, { step: { parts } });
    const last = h.count - 1;
    const steps = (cycle * parts) / h.every;
    const reached = largest(h.displacement, last - 2 * steps, last + 1);
    expect(Math.abs(reached / X - 1), `amplitude ${reached}`).toBeLessThan(0.01);
    const work = (h.energy.dampers[last] - h.energy.dampers[last - 2 * steps]) / 2;
    const closed = lambda * coefficient * w ** a * reached ** (1 + a);
    expect(Math.abs(work / closed - 1), `work ${work} J, ${closed} J`).toBeLessThan(3e-3);
    expect(storeys.damperWork[0]).toBeCloseTo(energy.dampers, 9);
    expect(energy.imbalance).toBeLessThan(1e-3);
  });
});
