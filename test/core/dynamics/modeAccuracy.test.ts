import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { methodOf, spectralRadiusAtInfinity, stabilityLimit } from '../../../src/core/dynamics/methods.ts';
import { modeAccuracy } from '../../../src/core/dynamics/modeAccuracy.ts';
import type { MethodChoice } from '../../../src/core/dynamics/run.ts';
import { AVERAGE, LINEAR, run, shearFrame } from '../../support/frames.ts';

const CENTRAL: MethodChoice = { kind: 'central-difference' };
const at = (choice: MethodChoice, stepOverPeriod: number, ratio = 0) =>
  modeAccuracy(methodOf(choice), 2 * Math.PI, ratio, stepOverPeriod);

describe('[EVI-1] what a scheme makes of a mode', () => {
  // Published check A8 (figures read off a plot: tolerance 5e-4): undamped, gamma = 1/2, cos(w_num h) = 1 - (W^2 / 2) / (1 + beta W^2); no amplitude decay.
  test.each([
    ['average acceleration', AVERAGE, 0.032],
    ['linear acceleration', LINEAR, 0.0162],
    ['central difference', CENTRAL, -0.0168],
  ] as const)('%s at a tenth of the period', (_, choice, printed) => {
    const { periodElongation, amplitudeDecay, addedDamping, stepsAPeriod } = at(choice, 0.1);
    expect(periodElongation).toBeCloseTo(printed, 3);
    expect(amplitudeDecay).toBeCloseTo(0, 12);
    expect(addedDamping).toBeCloseTo(0, 12);
    expect(stepsAPeriod).toBeCloseTo(10, 12);
    const W = 0.2 * Math.PI;
    const { beta } = methodOf(choice);
    const angle = Math.acos(1 - W ** 2 / 2 / (1 + beta * W ** 2));
    expect(periodElongation).toBeCloseTo(W / angle - 1, 13);
  });

  test('average acceleration is (W/2) / atan(W/2) at any step, and keeps its digits at small ones', () => {
    for (const share of [1e-5, 1e-3, 0.05, 0.3, 2]) {
      const half = Math.PI * share;
      expect(at(AVERAGE, share).periodElongation).toBeCloseTo(half / Math.atan(half) - 1, 13);
    }
    // W^2 / 12, to six figures of the elongation itself.
    const small = at(AVERAGE, 1e-4).periodElongation ?? Number.NaN;
    expect(small / ((2e-4 * Math.PI) ** 2 / 12)).toBeCloseTo(1, 5);
  });

  test('a mode beyond the stability limit does not swing; within it the amplitude never grows', () => {
    // Published check A9: dt/T <= .3183 for central difference, .551 for linear acceleration.
    for (const choice of [CENTRAL, LINEAR]) {
      const limit = stabilityLimit(methodOf(choice)) / (2 * Math.PI);
      expect(at(choice, 1.001 * limit).periodElongation).toBeNull();
      expect(at(choice, 0.999 * limit).amplitudeDecay).toBeCloseTo(0, 9);
    }
    expect(at(AVERAGE, 0.1, 1).periodElongation).toBeNull();
  });

  test('numerical damping grows with the step towards the radius at infinity', () => {
    let cases = 0;
    const choices: fc.Arbitrary<MethodChoice> = fc.oneof(
      fc
        .double({ min: 0, max: 1, noNaN: true })
        .map((spectralRadius) => ({ kind: 'generalized-alpha' as const, spectralRadius })),
      fc.double({ min: -1 / 3, max: 0, noNaN: true }).map((alpha) => ({ kind: 'hht' as const, alpha })),
    );
    fc.assert(
      fc.property(choices, fc.double({ min: 1e-3, max: 0.3, noNaN: true }), (choice, share) => {
        const here = at(choice, share);
        const finer = at(choice, share / 2);
        const radius = spectralRadiusAtInfinity(methodOf(choice));
        if (here.addedDamping === null || finer.addedDamping === null) throw new Error('it swings at these steps');
        expect(here.addedDamping).toBeGreaterThanOrEqual(-1e-12);
        expect(here.addedDamping).toBeGreaterThanOrEqual(finer.addedDamping - 1e-12);
        if (radius < 0.99) expect(here.amplitudeDecay).toBeGreaterThan(0);
        cases++;
      }),
    );
    expect(cases).toBeGreaterThanOrEqual(100);
  });

  // The march itself in free vibration: a one-storey frame of period 1 s after one kick of the ground.
  test.each([
    ['average acceleration', AVERAGE, 0],
    ['average acceleration, damped', AVERAGE, 0.05],
    ['generalized-alpha 0.5', { kind: 'generalized-alpha', spectralRadius: 0.5 }, 0],
    ['generalized-alpha 0', { kind: 'generalized-alpha', spectralRadius: 0 }, 0.02],
    ['HHT -0.1', { kind: 'hht', alpha: -0.1 }, 0.03],
    ['Newmark 0.3, 0.6', { kind: 'newmark', beta: 0.3025, gamma: 0.6 }, 0],
    ['central difference', CENTRAL, 0.05],
  ] as const)('the march says the same: %s', (_, method, ratio) => {
    const step = 0.1;
    const frame = shearFrame(
      [1],
      [(2 * Math.PI) ** 2],
      ratio > 0 ? { kind: 'modal', ratios: [ratio] } : { kind: 'none' },
    );
    const kick = Float64Array.of(0, 1, 0);
    const { histories } = run(frame, kick, step, { method, tail: 12, histories: true });
    const u = histories?.displacement ?? new Float64Array();
    const { periodElongation, amplitudeDecay } = modeAccuracy(methodOf(method), 2 * Math.PI, ratio, step);
    if (periodElongation === null || amplitudeDecay === null) throw new Error('it swings');
    // A free vibration r^j cos(W j + phase) obeys u(j+1) = 2 r cos(W) u(j) - r^2 u(j-1) exactly.
    const swing = Math.sqrt(1 - ratio ** 2);
    const angle = (swing * 2 * Math.PI * step) / (1 + periodElongation);
    const decay = Math.log1p(-amplitudeDecay) - (2 * Math.PI * ratio) / swing;
    const r = Math.exp((decay * angle) / (2 * Math.PI));
    const from = 60; // the third root of the family has died out by then
    for (let j = from; j < from + 40; j++) {
      expect(u[j + 1]).toBeCloseTo(2 * r * Math.cos(angle) * u[j] - r * r * u[j - 1], 12);
    }
    expect(Math.max(...u.subarray(from).map(Math.abs))).toBeGreaterThan(1e-7);
  });
});
