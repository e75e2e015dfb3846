import { describe, expect, it } from 'vitest';
import { evenAxis, niceStep, risingAxis, ticksBetween } from '../../../src/ui/plots/ticks.ts';

describe('ticks', () => {
  it('stand at 1, 2, 5 times a power of ten', () => {
    expect([0.3, 0.7, 1, 1.1, 3, 7, 30].map(niceStep)).toEqual([0.5, 1, 1, 2, 5, 10, 50]);
    expect(ticksBetween(0, 35, 8)).toEqual({ at: [0, 5, 10, 15, 20, 25, 30, 35], decimals: 0 });
    expect(ticksBetween(3.8, 4.33, 6).at.map((value) => value.toFixed(1))).toEqual([
      '3.8',
      '3.9',
      '4.0',
      '4.1',
      '4.2',
      '4.3',
    ]);
  });

  it('an axis about zero has one number near the largest value and holds both', () => {
    for (const [largest, tick] of [
      [2.99, 3],
      [11.02, 10],
      [0.48, 0.5],
      [1, 1],
      [73, 60],
    ]) {
      const { end, ticks } = evenAxis(largest);
      expect(ticks.at[2]).toBeCloseTo(tick, 12);
      expect(end).toBeGreaterThan(Math.max(largest, tick));
    }
  });

  it('an axis of nothing is still an axis', () => {
    expect(evenAxis(0).end).toBe(1);
    expect(risingAxis(Number.NaN, 3).end).toBe(1);
    expect(ticksBetween(2, 2, 5).at).toEqual([]);
  });
});
