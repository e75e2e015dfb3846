import { describe, expect, it } from 'vitest';
import { poseAt } from '../../../src/ui/sheet/cursor.ts';

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
