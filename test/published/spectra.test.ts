import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { measuresOf } from '../../src/core/doors.ts';
import { recurrence } from '../../src/core/spectrum/recurrence.ts';
import { spectrumOf } from '../../src/core/spectrum/spectrum.ts';
import { prepared, run, shearFrame } from '../support/frames.ts';

const INCH = 0.0254;

// A. K. Chopra, Dynamics of Structures, 4th ed., Example 5.1 and Table E5.1 (values from memory of the print, confirmed by an
// independent computation): T = 1 s, 5 %, p = 10 sin(pi t / 0.6) kip to 0.6 s, step 0.1 s. Tolerance 1.5e-4 in.
describe('A1 interpolation of the excitation', () => {
  const [m, k, z, h] = [0.2533, 10, 0.05, 0.1];
  const w = Math.sqrt(k / m);
  test('recurrence coefficients', () => {
    const r = recurrence(w, z, h);
    // The print's C and D are on a force: C = -b11 / m, D = -b12 / m.
    for (const [got, printed] of [
      [r.a11, 0.8129],
      [r.a12, 0.09067],
      [-r.b11 / m, 0.01236],
      [-r.b12 / m, 0.00635],
    ])
      expect(Math.abs(got - printed)).toBeLessThan(5e-5);
  });
  test('the table, digit for digit', () => {
    const { a11, a12, a21, a22, b11, b12, b21, b22 } = recurrence(w, z, h);
    const printed = [0, 0.0318, 0.2274, 0.6336, 1.1339, 1.4896, 1.448, 0.9037, 0.0579, -0.7577, -1.2432];
    const ag = printed.map((_, i) => (i < 6 ? (-10 * Math.sin((Math.PI * i) / 6)) / m : 0));
    let [u, v] = [0, 0];
    for (let i = 1; i < printed.length; i++) {
      [u, v] = [a11 * u + a12 * v + b11 * ag[i - 1] + b12 * ag[i], a21 * u + a22 * v + b21 * ag[i - 1] + b22 * ag[i]];
      expect(Math.abs(u - printed[i])).toBeLessThan(1.5e-4);
    }
  });
});

// K8: Nigam and Jennings (1969): the recurrence is the matrix exponential. Here: two half steps are one whole step, and the
// closed form meets the series where one takes over from the other.
test('K8 the recurrence composes, on both sides of the change of form', () => {
  for (const wh of [0.01, 0.2999, 0.3001, 0.7, 3]) {
    const [w, z] = [5, 0.07];
    const [whole, half] = [recurrence(w, z, wh / w), recurrence(w, z, wh / w / 2)];
    const step = (r: typeof whole, [u, v]: number[], g: number, gn: number) => [
      r.a11 * u + r.a12 * v + r.b11 * g + r.b12 * gn,
      r.a21 * u + r.a22 * v + r.b21 * g + r.b22 * gn,
    ];
    const once = step(whole, [0.3, -1.1], 2, -0.7);
    const twice = step(half, step(half, [0.3, -1.1], 2, 0.65), 0.65, -0.7);
    for (let i = 0; i < 2; i++) expect(Math.abs(once[i] - twice[i])).toBeLessThan(1e-12);
  }
});

/** Dynamic factor of a force pulse sampled finely: a force p is a ground acceleration -p, static displacement p / w^2. */
function dynamicFactor(pulse: (t: number) => number, duration: number, samples = 4000): number {
  const interval = duration / samples;
  const acceleration = Float64Array.from({ length: samples + 1 }, (_, i) => -pulse(i * interval));
  const { displacement } = spectrumOf({ interval, acceleration }, 0, [1]);
  return displacement[0] * (2 * Math.PI) ** 2;
}

// Chopra, chapter 4 (closed forms, confirmed): undamped, T = 1 s.
describe('K1 to K4 pulses', () => {
  test.each([
    [0.25, 0.9428],
    [0.5, Math.PI / 2],
    [1, 1.7321],
    [1.5, 1.5],
  ])('half sine of duration %d', (td, Rd) =>
    expect(Math.abs(dynamicFactor((t) => Math.sin((Math.PI * t) / td), td) - Rd)).toBeLessThan(6e-4),
  );
  test.each([0.1, 1 / 6, 0.25, 0.5, 1])('rectangle of duration %d', (td) => {
    expect(Math.abs(dynamicFactor(() => 1, td, 8000) - (td < 0.5 ? 2 * Math.sin(Math.PI * td) : 2))).toBeLessThan(2e-3);
  });
  test('symmetric triangle', () =>
    expect(Math.abs(dynamicFactor((t) => 1 - Math.abs(2 * t - 1), 1) - 1.5085)).toBeLessThan(1e-3));
  test.each([
    [0.5, 1.2],
    [1, 1.55],
    [2, 1.76],
  ])('decaying triangle of duration %d', (td, Rd) =>
    expect(Math.abs(dynamicFactor((t) => 1 - t / td, td) - Rd)).toBeLessThan(1.2e-2),
  );
  test('N-wave of the period', () => expect(Math.abs(dynamicFactor((t) => 1 - 2 * t, 1, 8000) - 2)).toBeLessThan(2e-3));
});

// Closed form of the steady state under a sine base motion (Chopra, section 3.5): drift / (ag / w^2) = 1 / sqrt(...).
test.each([0.5, 0.9, 1.3, 2])('K5 steady state at frequency ratio %d', (b) => {
  const [z, w] = [0.05, 2 * Math.PI];
  const interval = 0.002;
  const cycles = 120;
  // Comes and goes over 40 cycles, without a kink, so that no transient is added to the steady state.
  const smooth = (cycle: number) => (1 - Math.cos(Math.PI * Math.min(1, Math.max(0, cycle / 40)))) / 2;
  const ramped = Float64Array.from({ length: Math.round(cycles / b / interval) + 1 }, (_, i) => {
    const cycle = i * interval * b;
    return Math.sin(2 * Math.PI * cycle) * smooth(cycle) * smooth(cycles - cycle);
  });
  const { displacement } = spectrumOf({ interval, acceleration: ramped }, z, [1]);
  const closed = 1 / Math.sqrt((1 - b * b) ** 2 + (2 * z * b) ** 2) / w ** 2;
  expect(Math.abs(displacement[0] / closed - 1)).toBeLessThan(5e-3);
});

describe('[SPC-1] edges', () => {
  const motion = { interval: 0.02, acceleration: Float64Array.from([0, 1, -3, 2, 0.5, -1, 0]) };
  test('damping and periods out of range are refused', () => {
    for (const z of [-0.1, 1, 1.5, Number.NaN]) expect(() => spectrumOf(motion, z, [1])).toThrow(RangeError);
    for (const T of [-1, Number.NaN, Number.POSITIVE_INFINITY])
      expect(() => spectrumOf(motion, 0.05, [T])).toThrow(RangeError);
  });
  // Invariant 13.
  test('T to 0: pseudo-acceleration becomes the peak; T long: displacement becomes that of the ground', () => {
    const { pseudoAcceleration } = spectrumOf(motion, 0.05, [0, 1e-6, 1e-3]);
    expect(pseudoAcceleration[0]).toBe(3);
    for (const a of pseudoAcceleration) expect(Math.abs(a / 3 - 1)).toBeLessThan(0.01);
    const pulse = { interval: 0.02, acceleration: Float64Array.from([0, 1, -1, -1, 1, 0]) };
    const { displacement } = spectrumOf(pulse, 0.05, [1000]);
    expect(Math.abs(displacement[0] / measuresOf(pulse).peakDisplacement - 1)).toBeLessThan(0.01);
  });
  // Invariant 8.
  test('the linear midpoints put in change nothing', () => {
    const { acceleration: a } = motion;
    const finer = Float64Array.from({ length: 2 * a.length - 1 }, (_, i) =>
      i % 2 === 0 ? a[i / 2] : (a[(i - 1) / 2] + a[(i + 1) / 2]) / 2,
    );
    const periods = [0.05, 0.2, 1];
    const [x, y] = [
      spectrumOf(motion, 0.05, periods),
      spectrumOf({ interval: 0.01, acceleration: Float64Array.from([...finer, 0]) }, 0.05, periods),
    ];
    for (let i = 0; i < 3; i++) expect(Math.abs(x.displacement[i] / y.displacement[i] - 1)).toBeLessThan(1e-4);
  });
});

const RECORD = new URL('../../../shared/records/imperial-valley-1940-ns.txt', import.meta.url);

/** The 1940 record as the test's own eyes see it: 8F10.5 under its heading, in g. */
function record(g: number) {
  const values = readFileSync(RECORD, 'utf8')
    .split(/\r?\n/)
    .filter((line) => line.trim() !== '' && !line.startsWith('#'))
    .flatMap((line) => line.trim().split(/\s+/).map(Number));
  return { interval: 0.02, acceleration: Float64Array.from(values, (value) => value * g) };
}

describe.runIf(existsSync(RECORD))('the 1940 record', () => {
  // Chopra, section 6.1 and Figure 6.1.4 (from memory): peak ground displacement 8.40 in with the first sample at t = 0. The
  // printed peak velocity is not reproduced by anybody and is not tested. Arias and duration: computed by independent code.
  test('C1 ground motion', () => {
    const motion = record(9.80665);
    expect(motion.acceleration.length).toBe(1560);
    const m = measuresOf(motion);
    expect(Math.abs(m.peakAcceleration / 9.80665 - 0.319)).toBeLessThan(5e-4);
    expect(Math.abs(m.peakDisplacement / INCH - 8.405)).toBeLessThan(6e-3);
    expect(Math.abs(m.ariasIntensity - 1.7236)).toBeLessThan(1e-4);
    expect(Math.abs(m.duration5to95 - 23.86)).toBeLessThan(0.01);
    expect(Math.abs(m.endVelocity / INCH - 0.002)).toBeLessThan(1e-3);
  });
  // Chopra, Figures 6.4.1 and 6.6.2 (from memory), inches; the print took peaks at the samples, so ours may be a little above.
  test.each([
    [0.5, 0.02, 2.67],
    [1, 0.02, 5.97],
    [2, 0.02, 7.47],
    [2, 0, 9.91],
    [2, 0.05, 5.37],
  ])('C2 peak displacement at T = %d s, damping %d: %d in', (T, z, printed) => {
    const got = spectrumOf(record(9.80665), z, [T]).displacement[0] / INCH;
    expect(got - printed).toBeGreaterThan(-0.0085);
    expect(got - printed).toBeLessThan(0.0085 + 0.012);
  });
  // Peak displacements in cm, computed by independent code (matrix exponential, largest value on a grid of 1.25 ms): they fall
  // short of the true peak by up to 0.05 % (checked on a grid a hundred times finer), hence 0.06 % and the last figure.
  test.each<[number, number[]]>([
    [0, [0.0405, 0.402, 1.7897, 3.6886, 8.1986, 13.5216, 18.8639, 19.041, 25.1849, 58.1962, 30.7524, 39.9565]],
    [0.02, [0.0274, 0.1578, 1.0595, 1.8993, 6.8241, 8.8542, 15.1588, 11.9978, 18.9698, 39.4707, 28.5758, 28.7151]],
    [0.05, [0.0261, 0.1612, 0.8149, 1.6986, 5.7062, 6.27, 11.3041, 10.5561, 13.6532, 27.47, 25.7225, 25.7907]],
    [0.1, [0.0249, 0.1497, 0.593, 1.3759, 4.3599, 5.0549, 7.6432, 8.8231, 11.8987, 21.7035, 21.8822, 23.2574]],
    [0.2, [0.0232, 0.124, 0.4425, 1.0147, 2.9353, 3.8488, 4.6352, 6.4516, 9.8776, 15.6771, 16.3244, 19.09]],
  ])('C3 spectrum at damping %d', (z, expected) => {
    const periods = [0.05, 0.1, 0.2, 0.3, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5];
    const { displacement } = spectrumOf(record(9.80665), z, periods);
    expected.forEach((cm, i) => {
      expect(Math.abs(displacement[i] * 100 - cm), `T ${periods[i]}`).toBeLessThan(6e-5 + 6e-4 * cm);
    });
  });

  // Chopra, section 13.2.6 (values from memory): five floors of 100 kips / g on storeys of 31.54 kip/in, 12 ft, 5 % in all modes,
  // g = 386 in/s2. Tolerance 0.4 % on histories, 0.25 % on combinations.
  describe('B5 five-storey uniform frame, units kip, in, s', () => {
    const g = 386;
    const motion = record(g);
    const frame = shearFrame(Array(5).fill(100 / g), Array(5).fill(31.54), { kind: 'modal', ratios: [0.05] }, 144);
    const { storeys, floors } = run(frame, motion.acceleration, 0.02, { step: { parts: 8 } });
    test.each<[string, () => number, number]>([
      ['roof displacement', () => floors.peakDisplacement[4], 6.847],
      ['base shear', () => storeys.peakShear[0], 73.278],
      ['top-storey shear', () => storeys.peakShear[4], 35.217],
      ['base overturning, kip ft', () => storeys.peakOverturning[0] / 12, 2593.2],
    ])('%s by response history', (_, got, printed) => expect(Math.abs(got() / printed - 1)).toBeLessThan(4e-3));
    test('modal peaks of base shear, SRSS and CQC', () => {
      const { modes, arrays } = prepared(frame);
      const { displacement } = spectrumOf(
        motion,
        0.05,
        modes.map(({ period }) => period),
      );
      const shears = modes.map(({ effectiveMass, frequency }, r) => effectiveMass * frequency ** 2 * displacement[r]);
      for (const [r, printed] of [60.469, 24.533, 9.867, 2.943, 0.595].entries())
        expect(Math.abs(shears[r] - printed)).toBeLessThan(Math.max(0.0012, 60.469 * 1.5e-3));
      const combined = (peaks: number[]) => {
        const z = 0.05;
        let [srss, cqc] = [0, 0];
        for (const [i, a] of peaks.entries()) {
          srss += a * a;
          for (const [j, b] of peaks.entries()) {
            const beta = modes[i].frequency / modes[j].frequency;
            cqc +=
              (a * b * 8 * z * z * (1 + beta) * beta ** 1.5) /
              ((1 - beta ** 2) ** 2 + 4 * z * z * beta * (1 + beta) ** 2);
          }
        }
        return [Math.sqrt(srss), Math.sqrt(cqc)];
      };
      const top = modes.map(
        ({ shape, participation, frequency }, r) =>
          participation * arrays.mass[4] * shape[4] * frequency ** 2 * displacement[r],
      );
      const roof = modes.map(({ shape, participation }, r) => participation * shape[4] * displacement[r]);
      for (const [peaks, printed] of [
        [shears, [66.066, 66.507]],
        [top, [30.074, 29.338]],
        [roof, [6.8, 6.793]],
      ] as const) {
        for (const [i, value] of combined([...peaks]).entries())
          expect(Math.abs(value / printed[i] - 1)).toBeLessThan(2.5e-3);
      }
    });
  });
});
