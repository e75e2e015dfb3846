import { describe, expect, test } from 'vitest';
import type { Frame } from '../../src/core/frame/frame.ts';
import { harmonic, histories, largest } from '../support/oneStorey.ts';

// Den Hartog, Mechanical Vibrations, section 3.3 (from memory): an undamped mass under a harmonic force, with a tuned mass of mu x its mass:
// best tuning f = 1 / (1 + mu) and damping zeta = sqrt(3 mu / (8 (1 + mu)^3)), the largest amplification then sqrt(1 + 2 / mu), the mean of two
// peaks, 1 %. Ground displacement acts on the mass through its storey as a force k xg does, so its amplification is that of total
// acceleration over ground acceleration. The tuned mass is one more storey with a linear damper.
const MU = 0.05;
const W = 2 * Math.PI;
const M = 1e5;

function withTunedMass(f: number, zeta: number): Frame {
  const tuned = { mass: MU * M, frequency: f * W };
  return {
    storeys: [
      { name: 'Storey', height: 3, mass: M, stiffness: M * W ** 2, law: { kind: 'elastic' } },
      {
        name: 'Tuned mass',
        height: 1,
        mass: tuned.mass,
        stiffness: tuned.mass * tuned.frequency ** 2,
        law: { kind: 'elastic' },
        damper: { coefficient: 2 * zeta * tuned.mass * tuned.frequency, exponent: 1 },
      },
    ],
    damping: { kind: 'none' },
    pDelta: false,
  };
}

describe('K6 tuned mass under a harmonic ground motion', () => {
  const f = 1 / (1 + MU);
  const zeta = Math.sqrt((3 * MU) / (8 * (1 + MU) ** 3));

  /** Amplification of the mass at g x its frequency; Den Hartog's closed form. */
  function closedForm(g: number): number {
    const c = (2 * zeta * f * g) ** 2;
    const own = g * g - f * f;
    const below = c * (g * g - 1 + MU * g * g) ** 2 + (MU * f * f * g * g - (g * g - 1) * own) ** 2;
    return Math.sqrt((c + own * own) / below);
  }

  function marched(g: number): number {
    const [cycle, parts] = [40, 8];
    const interval = (2 * Math.PI) / (g * W) / cycle;
    const ground = harmonic(0.1, g * W, interval, 60 * cycle + 1, 10);
    const { histories: h } = histories(withTunedMass(f, zeta), ground, interval, { step: { parts } });

    return largest(h.acceleration, h.count - 2 * parts * cycle, h.count) / 0.1;
  }

  test('tuning and damping for a twentieth of the mass', () => {
    expect(f).toBeCloseTo(0.952, 3);
    expect(zeta).toBeCloseTo(0.127, 3);
  });

  test('amplification follows the closed form over the frequencies, its largest value sqrt(1 + 2 / mu)', () => {
    let most = 0;
    for (let g = 0.7; g < 1.21; g += 0.02) {
      const amplification = marched(g);
      expect(Math.abs(amplification / closedForm(g) - 1), `g = ${g}: ${amplification}`).toBeLessThan(3e-3);
      most = Math.max(most, amplification);
    }
    expect(Math.abs(most / Math.sqrt(1 + 2 / MU) - 1)).toBeLessThan(0.01);
  });
});

// Warburton (1982), Earthq. Eng. Struct. Dyn. 10, 381-401 (from memory): least variance of the mass's displacement under white-noise base
// acceleration at f = sqrt(1 - mu / 2) / (1 + mu), zeta = sqrt(mu (1 - mu / 4) / (4 (1 + mu) (1 - mu / 2))). The variance under white noise is in
// proportion to the integral of the squared response to a short push.
test('K6 tuned mass under a base acceleration: least squared response where the closed form says', () => {
  const best = Math.sqrt(1 - MU / 2) / (1 + MU);
  const damping = Math.sqrt((MU * (1 - MU / 4)) / (4 * (1 + MU) * (1 - MU / 2)));
  const squared = (f: number, zeta: number) => {
    const push = new Float64Array([1, 0]);
    const { histories: h } = histories(withTunedMass(f, zeta), push, 0.01, { step: { parts: 1 }, tail: 60 });
    return h.displacement.subarray(0, h.count).reduce((sum, u) => sum + u * u, 0);
  };
  /** Where the parabola through the values at -1, 0 and 1 is least. */
  const lowest = ([below, at, above]: readonly number[]) => (below - above) / (2 * (below - 2 * at + above));
  const byTuning = [-1, 0, 1].map((side) => squared(best * (1 + 0.02 * side), damping));
  const byDamping = [-1, 0, 1].map((side) => squared(best, damping * (1 + 0.1 * side)));
  expect(Math.min(...byTuning)).toBe(byTuning[1]);
  expect(Math.min(...byDamping)).toBe(byDamping[1]);
  expect(Math.abs(0.02 * lowest(byTuning))).toBeLessThan(2e-3);
  expect(Math.abs(0.1 * lowest(byDamping))).toBeLessThan(1e-2);
});
