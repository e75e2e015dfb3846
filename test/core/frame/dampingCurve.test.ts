import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { dampingCurve, wantedRatios } from '../../../src/core/frame/dampingCurve.ts';
import type { Damping } from '../../../src/core/frame/frame.ts';
import { anyFrame, prepared, shearFrame } from '../../support/frames.ts';

const frame = shearFrame([2e5, 2e5, 1.5e5], [2e8, 1.6e8, 1.2e8]);
const { modes } = prepared(frame);
const periods = modes.map(({ period }) => period);

describe('[FRM-2] damping by period', () => {
  test('goes through the ratio that each mode of the frame gets from its matrix', () => {
    let curves = 0;
    fc.assert(
      fc.property(anyFrame, (any) => {
        const { modes: own, dampingRatios } = prepared(any);
        const at = own.map(({ period }) => period);
        const curve = dampingCurve(any.damping, own, at);
        if (curve === null) {
          expect(any.damping.kind).toBe('modal');
          return;
        }
        curves++;
        for (let r = 0; r < own.length; r++) expect(curve[r]).toBeCloseTo(dampingRatios[r], 9);
      }),
    );
    expect(curves).toBeGreaterThan(30);
  });

  test('Rayleigh: the ratios asked for in its two modes, the least between them where a0 T / (4 pi) = pi a1 / T', () => {
    const damping: Damping = { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.03] };
    const [w1, w3] = [modes[0].frequency, modes[2].frequency];
    const curve = dampingCurve(damping, modes, periods) ?? [];
    expect(curve[0]).toBeCloseTo(0.05, 12);
    expect(curve[2]).toBeCloseTo(0.03, 12);
    // The two conditions solved by Cramer's rule, apart from the code under test.
    const det = w3 / (4 * w1) - w1 / (4 * w3);
    const a0 = ((0.05 * w3) / 2 - (0.03 * w1) / 2) / det;
    const a1 = (0.03 / (2 * w1) - 0.05 / (2 * w3)) / det;
    const least = 2 * Math.PI * Math.sqrt(a1 / a0);
    const near = dampingCurve(damping, modes, [0.97 * least, least, 1.03 * least]) ?? [];
    expect(near[1]).toBeCloseTo(Math.sqrt(a0 * a1), 12);
    expect(Math.min(near[0], near[2])).toBeGreaterThan(near[1]);
  });

  test('stiffness-proportional: falls with the period, half the ratio at twice the period', () => {
    const damping: Damping = { kind: 'stiffness-proportional', mode: 1, ratio: 0.04 };
    const curve = dampingCurve(damping, modes, [periods[0], 2 * periods[0]]);
    expect(curve?.[0]).toBeCloseTo(0.04, 12);
    expect(curve?.[1]).toBeCloseTo(0.02, 12);
  });

  test('none is zero at any period; modal has no curve; a mode that is not there is named', () => {
    expect(dampingCurve({ kind: 'none' }, modes, [0.1, 1])).toEqual(new Float64Array(2));
    expect(dampingCurve({ kind: 'modal', ratios: [0.05] }, modes, [0.1])).toBeNull();
    const far: Damping = { kind: 'stiffness-proportional', mode: 4, ratio: 0.04 };
    expect(() => dampingCurve(far, modes, [0.1])).toThrow('mode 4, expected 1 to 3');
  });

  test('wanted ratios are named once each', () => {
    expect(wantedRatios({ kind: 'none' })).toEqual([]);
    expect(wantedRatios({ kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] })).toEqual([0.05]);
    expect(wantedRatios({ kind: 'modal', ratios: [0.05, 0.03, 0.05] })).toEqual([0.05, 0.03]);
    expect(wantedRatios({ kind: 'stiffness-proportional', mode: 1, ratio: 0.02 })).toEqual([0.02]);
  });
});
