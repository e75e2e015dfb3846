import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { MethodChoice, Run } from '../../../src/core/dynamics/run.ts';
import type { Damping, Frame, Storey } from '../../../src/core/frame/frame.ts';
import { exactDisplacements } from '../../support/exact.ts';
import { AVERAGE, anyFrame, noise, prepared, run, shearFrame } from '../../support/frames.ts';

// Invariants of the published checks; numbers in brackets are theirs. Every property counts the cases it really ran.
const METHODS: readonly MethodChoice[] = [
  AVERAGE,
  { kind: 'hht', alpha: -0.1 },
  { kind: 'generalized-alpha', spectralRadius: 0.6 },
];
const anyMethod = fc.constantFrom(...METHODS);
const anySeed = fc.integer({ min: 1, max: 1e6 });
const RUNS = { numRuns: 60 };

/** Largest relative difference of two arrays, over the largest entry. */
function apart(a: Float64Array, b: Float64Array, factor = 1): number {
  let [gap, size] = [0, 0];
  for (let i = 0; i < a.length; i++) {
    gap = Math.max(gap, Math.abs(a[i] * factor - b[i]));
    size = Math.max(size, Math.abs(b[i]));
  }
  return size > 0 ? gap / size : gap;
}
const withStoreys = (frame: Frame, change: (storey: Storey, i: number) => Partial<Storey>): Frame => ({
  ...frame,
  storeys: frame.storeys.map((storey, i) => ({ ...storey, ...change(storey, i) })),
});

/** Runs a property and insists that the cases were really run. */
function holds<T>(arbitrary: fc.Arbitrary<T>, property: (value: T) => void): void {
  let cases = 0;
  fc.assert(
    fc.property(arbitrary, (value) => {
      cases++;
      property(value);
    }),
    RUNS,
  );
  expect(cases).toBeGreaterThanOrEqual(RUNS.numRuns);
}

describe('[DYN-8] invariants of elastic runs', () => {
  test('flipping the motion flips nothing but signs, bit for bit (3)', () => {
    holds(fc.tuple(anyFrame, anyMethod, anySeed), ([frame, method, seed]) => {
      const ag = noise(seed, 150);
      const [plus, minus] = [1, -1].map((scale) => run(frame, ag, 0.02, { method, scale, histories: true }));
      expect(minus.storeys.peakDrift).toEqual(plus.storeys.peakDrift);
      expect(minus.floors).toEqual(plus.floors);
      expect(minus.energy).toEqual(plus.energy);
      expect(minus.histories?.displacement).toEqual(plus.histories?.displacement.map((u) => 0 - u));
    });
  });

  test('the response is in proportion to the motion; a scale of zero gives zeros (3)', () => {
    holds(
      fc.tuple(anyFrame, anyMethod, anySeed, fc.double({ min: 0.01, max: 100, noNaN: true })),
      ([frame, method, seed, scale]) => {
        const ag = noise(seed, 150);
        const one = run(frame, ag, 0.02, { method });
        const scaled = run(frame, ag, 0.02, { method, scale });
        expect(apart(one.storeys.peakDrift, scaled.storeys.peakDrift, scale)).toBeLessThan(1e-10);
        expect(apart(one.floors.peakAcceleration, scaled.floors.peakAcceleration, scale)).toBeLessThan(1e-10);
        expect(Math.abs(one.energy.input * scale * scale - scaled.energy.input)).toBeLessThan(
          1e-9 * scaled.energy.input + 1e-300,
        );
        const still = run(frame, ag, 0.02, { method, scale: 0 });
        expect(Math.max(...still.storeys.peakDrift, ...still.floors.peakAcceleration, still.energy.input)).toBe(0);
        expect(still.energy.imbalance).toBe(0);
      },
    );
  });

  test('two motions superpose (3)', () => {
    holds(fc.tuple(anyFrame, anyMethod, anySeed), ([frame, method, seed]) => {
      const [a, b] = [noise(seed, 120), noise(seed + 1, 120)];
      const history = (ag: Float64Array) =>
        run(frame, ag, 0.02, { method, histories: true }).histories?.displacement ?? new Float64Array();
      const both = history(a.map((x, i) => x + b[i]));
      const [ua, ub] = [history(a), history(b)];
      expect(
        apart(
          ua.map((u, i) => u + ub[i]),
          both,
        ),
      ).toBeLessThan(1e-10);
    });
  });

  test('mass, stiffness and gravity times s: drifts and accelerations stay, forces and energies grow by s (5)', () => {
    holds(fc.tuple(anyFrame, anySeed, fc.double({ min: 0.1, max: 10, noNaN: true })), ([frame, seed, s]) => {
      const ag = noise(seed, 150);
      const one = run(frame, ag, 0.02);
      const scaled = run(
        withStoreys(frame, (x) => ({ mass: x.mass * s, stiffness: x.stiffness * s })),
        ag,
        0.02,
      );
      expect(apart(one.storeys.peakDrift, scaled.storeys.peakDrift)).toBeLessThan(1e-9);
      expect(apart(one.floors.peakAcceleration, scaled.floors.peakAcceleration)).toBeLessThan(1e-9);
      expect(apart(one.storeys.peakShear, scaled.storeys.peakShear, s)).toBeLessThan(1e-9);
      expect(Math.abs((one.energy.input * s) / scaled.energy.input - 1)).toBeLessThan(1e-9);
    });
  });

  test('interval, step and tail times tau, stiffness over tau squared: drifts times tau squared, accelerations stay (6)', () => {
    holds(fc.tuple(anyFrame, anySeed, fc.double({ min: 0.3, max: 3, noNaN: true })), ([frame, seed, tau]) => {
      const ag = noise(seed, 150);
      const one = run(frame, ag, 0.02, { tail: 1 });
      const slow = run(
        withStoreys(frame, (x) => ({ stiffness: x.stiffness / tau ** 2 })),
        ag,
        0.02 * tau,
        { tail: tau },
      );
      expect(apart(one.storeys.peakDrift, slow.storeys.peakDrift, tau ** 2)).toBeLessThan(1e-9);
      expect(apart(one.storeys.peakShear, slow.storeys.peakShear)).toBeLessThan(1e-9);
      expect(apart(one.floors.peakAcceleration, slow.floors.peakAcceleration)).toBeLessThan(1e-9);
    });
  });

  test('the linear midpoints put into a record change nothing at the same step (8)', () => {
    holds(fc.tuple(anyFrame, anyMethod, anySeed), ([frame, method, seed]) => {
      const ag = noise(seed, 100);
      const finer = Float64Array.from({ length: 199 }, (_, i) =>
        i % 2 === 0 ? ag[i / 2] : (ag[(i - 1) / 2] + ag[(i + 1) / 2]) / 2,
      );
      const coarse = run(frame, ag, 0.02, { method, step: 0.01 });
      const fine = run(frame, finer, 0.01, { method, step: 0.01 });
      expect(apart(coarse.storeys.peakDrift, fine.storeys.peakDrift)).toBeLessThan(1e-9);
      expect(fine.steps).toBe(coarse.steps);
    });
  });

  test('trailing zeros are a tail; leading zeros only shift the time (8)', () => {
    holds(fc.tuple(anyFrame, anyMethod, anySeed), ([frame, method, seed]) => {
      const ag = noise(seed, 100);
      ag[0] = 0;
      const tail = run(frame, ag, 0.02, { method, tail: 1 });
      const zeros = run(frame, Float64Array.from([...ag, ...new Float64Array(50)]), 0.02, { method });
      expect(zeros.steps).toBe(tail.steps);
      expect(zeros.storeys).toEqual(tail.storeys);
      const led = run(frame, Float64Array.from([...new Float64Array(10), ...ag]), 0.02, { method, tail: 1 });
      expect(apart(led.storeys.peakDrift, tail.storeys.peakDrift)).toBeLessThan(1e-12);
      expect(
        apart(
          led.storeys.peakTime.map((t) => t - 0.2),
          tail.storeys.peakTime,
        ),
      ).toBeLessThan(1e-9);
    });
  });

  test('P-Delta without gravity is no P-Delta (9)', () => {
    holds(fc.tuple(anyFrame, anySeed), ([frame, seed]) => {
      const weightless = { ...withStoreys(frame, () => ({ gravity: 0 })), pDelta: true };
      const [a, b] = [frame, weightless].map((f) => run(f, noise(seed, 100), 0.02, { stopDrift: 1e9 }));
      expect(b).toEqual(a);
    });
  });

  test('modal damping of one ratio in all modes of one storey is stiffness-proportional damping', () => {
    const ag = noise(42, 400);
    const with_ = (damping: Damping) => run(shearFrame([2e5], [5e7], damping), ag, 0.02);
    const [full, banded] = [
      with_({ kind: 'modal', ratios: [0.05] }),
      with_({ kind: 'stiffness-proportional', mode: 1, ratio: 0.05 }),
    ];
    expect(apart(full.storeys.peakDrift, banded.storeys.peakDrift)).toBeLessThan(1e-12);
    expect(Math.abs(full.energy.damping / banded.energy.damping - 1)).toBeLessThan(1e-12);
  });

  test('Rayleigh damping as dashpots and as the modal ratios it means give the same run', () => {
    const frame = shearFrame([3e5, 2e5, 2e5, 1e5], [2e8, 1.5e8, 1e8, 0.5e8], {
      kind: 'rayleigh',
      modes: [1, 3],
      ratios: [0.04, 0.07],
    });
    const ratios = Array.from(prepared(frame).dampingRatios);
    const same = { ...frame, damping: { kind: 'modal' as const, ratios } };
    for (const method of METHODS) {
      const [a, b] = [frame, same].map((f): Run => run(f, noise(9, 900), 0.02, { method, tail: 3 }));
      expect(apart(a.storeys.peakDrift, b.storeys.peakDrift)).toBeLessThan(1e-10);
      expect(apart(a.floors.peakAcceleration, b.floors.peakAcceleration)).toBeLessThan(1e-10);
      expect(Math.abs(a.energy.damping / b.energy.damping - 1)).toBeLessThan(1e-10);
    }
  });

  test('the exact modal answer is the limit of every scheme, and the error falls by 4 a halving (12)', () => {
    const frame = shearFrame([3e5, 2e5, 2e5], [2e8, 1.5e8, 1e8], { kind: 'modal', ratios: [0.05, 0.03, 0.02] });
    const ag = noise(21, 300);
    for (const method of METHODS) {
      const errors = [16, 32, 64].map((parts) => {
        const exact = exactDisplacements(prepared(frame), ag, 0.02, parts);
        return apart(
          run(frame, ag, 0.02, { method, step: { parts }, histories: true }).histories?.displacement ??
            new Float64Array(),
          exact,
        );
      });
      expect(errors[1] / errors[2]).toBeGreaterThan(3.7);
      expect(errors[0] / errors[1]).toBeGreaterThan(3.5);
      expect(errors[2]).toBeLessThan(1e-4);
    }
  });

  test('a very stiff storey with a vanishing mass changes no other drift (16)', () => {
    const rows = { m: [3e5, 2e5, 1e5], k: [2e8, 1.5e8, 1e8] };
    const damping: Damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] };
    const ag = noise(33, 600);
    const plain = run(shearFrame(rows.m, rows.k, damping), ag, 0.01).storeys.peakDrift;
    const inserted = shearFrame([3e5, 1e-2, 2e5, 1e5], [2e8, 2e14, 1.5e8, 1e8], damping);
    const drifts = run(inserted, ag, 0.01).storeys.peakDrift;
    expect(apart(Float64Array.from([drifts[0], drifts[2], drifts[3]]), plain)).toBeLessThan(1e-4);
  });
});
