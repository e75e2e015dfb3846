import { describe, expect, it } from 'vitest';
import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import type { Frame, Law } from '../../../src/core/frame/frame.ts';
import type { Answers } from '../../../src/state/answers.ts';
import { type ProfileKind, profileOf } from '../../../src/ui/plots/profile.ts';
import { noise, run, shearFrame } from '../../support/frames.ts';

const law: Law = { kind: 'bilinear', strength: 3e5, hardening: 0.02 };
const base = shearFrame([2e5, 2e5, 2e5], [1.5e8, 1.2e8, 1e8], { kind: 'modal', ratios: [0.03] });

function answersOf(change: (frame: Frame) => Frame, factor: number): Answers {
  const frame = change(base);
  const runs = [3, 4].map((seed) => ({ motion: `M${seed}`, run: run(frame, noise(seed, 900), 0.01, { scale: 2 }) }));
  const limits = { drift: 0.015, factor, measure: 'mean' as const, source: '' };
  return { case: { frame }, runs, envelope: envelopeOf(runs, limits, [], frame) } as unknown as Answers;
}

const yielding = answersOf(
  (frame) => ({ ...frame, storeys: frame.storeys.map((s, i) => (i === 1 ? { ...s, law } : s)) }),
  0.5,
);

describe('profileOf', () => {
  it('shows drift as it is compared with the limit', () => {
    const profile = profileOf('profile', yielding);
    const { ratio } = yielding.envelope;
    for (let i = 0; i < 3; i++)
      expect((profile.suite?.[i] ?? 0) / (profile.limit ?? 0)).toBeCloseTo(ratio?.[i] ?? 0, 12);
    const alone = yielding.runs.map(({ run: one }) => profile.of(one)[2]);
    expect((alone[0] + alone[1]) / 2).toBeCloseTo(profile.suite?.[2] ?? 0, 12);
  });

  it('has a ductility only where a storey can yield', () => {
    const { suite, of } = profileOf('ductility', yielding);
    expect(suite?.[1]).toBeGreaterThan(1);
    expect(suite?.[0]).toBeNaN();
    expect(Array.from(of(yielding.runs[0].run)).filter(Number.isFinite)).toHaveLength(1);
  });

  it('shows residual drift over height, of magnitudes, without the factor', () => {
    const { suite, of, limit } = profileOf('residual', yielding);
    const { residualDrift } = yielding.runs[0].run.storeys;
    expect(of(yielding.runs[0].run)[1]).toBe(Math.abs(residualDrift[1]) / 3);
    const alone = yielding.runs.map(({ run: one }) => of(one)[1]);
    expect(suite?.[1]).toBeCloseTo((alone[0] + alone[1]) / 2, 12);
    expect(limit).toBeNull();
  });

  it('leaves an isolator out of drifts', () => {
    const isolated = answersOf(
      (frame) => ({
        ...frame,
        storeys: frame.storeys.map((s, i) => (i === 0 ? { ...s, role: 'isolator' as const } : s)),
      }),
      1,
    );
    for (const kind of ['profile', 'residual'] satisfies ProfileKind[]) {
      const { suite, of } = profileOf(kind, isolated);
      expect(suite?.[0]).toBeNaN();
      expect(of(isolated.runs[0].run)[0]).toBeNaN();
      expect(suite?.[1]).toBeGreaterThanOrEqual(0);
    }
  });
});
