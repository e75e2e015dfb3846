import fc from 'fast-check';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { dampingMatrix } from '../../../src/core/frame/damping.ts';
import { prepareFrame } from '../../../src/core/frame/prepare.ts';
import { anyFrame, prepared, shearFrame } from '../../support/frames.ts';

describe('[FRM-1] modes', () => {
  test('are those of the library eigenvalue solver on M^-1/2 K M^-1/2', () => {
    fc.assert(
      fc.property(anyFrame, (frame) => {
        const { modes, arrays } = prepared(frame);
        const { n, mass, stiffness: k } = arrays;
        const a = Matrix.zeros(n, n);
        for (let i = 0; i < n; i++) {
          a.set(i, i, (k[i] + (i + 1 < n ? k[i + 1] : 0)) / mass[i]);
          if (i === 0) continue;
          const off = -k[i] / Math.sqrt(mass[i] * mass[i - 1]);
          a.set(i, i - 1, off);
          a.set(i - 1, i, off);
        }
        const squares = new EigenvalueDecomposition(a, { assumeSymmetric: true }).realEigenvalues;
        for (const [r, mode] of modes.entries()) expect(mode.frequency ** 2 / squares[r]).toBeCloseTo(1, 8);
      }),
    );
  });

  // Invariant 10: sum of effective masses, sum of Gamma phi, orthogonality.
  test('effective masses sum to the mass, Gamma phi to one at each floor; shapes are orthogonal', () => {
    fc.assert(
      fc.property(anyFrame, (frame) => {
        const { modes, arrays } = prepared(frame);
        const { n, mass } = arrays;
        const total = mass.reduce((a, b) => a + b, 0);
        const effective = modes.reduce((sum, mode) => sum + mode.effectiveMass, 0);
        expect(effective / total).toBeCloseTo(1, 9);
        for (let i = 0; i < n; i++)
          expect(modes.reduce((sum, { participation, shape }) => sum + participation * shape[i], 0)).toBeCloseTo(1, 8);
        const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, x, i) => sum + mass[i] * x * b[i], 0);
        for (let r = 0; r < n; r++) {
          for (let s = 0; s < r; s++) {
            const [a, b] = [modes[r].shape, modes[s].shape];
            expect(Math.abs(dot(a, b)) / Math.sqrt(dot(a, a) * dot(b, b))).toBeLessThan(1e-9);
          }
        }
      }),
    );
  });

  // Invariant 11.
  test('more stiffness raises or keeps every frequency, more mass lowers or keeps it', () => {
    fc.assert(
      fc.property(anyFrame, fc.nat(7), fc.double({ min: 1.01, max: 3, noNaN: true }), (frame, which, factor) => {
        const at = which % frame.storeys.length;
        const change = (key: 'mass' | 'stiffness') => ({
          ...frame,
          storeys: frame.storeys.map((s, i) => (i === at ? { ...s, [key]: s[key] * factor } : s)),
        });
        const before = prepared(frame).modes;
        const [stiffer, heavier] = [prepared(change('stiffness')).modes, prepared(change('mass')).modes];
        for (const [r, mode] of before.entries()) {
          expect(stiffer[r].frequency).toBeGreaterThanOrEqual(mode.frequency * (1 - 1e-12));
          expect(heavier[r].frequency).toBeLessThanOrEqual(mode.frequency * (1 + 1e-12));
        }
      }),
    );
  });

  test('a stiffness that is not above zero is refused, not looped on', () => {
    for (const k of [0, -1, Number.NaN]) expect(() => prepared(shearFrame([1, 1], [1, k]))).toThrow();
    expect(() => prepared(shearFrame([1, Number.NaN], [1, 1]))).toThrow(RangeError);
  });
});

describe('[FRM-2] damping', () => {
  // D3: the ratios asked for come back, and nothing stands off the diagonal of phi' C phi.
  test('modal damping rebuilt as a matrix gives back its ratios', () => {
    const frame = shearFrame([3, 2, 1], [300, 200, 100], { kind: 'modal', ratios: [0.02, 0.05] });
    const { arrays, modes, damping } = prepared(frame);
    if (damping.kind !== 'full') throw new Error('full');
    expect(Array.from(damping.ratios)).toEqual([0.02, 0.05, 0.05]);
    const n = 3;
    const c = new Float64Array(n * n);
    for (const [r, { shape, frequency }] of modes.entries()) {
      const modalMass = shape.reduce((sum, x, i) => sum + arrays.mass[i] * x * x, 0);
      for (let i = 0; i < n; i++)
        for (let j = 0; j < n; j++)
          c[i * n + j] +=
            ((2 * damping.ratios[r] * frequency) / modalMass) * arrays.mass[i] * shape[i] * shape[j] * arrays.mass[j];
    }
    for (const [r, a] of modes.entries()) {
      for (const [s, b] of modes.entries()) {
        let work = 0;
        for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) work += a.shape[i] * c[i * n + j] * b.shape[j];
        const modalMass = a.shape.reduce((sum, x, i) => sum + arrays.mass[i] * x * x, 0);
        expect(work / (2 * a.frequency * modalMass)).toBeCloseTo(r === s ? damping.ratios[r] : 0, 12);
      }
    }
  });

  test('with P-Delta the ratios are exact in the frame that vibrates', () => {
    const frame = shearFrame(
      [3e5, 2e5],
      [1e8, 0.6e8],
      { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.03] },
      3,
      true,
    );
    const { dampingRatios, modes } = prepared(frame);
    expect(dampingRatios[0]).toBeCloseTo(0.05, 12);
    expect(dampingRatios[1]).toBeCloseTo(0.03, 12);
    expect(modes[0].period).toBeGreaterThan(prepared({ ...frame, pDelta: false }).modes[0].period);
  });

  test('damping that comes out below zero in a mode is refused with the mode named', () => {
    const result = prepareFrame(
      shearFrame([1, 1, 1, 1], [100, 100, 100, 100], { kind: 'rayleigh', modes: [1, 2], ratios: [0.2, 0.01] }),
    );
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.faults[0].message).toMatch(/mode 3/);
  });

  test('a mode that is not there is a caller error', () => {
    const { arrays, modes } = prepared(shearFrame([1, 1], [1, 1]));
    expect(() => dampingMatrix({ kind: 'stiffness-proportional', mode: 3, ratio: 0.05 }, arrays, modes)).toThrow(
      RangeError,
    );
  });
});
