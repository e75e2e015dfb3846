import { describe, expect, test } from 'vitest';
import { runAtAutoStep, stepErrorOf } from '../../../src/core/doors.ts';
import {
  AIM,
  autoStep,
  leastParts,
  MOST_PARTS,
  modesThatMatter,
  mostParts,
} from '../../../src/core/dynamics/autoStep.ts';
import type { MethodChoice, Run, RunCase } from '../../../src/core/dynamics/run.ts';
import { AVERAGE, noise, prepared, run, shearFrame } from '../../support/frames.ts';

const frame = shearFrame([3e5, 2e5, 2e5], [1.6e8, 1.2e8, 0.9e8], {
  kind: 'rayleigh',
  modes: [1, 2],
  ratios: [0.05, 0.05],
});
const whole = prepared(frame);
const { modes } = whole;

/** A run of one storey with that peak drift, as far as the search looks at it. */
const reaching = (drift: number, ending: Run['ending'] = null): Run => {
  const one = run(shearFrame([1], [40]), noise(1, 10), 0.01);
  return { ...one, ending, storeys: { ...one.storeys, peakDrift: Float64Array.of(drift) } };
};
const collapse = (storey: number): Run['ending'] => ({ status: 'collapsed', storey, time: 1 });

describe('[EVI-2] where the search begins', () => {
  test('twenty steps a period for each mode that matters', () => {
    const mode = modesThatMatter(modes);
    expect(modes.slice(0, mode).reduce((sum, m) => sum + m.effectiveMassRatio, 0)).toBeGreaterThanOrEqual(0.95);
    expect(modes.slice(0, mode - 1).reduce((sum, m) => sum + m.effectiveMassRatio, 0)).toBeLessThan(0.95);
    const { period } = modes[mode - 1];
    expect(leastParts(whole, AVERAGE, period / 20.001)).toEqual({ parts: 1, why: { kind: 'interval' }, enough: true });
    expect(leastParts(whole, AVERAGE, period / 19.9)).toEqual({
      parts: 2,
      why: { kind: 'steps-a-period', mode },
      enough: true,
    });
    expect(leastParts(whole, AVERAGE, period / 4.9)).toMatchObject({ parts: 8 });
    expect(leastParts(whole, AVERAGE, 4 * period)).toMatchObject({ parts: MOST_PARTS, enough: false });
  });
  test('the stability limit where it asks for more', () => {
    const stiff = shearFrame([3e5, 1e3], [1.6e8, 1e9]);
    const central: MethodChoice = { kind: 'central-difference' };
    const { parts, why } = leastParts(prepared(stiff), central, 0.01);
    if (why.kind !== 'stability') throw new Error(why.kind);
    expect(0.01 / parts).toBeLessThanOrEqual(why.limit);
    expect(0.02 / parts).toBeGreaterThan(why.limit);
    expect(leastParts(prepared(stiff), AVERAGE, 0.01).why.kind).toBe('interval');
  });
  test('a record so long that the run at half the step could not be held is given fewer parts', () => {
    expect(mostParts(20_000, 0.01, 5)).toBe(64);
    expect(mostParts(1e6, 0.01, 0)).toBe(8);
    expect(mostParts(5e7, 0.01, 0)).toBe(1);
  });
});

describe('[EVI-3] the halving rule', () => {
  const search = (first: number, drifts: Readonly<Record<number, Run>>) => {
    const asked: number[] = [];
    const known = new Map<number, Run>();
    for (;;) {
      const found = autoStep(first, MOST_PARTS, (parts) => known.get(parts));
      if (found.kind === 'settled') return { asked, ...found };
      asked.push(found.parts);
      known.set(found.parts, drifts[found.parts] ?? reaching(1));
    }
  };
  test('takes the first whose half-step run changes it by less; each half-step run is the next candidate', () => {
    const { asked, parts, stepError, converged } = search(1, {
      1: reaching(1.1),
      2: reaching(1.02),
      4: reaching(1.001),
    });
    expect(asked).toEqual([1, 2, 4, 8]);
    expect({ parts, converged }).toEqual({ parts: 4, converged: true });
    expect(stepError).toBeCloseTo((2 * 0.001) / 1.001, 12);
  });
  test('an error of the aim itself is not under it', () => {
    expect(search(1, { 1: reaching(200), 2: reaching(199), 4: reaching(199) })).toMatchObject({ parts: 2 });
    expect(search(1, { 1: reaching(200), 2: reaching(199.01), 4: reaching(199) })).toMatchObject({ parts: 1 });
  });
  test('says so where the most parts are not enough', () => {
    const drifts = Object.fromEntries([1, 2, 4, 8, 16, 32, 64, 128].map((n, i) => [n, reaching(i % 2 === 0 ? 1 : 2)]));
    expect(search(1, drifts)).toMatchObject({ parts: 64, converged: false, stepError: 2 });
  });
  test('a run that ended early is confirmed by one that ended alike, and has no step error', () => {
    const alike = { 1: reaching(1, collapse(0)), 2: reaching(2, collapse(0)) };
    expect(search(1, alike)).toMatchObject({ parts: 1, converged: true, stepError: null });
    const elsewhere = { 1: reaching(1, collapse(0)), 2: reaching(2, collapse(1)), 4: reaching(2, collapse(1)) };
    expect(search(1, elsewhere)).toMatchObject({ parts: 2 });
    expect(search(1, { 1: reaching(9, collapse(0)) })).toMatchObject({ parts: 2, stepError: 0, converged: true });
  });
});

describe('[EVI-4] a run at the step that halving comes to', () => {
  const motion = { interval: 0.02, acceleration: noise(3, 300), scale: 1 };
  const analysis = { method: AVERAGE, step: 'auto', tail: 1, stopDrift: 0.1 } as const;
  const runCase: RunCase = { frame, analysis, motion };
  test('is the run at that step, its error that of the half-step run, and no coarser step does', () => {
    const { run: found, parts, stepError, converged, why } = runAtAutoStep(whole, runCase, { histories: true });
    const at = (n: number) =>
      run(frame, motion.acceleration, 0.02, { step: { parts: n }, tail: 1, histories: n === parts });
    expect(found).toEqual(at(parts));
    expect(found.histories?.every).toBe(1);
    expect(stepError).toBe(stepErrorOf(at(parts), at(2 * parts)));
    expect(stepError).toBeLessThan(AIM);
    expect(converged).toBe(true);
    const least = leastParts(whole, AVERAGE, 0.02).parts;
    expect(parts).toBeGreaterThan(least);
    for (let n = least; n < parts; n *= 2) expect(stepErrorOf(at(n), at(2 * n))).toBeGreaterThanOrEqual(AIM);
    expect(why).toBe(`${parts} parts of the interval of 0.02 s, the first with a step error under 1 %`);
  });
  test('a run itself is never asked with "auto"', () => {
    expect(() => run(frame, motion.acceleration, 0.02, { step: 'auto' })).toThrow(/parts of the interval|halving/);
  });
});
