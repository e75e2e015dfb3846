import { expect, test } from 'vitest';
import { histories, oneStorey } from '../support/oneStorey.ts';

// Coulomb friction F beside a spring k: the frequency is that of the spring, the amplitude falls by 4 F / k a cycle, and the mass
// stops where |u| <= F / k. Chopra, Dynamics of Structures, section 2.4 (from memory). Here friction is a bilinear storey whose
// post-yield stiffness is the spring, its initial stiffness 1000 times that; tolerance 1 %.
test('a storey of spring and friction dies down by 4 F / k a cycle', () => {
  const k = 400;
  const F = 6;
  const hardening = 1e-3;
  const mass = 1;
  const period = 2 * Math.PI * Math.sqrt(mass / k);
  const law = { kind: 'bilinear', strength: F / (1 - hardening), hardening } as const;
  const frame = oneStorey({ mass, stiffness: k / hardening, law });
  // A push of a quarter period, then eight periods of free vibration.
  const interval = period / 100;
  const push = Float64Array.from({ length: 26 }, (_, i) => (i < 25 ? -60 : 0));
  const { histories: h, storeys } = histories(frame, push, interval, { step: { parts: 40 }, tail: 8 * period });
  const step = h.every * (interval / 40);
  const u = h.displacement;
  const turns: { readonly at: number; readonly u: number }[] = [];
  for (let i = 25 * 40; i + 1 < h.count; i++) {
    // Tremors on the steep elastic line, once it has stopped, are no swings.
    if ((u[i] - u[i - 1]) * (u[i + 1] - u[i]) < 0 && Math.abs(u[i] - (turns.at(-1)?.u ?? 0)) > F / k)
      turns.push({ at: i * step, u: u[i] });
  }
  expect(turns.length).toBeGreaterThanOrEqual(5);
  for (let i = 1; i < turns.length; i++) {
    const fall = Math.abs(turns[i - 1].u) - Math.abs(turns[i].u);
    expect(Math.abs(fall / ((2 * F) / k) - 1), `half cycle ${i}: falls by ${fall}`).toBeLessThan(0.01);
  }
  const half = (turns[turns.length - 1].at - turns[0].at) / (turns.length - 1);
  expect(Math.abs(half / (period / 2) - 1), `half cycles take ${half} s`).toBeLessThan(0.01);
  const stop = Math.abs(storeys.residualDrift[0]);
  expect(stop).toBeLessThan((1.01 * F) / k);
  expect(Math.abs(stop - Math.abs(turns.at(-1)?.u ?? 0))).toBeLessThan((0.01 * F) / k);
});
