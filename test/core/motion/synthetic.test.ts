import { describe, expect, test } from 'vitest';
import { digestOfSamples } from '../../../src/core/digest.ts';
import { spectrumOf } from '../../../src/core/doors.ts';
import { demoMotions } from '../../../src/core/motion/demoMotions.ts';
import { displacementOf, velocityOf } from '../../../src/core/motion/integrals.ts';
import { measuresOf } from '../../../src/core/motion/measures.ts';
import { type SyntheticOptions, syntheticMotion } from '../../../src/core/motion/synthetic.ts';
import { STANDARD_GRAVITY } from '../../../src/core/units/constants.ts';

const options: SyntheticOptions = {
  seed: 5,
  interval: 0.01,
  duration: 30,
  peak: 3,
  groundFrequency: 2,
  groundDamping: 0.5,
  lowCut: 0.3,
  strongFrom: 2,
  strongTo: 9,
  fade: 4,
};

describe('[SYN-1] one motion', () => {
  const a = syntheticMotion(options);
  test('as many samples as its duration holds, the peak to the last bit but one, nothing at its start', () => {
    expect(a.length).toBe(3001);
    expect(Math.abs(measuresOf({ interval: 0.01, acceleration: a }).peakAcceleration / 3 - 1)).toBeLessThan(1e-15);
    expect(Math.abs(a[0])).toBeLessThan(1e-12);
  });
  test('the same seed gives the same bits, another seed another motion', () => {
    expect(syntheticMotion({ ...options })).toEqual(a);
    expect(syntheticMotion({ ...options, seed: 6 })).not.toEqual(a);
  });
  test('ground velocity and displacement come back to zero, and displacement stays of the size that its velocity asks for', () => {
    const v = velocityOf(a, 0.01);
    const d = displacementOf(a, v, 0.01);
    const { peakVelocity, peakDisplacement } = measuresOf({ interval: 0.01, acceleration: a });
    expect(Math.abs(v[3000])).toBeLessThan(1e-10 * peakVelocity);
    expect(Math.abs(d[3000])).toBeLessThan(1e-10 * peakDisplacement);
    // Newmark and Hall (1982), Earthquake Spectra and Design: peak a x peak d / peak v^2 is about 6 for ground motions.
    const ratio = (3 * peakDisplacement) / peakVelocity ** 2;
    expect(ratio).toBeGreaterThan(1.5);
    expect(ratio).toBeLessThan(12);
  });
  test('it has died away: the last sample is under a hundredth of the peak', () =>
    expect(Math.abs(a[3000])).toBeLessThan(0.03));
  test('strong from its rise to its fade: most of the energy lies there', () => {
    const share = (from: number, to: number) =>
      a.subarray(from, to).reduce((s, x) => s + x * x, 0) / a.reduce((s, x) => s + x * x, 0);
    expect(share(100, 1500)).toBeGreaterThan(0.85);
    expect(share(0, 100)).toBeLessThan(0.05);
  });
  test('a softer ground moves the spectrum to longer periods', () => {
    const long = (groundFrequency: number) => {
      const acceleration = syntheticMotion({ ...options, groundFrequency, groundDamping: 0.3 });
      const { pseudoAcceleration } = spectrumOf({ interval: 0.01, acceleration }, 0.05, [0.15, 1]);
      return pseudoAcceleration[1] / pseudoAcceleration[0];
    };
    expect(long(1)).toBeGreaterThan(2 * long(5));
  });
});

describe('[SYN-2] the seven of the example', () => {
  const motions = demoMotions();
  test('names, intervals, durations and peaks as stated, their origin says synthetic and its seed', () => {
    expect(
      motions.map(({ name, interval, acceleration }) => {
        const { peakAcceleration } = measuresOf({ interval, acceleration });
        const peak = Math.round((peakAcceleration / STANDARD_GRAVITY) * 1e6) / 1e6;
        return [name, interval, Math.round((acceleration.length - 1) * interval), peak];
      }),
    ).toEqual([
      ['Alder Creek 000', 0.01, 36, 0.31],
      ['Brack Hill 090', 0.01, 30, 0.44],
      ['Corran Dam 045', 0.005, 28, 0.27],
      ['Dunmere 270', 0.01, 40, 0.22],
      ['Eskfoot 180', 0.02, 48, 0.19],
      ['Fallow Bridge 000', 0.01, 32, 0.36],
      ['Gannet Point 315', 0.005, 30, 0.41],
    ]);
    for (const { origin } of motions) expect(origin.layout).toMatch(/^synthetic, seed \d+$/);
    expect(new Set(motions.map(({ origin }) => origin.layout)).size).toBe(7);
  });
  test('each is at rest again at its end, and none repeats another', () => {
    for (const { interval, acceleration } of motions) {
      const { endVelocity, peakVelocity } = measuresOf({ interval, acceleration });
      expect(Math.abs(endVelocity)).toBeLessThan(1e-10 * peakVelocity);
      expect(acceleration.every(Number.isFinite)).toBe(true);
    }
    expect(new Set(motions.map(({ acceleration }) => digestOfSamples(acceleration))).size).toBe(7);
  });
});
