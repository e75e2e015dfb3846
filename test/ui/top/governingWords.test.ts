import { expect, test } from 'vitest';
import { type Envelope, envelopeOf } from '../../../src/core/checks/envelope.ts';
import { verdictOf } from '../../../src/core/checks/verdict.ts';
import { governingWords } from '../../../src/ui/top/governingWords.ts';

const blank = envelopeOf([], { drift: 0.015, factor: 1, source: '' }, [], { storeys: [] });
const drift = { mean: new Float64Array(2), median: new Float64Array(2), max: new Float64Array(2) };
const statistic = { ...drift, governing: new Int32Array(2) } as unknown as NonNullable<Envelope['drift']>;
const isolated = (isolator: number | null, storey: number): Envelope => ({
  ...blank,
  drift: statistic,
  ratio: Float64Array.of(Number.NaN, storey),
  governingStorey: 1,
  isolator: { limit: 0.3, ratio: isolator },
});

test('the bar names what the verdict names', () => {
  expect(governingWords(isolated(1.72, 0.35))).toEqual({ words: 'isolator at 1.72', over: true });
  expect(verdictOf(isolated(1.72, 0.35), []).headline).toMatch(/^The isolator governs: 1\.72 /);
  expect(governingWords(isolated(0.3, 0.35))).toEqual({ words: 'storey 2 at 0.35', over: false });
  expect(governingWords(isolated(null, 1.2))).toEqual({ words: 'storey 2 at 1.20', over: true });
  expect(governingWords({ ...isolated(1, 1), incomplete: ['A', 'B'] })).toEqual({
    words: '2 did not finish',
    over: true,
  });
  expect(governingWords({ ...blank, ratio: null, governingStorey: -1 })).toEqual({ words: '', over: false });
});
