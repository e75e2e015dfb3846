import { describe, expect, test } from 'vitest';
import type { Frame } from '../../src/core/frame/frame.ts';
import { prepared } from '../support/frames.ts';

// Naeim and Kelly (1999), Design of Seismic Isolated Structures, chapter 3 (from memory): a mass m on a storey over a base mb on an isolator,
// gamma = m / (m + mb), eps = (wb / ws)^2. w1 = wb sqrt(1 - gamma eps), w2 = ws sqrt((1 + gamma eps) / (1 - gamma)); participation of the
// modes in the isolator's displacement 1 - gamma eps and gamma eps. To first order in eps: 0.2 % at eps = 0.0225.
describe('K7 isolated frame', () => {
  const [m, mb, Ts, Tb] = [1e5, 3e4, 0.3, 2];
  const gamma = m / (m + mb);
  const eps = (Ts / Tb) ** 2;
  const [wb, ws] = [(2 * Math.PI) / Tb, (2 * Math.PI) / Ts];
  const frame: Frame = {
    storeys: [
      {
        name: 'Isolator',
        role: 'isolator',
        height: 0.5,
        mass: mb,
        stiffness: (m + mb) * wb ** 2,
        law: { kind: 'elastic' },
        damper: { coefficient: 2 * 0.1 * wb * (m + mb), exponent: 1 },
      },
      { name: 'Storey', height: 3, mass: m, stiffness: m * ws ** 2, law: { kind: 'elastic' } },
    ],
    damping: { kind: 'none' },
    pDelta: false,
  };
  const { modes } = prepared(frame);

  test('frequencies', () => {
    expect(eps).toBeCloseTo(0.0225, 12);
    expect(Math.abs(modes[0].frequency / (wb * Math.sqrt(1 - gamma * eps)) - 1)).toBeLessThan(2e-3);
    expect(Math.abs(modes[1].frequency / (ws * Math.sqrt((1 + gamma * eps) / (1 - gamma))) - 1)).toBeLessThan(2e-3);
  });

  test('participation', () => {
    const atIsolator = modes.map(({ participation, shape }) => participation * shape[0]);
    expect(Math.abs(atIsolator[0] - (1 - gamma * eps))).toBeLessThan(2e-3);
    expect(Math.abs(atIsolator[1] - gamma * eps)).toBeLessThan(2e-3);
    expect(Math.abs(modes[0].effectiveMassRatio - 1)).toBeLessThan(2e-3);
    expect(modes[1].effectiveMassRatio).toBeLessThan(2e-3);
  });
});
