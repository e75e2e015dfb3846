import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import type { Limits } from '../../../src/core/checks/limits.ts';
import { prepareFrame, runCase } from '../../../src/core/doors.ts';
import type { Analysis } from '../../../src/core/dynamics/run.ts';
import type { Frame } from '../../../src/core/frame/frame.ts';
import type { ReportSource } from '../../../src/core/report/source.ts';

const frame: Frame = {
  storeys: [
    { name: 'Entrance', height: 4.2, mass: 412_000, stiffness: 1.85e8, law: { kind: 'elastic' } },
    { name: 'Wards', height: 3.6, mass: 380_000, stiffness: 1.4e8, law: { kind: 'elastic' }, gravity: 3.9e6 },
    { name: 'Plant', height: 3.6, mass: 310_000, stiffness: 1.1e8, law: { kind: 'elastic' } },
  ],
  damping: { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.04] },
  pDelta: true,
};
/** The same on an isolator with a damper, over two storeys that yield. */
const isolated: Frame = {
  storeys: [
    {
      name: 'Isolators',
      height: 1.5,
      mass: 500_000,
      stiffness: 4e7,
      law: { kind: 'bilinear', strength: 8e5, hardening: 0.3 },
      damper: { coefficient: 4e5, exponent: 1 },
      role: 'isolator',
    },
    { ...frame.storeys[0], law: { kind: 'bilinear', strength: 8e5, hardening: 0.03 } },
    { ...frame.storeys[1], law: { kind: 'elastic' } },
  ],
  damping: { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05], stiffness: 'tangent' },
  pDelta: true,
};
const analysis: Analysis = {
  method: { kind: 'newmark', beta: 0.25, gamma: 0.5 },
  step: { parts: 2 },
  tail: 1,
  stopDrift: 0.1,
};
const limits: Limits = { drift: 0.02, factor: 1.25, source: 'clause 4.2 of the brief' };

/** Three storeys under two short motions, really computed; `strength` scales the ground so that a run can be made to stop. */
export function exampleSource({ strength = 1, histories = false } = {}): ReportSource {
  return sourceOf(frame, limits, strength, histories);
}

/** Three rows that yield, the lowest an isolator; without a limit of its own where none is given [m]. */
export function isolatedSource({ limit, strength = 0.4 }: { limit?: number; strength?: number } = {}): ReportSource {
  return sourceOf(isolated, limit === undefined ? limits : { ...limits, isolator: limit }, strength, true);
}

function sourceOf(frame: Frame, limits: Limits, strength: number, histories: boolean): ReportSource {
  const prepared = prepareFrame(frame);
  if (!prepared.ok) throw new Error('the example must stand');
  const motions = [
    { name: 'A', interval: 0.02, scale: 1.35 * strength, period: 0.9 },
    { name: 'B', interval: 0.01, scale: -1, period: 0.35 },
  ].map((one) => {
    const acceleration = Float64Array.from(
      { length: 300 },
      (_, i) => 2 * Math.sin((2 * Math.PI * i * one.interval) / one.period),
    );
    return { ...one, acceleration };
  });
  const runs = motions.map(({ name, interval, scale, acceleration }, r) => ({
    motion: name,
    run: runCase({ frame, analysis, motion: { interval, scale, acceleration } }, { histories }),
    stepError: r === 0 ? 0.004 : null,
  }));
  return {
    title: 'Riverside clinic',
    prepared: prepared.value,
    motions: [
      ...motions.map(({ name, interval, scale, acceleration }) => ({
        name,
        interval,
        scale,
        count: acceleration.length,
        peakAcceleration: Math.max(...acceleration.map(Math.abs)),
        used: true,
      })),
      { name: 'C', interval: 0.02, scale: 1, count: 10, peakAcceleration: null, used: false, reason: 'no site match' },
    ],
    runs,
    envelope: envelopeOf(runs, limits, ['C'], frame),
    analysis,
    limits,
  };
}
