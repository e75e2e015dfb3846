import { describe, expect, it } from 'vitest';
import { envelopeOf } from '../../../src/core/checks/envelope.ts';
import { prepareFrame } from '../../../src/core/doors.ts';
import type { Frame, Law, Storey } from '../../../src/core/frame/frame.ts';
import type { Answers } from '../../../src/state/answers.ts';
import type { LoopForce } from '../../../src/ui/plots/choice.ts';
import { backboneTo, loopOf } from '../../../src/ui/plots/loop.ts';
import { noise, run, shearFrame } from '../../support/frames.ts';

const HEIGHT = 3;
const bilinear: Law = { kind: 'bilinear', strength: 4e5, hardening: 0.05 };
const base = shearFrame([2e5, 2e5], [1.5e8, 1.2e8], { kind: 'modal', ratios: [0.03] }, HEIGHT);

function shownOf(change: (storey: Storey, i: number) => Storey, limits: object = {}) {
  const frame: Frame = { ...base, storeys: base.storeys.map(change) };
  const result = run(frame, noise(7, 1200), 0.01, { histories: true, tail: 2, scale: 2 });
  const prepared = prepareFrame(frame);
  if (!prepared.ok) throw new Error('frame');
  const envelope = envelopeOf([{ motion: 'A', run: result }], { drift: 0.02, source: '', ...limits }, [], frame);
  const answers = { case: { frame, prepared: prepared.value }, envelope } as unknown as Answers;
  return { motion: 'A', run: result, answers, storey: 0, heights: frame.storeys.map(({ height }) => height) };
}

const yielding = shownOf((storey) => ({ ...storey, law: bilinear }));
const damped = shownOf((storey) => ({ ...storey, law: bilinear, damper: { coefficient: 8e5, exponent: 0.6 } }));

describe('loopOf', () => {
  it('shows the largest drift of the run, against a force that the law can carry', () => {
    const loop = loopOf(yielding, 'law');
    expect(loop).not.toBeNull();
    if (loop === null) return;
    expect(Math.max(...loop.drift.map(Math.abs))).toBeCloseTo(yielding.run.storeys.peakDrift[0], 14);
    expect(loop.peakForce).toBeCloseTo(yielding.run.storeys.peakShear[0], 3);
    expect(loop.limit).toBeCloseTo(0.02 * HEIGHT, 12);
  });

  it('first yields at the yield drift, and there with the strength', () => {
    const loop = loopOf(yielding, 'law');
    const yieldDrift = 4e5 / 1.5e8;
    expect(yielding.run.storeys.firstYield[0]).toBeGreaterThan(0);
    expect(Math.abs(loop?.firstYield?.drift ?? 0)).toBeCloseTo(yieldDrift, 9);
    // Straight between two steps, of which the later one is past the corner: a little under the strength.
    expect(Math.abs(loop?.firstYield?.force ?? 0) / 4e5).toBeGreaterThan(0.9);
    expect(Math.abs(loop?.firstYield?.force ?? 0) / 4e5).toBeLessThan(1.001);
  });

  it('parts law and damper: both together are the storey shear, and the damper answers the rate of drift', () => {
    const of = (which: LoopForce) => loopOf(damped, which)?.force ?? new Float64Array();
    const [law, damper, shear] = [of('law'), of('damper'), of('shear')];
    for (let j = 0; j < shear.length; j += 7) expect(law[j] + damper[j]).toBeCloseTo(shear[j], 4);
    expect(Math.max(...damper.map(Math.abs))).toBeGreaterThan(1e4);
    expect(loopOf(damped, 'shear')?.peakForce).toBeCloseTo(damped.run.storeys.peakShear[0], 3);
    expect(loopOf(damped, 'damper')?.firstYield).toBeNull();
  });

  it('shows the law where the storey has no damper, whatever was asked for; nothing without histories', () => {
    expect(loopOf(yielding, 'damper')?.which).toBe('law');
    expect(loopOf({ ...yielding, run: { ...yielding.run, histories: null } }, 'law')).toBeNull();
    expect(loopOf({ ...yielding, storey: 2 }, 'law')).toBeNull();
  });

  it('holds an isolator against its own limit, and against none where none is typed', () => {
    const isolated = (storey: Storey, i: number): Storey => (i === 0 ? { ...storey, role: 'isolator' } : storey);
    expect(loopOf(shownOf(isolated, { isolator: 0.31 }), 'law')?.limit).toBe(0.31);
    expect(loopOf(shownOf(isolated), 'law')?.limit).toBe(Number.POSITIVE_INFINITY);
    expect(loopOf({ ...shownOf(isolated), storey: 1 }, 'law')?.limit).toBeCloseTo(0.02 * HEIGHT, 12);
  });
});

describe('backboneTo', () => {
  it('reaches the end both ways, odd about zero, with the slope after yield; an elastic law has none', () => {
    const storey: Storey = { name: '', height: HEIGHT, mass: 1, stiffness: 1.5e8, law: bilinear };
    const line = backboneTo(storey, 0.02);
    expect(line?.drift[0]).toBeCloseTo(-0.02, 12);
    expect(line?.drift.at(-1)).toBeCloseTo(0.02, 12);
    expect(line?.force.at(-1)).toBeCloseTo(4e5 + 0.05 * 1.5e8 * (0.02 - 4e5 / 1.5e8), 3);
    expect(line?.force[0]).toBeCloseTo(-(line?.force.at(-1) ?? 0), 6);
    expect(backboneTo({ ...storey, law: { kind: 'elastic' } }, 0.02)).toBeNull();
  });
});
