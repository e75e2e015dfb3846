import fc from 'fast-check';
import { expect, test } from 'vitest';
import { factorTridiagonal, solveTridiagonalInto } from '../../../src/core/linalg/tridiagonal.ts';

// Judged by backward error: |A x - b| against |A| |x|, not by closeness of x (Golub & Van Loan, section 3.5, from memory).
test('[LIN-1] solves any shear frame matrix to a backward error of rounding', () => {
  let cases = 0;
  const positive = fc.double({ min: 1e-6, max: 1e9, noNaN: true });
  fc.assert(
    fc.property(
      fc.array(fc.tuple(positive, positive, fc.double({ min: -1e6, max: 1e6, noNaN: true })), {
        minLength: 1,
        maxLength: 60,
      }),
      (rows) => {
        cases++;
        const n = rows.length;
        const k = rows.map((row) => row[1]);
        const diagonal = Float64Array.from(rows, ([m], i) => m + k[i] + (i + 1 < n ? k[i + 1] : 0));
        const off = Float64Array.from(rows, (_, i) => (i > 0 ? -k[i] : 0));
        const b = Float64Array.from(rows, (row) => row[2]);
        const factors = factorTridiagonal(diagonal, off);
        if ('row' in factors) throw new Error(`row ${factors.row}`);
        const x = new Float64Array(n);
        solveTridiagonalInto(factors, b, x);
        const largest = Math.max(...x.map(Math.abs), 1e-300);
        for (let i = 0; i < n; i++) {
          const left = diagonal[i] * x[i] + (i > 0 ? off[i] * x[i - 1] : 0) + (i + 1 < n ? off[i + 1] * x[i + 1] : 0);
          expect(Math.abs(left - b[i])).toBeLessThanOrEqual(
            1e-14 * (2 * Math.max(...diagonal) * largest + Math.abs(b[i])),
          );
        }
      },
    ),
  );
  expect(cases).toBeGreaterThanOrEqual(100);
});

test('[LIN-2] names the first row whose pivot is not above zero, NaN included', () => {
  expect(factorTridiagonal(Float64Array.of(1, -1), Float64Array.of(0, 0))).toEqual({ row: 1 });
  expect(factorTridiagonal(Float64Array.of(Number.NaN, 1), Float64Array.of(0, 0))).toEqual({ row: 0 });
});
