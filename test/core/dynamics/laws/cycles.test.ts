import { describe, expect, test } from 'vitest';
import type { Law } from '../../../../src/core/frame/frame.ts';
import { Walker } from './support.ts';

const K = 2.5e7;
const FY = 4e5;
const XY = FY / K;

/** Work of the third cycle between +-X, each half in `parts` increments. */
function cycleWork(law: Law, ductility: number, parts: number): number {
  const walker = new Walker(law, K);
  let before = 0;
  for (let cycle = 0; cycle < 3; cycle++) {
    walker.inParts(ductility * XY, parts);
    if (cycle > 0) before = walker.work - before;
    if (cycle === 2) return before;
    before = walker.work;
    walker.inParts(-ductility * XY, parts);
  }
  return Number.NaN;
}

// Closed forms of a steady cycle at amplitude X (Chopra, Dynamics of Structures, ch. 7, and plain geometry of the loops).
describe('[LAW-1] energy of a steady cycle', () => {
  const cases = [0, 0.02, 0.1, 0.5].flatMap((h) =>
    [1.5, 3, 8].flatMap((mu) => [1, 3, 40].map((parts) => [h, mu, parts] as const)),
  );

  test.each(cases)('bilinear, hardening %d, ductility %d, %d increments: 4 (1 - h) Fy (X - xy)', (h, mu, parts) => {
    const law: Law = { kind: 'bilinear', strength: FY, hardening: h };
    expect(cycleWork(law, mu, parts) / (4 * (1 - h) * FY * XY * (mu - 1))).toBeCloseTo(1, 9);
  });

  test.each(cases)('peak-oriented, hardening %d, ductility %d, %d increments: 2 F (X - F / k)', (h, mu, parts) => {
    const law: Law = { kind: 'peak-oriented', strength: FY, hardening: h };
    const force = FY * (1 + h * (mu - 1));
    expect(cycleWork(law, mu, parts) / (2 * force * (mu * XY - force / K))).toBeCloseTo(1, 9);
  });

  test.each(cases)('flag, hardening %d, ductility %d, %d increments: 2 r Fy (X - xy)', (h, mu, parts) => {
    for (const ratio of [0.2, 0.4, 1 - h]) {
      const law: Law = { kind: 'flag', strength: FY, hardening: h, ratio };
      expect(cycleWork(law, mu, parts) / (2 * ratio * FY * XY * (mu - 1))).toBeCloseTo(1, 9);
    }
  });

  // Unloading is straight for beta = gamma, then n = 1: u = 1 - exp(-y), n = 2: u = tanh y, over y = 2 X / xy - u(end).
  test.each([0, 0.1, 0.5])('Bouc-Wen, hardening %d: the loops of exponents 1 and 2', (h) => {
    for (const mu of [0.7, 2, 6]) {
      for (const exponent of [1, 2]) {
        const reached = exponent === 1 ? (y: number) => -Math.expm1(-y) : Math.tanh;
        const gained = exponent === 1 ? (y: number) => y + Math.expm1(-y) : (y: number) => Math.log(Math.cosh(y));
        let end = 1;
        for (let i = 0; i < 200; i++) end = reached(2 * mu - end);
        const expected = 2 * (1 - h) * FY * XY * (gained(2 * mu - end) - 0.5 * end ** 2);
        const law: Law = { kind: 'bouc-wen', strength: FY, hardening: h, exponent, beta: 0.5, gamma: 0.5 };
        const walker = new Walker(law, K);
        for (let i = 0; i < 30; i++) walker.inParts((i % 2 ? -mu : mu) * XY, 200);
        const before = walker.work;
        walker.inParts(mu * XY, 200);
        walker.inParts(-mu * XY, 200);
        expect((walker.work - before) / expected).toBeCloseTo(1, 7);
        expect(walker.z).toBeCloseTo(-end, 8);
      }
    }
  });

  test('the wrong height of a flag would show', () => {
    const law: Law = { kind: 'flag', strength: FY, hardening: 0.1, ratio: 0.41 };
    expect(cycleWork(law, 3, 3) / (2 * 0.4 * FY * XY * 2)).not.toBeCloseTo(1, 2);
  });
});

describe('[LAW-1] forces on the way, by hand (k = 1, Fy = 1)', () => {
  const walk = (law: Law, drifts: readonly number[]) => {
    const walker = new Walker(law);
    return drifts.map((drift) => walker.to(drift));
  };
  const close = (got: readonly number[], expected: readonly number[]) => {
    expect(got.length).toBe(expected.length);
    for (let i = 0; i < got.length; i++) expect(got[i]).toBeCloseTo(expected[i], 12);
  };

  test('bilinear: between two lines of the post-yield slope', () => {
    // Lines +-0.9 + 0.1 x.
    close(
      walk({ kind: 'bilinear', strength: 1, hardening: 0.1 }, [0.5, 3, 2, 0, -3, 3]),
      [0.5, 1.2, 0.2, -0.9, -1.2, 1.2],
    );
  });

  test('peak-oriented: aims at the yield point of a side that has not yielded, then at its peak', () => {
    // To 3 (force 1); zero at 2; from there at (-1, -1): slope 1/3. On along the envelope to -2; zero at -1; then at (3, 1): slope 1/4.
    close(
      walk({ kind: 'peak-oriented', strength: 1, hardening: 0 }, [3, 2.5, 0.5, -1, -2, -1.5, 1, 3, 4]),
      [1, 0.5, -0.5, -1, -1, -0.5, 0.5, 1, 1],
    );
  });

  test('peak-oriented: after a partial unloading back along it, then on along the branch that was left', () => {
    // On the branch from (2, 0) to (-1, -1) at (0.5, -0.5); unloads by 0.3, comes back, goes on.
    close(
      walk({ kind: 'peak-oriented', strength: 1, hardening: 0 }, [3, 0.5, 0.8, 0.6, 0.5, -0.4, -1]),
      [1, -0.5, -0.2, -0.4, -0.5, -0.8, -1],
    );
  });

  test('peak-oriented: fully unloaded on a branch, it aims at the peak of the side that it enters', () => {
    // At (0.5, -0.5); zero at 1; from there at (3, 1): slope 1/2. One increment and two give the same.
    const law: Law = { kind: 'peak-oriented', strength: 1, hardening: 0 };
    close(walk(law, [3, 0.5, 2]), [1, -0.5, 0.5]);
    close(walk(law, [3, 0.5, 1, 2]), [1, -0.5, 0, 0.5]);
  });

  test('flag: up the upper line, down the lower one, elastic below the fork', () => {
    // Upper 0.9 + 0.1 x, lower 0.4 + 0.1 x, fork at 4/9.
    close(
      walk({ kind: 'flag', strength: 1, hardening: 0.1, ratio: 0.5 }, [3, 2.8, 1, 0.3, 0, -3, -1, -1.1]),
      [1.2, 1.0, 0.5, 0.3, 0, -1.2, -0.5, -0.6],
    );
  });

  // Wen (1976): z = 1 - exp(-x / xy) for n = 1, z = tanh(x / xy) for n = 2.
  test.each([
    [1, (y: number) => -Math.expm1(-y), 1e-14],
    [2, Math.tanh, 5e-7],
  ] as const)('Bouc-Wen: first loading for exponent %d', (exponent, exact, tolerance) => {
    const law: Law = { kind: 'bouc-wen', strength: 1, hardening: 0.1, exponent, beta: 0.5, gamma: 0.5 };
    const walker = new Walker(law);
    for (let i = 1; i <= 60; i++) {
      walker.to(i * 0.1);
      expect(Math.abs(walker.z - exact(i * 0.1))).toBeLessThan(tolerance);
      expect(walker.force).toBeCloseTo(0.1 * walker.drift + 0.9 * walker.z, 14);
    }
  });

  test('Bouc-Wen: unloading is straight, of the initial stiffness, for beta = gamma, and steeper for beta > gamma', () => {
    for (const exponent of [1, 1.7, 3, 12]) {
      const law: Law = { kind: 'bouc-wen', strength: 1, hardening: 0.1, exponent, beta: 0.5, gamma: 0.5 };
      const straight = new Walker(law);
      straight.to(2);
      const steeper = new Walker({ ...law, beta: 0.8, gamma: 0.2 });
      steeper.to(2);
      const top = straight.force;
      for (const back of [0.1, 0.35, 0.6]) {
        expect(straight.to(2 - back)).toBeCloseTo(top - back, 12);
        expect(steeper.to(2 - back)).toBeLessThan(top - back);
      }
    }
  });
});
