import { describe, expect, it } from 'vitest';
import { contentOf, ENERGY_PARTS, TIME_PANELS, valueAt } from '../../../src/ui/strip/panelContent.ts';
import { noise, run, shearFrame } from '../../support/frames.ts';

const HEIGHT = 3.2;
const frame = shearFrame([2e5, 2e5, 1.5e5], [2e8, 1.6e8, 1.2e8], { kind: 'modal', ratios: [0.05] }, HEIGHT);
const result = run(frame, noise(5, 1500), 0.01, { histories: true, tail: 2 });
const heights = [HEIGHT, HEIGHT, HEIGHT];

describe('contentOf', () => {
  it('shows histories whose largest values are the peaks of the run, at the times of the run', () => {
    for (const storey of [0, 1, 2]) {
      const drift = contentOf('drift', result, storey, heights);
      expect(drift).not.toBeNull();
      if (drift === null) continue;
      expect(Math.max(...drift.values.map(Math.abs))).toBeCloseTo(result.storeys.peakDriftRatio[storey], 14);
      expect(Math.abs(valueAt(drift.values, drift.interval, drift.peak.time))).toBeCloseTo(drift.peak.value, 14);
      const shear = contentOf('storey-shear', result, storey, heights);
      expect(shear?.peak.value).toBe(result.storeys.peakShear[storey]);
      expect(Math.abs(valueAt(shear?.values ?? new Float64Array(), 0.01, shear?.peak.time ?? 0))).toBeCloseTo(
        result.storeys.peakShear[storey],
        3,
      );
    }
  });

  it('stacks the energies up to the input, as far apart as the run says', () => {
    const energy = contentOf('energy', result, 0, heights);
    const top = energy?.stack.at(-1)?.sum ?? new Float64Array();
    const { input } = result.histories?.energy ?? { input: new Float64Array() };
    let [apart, largest] = [0, 0];
    for (let j = 0; j < input.length; j++) {
      largest = Math.max(largest, Math.abs(input[j]));
      apart = Math.max(apart, Math.abs(input[j] - top[j]));
    }
    expect(energy?.stack.map(({ part }) => part)).toEqual(ENERGY_PARTS.filter((part) => result.energy[part] !== 0));
    expect(apart / largest).toBeLessThan(2 * result.energy.imbalance + 1e-12);
    expect(apart).toBeGreaterThan(0);
  });

  it('says where P-Delta takes the strain energy below zero, as in a collapse', () => {
    const falling = {
      ...frame,
      pDelta: true,
      storeys: frame.storeys.map((storey) => ({
        ...storey,
        law: { kind: 'bilinear' as const, strength: 6e4, hardening: 0 },
      })),
    };
    const collapse = run(falling, noise(5, 1500), 0.01, { histories: true, scale: 3 });
    expect(collapse.ending).not.toBeNull();
    const { strain, input } = collapse.histories?.energy ?? { strain: new Float64Array(), input: new Float64Array() };
    const share = -Math.min(...strain) / Math.max(...input.map(Math.abs));
    expect(share).toBeGreaterThan(0.01);
    expect(contentOf('energy', collapse, 0, heights)?.strainBelowZero).toBeCloseTo(share, 12);
    expect(contentOf('energy', result, 0, heights)?.strainBelowZero).toBe(0);
  });

  it('shows an isolator by its displacement, the storeys above it by their drift ratio', () => {
    const isolator = contentOf('drift', result, 0, heights, true);
    expect(isolator?.quantity).toBe('displacement');
    expect(isolator?.peak.value).toBe(result.storeys.peakDrift[0]);
    expect(contentOf('drift', result, 1, heights, true)?.quantity).toBe('percent');
  });

  it('stacks hysteretic work and dampers of a frame that yields, in that order under strain and kinetic', () => {
    const yielding = {
      ...frame,
      storeys: frame.storeys.map((storey) => ({
        ...storey,
        law: { kind: 'bilinear' as const, strength: 3e5, hardening: 0.02 },
        damper: { coefficient: 5e5, exponent: 0.5 },
      })),
    };
    const hard = run(yielding, noise(5, 1500), 0.01, { histories: true, scale: 2 });
    const energy = contentOf('energy', hard, 0, heights);
    expect(energy?.stack.map(({ part }) => part)).toEqual(['hysteretic', 'damping', 'dampers', 'strain', 'kinetic']);
    const ends = energy?.stack.map(({ sum }) => sum.at(-1) ?? 0) ?? [];
    expect(ends[0]).toBeCloseTo(
      hard.storeys.dissipated.reduce((sum, work) => sum + work, 0),
      3,
    );
    expect(ends[2] - ends[1]).toBeCloseTo(
      hard.storeys.damperWork.reduce((sum, work) => sum + work, 0),
      3,
    );
  });

  it('has nothing for a run without histories, for no storey, for another building', () => {
    for (const { kind } of TIME_PANELS) {
      expect(contentOf(kind, { ...result, histories: null }, 0, heights)).toBeNull();
      expect(contentOf(kind, result, -1, heights)).toBeNull();
      expect(contentOf(kind, result, 0, [HEIGHT])).toBeNull();
    }
  });
});
