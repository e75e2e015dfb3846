import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cautionsOf } from '../../../src/core/checks/cautions.ts';
import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import type { Limits } from '../../../src/core/checks/limits.ts';
import { statisticOf } from '../../../src/core/checks/statistic.ts';
import { verdictOf } from '../../../src/core/checks/verdict.ts';
import type { Analysis, Run } from '../../../src/core/dynamics/run.ts';
import { AVERAGE, noise, prepared, run, shearFrame } from '../../support/frames.ts';

const frame = shearFrame([3e5, 2e5, 2e5], [1.6e8, 1.2e8, 0.9e8], {
  kind: 'rayleigh',
  modes: [1, 2],
  ratios: [0.05, 0.05],
});
const limits: Limits = { drift: 0.01, source: 'a clause, design earthquake' };
const analysis: Analysis = { method: AVERAGE, step: { parts: 1 }, tail: 0, stopDrift: 0.1 };
const suite = (count: number, scale = 1) =>
  Array.from({ length: count }, (_, i) => ({
    motion: `M${i + 1}`,
    run: run(frame, noise(i + 1, 400), 0.01, { scale, tail: 20 }),
  }));
const failed = (base: Run): Run => ({ ...base, ending: { status: 'collapsed', storey: 1, time: 8.41 } });

describe('[CHK-1] the statistics of a suite', () => {
  // Invariant 17: mean <= max, min <= median <= max; one motion: all equal; the same motion twice: unchanged.
  test('keep their order, whatever the values', () => {
    let cases = 0;
    const rows = fc.array(fc.array(fc.double({ min: 0, max: 1e9, noNaN: true }), { minLength: 3, maxLength: 3 }), {
      minLength: 1,
      maxLength: 12,
    });
    fc.assert(
      fc.property(rows, (values) => {
        cases++;
        const { mean, median, max, governing } = statisticOf(values.map((row) => Float64Array.from(row)));
        for (let i = 0; i < 3; i++) {
          const column = values.map((row) => row[i]);
          expect(mean[i]).toBeLessThanOrEqual(max[i]);
          expect(median[i]).toBeLessThanOrEqual(max[i]);
          expect(median[i]).toBeGreaterThanOrEqual(Math.min(...column));
          expect(max[i]).toBe(Math.max(...column));
          expect(column[governing[i]]).toBe(max[i]);
          if (values.length === 1) expect([mean[i], median[i]]).toEqual([max[i], max[i]]);
        }
      }),
    );
    expect(cases).toBeGreaterThanOrEqual(100);
  });
  test('the median of an even number is the mean of the middle two', () => {
    expect(statisticOf([1, 9, 2, 4].map((x) => Float64Array.of(x))).median[0]).toBe(3);
  });
  test('the same motion twice changes nothing', () => {
    const [one] = suite(1);
    const [single, twice] = [envelopeOf([one], limits, [], frame), envelopeOf([one, one], limits, [], frame)];
    expect(twice.drift).toEqual(single.drift);
    expect(twice.ratio).toEqual(single.ratio);
  });
});

describe('[CHK-2] drift against its limit', () => {
  // EN 1998-1:2004 4.3.3.4.3(3): the mean from 7 motions on, the most unfavourable below.
  test('the mean from seven motions on, else the largest, unless the user says', () => {
    expect(envelopeOf(suite(6), limits, [], frame).measure).toBe('max');
    expect(envelopeOf(suite(7), limits, [], frame).measure).toBe('mean');
    expect(envelopeOf(suite(7), { ...limits, measure: 'median' }, [], frame).measure).toBe('median');
  });
  test('ratio = factor x measure / limit', () => {
    const runs = suite(3);
    const { ratio, drift } = envelopeOf(runs, { ...limits, factor: 0.5 }, [], frame);
    for (let i = 0; i < 3; i++) {
      const largest = Math.max(...runs.map((entry) => entry.run.storeys.peakDriftRatio[i]));
      expect(drift?.max[i]).toBe(largest);
      expect(ratio?.[i]).toBe((0.5 * largest) / 0.01);
    }
  });
  test('while a used motion is incomplete there is no statistic and no ratio, and it is named', () => {
    const runs = suite(3);
    const envelope = envelopeOf([runs[0], { ...runs[1], run: failed(runs[1].run) }, runs[2]], limits, ['X'], frame);
    expect(envelope).toMatchObject({
      incomplete: ['M2'],
      leftOut: ['X'],
      drift: null,
      ratio: null,
      shear: null,
      acceleration: null,
      governingStorey: -1,
    });
  });
});

describe('[CHK-3] the verdict', () => {
  test('names the governing storey, its ratio, the measure and the next', () => {
    const runs = suite(7);
    const envelope = envelopeOf(runs, limits, [], frame);
    const { headline, detail, over } = verdictOf(envelope, runs);
    expect(headline).toMatch(/^Storey \d governs: \d+\.\d\d\d? of the limit$/);
    expect(detail).toMatch(/^mean \d+\.\d\d %, limit 1\.00 %; next, storey \d at \d\.\d\d$/);
    expect(over).toBe((envelope.ratio?.[envelope.governingStorey] ?? 0) > 1);
  });
  test('shows the factored drift, and what was left out', () => {
    const runs = suite(2);
    const { headline, detail } = verdictOf(envelopeOf(runs, { ...limits, factor: 0.5 }, ['E'], frame), runs);
    expect(headline).toMatch(/, 2 of 3 motions$/);
    expect(detail).toMatch(/^largest .* × 0\.5 = .*; left out: E$/);
  });
  test('a motion that did not finish has the word', () => {
    const runs = suite(2);
    const broken = [runs[0], { motion: 'M2', run: failed(runs[1].run) }];
    const verdict = verdictOf(envelopeOf(broken, limits, [], frame), broken);
    expect(verdict.over).toBe(true);
    expect(verdict.headline).toBe('M2 did not finish');
    expect(verdict.detail).toMatch(/storey 2 .* at 8\.41 s/);
  });
});

describe('[CHK-4] cautions', () => {
  const codes = (
    runs: ReturnType<typeof suite>,
    more: Partial<Parameters<typeof cautionsOf>[0]> = {},
    limit: Partial<Limits> = {},
  ) =>
    cautionsOf({
      envelope: envelopeOf(runs, { ...limits, ...limit }, [], frame),
      limits: { ...limits, ...limit },
      analysis,
      prepared: prepared(frame),
      runs,
      motions: runs.map(({ motion }) => ({ name: motion, interval: 0.01 })),
      stepErrors: null,
      ...more,
    }).map(({ code, text }) => `${code}: ${text}`);
  const having = (list: string[], code: string) => list.filter((line) => line.startsWith(`${code}:`));

  test('a limit that is exceeded comes first, with storey and ratio; one that is met is silent', () => {
    const over = codes(suite(7, 40));
    expect(over[0]).toMatch(/^limit-exceeded: Limit exceeded: storey \d, \d+\.\d\d/);
    expect(having(codes(suite(7, 0.01)), 'limit-exceeded')).toEqual([]);
  });
  test('met on the mean while motions exceed it alone is said', () => {
    const runs = suite(7);
    const mean = Math.max(...(envelopeOf(runs, limits, [], frame).drift?.mean ?? []));
    expect(having(codes(runs, {}, { drift: mean * 1.0001 }), 'met-on-the-mean-only')[0]).toMatch(
      /Limit met on the mean of 7; \w+ motions? exceeds? it alone/,
    );
  });
  test('step error, imbalance and steps a period', () => {
    const runs = suite(1);
    expect(having(codes(runs, { stepErrors: { M1: 0.018 } }), 'step-error')).toEqual([
      'step-error: Step error 1.8 % in M1: halve the step',
    ]);
    expect(having(codes(runs, { stepErrors: { M1: 0.009 } }), 'step-error')).toEqual([]);
    const loose = [{ motion: 'M1', run: { ...runs[0].run, energy: { ...runs[0].run.energy, imbalance: 0.03 } } }];
    expect(having(codes(loose), 'imbalance').length).toBe(1);
    const coarse = [{ motion: 'M1', run: run(frame, noise(1, 400), 0.05) }];
    expect(having(codes(coarse), 'few-steps-a-period').length).toBe(1);
    expect(having(codes(runs), 'few-steps-a-period')).toEqual([]);
  });
  test('coarse interval, a cut-off end, a limit without source, a motion that did not finish', () => {
    const runs = suite(2);
    expect(
      having(codes(runs, { motions: [{ name: 'M1', interval: 0.02, lastOverPeak: 0.2 }] }), 'coarse-interval')[0],
    ).toMatch(/nothing above 25 Hz/);
    expect(
      having(codes(runs, { motions: [{ name: 'M1', interval: 0.005, lastOverPeak: 0.2 }] }), 'cut-off').length,
    ).toBe(1);
    expect(having(codes(runs, {}, { source: ' ' }), 'limit-without-source').length).toBe(1);
    expect(having(codes([runs[0], { motion: 'M2', run: failed(runs[1].run) }]), 'did-not-finish')[0]).toMatch(
      /M2 did not finish: storey 2/,
    );
  });
  test('a linear run far beyond its range says so; a frame that still moves at the end says so', () => {
    expect(having(codes(suite(1, 200)), 'beyond-linear').length).toBe(1);
    const short = [{ motion: 'M1', run: run(frame, noise(1, 400, 4000), 0.01) }];
    expect(having(codes(short), 'still-moving').length).toBe(1);
  });
  test('no caution ever says that the limit is passed', () => {
    for (const line of codes(suite(7, 40))) expect(line).not.toMatch(/pass(es|ed)? the limit/);
  });
});
