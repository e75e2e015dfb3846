import { EigenvalueDecomposition, inverse, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { type Method, methodOf, spectralRadiusAtInfinity, stabilityLimit } from '../../src/core/dynamics/methods.ts';

/** Roots of the amplification matrix of the undamped oscillator at W = omega h, state (u, h v, h^2 a). */
function roots({ am, af, beta, gamma }: Method, W: number): { modulus: number; angle: number }[] {
  const left = new Matrix([
    [1, 0, -beta],
    [0, 1, -gamma],
    [(1 - af) * W * W, 0, 1 - am],
  ]);
  const right = new Matrix([
    [1, 1, 0.5 - beta],
    [0, 1, 1 - gamma],
    [-af * W * W, 0, -am],
  ]);
  const e = new EigenvalueDecomposition(inverse(left).mmul(right), { assumeSymmetric: false });
  return e.realEigenvalues.map((re, i) => ({
    modulus: Math.hypot(re, e.imaginaryEigenvalues[i]),
    angle: Math.atan2(e.imaginaryEigenvalues[i], re),
  }));
}
const radius = (method: Method, W: number) => Math.max(...roots(method, W).map((r) => r.modulus));

describe('A7 parameters and spectral radius at infinity', () => {
  // Chung and Hulbert (1993), J. Appl. Mech. 60, 371: the four numbers from the spectral radius.
  test('generalized-alpha at 0.8', () => {
    const m = methodOf({ kind: 'generalized-alpha', spectralRadius: 0.8 });
    expect(m.am).toBeCloseTo(1 / 3, 12);
    expect(m.af).toBeCloseTo(4 / 9, 12);
    expect(m.beta).toBeCloseTo(100 / 324, 12);
    expect(m.gamma).toBeCloseTo(11 / 18, 12);
  });
  test.each([0, 0.5, 0.8, 1])('generalized-alpha at %d keeps its promise', (r) => {
    const m = methodOf({ kind: 'generalized-alpha', spectralRadius: r });
    expect(spectralRadiusAtInfinity(m)).toBeCloseTo(r, 6);
    expect(Math.abs(radius(m, 1e5) - r)).toBeLessThan(r === 0 ? 2e-2 : 2e-3);
  });
  // Hilber, Hughes and Taylor (1977), EESD 5, 283: rho_inf = (1 + alpha) / (1 - alpha).
  test.each([-0.05, -0.1, -0.3])('HHT at alpha %d', (alpha) => {
    const m = methodOf({ kind: 'hht', alpha });
    expect(spectralRadiusAtInfinity(m)).toBeCloseTo((1 + alpha) / (1 - alpha), 6);
    expect(Math.abs(radius(m, 1e5) - (1 + alpha) / (1 - alpha))).toBeLessThan(2e-3);
  });
  // Newmark with beta = (gamma + 1/2)^2 / 4: rho_inf = (3/2 - gamma) / (gamma + 1/2).
  test.each([0.6, 0.8])('Newmark with gamma %d', (gamma) => {
    const m = methodOf({ kind: 'newmark', beta: (gamma + 0.5) ** 2 / 4, gamma });
    expect(spectralRadiusAtInfinity(m)).toBeCloseTo((1.5 - gamma) / (gamma + 0.5), 6);
    expect(Math.abs(radius(m, 1e5) - (1.5 - gamma) / (gamma + 0.5))).toBeLessThan(5e-3);
  });
});

// Chopra, sections 5.5 and 5.4 (figure 5.5.2); closed form cos(w_num h) = 1 - (W^2 / 2) / (1 + beta W^2) for gamma = 1/2.
describe('A8 numerical period', () => {
  test.each([
    [1 / 4, 0.032],
    [1 / 6, 0.0162],
    [0, -0.0168],
  ])('beta %d lengthens the period by %d at h = T / 10, without decay', (beta, elongation) => {
    const W = (2 * Math.PI) / 10;
    const pair = roots(methodOf({ kind: 'newmark', beta, gamma: 0.5 }), W).filter(
      (r) => r.modulus > 0.5 && r.angle > 1e-9,
    );
    expect(pair.length).toBe(1);
    expect(pair[0].modulus).toBeCloseTo(1, 9);
    expect(W / pair[0].angle).toBeCloseTo(W / Math.acos(1 - (W * W) / 2 / (1 + beta * W * W)), 7);
    expect(Math.abs(W / pair[0].angle - 1 - elongation)).toBeLessThan(5e-4);
  });
});

// Hughes, The Finite Element Method, section 9.1 (from memory): h / T <= 1 / (pi sqrt 2) / sqrt(gamma - 2 beta).
describe('A9 stability limits', () => {
  test.each([
    [0, 0.3183],
    [1 / 12, 0.39],
    [1 / 6, 0.551],
  ])('beta %d: step over period at most %d', (beta, limit) => {
    const m = methodOf({ kind: 'newmark', beta, gamma: 0.5 });
    const W = stabilityLimit(m);
    expect(Math.abs(W / (2 * Math.PI) - limit)).toBeLessThan(5e-4);
    expect(radius(m, W * 0.999)).toBeLessThan(1 + 1e-6);
    expect(radius(m, W * 1.001)).toBeGreaterThan(1.01);
  });
  test('2 beta >= gamma is stable at any step', () => {
    expect(stabilityLimit(methodOf({ kind: 'newmark', beta: 0.25, gamma: 0.5 }))).toBe(Number.POSITIVE_INFINITY);
  });
});
