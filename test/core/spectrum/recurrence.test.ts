import fc from 'fast-check';
import { expect, test } from 'vitest';
import { recurrence } from '../../../src/core/spectrum/recurrence.ts';
import { exponential } from '../../support/exact.ts';

// K8: Nigam and Jennings (1969), Bull. Seism. Soc. Am. 59, 909-922: the eight coefficients are those of the matrix exponential of
// the state (u, v, -ag, -slope).
test('K8 the recurrence is the matrix exponential to 1e-12, for closed forms and series alike', () => {
  let [series, closed] = [0, 0];
  fc.assert(
    fc.property(
      fc.integer({ min: -1000, max: 340 }),
      fc.double({ min: 0, max: 0.99, noNaN: true }),
      fc.double({ min: 0.1, max: 200, noNaN: true }),
      (hundredths, z, w) => {
        const wh = Math.exp(hundredths / 100);
        if (wh < 0.3) series++;
        else closed++;
        const h = wh / w;
        const r = recurrence(w, z, h);
        const e = exponential(w, z, h);
        // p = -ag at the start and s = -(ag' - ag) / h, so ag takes -(column of p) + (column of s) / h. Scales: u and b11 in
        // 1 and 1 / w^2 by rows of velocity w times as large.
        const pairs = [
          [r.a11, e[0], 1],
          [r.a12, e[1], 1 / w],
          [r.b11, e[3] / h - e[2], 1 / w ** 2],
          [r.b12, -e[3] / h, 1 / w ** 2],
          [r.a21, e[4], w],
          [r.a22, e[5], 1],
          [r.b21, e[7] / h - e[6], 1 / w],
          [r.b22, -e[7] / h, 1 / w],
        ];
        for (const [got, exact, scale] of pairs) expect(Math.abs(got - exact) / scale).toBeLessThan(1e-12);
      },
    ),
    { numRuns: 400, endOnFailure: true },
  );
  expect(series).toBeGreaterThan(50);
  expect(closed).toBeGreaterThan(50);
});

test('a frequency, step or damping out of range is refused by name', () => {
  for (const [w, z, h] of [
    [0, 0.05, 0.01],
    [-1, 0.05, 0.01],
    [1, 0.05, 0],
    [1, -0.01, 0.01],
    [1, 1, 0.01],
    [Number.NaN, 0.05, 0.01],
    [1, Number.NaN, 0.01],
  ])
    expect(() => recurrence(w, z, h)).toThrow(/^recurrence: /);
});
