import { describe, expect, it } from 'vitest';
import { MARK, marksAt, poseAt } from '../../../src/ui/sheet/cursor.ts';
import { noise, run, shearFrame } from '../../support/frames.ts';

const zero = new Float64Array(3);
const histories = {
  every: 2,
  count: 3,
  ground: zero,
  displacement: Float64Array.of(0, 0.1, -0.3, 0, 0.2, -0.6),
  shear: new Float64Array(6),
  acceleration: new Float64Array(6),
  energy: { input: zero, kinetic: zero, strain: zero, damping: zero, dampers: zero, hysteretic: zero },
  nonlinear: null,
};

describe('the frame at the cursor', () => {
  it('stands on the kept entries and straight between them', () => {
    const pose = poseAt(histories, 0.005, 0.01, new Float64Array(2));
    expect([...pose]).toEqual([0.1, 0.2]);
    const between = poseAt(histories, 0.005, 0.015, pose);
    expect(between).toBe(pose);
    expect(between[0]).toBeCloseTo(-0.1, 12);
    expect(between[1]).toBeCloseTo(-0.2, 12);
  });

  it('stays on the last entry past the end, on the first before the start', () => {
    expect([...poseAt(histories, 0.005, 99, new Float64Array(0))]).toEqual([-0.3, -0.6]);
    expect([...poseAt(histories, 0.005, -1, new Float64Array(0))]).toEqual([0, 0]);
  });
});

describe('marks of yielding at the cursor', () => {
  const elastic = shearFrame([2e5, 2e5, 2e5], [8e7, 8e7, 8e7], { kind: 'modal', ratios: [0.03] });
  const law = { kind: 'bilinear', strength: 4e5, hardening: 0.05 } as const;
  const frame = { ...elastic, storeys: elastic.storeys.map((storey, i) => (i === 1 ? storey : { ...storey, law })) };
  const whole = run(frame, noise(5, 400), 0.01, { histories: true });
  const { histories, storeys, step } = whole;
  const yielding = histories?.nonlinear?.yielding ?? new Uint8Array(0);
  const count = histories?.count ?? 0;

  it('none before a storey yields, filled while it is past yield, open after', () => {
    expect(storeys.firstYield[0]).toBeGreaterThan(0);
    const seen = new Set<number>();
    for (let j = 0; j < count; j++) {
      const marks = marksAt(whole, j * step, new Uint8Array(3));
      const past = yielding[j] === 1;
      expect(marks[0]).toBe(past ? MARK.yielding : j * step >= storeys.firstYield[0] ? MARK.yielded : MARK.none);
      expect(marks[1]).toBe(MARK.none);
      seen.add(marks[0]);
    }
    expect([...seen].sort()).toEqual([MARK.none, MARK.yielded, MARK.yielding]);
  });

  it('without histories: marked where it yields at any time', () => {
    expect([...marksAt({ ...whole, histories: null }, 0, new Uint8Array(0))]).toEqual([
      MARK.yielded,
      MARK.none,
      Number.isNaN(storeys.firstYield[2]) ? MARK.none : MARK.yielded,
    ]);
  });
});
