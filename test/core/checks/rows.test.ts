import { describe, expect, test } from 'vitest';
import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import { governingRow } from '../../../src/core/checks/governingRow.ts';
import { residualRatios } from '../../../src/core/checks/residualRatio.ts';
import { verdictOf } from '../../../src/core/checks/verdict.ts';
import type { Frame } from '../../../src/core/frame/frame.ts';
import { noise, run, shearFrame } from '../../support/frames.ts';

const plain = shearFrame([3e5, 2e5, 2e5], [0.4e8, 1.2e8, 0.9e8], { kind: 'modal', ratios: [0.05] });
const isolated: Frame = {
  ...plain,
  storeys: plain.storeys.map((storey, i) => (i === 0 ? { ...storey, role: 'isolator' } : storey)),
};
const runs = [1, 2, 3].map((seed) => ({ motion: `M${seed}`, run: run(isolated, noise(seed, 400), 0.01) }));

describe('[CHK-3] the row that governs', () => {
  test('is the isolator where it is nearer to its own limit than any storey, as the verdict says', () => {
    let cases = 0;
    for (const isolator of [0.001, 0.02, 0.3, 5]) {
      const envelope = envelopeOf(runs, { drift: 0.01, isolator, source: '' }, [], isolated);
      const row = governingRow(envelope);
      const named = verdictOf(envelope, runs).headline;
      expect(named).toMatch(row === 0 ? /^The isolator governs/ : new RegExp(`^Storey ${row + 1} governs`));
      cases += row === 0 ? 1 : 0;
    }
    expect(cases).toBeGreaterThan(0);
    expect(cases).toBeLessThan(4);
  });

  test('is the governing storey without an isolator or a limit of it', () => {
    const envelope = envelopeOf(runs, { drift: 0.01, source: '' }, [], isolated);
    expect(governingRow(envelope)).toBe(envelope.governingStorey);
    expect(governingRow(envelope)).toBeGreaterThan(0);
  });
});

test('[CHK-1] residual drift over the height, of the statistic that is compared', () => {
  const envelope = envelopeOf(runs, { drift: 0.01, measure: 'median', source: '' }, [], plain);
  const ratios = residualRatios(envelope, plain);
  plain.storeys.forEach(({ height }, i) => {
    const sorted = runs.map((one) => Math.abs(one.run.storeys.residualDrift[i])).sort((a, b) => a - b);
    expect(ratios?.[i]).toBe(sorted[1] / height);
  });
  expect(residualRatios({ ...envelope, residualDrift: null }, plain)).toBeNull();
});
