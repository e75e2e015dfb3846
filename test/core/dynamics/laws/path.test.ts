import { describe, expect, test } from 'vitest';
import { backbone, lawPath, typicalCycle } from '../../../../src/core/dynamics/laws/path.ts';
import type { Law } from '../../../../src/core/frame/frame.ts';

const K = 2.5e7;
const XY = 0.016;
const strength = K * XY;
const bilinear: Law = { kind: 'bilinear', strength, hardening: 0.1 };

describe('[LAW-6] force along a path', () => {
  test('is the law at each drift, from the virgin state', () => {
    const force = lawPath(bilinear, K, Float64Array.of(XY / 2, 3 * XY, 2 * XY, 0));
    const expected = [0.5, 1.2, 0.2, -0.9];
    for (let i = 0; i < 4; i++) expect(force[i] / strength).toBeCloseTo(expected[i], 12);
  });

  test('the backbone goes from zero through the yield point to the ductility', () => {
    const { drift, force } = backbone(bilinear, K, 4);
    expect([drift[0], force[0]]).toEqual([0, 0]);
    const at = drift.findIndex((d) => d >= XY * (1 - 1e-9));
    expect(drift[at] / XY).toBeCloseTo(1, 12);
    expect(force[at] / strength).toBeCloseTo(1, 12);
    expect(drift[drift.length - 1] / XY).toBeCloseTo(4, 12);
    expect(force[force.length - 1] / strength).toBeCloseTo(1.3, 12);
  });

  test.each<Law>([
    { kind: 'elastic' },
    bilinear,
    { kind: 'peak-oriented', strength, hardening: 0 },
    { kind: 'flag', strength, hardening: 0.1, ratio: 0.9 },
    { kind: 'bouc-wen', strength, hardening: 0.1, exponent: 1.4, beta: 0.6, gamma: 0.4 },
  ])('$kind: the growing cycles reach the ductility both ways, in steps fine enough to draw', (law) => {
    for (const ductility of [0.5, 4, 60]) {
      const unit = law.kind === 'elastic' ? 1 : XY;
      const { drift, force } = typicalCycle(law, K, ductility);
      expect(force.length).toBe(drift.length);
      expect(Math.max(...drift) / unit).toBeCloseTo(ductility, 12);
      expect(Math.min(...drift) / unit).toBeCloseTo(-ductility, 12);
      const most = Math.max(...force);
      for (let i = 1; i < force.length; i++) {
        expect(Math.abs(drift[i] - drift[i - 1])).toBeLessThanOrEqual(
          unit * Math.max(0.0251, (2 * ductility) / 400 + 1e-9),
        );
        expect(Number.isFinite(force[i])).toBe(true);
      }
      expect(most).toBeGreaterThan(0);
    }
  });
});
