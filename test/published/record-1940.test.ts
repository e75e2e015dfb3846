import { describe, expect, test } from 'vitest';
import { measuresOf, spectrumOf } from '../../src/core/doors.ts';
import { displacementOf, velocityOf } from '../../src/core/motion/integrals.ts';
import { recurrence } from '../../src/core/spectrum/recurrence.ts';
import { RECORD_1940, record1940 } from '../support/record1940.ts';

const INCH = 0.0254;

describe.runIf(RECORD_1940)('Imperial Valley 1940, north-south', () => {
  const motion = RECORD_1940 ? record1940() : { interval: 0.02, acceleration: new Float64Array(1) };

  // Chopra, Dynamics of Structures, Figure 6.1.4 (from memory): 0.319 g and 8.40 in, reproduced with the first sample at t = 0.
  // The printed peak velocity is reproduced by no reading of the table and is not tested. Arias intensity, 5-95 % duration and
  // the state at the end: computed by independent code.
  test('C1 ground motion', () => {
    const { interval, acceleration } = motion;
    expect(acceleration.length).toBe(1560);
    const m = measuresOf(motion);
    expect(Math.abs(m.peakAcceleration / 9.80665 - 0.319)).toBeLessThan(5e-4);
    expect(Math.abs(m.peakDisplacement / INCH - 8.405)).toBeLessThan(1e-3);
    expect(Math.abs(m.ariasIntensity - 1.7236)).toBeLessThan(5e-5);
    expect(Math.abs(m.duration5to95 - 23.86)).toBeLessThan(5e-3);
    expect(Math.abs(m.endVelocity / INCH - 0.002)).toBeLessThan(5e-4);
    const v = velocityOf(acceleration, interval);
    const atSamples = v.reduce((largest, x) => Math.max(largest, Math.abs(x)), 0);
    expect(Math.abs(atSamples / INCH - 14.23)).toBeLessThan(5e-3);
    // The acceleration crosses zero between samples there.
    expect(m.peakVelocity / atSamples - 1).toBeGreaterThan(0.002);
    expect(m.peakVelocity / atSamples - 1).toBeLessThan(0.004);
    expect(Math.abs(displacementOf(acceleration, v, interval)[1559] / INCH + 0.97)).toBeLessThan(5e-3);
  });

  /** Largest |u| at the samples only, as the print took it. */
  function atSamples(period: number, z: number): number {
    const { a11, a12, a21, a22, b11, b12, b21, b22 } = recurrence((2 * Math.PI) / period, z, motion.interval);
    const ag = motion.acceleration;
    let [u, v, largest] = [0, 0, 0];
    for (let i = 1; i < ag.length; i++) {
      [u, v] = [a11 * u + a12 * v + b11 * ag[i - 1] + b12 * ag[i], a21 * u + a22 * v + b21 * ag[i - 1] + b22 * ag[i]];
      largest = Math.max(largest, Math.abs(u));
    }
    return largest;
  }

  // Chopra, Figures 6.4.1 and 6.6.2 (from memory), inches, peaks at the samples, tolerance 0.0085 in (rounding and 0.1 %); the true
  // peaks beside them computed by independent code on a grid of a sixteenth of the interval.
  test.each([
    [0.5, 0.02, 2.67, 2.688],
    [1, 0.02, 5.97, 5.969],
    [2, 0.02, 7.47, 7.469],
    [2, 0, 9.91, 9.915],
    [2, 0.05, 5.37, 5.375],
  ])('C2 peak displacement, T = %d s, damping %d: %d in at the samples, %d in truly', (T, z, printed, computed) => {
    expect(Math.abs(atSamples(T, z) / INCH - printed)).toBeLessThan(8.5e-3);
    expect(Math.abs(spectrumOf(motion, z, [T]).displacement[0] / INCH - computed)).toBeLessThan(1e-3);
  });

  // Chopra, Figure 6.6.2 (from memory): pseudo-accelerations 1.09, 0.610 and 0.191 g at 2 %.
  test.each([
    [0.5, 1.09, 5e-3],
    [1, 0.61, 1e-3],
    [2, 0.191, 5e-4],
  ])('C2 pseudo-acceleration, T = %d s: %d g', (T, printed, half) => {
    const [a] = spectrumOf(motion, 0.02, [T]).pseudoAcceleration;
    expect(Math.abs((((2 * Math.PI) / T) ** 2 * atSamples(T, 0.02)) / 9.80665 - printed)).toBeLessThan(half);
    expect(a / 9.80665 - printed).toBeGreaterThan(-half);
  });

  // Peak displacement in cm, computed by independent code (matrix exponential on a grid of a sixteenth of the interval, which falls
  // short of the true peak by up to 0.05 %; see 2.688 in, that is 6.828 cm, in C2): tolerance 0.06 % and the last figure.
  const periods = [0.05, 0.1, 0.2, 0.3, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5];
  test.each<[number, number[]]>([
    [0, [0.0405, 0.402, 1.7897, 3.6886, 8.1986, 13.5216, 18.8639, 19.041, 25.1849, 58.1962, 30.7524, 39.9565]],
    [0.02, [0.0274, 0.1578, 1.0595, 1.8993, 6.8241, 8.8542, 15.1588, 11.9978, 18.9698, 39.4707, 28.5758, 28.7151]],
    [0.05, [0.0261, 0.1612, 0.8149, 1.6986, 5.7062, 6.27, 11.3041, 10.5561, 13.6532, 27.47, 25.7225, 25.7907]],
    [0.1, [0.0249, 0.1497, 0.593, 1.3759, 4.3599, 5.0549, 7.6432, 8.8231, 11.8987, 21.7035, 21.8822, 23.2574]],
    [0.2, [0.0232, 0.124, 0.4425, 1.0147, 2.9353, 3.8488, 4.6352, 6.4516, 9.8776, 15.6771, 16.3244, 19.09]],
  ])('C3 spectrum at damping %d', (z, expected) => {
    const { displacement } = spectrumOf(motion, z, periods);
    expected.forEach((cm, i) => {
      const off = Math.abs(displacement[i] * 100 - cm);
      expect(off, `T ${periods[i]}: ${displacement[i] * 100}, ${cm}`).toBeLessThan(5e-5 + 6e-4 * cm);
    });
  });
});
