import fc from 'fast-check';
import { prepareFrame, runCase } from '../../src/core/doors.ts';
import type { Analysis, MethodChoice, Run } from '../../src/core/dynamics/run.ts';
import type { Damping, Frame } from '../../src/core/frame/frame.ts';
import type { PreparedFrame } from '../../src/core/frame/prepare.ts';

export const AVERAGE: MethodChoice = { kind: 'newmark', beta: 0.25, gamma: 0.5 };
export const LINEAR: MethodChoice = { kind: 'newmark', beta: 1 / 6, gamma: 0.5 };

/** A shear frame from masses and stiffness, ground up; equal heights. */
export function shearFrame(
  masses: readonly number[],
  stiffness: readonly number[],
  damping: Damping = { kind: 'none' },
  height = 3,
  pDelta = false,
): Frame {
  const storeys = masses.map((mass, i) => ({
    name: `Storey ${i + 1}`,
    height,
    mass,
    stiffness: stiffness[i],
    law: { kind: 'elastic' as const },
  }));
  return { storeys, damping, pDelta };
}

export function prepared(frame: Frame): PreparedFrame {
  const result = prepareFrame(frame);
  if (!result.ok) throw new Error(result.faults.map((fault) => fault.message).join('; '));
  return result.value;
}

export interface RunOptions {
  readonly method?: MethodChoice;
  readonly step?: Analysis['step'];
  readonly tail?: number;
  readonly scale?: number;
  readonly stopDrift?: number;
  readonly histories?: boolean;
}

export function run(frame: Frame, acceleration: Float64Array, interval: number, options: RunOptions = {}): Run {
  const { method = AVERAGE, step = { parts: 1 }, tail = 0, scale = 1, stopDrift = 0.1, histories = false } = options;
  return runCase(
    { frame, analysis: { method, step, tail, stopDrift }, motion: { interval, acceleration, scale } },
    { histories },
  );
}

/** Seeded noise that fades, m/s2: a stand-in for a motion where only numbers matter. Linear congruential, Numerical Recipes' constants. */
export function noise(seed: number, count: number, fade = count / 3): Float64Array {
  let state = seed >>> 0;
  return Float64Array.from({ length: count }, (_, i) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state / 2 ** 31 - 1) * 3 * Math.exp(-i / fade);
  });
}

const kg = fc.double({ min: 1e4, max: 1e6, noNaN: true });
const stiff = fc.double({ min: 1e7, max: 1e9, noNaN: true });
const ratio = fc.double({ min: 0.005, max: 0.1, noNaN: true });

/** Random elastic frames of 1 to 8 storeys with each kind of damping. */
export const anyFrame: fc.Arbitrary<Frame> = fc
  .array(fc.tuple(kg, stiff, fc.double({ min: 2.5, max: 6, noNaN: true })), { minLength: 1, maxLength: 8 })
  .chain((rows) => {
    const kinds: fc.Arbitrary<Damping>[] = [
      fc.constant<Damping>({ kind: 'none' }),
      ratio.map((r): Damping => ({ kind: 'stiffness-proportional', mode: 1, ratio: r })),
      fc.array(ratio, { minLength: 1, maxLength: 4 }).map((ratios): Damping => ({ kind: 'modal', ratios })),
    ];
    if (rows.length > 1) kinds.push(ratio.map((r): Damping => ({ kind: 'rayleigh', modes: [1, 2], ratios: [r, r] })));
    return fc.oneof(...kinds).map((damping) => ({
      storeys: rows.map(([mass, stiffness, height], i) => ({
        name: `S${i}`,
        mass,
        stiffness,
        height,
        law: { kind: 'elastic' as const },
      })),
      damping,
      pDelta: false,
    }));
  });
