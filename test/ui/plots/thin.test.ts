import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { thinned, thinnedPath } from '../../../src/ui/plots/thin.ts';

const history = fc.float64Array({ minLength: 1, maxLength: 400, noNaN: true, noDefaultInfinity: true });

describe('thinned', () => {
  it('keeps the smallest and the largest value of the stretch, at most two a column, in order', () => {
    fc.assert(
      fc.property(history, fc.integer({ min: 1, max: 60 }), (values, columns) => {
        const kept = thinned(values, 0, values.length, columns);
        const shown = Array.from(kept, (i) => values[i]);
        expect(Math.max(...shown)).toBe(Math.max(...values));
        expect(Math.min(...shown)).toBe(Math.min(...values));
        expect(kept.length).toBeLessThanOrEqual(2 * columns);
        for (let i = 1; i < kept.length; i++) expect(kept[i]).toBeGreaterThan(kept[i - 1]);
      }),
    );
  });

  it('keeps a peak of one sample that each n-th would miss', () => {
    const values = new Float64Array(10_000);
    values[4321] = -7;
    expect(Array.from(thinned(values, 0, values.length, 100))).toContain(4321);
  });

  it('takes all entries where there are no more than two a column, and only those asked for', () => {
    expect(Array.from(thinned(Float64Array.of(5, 6, 7, 8), 1, 3, 10))).toEqual([1, 2]);
    expect(thinned(new Float64Array(0), 0, 0, 10).length).toBe(0);
  });
});

describe('thinnedPath', () => {
  it('never leaves a point further than the reach from the one drawn before it', () => {
    fc.assert(
      fc.property(history, (x) => {
        const y = x.map((value) => -value);
        const reach = { x: 1e3, y: 1e3 };
        const kept = thinnedPath(x, y, reach);
        expect(kept[0]).toBe(0);
        expect(kept.at(-1)).toBe(x.length - 1);
        let at = 0;
        for (let i = 0; i < x.length; i++) {
          if (kept[at + 1] === i) at += 1;
          expect(Math.abs(x[i] - x[kept[at]])).toBeLessThan(kept[at] === i ? 1 : reach.x);
        }
      }),
    );
  });
});
