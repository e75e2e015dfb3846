import { describe, expect, it } from 'vitest';
import { lawPath } from '../../../src/core/dynamics/laws/path.ts';
import { stepLimit } from '../../../src/core/dynamics/steps.ts';
import type { Law } from '../../../src/core/frame/frame.ts';
import { prepared, shearFrame } from '../../support/frames.ts';

const K = 1e8;
const CENTRAL = { kind: 'central-difference' } as const;

function oneStorey(law: Law) {
  const frame = shearFrame([1e5], [K]);
  return prepared({ ...frame, storeys: frame.storeys.map((storey) => ({ ...storey, law })) });
}

describe('[FRM-3] how much stiffer a storey can get', () => {
  it('is the slope that Bouc-Wen unloads at from its strength', () => {
    for (const [beta, hardening] of [
      [0.5, 0],
      [0.8, 0.05],
      [2, 0.1],
    ]) {
      const law: Law = { kind: 'bouc-wen', strength: 1e6, hardening, exponent: 2, beta, gamma: 1 - beta };
      const [far, back] = [0.5, 0.5 - 1e-7];
      const [high, low] = lawPath(law, K, Float64Array.of(far, back));
      expect(oneStorey(law).stiffening).toBeCloseTo((high - low) / (far - back) / K, 3);
    }
  });

  it('shortens the largest stable step by its square root, and is 1 for every other law', () => {
    const elastic = stepLimit(oneStorey({ kind: 'elastic' }), CENTRAL) ?? 0;
    const steep: Law = { kind: 'bouc-wen', strength: 1e6, hardening: 0, exponent: 1, beta: 2, gamma: -1 };
    expect(stepLimit(oneStorey(steep), CENTRAL)).toBeCloseTo(elastic / 2, 9);
    for (const law of [
      { kind: 'bilinear', strength: 1e6, hardening: 0.02 },
      { kind: 'peak-oriented', strength: 1e6, hardening: 0.02 },
      { kind: 'flag', strength: 1e6, hardening: 0.02, ratio: 0.5 },
    ] as const)
      expect(oneStorey(law).stiffening).toBe(1);
  });
});
