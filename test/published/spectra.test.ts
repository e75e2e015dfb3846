import { describe, expect, test } from 'vitest';
import { recurrence } from '../../src/core/spectrum/recurrence.ts';

// A. K. Chopra, Dynamics of Structures, 4th ed., Example 5.1 and Table E5.1 (from memory of the print, confirmed by an independent
// computation): m = 0.2533 kip s2/in, k = 10 kip/in, 5 %, p = 10 sin(pi t / 0.6) kip to 0.6 s, step 0.1 s. Tolerance 1.5e-4 in.
describe('A1 interpolation of the excitation', () => {
  const [m, k, z, h] = [0.2533, 10, 0.05, 0.1];
  const r = recurrence(Math.sqrt(k / m), z, h);
  test.each([
    ['A', r.a11, 0.8129, 5e-5],
    ['B', r.a12, 0.09067, 5e-6],
    // The print's C and D act on a force p = -m ag.
    ['C', -r.b11 / m, 0.01236, 5e-6],
    ['D', -r.b12 / m, 0.00635, 5e-6],
  ])('recurrence coefficient %s', (_, got, printed, half) => expect(Math.abs(got - printed)).toBeLessThan(half));
  test('the table, digit for digit', () => {
    const printed = [0, 0.0318, 0.2274, 0.6336, 1.1339, 1.4896, 1.448, 0.9037, 0.0579, -0.7577, -1.2432];
    const ag = printed.map((_, i) => (i < 6 ? (-10 * Math.sin((Math.PI * i) / 6)) / m : 0));
    let [u, v] = [0, 0];
    for (let i = 1; i < printed.length; i++) {
      [u, v] = [
        r.a11 * u + r.a12 * v + r.b11 * ag[i - 1] + r.b12 * ag[i],
        r.a21 * u + r.a22 * v + r.b21 * ag[i - 1] + r.b22 * ag[i],
      ];
      expect(Math.abs(u - printed[i]), `t = ${i / 10} s`).toBeLessThan(1.5e-4);
    }
  });
});
