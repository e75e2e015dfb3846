import { describe, expect, test } from 'vitest';
import { spectrumOf } from '../../src/core/doors.ts';

/**
 * Largest dynamic factor of an undamped oscillator of T = 1 s under a force pulse: a force p is a ground acceleration -p, the
 * static displacement p / w^2. A pulse that ends with a jump is given half an interval less, since a motion falls to zero over
 * one interval after its last sample.
 */
function dynamicFactor(pulse: (t: number) => number, duration: number, endsWith: 'zero' | 'jump' = 'zero'): number {
  const samples = 8000;
  const interval = duration / (endsWith === 'jump' ? samples + 0.5 : samples);
  const acceleration = Float64Array.from({ length: samples + 1 }, (_, i) => -pulse(i * interval));
  return spectrumOf({ interval, acceleration }, 0, [1]).displacement[0] * (2 * Math.PI) ** 2;
}

const TOLERANCE = 1e-4;

// Chopra, Dynamics of Structures, section 4.8 (from memory): half sine shorter than T / 2:
// (T / td) cos(pi td / T) / ((T / 2 td)^2 - 1); td / T = 1/2: pi / 2; the others as printed (confirmed).
describe('K1 half-sine force', () => {
  test.each([
    [0.25, (4 * Math.cos(Math.PI / 4)) / 3],
    [0.5, Math.PI / 2],
    [1, 1.7321],
    [1.5, 1.5],
  ])('td / T = %d: %d', (td, factor) =>
    expect(Math.abs(dynamicFactor((t) => Math.sin((Math.PI * t) / td), td) - factor)).toBeLessThan(TOLERANCE),
  );
  test('the largest of all is 1.768 at td / T = 0.81', () => {
    const factors = [0.71, 0.76, 0.81, 0.86, 0.91].map((td) => dynamicFactor((t) => Math.sin((Math.PI * t) / td), td));
    expect(Math.max(...factors)).toBe(factors[2]);
    expect(Math.abs(factors[2] - 1.768)).toBeLessThan(5e-4);
  });
});

// Chopra, section 4.7 (from memory): rectangular pulse, 2 sin(pi td / T) up to T / 2, then 2.
test.each([0.1, 1 / 6, 0.25, 0.5, 1])('K2 rectangular force, td / T = %d', (td) => {
  const factor = td < 0.5 ? 2 * Math.sin(Math.PI * td) : 2;
  expect(Math.abs(dynamicFactor(() => 1, td, 'jump') - factor)).toBeLessThan(TOLERANCE);
});

// Chopra, section 4.9 (from memory): symmetric triangle of length T, 1.51 in print, 1.5085 computed.
test('K3 symmetric triangle, td = T', () => {
  expect(Math.abs(dynamicFactor((t) => 1 - Math.abs(2 * t - 1), 1) - 1.5085)).toBeLessThan(TOLERANCE);
});

// Clough and Penzien, Dynamics of Structures, chapter on impulsive loading (from memory): force falling in a straight line,
// 2 (1 - atan(w td) / (w td)) where the peak comes within the pulse; in print 1.20, 1.55, 1.76.
test.each([
  [0.5, 1.2],
  [1, 1.55],
  [2, 1.76],
])('K3 decaying triangle, td / T = %d: %d', (td, printed) => {
  const got = dynamicFactor((t) => 1 - t / td, td);
  const x = 2 * Math.PI * td;
  expect(Math.abs(got - 2 * (1 - Math.atan(x) / x))).toBeLessThan(TOLERANCE);
  expect(Math.abs(got - printed)).toBeLessThan(5e-3);
});

// N-wave 1 - 2 t / td of length T (closed form, confirmed): 2.
test('K4 N-wave, td = T', () => {
  expect(Math.abs(dynamicFactor((t) => 1 - 2 * t, 1, 'jump') - 2)).toBeLessThan(5e-4);
});

// Chopra, section 3.6 (from memory): steady state under a sine base motion, drift / (ag / w^2) = 1 / sqrt((1 - b^2)^2 + (2 z b)^2).
describe('K5 steady state under a sine base motion', () => {
  const [z, w, interval, cycles] = [0.05, 2 * Math.PI, 0.002, 200];
  // Comes and goes over 80 cycles, without a kink, so that no transient is added to the steady state.
  const smooth = (cycle: number) => (1 - Math.cos(Math.PI * Math.min(1, Math.max(0, cycle / 80)))) / 2;
  test.each([0.5, 0.9, 1.3, 2])('frequency ratio %d', (b) => {
    const acceleration = Float64Array.from({ length: Math.round(cycles / b / interval) + 1 }, (_, i) => {
      const cycle = i * interval * b;
      return Math.sin(2 * Math.PI * cycle) * smooth(cycle) * smooth(cycles - cycle);
    });
    const closed = 1 / Math.sqrt((1 - b * b) ** 2 + (2 * z * b) ** 2) / w ** 2;
    const { displacement } = spectrumOf({ interval, acceleration }, z, [1]);
    expect(Math.abs(displacement[0] / closed - 1)).toBeLessThan(2e-3);
  });
});
