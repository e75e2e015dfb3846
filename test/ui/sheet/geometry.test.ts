import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisFor, linesOf } from '../../../src/ui/sheet/axis.ts';
import { inputColumns } from '../../../src/ui/sheet/columns.ts';
import {
  bearingMiddle,
  bearingPath,
  columnEnds,
  columnPath,
  columnWidths,
  swayFactor,
  ticksPath,
} from '../../../src/ui/sheet/drawing.ts';
import { layoutOf, ROOMY_FROM, WIDE_FROM } from '../../../src/ui/sheet/layout.ts';
import { rowsOf } from '../../../src/ui/sheet/rows.ts';

describe('rows to scale', () => {
  const clinic = [4.8, 4.2, 4.2, 3.6, 3.6, 3.6, 3.6, 3.6];

  it('levels stay true: each floor line is the rounded level', () => {
    const rows = rowsOf(clinic, 390);
    expect(rows.total).toBe(390);
    expect(rows.scale).toBeCloseTo(12.5, 12);
    expect(rows.heights[0]).toBe(60);
    expect(rows.tops[0]).toBe(330);
    expect(rows.tops[7]).toBe(0);
    expect(rows.toScale).toBe(true);
  });

  it('a low building is not blown up past 14 px/m', () => {
    expect(rowsOf([3.6], 390).scale).toBe(14);
  });

  it('sixty storeys keep 20 px each and say that they are not to scale', () => {
    const rows = rowsOf([4.8, ...Array.from({ length: 59 }, () => 3.6)], 390);
    expect(Math.min(...rows.heights)).toBe(20);
    expect(rows.toScale).toBe(false);
    expect(rows.total).toBe(1200);
  });

  it('a row of bearings is high enough to be drawn, and does not squeeze the others', () => {
    const rows = rowsOf([0.5, 3.6, 3.6], 390, true);
    expect(rows.heights[0]).toBe(36);
    expect(rows.heights[1]).toBe(50);
    expect(rows.toScale).toBe(false);
  });

  it('rows add up, none is under 20 px, whatever is typed', () => {
    const height = fc.option(fc.double({ min: -5, max: 40, noNaN: true }));
    fc.assert(
      fc.property(
        fc.array(height, { minLength: 1, maxLength: 60 }),
        fc.integer({ min: 200, max: 900 }),
        (heights, free) => {
          const rows = rowsOf(heights, free);
          expect(Math.min(...rows.heights)).toBeGreaterThanOrEqual(20);
          expect(rows.heights.reduce((sum, size) => sum + size, 0)).toBe(rows.total);
          expect(rows.tops[rows.tops.length - 1]).toBe(0);
        },
      ),
    );
  });
});

describe('layout', () => {
  it('stands where the look puts it at 1600 px', () => {
    const layout = layoutOf(1600, 1600, inputColumns({ hardening: true, gravity: false, damper: false }));
    expect(layout.lawNames).toBe(true);
    expect(layout.tracks).toMatch(
      /^\[name\] 126px \[height\] 52px \[mass\] 64px \[stiffness\] 72px \[law\] 112px \[strength\] 68px \[hardening\] 62px/,
    );
    expect(layout.inputs).toEqual({ x: 24, width: 556 });
    expect(layout.frame).toEqual({ x: 596, width: 296 });
    expect(layout.answers).toEqual({ x: 916, width: 660 });
    expect(layout.drift).toEqual({ x: 916, width: 270 });
    expect(layout.shear).toEqual({ x: 1312, width: 86 });
    expect(layout.acceleration).toEqual({ x: 1472, width: 66 });
  });

  it('folds the small plots away at 1024 px', () => {
    const layout = layoutOf(1024, 1024, inputColumns({ hardening: false, gravity: false, damper: false }));
    expect(layout.lawNames).toBe(false);
    expect(layout.frame).toEqual({ x: 388, width: 178 });
    expect(layout.drift).toEqual({ x: 582, width: 202 });
    expect(layout.shear).toBeNull();
  });

  it('needs no sideways scroll for what it shows by itself', () => {
    for (let width = 900; width <= 2600; width += 7) {
      const narrow = width < WIDE_FROM;
      const columns = inputColumns({ hardening: !narrow, gravity: false, damper: false });
      expect(layoutOf(width, width, columns, width >= ROOMY_FROM).width, `${width}`).toBe(width);
    }
  });

  it('fills every width from 900 px on to the pixel', () => {
    for (let width = 900; width <= 2600; width += 7) {
      for (const more of [0, 1, 2, 3, 4, 5, 6, 7]) {
        const columns = inputColumns({ hardening: (more & 1) > 0, gravity: (more & 2) > 0, damper: (more & 4) > 0 });
        for (const yielding of [false, true]) {
          const layout = layoutOf(width, width, columns, yielding);
          const sum = [...layout.tracks.matchAll(/(-?\d+)px/g)].reduce((all, match) => all + Number(match[1]), 0);
          expect(sum, `${width}`).toBe(layout.width - 2 * layout.margin);
          expect(layout.sideways, `${width}`).toBe(layout.width > width);
          expect(layout.width, `${width}`).toBeGreaterThanOrEqual(width);
          expect(layout.drift.width, `${width}`).toBeGreaterThanOrEqual(140);
          expect(Math.min(...Object.values(layout.signs)), `${width}`).toBeGreaterThanOrEqual(3);
        }
      }
    }
  });
});

describe('axes', () => {
  it('reads 0, 1, 2, 3 for a largest drift of 2.99 %', () => {
    const axis = axisFor(2.99, 3.6);
    expect(axis).toEqual({ end: 3, major: 1, minor: 0.5 });
    expect(linesOf(axis, axis.major)).toEqual([1, 2, 3]);
  });

  it('holds the largest value', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e9, noNaN: true }), (largest) => {
        const axis = axisFor(largest, 3);
        expect(axis.end).toBeGreaterThanOrEqual(largest * (1 - 1e-8));
        expect(linesOf(axis, axis.minor).length).toBeLessThanOrEqual(12);
      }),
    );
  });
});

describe('drawing', () => {
  it('a column leaves both floors upright', () => {
    expect(columnPath(128, 390, 114.1, 330)).toBe('M128 390C128 367 114.1 353 114.1 330');
  });

  it('a bearing shears with the floor it carries; its mark stands in its middle', () => {
    expect(bearingPath(100, 400, 130, 360)).toMatch(/^M89 387H111M119 373H141/);
    expect(bearingMiddle(0, 30, 400, 360)).toEqual([
      [15, 380],
      [15, 380],
    ]);
    expect(columnEnds(0, 30, 400, 360)).toEqual([
      [0, 394],
      [30, 366],
    ]);
    expect(columnEnds(0, 0, 400, 380)[0]?.[1]).toBe(396);
  });

  it('the motions of a row are one path', () => {
    expect(ticksPath([10, 20.04], 2, 22)).toBe('M10 2V22M20 2V22');
  });

  it('columns are drawn by stiffness', () => {
    const widths = columnWidths([640, 455, 205, null]);
    expect(widths[0]).toBeCloseTo(3.4);
    expect(widths[1]).toBeCloseTo(2.464, 3);
    expect(widths[2]).toBeCloseTo(1.2);
    expect(columnWidths([100, 100])).toEqual([2.4, 2.4]);
  });

  it('the sway is a whole factor, at most 20, at least 1', () => {
    expect(swayFactor(0.378, 12.5, 57)).toBe(12);
    expect(swayFactor(0.001, 12.5, 57)).toBe(20);
    expect(swayFactor(9, 12.5, 57)).toBe(1);
  });
});
