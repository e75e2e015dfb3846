import { describe, expect, it } from 'vitest';
import { stackGeometry } from '../../../src/ui/strip/geometry.ts';

describe('stackGeometry', () => {
  it('stands as it was drawn at 1600 and 1024 px', () => {
    const wide = stackGeometry(868, 384, false, 1);
    expect(wide.axisX + wide.axisWidth).toBe(868);
    expect([wide.strip, ...wide.panels].map(({ top, height }) => [top, height])).toEqual([
      [10, 88],
      [112, 78],
      [202, 64],
      [278, 78],
    ]);
    expect(wide.numbers).toBe(371);
    const narrow = stackGeometry(992, 0, true, 1);
    expect(narrow.height).toBe(214);
    expect(narrow.panels).toHaveLength(1);
  });

  it('shares out what a window is taller by, and never overlaps', () => {
    for (const height of [384, 400, 517, 800]) {
      for (const rows of [1, 2]) {
        const { strip, panels, numbers } = stackGeometry(868, height, false, rows);
        const bands = [strip, ...panels];
        bands.slice(1).forEach((band, i) => {
          expect(band.top).toBeGreaterThanOrEqual(bands[i].top + bands[i].height + 12);
        });
        expect(Math.abs(height - numbers - 13)).toBeLessThanOrEqual(2);
      }
    }
  });

  it('keeps the play button clear of the next label when the letters take a second row', () => {
    const one = stackGeometry(868, 384, false, 1);
    const two = stackGeometry(868, 384, false, 2);
    expect(two.panels[0].label - one.panels[0].label).toBe(20);
    expect(two.panels[1]).toEqual(one.panels[1]);
  });
});
