import { expect, test } from 'vitest';
import { noise, run, shearFrame } from '../support/frames.ts';

// Uang and Bertero (1990), Earthq. Eng. Struct. Dyn. 19, 77-90: relative energy balance 1/2 v'Mv + int v'Cv + int f'dx = -int ag
// m'v dt; the absolute input, int sum(m a_total) dug, differs from the relative one by kinetic terms only:
// E_abs - E_rel = 1/2 M vg^2 + vg m'v.
test('K9 relative and absolute input energy differ by the kinetic terms, at every tenth of the run', () => {
  const masses = [3e5, 2e5, 1.5e5];
  const frame = shearFrame(masses, [1.5e8, 1.1e8, 0.6e8], { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.04] });
  const parts = 40;
  const interval = 0.02;
  const { histories, energy } = run(frame, noise(17, 500), interval, { step: { parts }, histories: true });
  if (!histories) throw new Error('no histories');
  const { count, ground, displacement, acceleration } = histories;
  const h = interval / parts;
  const total = masses.reduce((sum, m) => sum + m, 0);
  const row = (x: Float64Array, i: number, j: number) => x[i * count + j];
  let [vg, absolute, largest] = [0, 0, 0];
  let baseOld = 0;
  const v = [0, 0, 0];
  for (let j = 1; j < count; j++) {
    const vgNew = vg + (h / 2) * (ground[j - 1] + ground[j]);
    const dug = h * vg + ((h * h) / 6) * (2 * ground[j - 1] + ground[j]);
    let base = 0;
    let momentum = 0;
    for (let i = 0; i < 3; i++) {
      // Average acceleration: v = 2 du / h - v before.
      v[i] = (2 * (row(displacement, i, j) - row(displacement, i, j - 1))) / h - v[i];
      base += masses[i] * row(acceleration, i, j);
      momentum += masses[i] * v[i];
    }
    absolute += ((baseOld + base) / 2) * dug;
    baseOld = base;
    vg = vgNew;
    largest = Math.max(largest, absolute);
    if (j % Math.round(count / 10) === 0) {
      const kinetic = 0.5 * total * vg * vg + vg * momentum;
      expect(Math.abs(absolute - histories.energy.input[j] - kinetic)).toBeLessThan(2e-3 * largest);
    }
  }
  expect(energy.input).toBeGreaterThan(0);
  expect(energy.imbalance).toBeLessThan(1e-8);
});
