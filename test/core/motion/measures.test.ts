import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { displacementOf, velocityOf } from '../../../src/core/motion/integrals.ts';
import { measuresOf } from '../../../src/core/motion/measures.ts';
import { STANDARD_GRAVITY } from '../../../src/core/units/constants.ts';

const motionOf = (interval: number, ...values: number[]) => ({ interval, acceleration: Float64Array.from(values) });

describe('[MEA-1] closed forms of simple broken lines', () => {
  // Constant acceleration a: v = a t, d = a t^2 / 2, Arias pi a^2 t / (2 g), 5 to 95 % in nine tenths of the time.
  test('a constant', () => {
    const m = measuresOf(motionOf(0.5, 2, 2, 2, 2, 2));
    expect(m.peakAcceleration).toBe(2);
    expect(m.peakAccelerationTime).toBe(0);
    expect(m.peakVelocity).toBeCloseTo(4, 14);
    expect(m.endVelocity).toBeCloseTo(4, 14);
    expect(m.peakDisplacement).toBeCloseTo(4, 14);
    expect(m.ariasIntensity).toBeCloseTo((Math.PI * 8) / (2 * STANDARD_GRAVITY), 14);
    expect(m.start5to95).toBeCloseTo(0.1, 12);
    expect(m.duration5to95).toBeCloseTo(1.8, 12);
  });
  // a = t on [0, 2]: v = t^2 / 2, d = t^3 / 6, the integral of a^2 is t^3 / 3.
  test('a ramp, exact however few its samples', () => {
    for (const values of [
      [0, 2],
      [0, 1, 2],
      [0, 0.25, 0.5, 0.75, 1, 1.25, 1.5, 1.75, 2],
    ]) {
      const m = measuresOf(motionOf(2 / (values.length - 1), ...values));
      expect(m.peakAccelerationTime).toBeCloseTo(2, 14);
      expect(m.endVelocity).toBeCloseTo(2, 14);
      expect(m.peakDisplacement).toBeCloseTo(8 / 6, 14);
      expect(m.ariasIntensity).toBeCloseTo((Math.PI * 8) / 3 / (2 * STANDARD_GRAVITY), 13);
    }
  });
  // a = 1 - t over two samples 2 s apart: v = t - t^2 / 2 peaks at 1/2 when t = 1, between the samples.
  test('the largest velocity lies between samples', () => {
    const m = measuresOf(motionOf(2, 1, -1));
    expect(m.peakVelocity).toBeCloseTo(0.5, 14);
    expect(m.endVelocity).toBeCloseTo(0, 14);
  });
  // a = 1 for 1 s, then 1 - t' falling by 2 a second: v = 1 + t' - t'^2 is zero at t' = (1 + sqrt 5) / 2, where d peaks.
  test('the largest displacement lies between samples', () => {
    const m = measuresOf(motionOf(1, 1, 1, -1, -3));
    const t = (1 + Math.sqrt(5)) / 2;
    expect(m.peakDisplacement).toBeCloseTo(0.5 + t + t ** 2 / 2 - t ** 3 / 3, 13);
  });
  // In the second interval d = 2 + t - 4 t^2 + 5/2 t^3: its velocity 1 - 8 t + 15/2 t^2 is zero twice, first where d peaks.
  test('a velocity that is zero twice between two samples', () => {
    const m = measuresOf(motionOf(1, 10, -8, 7));
    const t = (8 - Math.sqrt(34)) / 15;
    expect(m.endVelocity).toBeCloseTo(0.5, 14);
    expect(m.peakDisplacement).toBeCloseTo(2 + t - 4 * t ** 2 + 2.5 * t ** 3, 13);
    expect(m.peakDisplacement).toBeGreaterThan(2.06);
  });
  test('nothing moves: all zero, none of it NaN', () => {
    for (const values of [[0], [0, 0, 0]])
      expect(Object.values(measuresOf(motionOf(0.01, ...values))).every((x) => x === 0)).toBe(true);
  });
});

describe('[MEA-2] invariants', () => {
  const samples = fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 2, maxLength: 40 });
  const relative = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(1e-6, Math.abs(a), Math.abs(b));
  test('midpoints put in change nothing', () => {
    let compared = 0;
    fc.assert(
      fc.property(samples, (values) => {
        const finer = values.flatMap((a, i) => (i + 1 < values.length ? [a, (a + values[i + 1]) / 2] : [a]));
        const [x, y] = [measuresOf(motionOf(0.02, ...values)), measuresOf(motionOf(0.01, ...finer))];
        expect(y.peakAcceleration).toBe(x.peakAcceleration);
        expect(relative(x.peakVelocity, y.peakVelocity)).toBe(true);
        expect(relative(x.endVelocity, y.endVelocity)).toBe(true);
        expect(relative(x.ariasIntensity, y.ariasIntensity)).toBe(true);
        compared++;
      }),
    );
    expect(compared).toBeGreaterThan(90);
  });
  test('no sample on a grid fifty times finer is larger than the peaks, and the nearest comes near', () => {
    fc.assert(
      fc.property(samples, (values) => {
        const fine = Float64Array.from({ length: (values.length - 1) * 50 + 1 }, (_, i) => {
          const [at, part] = [Math.floor(i / 50), i % 50];
          return part === 0 ? values[at] : values[at] + ((values[at + 1] - values[at]) * part) / 50;
        });
        const v = velocityOf(fine, 0.0004);
        const d = displacementOf(fine, v, 0.0004);
        const largest = (x: Float64Array) => x.reduce((s, y) => Math.max(s, Math.abs(y)), 0);
        const m = measuresOf(motionOf(0.02, ...values));
        expect(largest(v)).toBeLessThanOrEqual(m.peakVelocity * (1 + 1e-9) + 1e-12);
        // The acceleration changes by at most 20 in 0.02 s, and a grid point lies within half a step of the peak.
        expect(m.peakVelocity - largest(v)).toBeLessThanOrEqual(((20 / 0.02) * 0.0002 ** 2) / 2 + 1e-12);
        expect(largest(d)).toBeGreaterThan(m.peakDisplacement * (1 - 1e-3) - 1e-7);
      }),
    );
  });
  test('turned about, only the sign of the end changes; doubled, peaks double and Arias is fourfold', () => {
    const values = [0, 1, -2.5, 3, 0.5, -1, 0.25];
    const m = measuresOf(motionOf(0.02, ...values));
    const turned = measuresOf(motionOf(0.02, ...values.map((a) => -a)));
    expect(turned).toEqual({ ...m, endVelocity: -m.endVelocity });
    const doubled = measuresOf(motionOf(0.02, ...values.map((a) => 2 * a)));
    expect(doubled.peakDisplacement).toBe(2 * m.peakDisplacement);
    expect(doubled.ariasIntensity).toBeCloseTo(4 * m.ariasIntensity, 12);
    expect(doubled.duration5to95).toBe(m.duration5to95);
  });
});
