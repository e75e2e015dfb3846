import { describe, expect, it } from 'vitest';
import { following, moved, shownRange, zoomed } from '../../../src/ui/strip/timeRange.ts';

describe('the stretch of time that is shown', () => {
  it('is the whole until one is chosen, and stays inside of a shorter run', () => {
    expect(shownRange(null, 35)).toEqual([0, 35]);
    expect(shownRange([30, 40], 35)).toEqual([25, 35]);
    expect(shownRange([30, 90], 35)).toEqual([0, 35]);
  });

  it('zooms about a time that stays where it is, and back to the whole', () => {
    const near = zoomed([0, 40], 10, 0.5, 40);
    expect(near).toEqual([5, 25]);
    expect(zoomed([5, 25], 10, 2, 40)).toBeNull();
    expect(zoomed([0, 40], 0, 1e-6, 40)).toEqual([0, 0.1]);
  });

  it('moves along and no further than the axis', () => {
    expect(moved([5, 15], 100, 40)).toEqual([30, 40]);
    expect(moved([5, 15], -100, 40)).toEqual([0, 10]);
  });

  it('turns on when the cursor leaves it', () => {
    expect(following([5, 15], 10, 40)).toEqual([5, 15]);
    expect(following([5, 15], 15.5, 40)).toEqual([14.5, 24.5]);
  });
});
