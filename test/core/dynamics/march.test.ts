import { describe, expect, test } from 'vitest';
import { prepareFrame, startRun } from '../../../src/core/doors.ts';
import type { MethodChoice } from '../../../src/core/dynamics/run.ts';
import type { Damping, Frame } from '../../../src/core/frame/frame.ts';
import { exactDisplacements } from '../../support/exact.ts';
import { AVERAGE, noise, prepared, run, shearFrame } from '../../support/frames.ts';

/** Two storeys with all periods near 1 s, so that one step suits both; a motion of a few long straight pieces. */
const RAMPS = Float64Array.from([0.4, 1.3, -2.1, 0.9, 1.6, -0.7, 0]);
const INTERVAL = 0.5;
const bench = (damping: Damping): Frame => shearFrame([3000, 1000], [2.2e5, 0.9e5], damping);

function errorAt(frame: Frame, method: MethodChoice, parts: number): number {
  const { histories } = run(frame, RAMPS, INTERVAL, { method, step: { parts }, histories: true });
  if (!histories) throw new Error('no histories');
  const exact = exactDisplacements(prepared(frame), RAMPS, INTERVAL, parts);
  let [worst, largest] = [0, 0];
  for (let i = 0; i < exact.length; i++) {
    worst = Math.max(worst, Math.abs(histories.displacement[i] - exact[i]));
    largest = Math.max(largest, Math.abs(exact[i]));
  }
  return worst / largest;
}

/** log2 of the ratio of errors for each adjacent pair of a ladder of halved steps, from 40 steps a period on. */
function pairOrders(frame: Frame, method: MethodChoice): number[] {
  const errors = [20, 40, 80, 160].map((parts) => errorAt(frame, method, parts));
  return errors.slice(1).map((error, i) => Math.log2(errors[i] / error));
}

const DAMPINGS: readonly Damping[] = [
  { kind: 'none' },
  { kind: 'rayleigh', modes: [1, 2], ratios: [0.03, 0.06] },
  { kind: 'modal', ratios: [0.05, 0.02] },
];

// Orders: Hughes, The Finite Element Method, section 9.1; Chung and Hulbert (1993); A10 of the published checks.
describe.each(DAMPINGS)('[DYN-3] order of accuracy, $kind damping', (damping) => {
  test.each<MethodChoice>([
    AVERAGE,
    { kind: 'newmark', beta: 1 / 6, gamma: 0.5 },
    { kind: 'central-difference' },
    { kind: 'hht', alpha: -0.1 },
    { kind: 'generalized-alpha', spectralRadius: 0 },
    { kind: 'generalized-alpha', spectralRadius: 0.5 },
    { kind: 'generalized-alpha', spectralRadius: 0.8 },
    { kind: 'generalized-alpha', spectralRadius: 1 },
  ])('second order: %o', (method) => {
    for (const order of pairOrders(bench(damping), method)) expect(Math.abs(order - 2)).toBeLessThan(0.1);
  });

  test('gamma 0.6 is first order only (the check can fail)', () => {
    for (const order of pairOrders(bench(damping), { kind: 'newmark', beta: 0.3025, gamma: 0.6 })) {
      expect(Math.abs(order - 1)).toBeLessThan(0.1);
    }
  });
});

describe('[DYN-4] energy', () => {
  test('average acceleration keeps the energy of undamped free vibration to 1e-10', () => {
    const frame = shearFrame([2e5, 1.5e5, 1e5], [9e7, 7e7, 4e7]);
    const { histories } = run(frame, Float64Array.from([0, 3, -2, 0]), 0.1, { tail: 30, histories: true });
    if (!histories) throw new Error('no histories');
    const { kinetic, strain } = histories.energy;
    const first = 4; // the motion has fallen to zero
    const start = kinetic[first] + strain[first];
    expect(start).toBeGreaterThan(0);
    for (let j = first; j < histories.count; j++)
      expect(Math.abs(kinetic[j] + strain[j] - start)).toBeLessThan(1e-10 * start);
  });

  test.each(DAMPINGS)('average acceleration leaves no imbalance, $kind damping', (damping) => {
    const { energy } = run(bench(damping), noise(7, 2000), 0.02, { tail: 3 });
    expect(energy.input).toBeGreaterThan(0);
    expect(energy.imbalance).toBeLessThan(1e-8);
    const sum = energy.kinetic + energy.strain + energy.damping;
    expect(Math.abs(energy.input - sum)).toBeLessThan(1e-8 * energy.input);
  });

  test('a dissipative scheme shows its own damping as imbalance, and less of it at half the step', () => {
    const method: MethodChoice = { kind: 'generalized-alpha', spectralRadius: 0.5 };
    const frame = bench({ kind: 'rayleigh', modes: [1, 2], ratios: [0.03, 0.06] });
    const at = (parts: number) => run(frame, RAMPS, INTERVAL, { method, step: { parts } }).energy.imbalance;
    expect(at(8)).toBeGreaterThan(1e-3);
    expect(at(16)).toBeLessThan(at(8) / 2);
  });

  // Uang and Bertero (1990), relative input energy: -int ag sum(m v) dt, here by a fine trapezoid rule from the histories.
  test('the input is the integral of the load on the velocity', () => {
    const frame = bench({ kind: 'modal', ratios: [0.05] });
    const { histories, energy } = run(frame, RAMPS, INTERVAL, { step: { parts: 400 }, histories: true });
    if (!histories) throw new Error('no histories');
    const { count, ground, displacement } = histories;
    let input = 0;
    for (let j = 1; j < count; j++) {
      for (const [i, mass] of [3000, 1000].entries()) {
        const moved = displacement[i * count + j] - displacement[i * count + j - 1];
        input -= 0.5 * (ground[j] + ground[j - 1]) * mass * moved;
      }
    }
    expect(Math.abs(energy.input - input)).toBeLessThan(1e-9 * energy.input);
  });
});

describe('[DYN-5] slices', () => {
  test.each(DAMPINGS)('any slicing gives the same bits, with and without histories, $kind damping', (damping) => {
    const frame = bench(damping);
    const acceleration = noise(3, 700);
    const whole = run(frame, acceleration, 0.02, { tail: 2.5, histories: true });
    const made = prepareFrame(frame);
    if (!made.ok) throw new Error('frame');
    const runCase = {
      frame,
      analysis: { method: AVERAGE, step: { parts: 1 }, tail: 2.5, stopDrift: 0.1 },
      motion: { interval: 0.02, acceleration, scale: 1 },
    };
    for (const slice of [1, 7, 64, 100_000]) {
      for (const histories of [false, true]) {
        const underWay = startRun(made.value, runCase, { histories });
        let rounds = 0;
        while (!underWay.advance(slice)) expect(++rounds).toBeLessThan(2000);
        const sliced = underWay.finish();
        expect({ ...sliced, histories: null }).toEqual({ ...whole, histories: null });
        if (histories) expect(sliced.histories).toEqual(whole.histories);
      }
    }
  });

  test('a run that is stopped half way says so and keeps what it had', () => {
    const frame = bench({ kind: 'none' });
    const made = prepared(frame);
    const underWay = startRun(
      made,
      {
        frame,
        analysis: { method: AVERAGE, step: { parts: 1 }, tail: 0, stopDrift: 0.1 },
        motion: { interval: 0.02, acceleration: noise(3, 700), scale: 1 },
      },
      { histories: true },
    );
    underWay.advance(100);
    const part = underWay.finish();
    expect(part.ending).toEqual({ status: 'cancelled', storey: -1, time: 2 });
    expect(part.histories?.count).toBe(101);
    expect(part.storeys.peakDrift[0]).toBeGreaterThan(0);
  });
});

describe('[DYN-6] endings', () => {
  test('a P-Delta run whose drift passes stopDrift is stopped there, with the storey named', () => {
    const base = shearFrame([1e5, 1e5], [2e6, 1e6], { kind: 'none' }, 3, true);
    const frame = { ...base, storeys: base.storeys.map((s, i) => ({ ...s, gravity: i === 1 ? 2.9e6 : 1e5 })) };
    const { ending, storeys, histories } = run(frame, noise(5, 3000), 0.01, {
      stopDrift: 0.05,
      scale: 0.2,
      histories: true,
    });
    expect(ending?.status).toBe('collapsed');
    expect(ending?.storey).toBe(1);
    expect(storeys.peakDriftRatio[1]).toBeGreaterThan(0.05);
    expect(storeys.peakTime[1]).toBeCloseTo(ending?.time ?? Number.NaN, 9);
    expect(histories?.count).toBe(Math.round((ending?.time ?? 0) / 0.01) + 1);
  });

  test('a linear run without P-Delta is not stopped', () => {
    const { ending, storeys } = run(bench({ kind: 'none' }), noise(5, 3000), 0.01, { scale: 1000 });
    expect(ending).toBeNull();
    expect(storeys.peakDriftRatio[0]).toBeGreaterThan(0.1);
  });

  test('numbers that leave the finite range end the run as diverged', () => {
    const { ending } = run(bench({ kind: 'none' }), Float64Array.from([0, 1e200, -1e200, 1e200, 0]), 0.1, {
      scale: 1e80,
    });
    expect(ending?.status).toBe('diverged');
  });

  test('a step beyond the stability limit never starts', () => {
    expect(() => run(bench({ kind: 'none' }), noise(1, 50), 0.5, { method: { kind: 'central-difference' } })).toThrow(
      /stability limit/,
    );
  });
});

describe('[DYN-7] what a run reports', () => {
  const frame = shearFrame(
    [3e5, 2.5e5, 2e5],
    [1.5e8, 1.2e8, 0.8e8],
    { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] },
    3.5,
    true,
  );
  const result = run(frame, noise(11, 1500), 0.02, { tail: 4, histories: true });
  const { histories, storeys, floors } = result;
  if (!histories) throw new Error('no histories');
  const { count } = histories;
  const row = (x: Float64Array, i: number) => x.subarray(i * count, (i + 1) * count);
  const peak = (x: Float64Array) => x.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const n = 3;
  const drift = Array.from({ length: n }, (_, i) =>
    row(histories.displacement, i).map((u, j) => u - (i > 0 ? row(histories.displacement, i - 1)[j] : 0)),
  );

  test('peaks are those of the histories', () => {
    for (let i = 0; i < n; i++) {
      expect(storeys.peakDrift[i]).toBe(peak(drift[i]));
      expect(Math.abs(drift[i][Math.round(storeys.peakTime[i] / result.step)])).toBe(storeys.peakDrift[i]);
      expect(storeys.peakDriftRatio[i]).toBeCloseTo(peak(drift[i]) / 3.5, 15);
      expect(storeys.peakShear[i]).toBeCloseTo(peak(row(histories.shear, i)), 3);
      expect(floors.peakDisplacement[i]).toBe(peak(row(histories.displacement, i)));
      expect(floors.peakAcceleration[i]).toBe(peak(row(histories.acceleration, i)));
    }
  });

  test('overturning is the largest sum of storey shear x height from the storey up', () => {
    for (let i = 0; i < n; i++) {
      let largest = 0;
      for (let j = 0; j < count; j++) {
        let moment = 0;
        for (let s = i; s < n; s++) moment += row(histories.shear, s)[j] * 3.5;
        largest = Math.max(largest, Math.abs(moment));
      }
      expect(storeys.peakOverturning[i] / largest).toBeCloseTo(1, 12);
    }
  });

  test('the residual drift is the mean over the last fundamental period', () => {
    const { modes } = prepared(frame);
    const last = Math.round(modes[0].period / result.step);
    for (let i = 0; i < n; i++) {
      const tail = drift[i].subarray(count - last);
      expect(storeys.residualDrift[i]).toBeCloseTo(tail.reduce((a, b) => a + b, 0) / last, 12);
      expect(storeys.residualSway[i]).toBeCloseTo(
        Math.max(...tail.map((d) => Math.abs(d - storeys.residualDrift[i]))),
        12,
      );
    }
  });

  // Invariant 14: at each step sum(m a_total) = -(V1 - P1 drift1 / h1) - 1'C v. Average acceleration: v = 2 du / h - v before.
  test('floors are in equilibrium with the base at every step', () => {
    const { arrays, damping } = prepared(frame);
    if (damping.kind !== 'banded') throw new Error('banded');
    const scale = peak(row(histories.shear, 0));
    const v = new Float64Array(n);
    for (let j = 1; j < count; j++) {
      let [inertia, viscous] = [0, 0];
      for (let i = 0; i < n; i++) {
        const u = row(histories.displacement, i);
        v[i] = (2 * (u[j] - u[j - 1])) / result.step - v[i];
        inertia += arrays.mass[i] * row(histories.acceleration, i)[j];
        viscous += damping.floor[i] * v[i];
      }
      viscous += damping.storey[0] * v[0];
      const base = row(histories.shear, 0)[j] - (arrays.gravityAbove[0] / 3.5) * drift[0][j];
      expect(Math.abs(inertia + base + viscous)).toBeLessThan(1e-8 * scale);
    }
  });

  test('histories beyond the memory limit are thinned, and say so', () => {
    const many = run(shearFrame([1e5], [1e7]), new Float64Array(1_200_001), 0.01, { histories: true });
    expect(many.histories?.every).toBeGreaterThan(1);
    expect(many.histories?.count).toBe(Math.floor(1_200_000 / (many.histories?.every ?? 1)) + 1);
  });
});
