import { describe, expect, test } from 'vitest';
import { runAtAutoStep, stepErrorOf } from '../../../src/core/doors.ts';
import { leastParts } from '../../../src/core/dynamics/autoStep.ts';
import type { Run } from '../../../src/core/dynamics/run.ts';
import { AVERAGE, prepared, run } from '../../support/frames.ts';
import { type Drawn, drawFrames } from '../../support/randomFrames.ts';

/** Tail [s] and a stop drift that no frame here comes to. */
const OPTIONS = { tail: 0.5, stopDrift: 5 };
const at = ({ frame, acceleration, interval }: Drawn, parts: number): Run =>
  run(frame, acceleration, interval, { ...OPTIONS, step: { parts } });
const least = ({ frame, interval }: Drawn) => leastParts(prepared(frame), AVERAGE, interval).parts;
const yields = ({ frame }: Drawn) => frame.storeys.some(({ law }) => law.kind !== 'elastic');

/** Largest error of a peak drift over the largest peak drift, against a run at a sixteenth of the step [-]. */
function trueError(drawn: Drawn, found: Run, parts: number): number {
  const [peaks, truth] = [found.storeys.peakDrift, at(drawn, 16 * parts).storeys.peakDrift];
  return Math.max(...peaks.map((d, i) => Math.abs(d - truth[i]))) / Math.max(...peaks);
}

describe('[EVI-7] the step error', () => {
  // At the coarsest step that a search begins with, where errors are largest. Five draws of 200 gave 970 of 1,000 (all 200 elastic
  // ones), at least 192 in each draw, and each of the 125 errors over 1 % was a bound.
  test('is a bound on the true error of the peak drifts in 95 % of 200 random frames', () => {
    const bound = { elastic: [0, 0], yielding: [0, 0] };
    let [yielded, furthest, large] = [0, 0, 0];
    for (const drawn of drawFrames(200, 1)) {
      const parts = least(drawn);
      const coarse = at(drawn, parts);
      const error = stepErrorOf(coarse, at(drawn, 2 * parts));
      const count = bound[yields(drawn) ? 'yielding' : 'elastic'];
      count[1]++;
      const truth = trueError(drawn, coarse, parts);
      if (truth <= error) count[0]++;
      if (truth > 0.01) large++;
      furthest = Math.max(furthest, truth - error);
      if (coarse.storeys.ductility.some((mu) => mu > 1)) yielded++;
    }
    const { elastic, yielding } = bound;
    expect([elastic[1], yielding[1]]).toEqual([40, 160]);
    expect(yielded).toBeGreaterThan(120);
    expect((elastic[0] + yielding[0]) / 200).toBeGreaterThanOrEqual(0.95);
    expect(elastic[0] / elastic[1]).toBeGreaterThanOrEqual(0.95);
    // Where it is none, it is off by little; and there is something to bound.
    expect(furthest).toBeLessThan(0.005);
    expect(large).toBeGreaterThan(5);
  });
});

describe('[EVI-8] the energy imbalance', () => {
  const frames = drawFrames(30, 7).filter(yields);
  const auto = (drawn: Drawn) => {
    const { frame, acceleration, interval } = drawn;
    const analysis = { method: AVERAGE, step: 'auto', ...OPTIONS } as const;
    const motion = { interval, acceleration, scale: 1 };
    return runAtAutoStep(prepared(frame), { frame, analysis, motion }, { histories: false });
  };
  test('is under 1 % at the auto step in every frame, and falls at least 3 times a halving', () => {
    const HALVINGS = 4;
    /** Logarithms of the falls, a row a halving. */
    const falls: number[][] = Array.from({ length: HALVINGS }, () => []);
    for (const drawn of frames) {
      const { run: found, parts, converged } = auto(drawn);
      expect(converged).toBe(true);
      const imbalance = [found.energy.imbalance];
      for (let i = 1; i <= HALVINGS; i++) imbalance.push(at(drawn, parts * 2 ** i).energy.imbalance);
      expect(imbalance[0]).toBeLessThan(0.01);
      // What never yields balances to rounding.
      if (!found.storeys.ductility.some((mu) => mu > 1)) continue;
      // A corner of a law falls anywhere in its step, so single halvings scatter: on the average of four in each frame, and of each over all.
      expect((imbalance[0] / imbalance[HALVINGS]) ** (1 / HALVINGS)).toBeGreaterThan(3);
      for (let i = 0; i < HALVINGS; i++) falls[i].push(Math.log(imbalance[i] / imbalance[i + 1]));
    }
    expect(falls[0].length).toBeGreaterThan(18);
    for (const row of falls) expect(Math.exp(row.reduce((sum, x) => sum + x, 0) / row.length)).toBeGreaterThan(3);
  });
  test('exceeds 2 % in three of four yielding frames marched at a quarter of their period, and is nothing in elastic ones', () => {
    let [yielded, over, elastic] = [0, 0, 0];
    for (const drawn of drawFrames(60, 7)) {
      const { frame, acceleration } = drawn;
      if (!yields(drawn)) {
        if (frame.storeys.some(({ damper }) => damper !== undefined)) continue;
        expect(at(drawn, 1).energy.imbalance).toBeLessThan(1e-8);
        elastic++;
        continue;
      }
      const { storeys, energy } = run(frame, acceleration, prepared(frame).modes[0].period / 4, OPTIONS);
      const ductility = Math.max(...storeys.ductility);
      // Ductilities of buildings: what hardly yields is nearly elastic, what yields without end is no building.
      if (!(ductility > 1.5 && ductility < 20)) continue;
      yielded++;
      if (energy.imbalance > 0.02) over++;
    }
    expect(yielded).toBeGreaterThan(15);
    expect(over / yielded).toBeGreaterThan(0.75);
    expect(elastic).toBeGreaterThan(5);
  });
});
