import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { measuresOf, spectrumOf } from '../../../src/core/doors.ts';
import { exponential } from '../../support/exact.ts';
import { noise } from '../../support/frames.ts';

/**
 * Largest |u| on a grid of at least 400 instants a period and 100 an interval by the matrix exponential, to one period after the
 * motion: falls short of the true one by (pi / 400)^2 / 2 = 3.1e-5 or less. Independent of the recursion under test.
 */
function onDenseGrid(acceleration: Float64Array, interval: number, z: number, period: number): number {
  const w = (2 * Math.PI) / period;
  const parts = Math.max(100, Math.ceil((400 * interval) / period));
  const h = interval / parts;
  const e = exponential(w, z, h);
  const after = Math.ceil(period / interval);
  let [u, v, largest] = [0, 0, 0];
  for (let i = 0; i < acceleration.length + after; i++) {
    const g = acceleration[i] ?? 0;
    const slope = ((acceleration[i + 1] ?? 0) - g) / interval;
    for (let k = 0; k < parts; k++) {
      const p = -(g + slope * k * h);
      const un = e[0] * u + e[1] * v + e[2] * p - e[3] * slope;
      v = e[4] * u + e[5] * v + e[6] * p - e[7] * slope;
      u = un;
      largest = Math.max(largest, Math.abs(u));
    }
  }
  return largest;
}

describe('[SPC-1] the true largest value, between samples too, within 1e-4', () => {
  const samples = fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 2, maxLength: 12 });
  test('against the matrix exponential on a dense grid, periods from a fiftieth to two hundred times the interval', () => {
    const seen = { long: 0, split: 0, leap: 0 };
    fc.assert(
      fc.property(
        samples,
        fc.integer({ min: -390, max: 530 }),
        fc.oneof(fc.constant(0), fc.double({ min: 0, max: 0.9999, noNaN: true })),
        (values, hundredths, z) => {
          const interval = 0.02;
          const acceleration = Float64Array.from(values);
          fc.pre(acceleration.some((a) => Math.abs(a) > 0.01));
          const ratio = Math.exp(hundredths / 100);
          if (ratio >= 36) seen.long++;
          else if (ratio >= 0.5) seen.split++;
          else seen.leap++;
          const period = ratio * interval;
          const dense = onDenseGrid(acceleration, interval, z, period);
          const got = spectrumOf({ interval, acceleration }, z, [period]).displacement[0];
          expect(got / dense - 1).toBeGreaterThan(-1e-4);
          expect(got / dense - 1).toBeLessThan(1e-4 + 3.2e-5);
        },
      ),
      {
        numRuns: 600,
        endOnFailure: true,
        // Failed once: a damped cycle of seven periods; a first extreme later than one period after the motion.
        examples: [
          [[-0.13, 0, 0], -388, 0.99],
          [[0, 0, -5, 0, 0, 5, 0, 0], 520, 0.99],
        ],
      },
    );
    for (const count of Object.values(seen)) expect(count).toBeGreaterThan(50);
  });
  test('the fastest motion that samples can hold', () => {
    const interval = 0.01;
    const acceleration = Float64Array.from({ length: 60 }, (_, i) => (i % 2 === 0 ? 1 : -1) * (1 + (i % 3)));
    for (const z of [0, 0.05, 0.3, 0.9])
      for (const period of [0.0013, 0.004, 0.0099, 0.0201, 0.0357, 0.0721, 0.361, 1.7]) {
        const dense = onDenseGrid(acceleration, interval, z, period);
        const got = spectrumOf({ interval, acceleration }, z, [period]).displacement[0];
        expect(Math.abs(got / dense - 1), `T ${period}, damping ${z}`).toBeLessThan(1e-4 + 3.2e-5);
      }
  });
});

describe('edges', () => {
  const motion = { interval: 0.02, acceleration: Float64Array.from([0, 1, -3, 2, 0.5, -1, 0]) };
  test('damping, periods, interval and motions out of range are refused by name', () => {
    for (const z of [-0.1, 1, 1.5, Number.NaN]) expect(() => spectrumOf(motion, z, [1])).toThrow(/^spectrum: damping /);
    for (const T of [-1, Number.NaN, Number.POSITIVE_INFINITY])
      expect(() => spectrumOf(motion, 0.05, [0.5, T])).toThrow(/^spectrum: period /);
    for (const interval of [0, -0.01, Number.NaN])
      expect(() => spectrumOf({ ...motion, interval }, 0.05, [1])).toThrow(/^spectrum: interval /);
    expect(() => spectrumOf({ interval: 0.02, acceleration: new Float64Array(0) }, 0.05, [1])).toThrow(/0 samples/);
  });
  test('a rigid oscillator: period 0 answers with the peak of the motion', () => {
    const { displacement, pseudoVelocity, pseudoAcceleration } = spectrumOf(motion, 0.05, [0]);
    expect([displacement[0], pseudoVelocity[0], pseudoAcceleration[0]]).toEqual([0, 0, 3]);
  });
  test('a motion of zeros answers zero; one sample is a motion', () => {
    const still = spectrumOf({ interval: 0.01, acceleration: new Float64Array(5) }, 0, [0, 1e-12, 0.001, 0.1, 10]);
    expect([...still.displacement, ...still.pseudoAcceleration].every((x) => x === 0)).toBe(true);
    const one = { interval: 0.01, acceleration: Float64Array.from([2]) };
    expect(spectrumOf(one, 0.02, [0.3]).displacement[0] / onDenseGrid(one.acceleration, 0.01, 0.02, 0.3)).toBeCloseTo(
      1,
      4,
    );
  });
  test('the three ordinates belong together and the periods come back as given', () => {
    const periods = [2, 0.1, 0.7];
    const s = spectrumOf(motion, 0.05, periods);
    expect([...s.periods]).toEqual(periods);
    periods.forEach((T, i) => {
      const w = (2 * Math.PI) / T;
      expect(s.pseudoVelocity[i]).toBeCloseTo(w * s.displacement[i], 12);
      expect(s.pseudoAcceleration[i]).toBeCloseTo(w * w * s.displacement[i], 12);
    });
  });
});

describe('invariants', () => {
  const motion = { interval: 0.01, acceleration: noise(7, 400) };
  motion.acceleration[0] = 0;
  // Invariant 13, published-checks: T to 0 and T to long.
  test('13 short: pseudo-acceleration is the peak of the motion, finite down to the smallest number', () => {
    for (const z of [0, 0.02, 0.2, 0.9999999]) {
      const peak = measuresOf(motion).peakAcceleration;
      const { displacement, pseudoVelocity, pseudoAcceleration } = spectrumOf(
        motion,
        z,
        [5e-324, 1e-300, 1e-30, 1e-12, 1e-9],
      );
      for (const a of pseudoAcceleration) expect(Math.abs(a / peak - 1)).toBeLessThan(1e-4);
      for (const x of [...displacement, ...pseudoVelocity]) expect(Number.isFinite(x)).toBe(true);
    }
    // The undamped oscillator swings about the line of the ground: near the peak at a hundredth of the interval already.
    const [near] = spectrumOf(motion, 0.05, [1e-4]).pseudoAcceleration;
    expect(Math.abs(near / measuresOf(motion).peakAcceleration - 1)).toBeLessThan(5e-3);
  });
  test('13 long: displacement is that of the ground, pseudo-acceleration vanishes', () => {
    const ramp = (i: number, n: number) => Math.sin((Math.PI * i) / n) ** 2 * Math.sin((6 * Math.PI * i) / n);
    const quiet = { interval: 0.01, acceleration: Float64Array.from({ length: 601 }, (_, i) => 3 * ramp(i, 600)) };
    const { peakDisplacement } = measuresOf(quiet);
    const s = spectrumOf(quiet, 0.05, [2e4, 1e8]);
    for (const d of s.displacement) expect(Math.abs(d / peakDisplacement - 1)).toBeLessThan(2e-3);
    expect(s.pseudoAcceleration[1]).toBeLessThan(1e-14);
  });
  // Invariant 8: linear midpoints change nothing.
  test('8 midpoints put in change nothing, zeros after the motion change nothing', () => {
    const { acceleration: a, interval } = motion;
    const finer = Float64Array.from({ length: 2 * a.length }, (_, i) =>
      i % 2 === 0 ? a[i / 2] : (a[(i - 1) / 2] + (a[(i + 1) / 2] ?? 0)) / 2,
    );
    const periods = [0.004, 0.03, 0.2, 1, 4];
    for (const z of [0, 0.05, 0.4]) {
      const { displacement } = spectrumOf(motion, z, periods);
      const fine = spectrumOf({ interval: interval / 2, acceleration: finer }, z, periods).displacement;
      const longer = spectrumOf(
        { interval, acceleration: Float64Array.from([...a, 0, 0, 0]) },
        z,
        periods,
      ).displacement;
      displacement.forEach((d, i) => {
        expect(Math.abs(fine[i] / d - 1)).toBeLessThan(1e-4);
        expect(Math.abs(longer[i] / d - 1)).toBeLessThan(1e-4);
      });
    }
  });
  // Invariant 3: sign and scale.
  test('3 the sign changes no bit, a scale of two doubles every bit', () => {
    const periods = [0.01, 0.1, 0.5, 3];
    const { displacement } = spectrumOf(motion, 0.05, periods);
    const scaled = (s: number) =>
      spectrumOf({ interval: 0.01, acceleration: motion.acceleration.map((a) => s * a) }, 0.05, periods).displacement;
    expect(scaled(-1)).toEqual(displacement);
    expect(scaled(2)).toEqual(displacement.map((d) => 2 * d));
  });
});

// A step of acceleration a on an undamped oscillator: u = a (1 - cos w t) / w^2, twice the static value (Chopra, section 4.3).
test('a motion that begins with a jump doubles the response of a short period', () => {
  const jump = { interval: 0.01, acceleration: Float64Array.from({ length: 50 }, () => 2) };
  for (const period of [1e-6, 1e-3, 0.004, 0.03, 0.2])
    expect(spectrumOf(jump, 0, [period]).pseudoAcceleration[0] / 4).toBeCloseTo(1, 4);
});
