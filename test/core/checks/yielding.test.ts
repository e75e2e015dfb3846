import { describe, expect, test } from 'vitest';
import { cautionsOf } from '../../../src/core/checks/cautions.ts';
import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import { evidenceSentence } from '../../../src/core/checks/evidenceSentence.ts';
import type { Limits } from '../../../src/core/checks/limits.ts';
import { verdictOf } from '../../../src/core/checks/verdict.ts';
import { type Evidence, evidenceOf } from '../../../src/core/dynamics/evidence.ts';
import type { Analysis, Run } from '../../../src/core/dynamics/run.ts';
import type { Damping, Frame, Storey } from '../../../src/core/frame/frame.ts';
import { AVERAGE, noise, prepared, run, shearFrame } from '../../support/frames.ts';

const limits: Limits = { drift: 0.01, source: 'a clause, design earthquake' };
const analysis: Analysis = { method: AVERAGE, step: { parts: 1 }, tail: 0, stopDrift: 0.1 };
const rayleigh: Damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] };
const yielding = (damping: Damping = rayleigh): Frame => {
  const plain = shearFrame([3e5, 2e5, 2e5], [1.6e8, 1.2e8, 0.9e8], damping);
  const soften = (storey: Storey): Storey => ({
    ...storey,
    law: { kind: 'bilinear', strength: 0.004 * storey.stiffness, hardening: 0.03 },
  });
  return { ...plain, storeys: plain.storeys.map(soften) };
};
const isolated: Frame = {
  ...yielding({ kind: 'rayleigh', modes: [2, 3], ratios: [0.05, 0.05] }),
  storeys: yielding().storeys.map((storey, i) =>
    i === 0
      ? { ...storey, role: 'isolator', stiffness: 8e6, law: { kind: 'bilinear', strength: 2e5, hardening: 0.1 } }
      : { ...storey, law: { kind: 'elastic' } },
  ),
};
const suiteOf = (frame: Frame, count: number, scale = 2) =>
  Array.from({ length: count }, (_, i) => ({
    motion: `M${i + 1}`,
    run: run(frame, noise(i + 1, 400), 0.01, { scale, tail: 20, stopDrift: 1 }),
  }));
const codesOf = (
  frame: Frame,
  runs: ReturnType<typeof suiteOf>,
  more: Partial<Parameters<typeof cautionsOf>[0]> = {},
  limit: Limits = limits,
) =>
  cautionsOf({
    envelope: envelopeOf(runs, limit, [], frame),
    limits: limit,
    analysis,
    prepared: prepared(frame),
    runs,
    motions: runs.map(({ motion }) => ({ name: motion, interval: 0.01 })),
    stepErrors: null,
    ...more,
  }).map(({ code, text }) => `${code}: ${text}`);
const having = (list: string[], code: string) => list.filter((line) => line.startsWith(`${code}:`));

describe('[CHK-6] a storey that comes down once it yields', () => {
  const runs = suiteOf(yielding(), 1);
  /** P/(k h) of the first storey, by its gravity load. */
  const leaning = (share: number): Frame => {
    const frame = yielding();
    const [first, ...rest] = frame.storeys.map((storey) => ({ ...storey, gravity: 0 }));
    return {
      ...frame,
      pDelta: true,
      storeys: [{ ...first, gravity: share * first.stiffness * first.height }, ...rest],
    };
  };
  test('is said where P-Delta takes more than hardening gives, and not beside it', () => {
    expect(having(codesOf(leaning(0.031), runs), 'softens-past-yield')).toEqual([
      'softens-past-yield: Storey 1: past yield P-Delta takes more than hardening gives, P/(k h) 3.1 % against 3.0 %',
    ]);
    expect(having(codesOf(leaning(0.029), runs), 'softens-past-yield')).toEqual([]);
    expect(having(codesOf({ ...leaning(0.031), pDelta: false }, runs), 'softens-past-yield')).toEqual([]);
  });
});

describe('[CHK-5] an isolator', () => {
  const runs = suiteOf(isolated, 3);
  const moves = (i: number) => runs[i].run.storeys.peakDrift[0];
  const largest = Math.max(moves(0), moves(1), moves(2));
  test('is left out of drift ratios and never governs the storeys', () => {
    const { ratio, governingStorey, drift } = envelopeOf(runs, limits, [], isolated);
    expect(ratio?.[0]).toBeNaN();
    expect(drift?.max[0]).toBeGreaterThan(drift?.max[1] ?? 0);
    expect(governingStorey).toBeGreaterThan(0);
    expect(ratio?.[governingStorey]).toBe(Math.max(ratio?.[1] ?? 0, ratio?.[2] ?? 0));
  });
  test('is compared with a limit of its own, without the factor on storey drifts', () => {
    expect(envelopeOf(runs, limits, [], isolated).isolator).toEqual({ limit: null, ratio: null });
    expect(envelopeOf(runs, limits, [], yielding()).isolator).toBeNull();
    const { isolator } = envelopeOf(runs, { ...limits, isolator: 0.2, factor: 0.5 }, [], isolated);
    expect(isolator?.ratio).toBeCloseTo(largest / 0.2, 12);
  });
  test('without a limit, or with nothing that damps it, is cautioned', () => {
    expect(having(codesOf(isolated, runs), 'isolator-without-limit')).toHaveLength(1);
    expect(having(codesOf(isolated, runs, {}, { ...limits, isolator: 0.2 }), 'isolator-without-limit')).toEqual([]);
    expect(having(codesOf(isolated, runs), 'isolator-undamped')).toEqual([]);
    const law = { kind: 'elastic' } as const;
    const bare = { ...isolated, storeys: isolated.storeys.map((storey) => ({ ...storey, law })) };
    expect(having(codesOf(bare, runs), 'isolator-undamped')).toHaveLength(1);
    const [first, ...rest] = bare.storeys;
    const damped = { ...bare, storeys: [{ ...first, damper: { coefficient: 1e5, exponent: 1 } }, ...rest] };
    expect(having(codesOf(damped, runs), 'isolator-undamped')).toEqual([]);
  });
  test('over its limit is said first, and governs where it is worse than the storeys', () => {
    const tight = { ...limits, drift: 0.9, isolator: largest / 1.07 };
    expect(codesOf(isolated, runs, {}, tight)[0]).toBe(
      'isolator-limit-exceeded: Limit exceeded: displacement of the isolator, 1.07',
    );
    const verdict = verdictOf(envelopeOf(runs, tight, [], isolated), runs);
    expect(verdict).toMatchObject({ over: true, headline: 'The isolator governs: 1.07 of its limit' });
    expect(verdict.detail).toMatch(/^storey \d at 0\.\d\d: largest \d\.\d\d %, limit 90\.00 %$/);
    const wide = { ...limits, drift: 1e-6, isolator: 2 * largest };
    expect(verdictOf(envelopeOf(runs, wide, [], isolated), runs).detail).toMatch(/; isolator at 0\.50 of its limit$/);
    expect(having(codesOf(isolated, runs, {}, wide), 'isolator-limit-exceeded')).toEqual([]);
  });
  test('alone on the ground has a verdict of its own', () => {
    const alone: Frame = { ...isolated, storeys: [isolated.storeys[0]], damping: { kind: 'none' } };
    const single = suiteOf(alone, 1);
    const limit = { ...limits, isolator: 1 };
    const envelope = envelopeOf(single, limit, ['X'], alone);
    expect(envelope.governingStorey).toBe(-1);
    expect(verdictOf(envelope, single)).toMatchObject({ over: false, detail: 'left out: X' });
    const none = verdictOf(envelopeOf(single, limits, [], alone), single);
    expect(none).toEqual({ over: false, headline: 'No storey is compared with a limit', detail: '' });
  });
  test('does not count where drift gathers, and its first mode not where damping is off', () => {
    const lines = codesOf(isolated, runs);
    expect(having(lines, 'drift-gathers').every((line) => !line.includes('storey 1'))).toBe(true);
    expect(having(lines, 'damping-off')).toEqual([]);
  });
});

describe('[CHK-6] what yielding adds', () => {
  const frame = yielding();
  const runs = suiteOf(frame, 3);
  test('ductility of the suite, none for an elastic storey', () => {
    const { ductility } = envelopeOf(runs, limits, [], frame);
    const first = runs.map((one) => one.run.storeys.ductility[0]);
    expect(Math.max(...first)).toBeGreaterThan(1);
    expect(ductility?.max[0]).toBe(Math.max(...first));
    expect(ductility?.mean[0]).toBeCloseTo(first.reduce((sum, mu) => sum + mu, 0) / 3, 12);
    expect(envelopeOf(runs, limits, [], frame).residualDrift?.max[0]).toBe(
      Math.max(...runs.map((one) => Math.abs(one.run.storeys.residualDrift[0]))),
    );
    const linear = shearFrame([1e5], [1e8]);
    expect(envelopeOf(suiteOf(linear, 1), limits, [], linear).ductility?.mean[0]).toBeNaN();
  });
  test('damping that carries over a fifth of the base shear while a storey is past yield', () => {
    const carrying = (share: number): ReturnType<typeof suiteOf> => {
      const [{ motion, run: one }] = runs;
      return [{ motion, run: { ...one, base: { peakDampingForce: share * one.storeys.peakShear[0] } } }];
    };
    expect(having(codesOf(frame, carrying(0.31)), 'damping-carries-shear')[0]).toMatch(
      /Damping on the initial stiffness carries up to 31 % of the peak base shear .* in M1/,
    );
    expect(having(codesOf(frame, carrying(0.199)), 'damping-carries-shear')).toEqual([]);
    const tangent = yielding({ ...rayleigh, stiffness: 'tangent' } as Damping);
    expect(having(codesOf(tangent, carrying(0.31)), 'damping-carries-shear')).toEqual([]);
    expect(having(codesOf(frame, carrying(Number.NaN)), 'damping-carries-shear')).toEqual([]);
  });
  test('a mode that matters and is damped by far more or far less than was wanted', () => {
    // Stiffness-proportional: the ratio grows with the frequency.
    const proportional = shearFrame([3e5, 2e5, 2e5], [1.6e8, 1.2e8, 0.9e8], {
      kind: 'stiffness-proportional',
      mode: 1,
      ratio: 0.05,
    });
    const { dampingRatios } = prepared(proportional);
    expect(dampingRatios[1]).toBeGreaterThan(0.1);
    const [line] = having(codesOf(proportional, suiteOf(proportional, 1)), 'damping-off');
    expect(line).toBe(
      `damping-off: Mode 2 is damped by ${(100 * dampingRatios[1]).toFixed(1)} %, ${(dampingRatios[1] / 0.05).toFixed(1)} times the 5.0 % wanted`,
    );
    // The same on mode 2: the first mode has too little.
    const low = { ...proportional, damping: { kind: 'stiffness-proportional', mode: 2, ratio: 0.05 } as const };
    expect(having(codesOf(low, suiteOf(low, 1)), 'damping-off')[0]).toMatch(
      /Mode 1 is damped by .*, 0\.\d\d times the/,
    );
    expect(having(codesOf(frame, runs), 'damping-off')).toEqual([]);
    const modal = shearFrame([3e5, 2e5], [1.6e8, 1.2e8], { kind: 'modal', ratios: [0.02, 0.2] });
    expect(having(codesOf(modal, suiteOf(modal, 1)), 'damping-off')).toEqual([]);
  });
  test('halved steps, a half-step run that ends, errors at a step that halving chose', () => {
    const halved = (halvings: number) =>
      runs.map((one) => ({ ...one, run: { ...one.run, marching: { ...one.run.marching, halvings } } }));
    expect(having(codesOf(frame, halved(0)), 'step-halved')).toEqual([]);
    expect(having(codesOf(frame, halved(1)), 'step-halved')[0]).toMatch(/Step halved once .* in M1/);
    expect(having(codesOf(frame, halved(12)), 'step-halved')[0]).toMatch(/Step halved 12 times/);
    const ending: Run['ending'] = { status: 'collapsed', storey: 1, time: 8.41 };
    const halves = [{ motion: 'M2', run: { ...runs[1].run, ending } }];
    expect(having(codesOf(frame, runs, { halves }), 'half-step-ended')[0]).toMatch(
      /M2 does not finish at half the step, storey 2 lost its stability at 8\.41 s, drift \d+\.\d %: halve the step/,
    );
    const auto = { analysis: { ...analysis, step: 'auto' as const }, stepErrors: { M1: 0.018 } };
    expect(having(codesOf(frame, runs, auto), 'step-error')).toEqual([
      'step-error: Step error 1.8 % in M1: type a shorter step',
    ]);
  });
  test('a yielding frame far beyond is not said to be linear', () => {
    const far = suiteOf(frame, 1, 60);
    expect(Math.max(...far[0].run.storeys.peakDriftRatio)).toBeGreaterThan(0.1);
    expect(having(codesOf(frame, far), 'beyond-linear')).toEqual([]);
  });
});

describe('[EVI-9] the evidence of a run, and in one sentence', () => {
  const frame = yielding();
  const [{ run: one }] = suiteOf(frame, 1);
  const whole = prepared(frame);
  test('step, solves, shortest period and what the scheme makes of each mode', () => {
    const evidence = evidenceOf(whole, one, 0.01, 0.004);
    expect(evidence).toMatchObject({ step: 0.01, parts: 1, stepError: 0.004, auto: null, halvings: 0 });
    expect(evidence.imbalance).toBe(one.energy.imbalance);
    expect(evidence.solvesAStep).toBe(one.marching.solves / one.steps);
    expect(evidence.solvesAStep).toBeGreaterThan(1);
    expect(evidence.stepsInShortest).toBeCloseTo(whole.modes[2].period / 0.01, 12);
    expect(evidence.modes.map(({ stepsAPeriod }) => stepsAPeriod * 0.01)).toEqual(
      whole.modes.map(({ period }) => expect.closeTo(period, 12)),
    );
    for (const { periodElongation } of evidence.modes) expect(periodElongation).toBeGreaterThan(0);
  });
  const saying = (changes: readonly Partial<Evidence>[]) =>
    evidenceSentence(changes.map((change) => ({ ...evidenceOf(whole, one, 0.01, 0.004), ...change })));
  test('says the worst of the suite', () => {
    expect(
      saying([
        { stepError: 0.004, imbalance: 2e-4 },
        { stepError: 0.001, imbalance: 1e-6 },
      ]),
    ).toBe('Drifts are converged to 0.4 %; energy balances to 0.02 %.');
    expect(saying([{ stepError: 2e-5, imbalance: 1e-13 }])).toBe(
      'Drifts are converged to less than 0.01 %; energy balances to less than 0.01 %.',
    );
  });
  test('is honest where it is not converged or not known', () => {
    expect(saying([{ stepError: 0.018, imbalance: 0.03 }])).toBe(
      'Drifts are not converged: the step error is 1.8 %; energy does not balance: it is off by 3.0 %.',
    );
    expect(saying([{ stepError: null, imbalance: 1e-3 }])).toBe(
      'The step error is not known; energy balances to 0.1 %.',
    );
    expect(
      saying([
        { stepError: null, imbalance: 1e-3 },
        { stepError: 0.002, imbalance: 1e-3 },
      ]),
    ).toBe('Drifts are converged to 0.2 %; the step error of 1 of 2 motions is not known; energy balances to 0.1 %.');
  });
});
