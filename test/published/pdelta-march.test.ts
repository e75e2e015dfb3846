import { describe, expect, test } from 'vitest';
import { run, shearFrame } from '../support/frames.ts';
import { histories, oneStorey } from '../support/oneStorey.ts';

// Closed forms: one storey of height H with gravity P, theta = P / (k H): period T0 / sqrt(1 - theta), static drift that without
// gravity divided by 1 - theta. Yielding, the same with the post-yield stiffness: drift (m ag - (1 - h) Fy) / (h k - P / H), as long as
// h k > P / H. Source: equilibrium of the storey in its displaced position.
const H = 3;
const mass = 1000;
const stiffness = 40 * mass;
const gravity = (theta: number) => theta * stiffness * H;

describe('F1 period', () => {
  const T0 = 2 * Math.PI * Math.sqrt(mass / stiffness);
  const push = Float64Array.from({ length: 21 }, (_, i) => (i < 20 ? -4 : 0));
  const laws = [
    ['elastic', { kind: 'elastic' }],
    ['bilinear, pushed past yield', { kind: 'bilinear', strength: 2500, hardening: 0.6 }],
  ] as const;

  test.each(laws.flatMap(([name, law]) => [0.05, 0.25, 0.5].map((theta) => [name, law, theta] as const)))(
    '%s, theta = $2',
    (_, law, theta) => {
      const frame = oneStorey({ mass, stiffness, law, gravity: gravity(theta) });
      const interval = 0.01;
      const { histories: h, storeys } = histories(frame, push, interval, { step: { parts: 10 }, tail: 12 * T0 });
      if (law.kind === 'bilinear') expect(storeys.ductility[0]).toBeGreaterThan(1.5);
      // Upward crossings of the middle of the last swings, where nothing yields any more.
      const half = h.displacement.subarray(Math.floor(h.count / 2));
      const middle = (Math.max(...half) + Math.min(...half)) / 2;
      const crossings: number[] = [];
      for (let i = 1; i < half.length; i++) {
        const [a, b] = [half[i - 1] - middle, half[i] - middle];
        if (a < 0 && b >= 0) crossings.push(i - b / (b - a));
      }
      expect(crossings.length).toBeGreaterThan(3);
      const period =
        ((crossings[crossings.length - 1] - crossings[0]) / (crossings.length - 1)) * h.every * (interval / 10);
      expect(Math.abs(period / (T0 / Math.sqrt(1 - theta)) - 1)).toBeLessThan(5e-4);
    },
  );
});

describe('F1 drift under a ground acceleration that rises slowly and stays', () => {
  const interval = 0.05;
  const held = (size: number) => Float64Array.from({ length: 1601 }, (_, i) => -size * Math.min(1, i / 800));
  const damping = { kind: 'modal', ratios: [0.6] } as const;
  const ending = (frame: ReturnType<typeof oneStorey>, size: number) =>
    histories(frame, held(size), interval, { step: { parts: 5 } }).histories.displacement.at(-1) ?? Number.NaN;

  test.each([0.05, 0.1, 0.25, 0.5, 0.9])('elastic, theta = %d', (theta) => {
    const drift = ending(oneStorey({ mass, stiffness, damping, gravity: gravity(theta) }), 2);
    expect(Math.abs(drift / ((mass * 2) / stiffness / (1 - theta)) - 1)).toBeLessThan(1e-5);
  });

  test.each([0, 0.05, 0.1, 0.15])('bilinear with a hardening of 0.2, theta = %d', (theta) => {
    const law = { kind: 'bilinear', strength: 1500, hardening: 0.2 } as const;
    const drift = ending(oneStorey({ mass, stiffness, law, damping, gravity: gravity(theta) }), 2);
    const closed = (mass * 2 - 0.8 * 1500) / ((0.2 - theta) * stiffness);
    expect(drift / (1500 / stiffness)).toBeGreaterThan(2);
    expect(Math.abs(drift / closed - 1)).toBeLessThan(1e-3);
  });
});

describe('collapse', () => {
  // Source: the equations of motion. Elastic-perfectly plastic, ag = -A from t = 0 on, no damping: u = A / w^2 (1 - cos w t) up to yield with w^2 = (k - P / H) / m; from there
  // u = u* + (uy - u*) cosh(l t) + vy / l sinh(l t) with l^2 = P / (H m) and u* = (Fy - m A) H / P, which passes any drift.
  test('of one storey comes when the closed form says', () => {
    const theta = 0.2;
    const [strength, A, stop] = [3000, 2.8, 0.1];
    const law = { kind: 'bilinear', strength, hardening: 0 } as const;
    const frame = oneStorey({ mass, stiffness, law, gravity: gravity(theta) });
    const w = Math.sqrt((stiffness * (1 - theta)) / mass);
    const l = Math.sqrt((stiffness * theta) / mass);
    const uy = strength / stiffness;
    const yielded = Math.acos(1 - (uy * w * w) / A) / w;
    const vy = (A / w) * Math.sin(w * yielded);
    const rest = (strength - mass * A) / (stiffness * theta);
    const u = (t: number) => rest + (uy - rest) * Math.cosh(l * t) + (vy / l) * Math.sinh(l * t);
    let [low, high] = [0, 5];
    for (let i = 0; i < 60; i++) {
      const middle = (low + high) / 2;
      if (u(middle) > stop * H) high = middle;
      else low = middle;
    }
    const time = yielded + high;
    const step = 0.01 / 20;
    const { ending, storeys } = run(frame, new Float64Array(401).fill(-A), 0.01, {
      step: { parts: 20 },
      stopDrift: stop,
    });
    expect(ending).toMatchObject({ status: 'collapsed', storey: 0 });
    // At the first step past it, give or take the error of the step.
    expect(Math.abs((ending?.time ?? 0) - time)).toBeLessThan(2 * step);
    expect(storeys.peakDriftRatio[0]).toBeGreaterThan(stop);
    expect(Math.abs(storeys.firstYield[0] - yielded)).toBeLessThan(2 * step);
  });

  // F2: P / H above the post-yield stiffness in the middle storey alone, so that one and no other runs away once it yields.
  const base = shearFrame(
    [2e5, 2e5, 2e5],
    [8e7, 6e7, 5e7],
    { kind: 'rayleigh', modes: [1, 2], ratios: [0.03, 0.03] },
    3.5,
    true,
  );
  const frame = (middle: number) => ({
    ...base,
    storeys: base.storeys.map((storey, i) => ({
      ...storey,
      gravity: 3e6,
      law: { kind: 'bilinear' as const, strength: [1.4e6, 6e5, 7e5][i], hardening: [0.1, middle, 0.1][i] },
    })),
  });
  const motion = Float64Array.from({ length: 501 }, (_, i) => 2 * Math.sin(2 * Math.PI * 1.4 * i * 0.02));

  test('is found and named in a frame made to collapse, and not where the storey hardens more than gravity takes', () => {
    const load = 2 * 3e6;
    const short = frame(0.01);
    expect(load / 3.5).toBeGreaterThan(0.01 * 6e7);
    const { ending, storeys, step, steps, energy } = run(short, motion, 0.02, {
      step: { parts: 4 },
      tail: 5,
      histories: true,
    });
    expect(ending).toMatchObject({ status: 'collapsed', storey: 1 });
    expect(ending?.time).toBeLessThan(step * steps);
    expect(storeys.peakDriftRatio[1]).toBeGreaterThan(0.1);
    expect(Math.max(storeys.peakDriftRatio[0], storeys.peakDriftRatio[2])).toBeLessThan(0.1);
    expect(storeys.peakTime[1]).toBeCloseTo(ending?.time ?? 0, 9);
    expect(Number.isFinite(energy.imbalance)).toBe(true);
    const finer = run(short, motion, 0.02, { step: { parts: 32 }, tail: 5 });
    expect(finer.ending).toMatchObject({ status: 'collapsed', storey: 1 });
    expect(Math.abs((finer.ending?.time ?? 0) - (ending?.time ?? 0))).toBeLessThan(0.02);
    expect(load / 3.5).toBeLessThan(0.2 * 6e7);
    expect(run(frame(0.2), motion, 0.02, { step: { parts: 4 }, tail: 5 }).ending).toBeNull();
    // The same frame without P-Delta stands.
    expect(run({ ...short, pDelta: false }, motion, 0.02, { step: { parts: 4 }, tail: 5 }).ending).toBeNull();
  });
});
