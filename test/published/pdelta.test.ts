import { expect, test } from 'vitest';
import { prepareFrame } from '../../src/core/doors.ts';
import { shearFrame } from '../support/frames.ts';

// F2, closed form: a shear frame is stable under gravity if and only if P / h < k in every storey.
test('F2 the storey that gravity takes is named', () => {
  const frame = shearFrame([1000, 1000, 1000], [4e4, 4e4, 4e4], { kind: 'none' }, 3, true);
  const loaded = (top: number) => ({
    ...frame,
    storeys: frame.storeys.map((storey, i) => ({ ...storey, gravity: [4e4, 4e4, top][i] })),
  });
  expect(prepareFrame(loaded(3.99e4)).ok).toBe(true);
  const refused = prepareFrame(loaded(4.001e4));
  expect(refused.ok).toBe(false);
  if (!refused.ok) expect(refused.faults.map((fault) => fault.where)).toEqual(['frame.storeys[0].stiffness']);
});
