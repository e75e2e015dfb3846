import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { runCase, stepErrorOf } from '../../src/core/doors.ts';
import type { Run } from '../../src/core/dynamics/run.ts';
import type { Frame } from '../../src/core/frame/frame.ts';
import { AVERAGE, prepared } from '../support/frames.ts';

/** What test/reference/yielding_frames.py writes: frames in the names of the project file, and their response, SI. */
interface Reference {
  readonly motions: Readonly<Record<string, { readonly interval: number; readonly acceleration: readonly number[] }>>;
  readonly frames: readonly {
    readonly name: string;
    readonly motion: string;
    readonly scale: number;
    readonly frame: Frame;
    readonly analysis: { readonly tail: number; readonly stopDrift: number };
    readonly expected: Expected;
  }[];
}

interface Expected {
  readonly period: number;
  readonly peakDrift: readonly number[];
  readonly peakShear: readonly number[];
  readonly peakAcceleration: readonly number[];
  readonly residualDrift: readonly number[];
  readonly ductility: readonly (number | null)[];
  readonly dissipated: readonly number[];
  readonly damperWork: readonly number[];
  readonly energy: Readonly<Record<'input' | 'kinetic' | 'strain' | 'damping' | 'dampers' | 'hysteretic', number>>;
}

const FILE = new URL('../reference/yielding-frames.json', import.meta.url);
const { motions, frames }: Reference = JSON.parse(readFileSync(FILE, 'utf8'));

/** Largest distance between two rows of numbers, over the largest magnitude of the expected one. */
function apart(got: ArrayLike<number>, expected: readonly number[]): number {
  const off = expected.map((value, i) => Math.abs(got[i] - value));
  return Math.max(...off) / Math.max(...expected.map(Math.abs));
}

// An independent integration at a relative tolerance of 1e-10, with every change of branch found as an event (test/reference/, scipy's
// DOP853); the definitions are those of the project file.
describe.each(frames)('$name', ({ motion, scale, frame, analysis, expected }) => {
  const { interval, acceleration } = motions[motion];
  const runs = new Map<number, Run>();
  const at = (parts: number): Run => {
    const known = runs.get(parts);
    if (known) return known;
    const result = runCase(
      {
        frame,
        analysis: { method: AVERAGE, step: { parts }, ...analysis },
        motion: { interval, acceleration: Float64Array.from(acceleration), scale },
      },
      { histories: false },
    );
    runs.set(parts, result);
    return result;
  };

  test('periods are the same', () => {
    expect(Math.abs(prepared(frame).modes[0].period / expected.period - 1)).toBeLessThan(1e-8);
  });

  // Where two runs agree by chance the estimate is next to nothing; peaks are read at the steps: hence the floor.
  test.each([4, 8])('peak drifts at 1/%d of the interval are within the reported step error', (parts) => {
    const error = stepErrorOf(at(parts), at(2 * parts));
    const off = apart(at(parts).storeys.peakDrift, expected.peakDrift);
    expect(off, `off by ${off}, reported ${error}`).toBeLessThan(Math.max(error, 1e-4));
  });

  test('all answers close in on the reference', () => {
    const { ending, storeys, floors, energy } = at(32);
    const largest = Math.max(...expected.peakDrift);
    expect(ending).toBeNull();
    const off = apart(storeys.peakDrift, expected.peakDrift);
    expect(off).toBeLessThan(3e-4);
    // Second order: 16 times finer than half an interval, up to 256 times closer.
    expect(off).toBeLessThan(0.1 * apart(at(2).storeys.peakDrift, expected.peakDrift));
    expect(apart(storeys.peakShear, expected.peakShear)).toBeLessThan(1e-3);
    // Acceleration turns sharply where a storey unloads.
    expect(apart(floors.peakAcceleration, expected.peakAcceleration)).toBeLessThan(5e-3);
    expected.residualDrift.forEach((drift, i) => {
      expect(Math.abs(storeys.residualDrift[i] - drift)).toBeLessThan(5e-4 * largest);
    });
    expected.ductility.forEach((ductility, i) => {
      if (ductility === null) expect(storeys.ductility[i]).toBeNaN();
      else expect(Math.abs(storeys.ductility[i] / ductility - 1)).toBeLessThan(1e-3);
    });
    for (const [got, wanted] of [
      [storeys.dissipated, expected.dissipated],
      [storeys.damperWork, expected.damperWork],
    ] as const) {
      wanted.forEach((work, i) => {
        expect(Math.abs(got[i] - work)).toBeLessThan(5e-4 * expected.energy.input);
      });
    }
    for (const [key, value] of Object.entries(expected.energy) as [keyof Expected['energy'], number][]) {
      expect(Math.abs(energy[key] - value), key).toBeLessThan(5e-4 * expected.energy.input);
    }
    expect(energy.imbalance).toBeLessThan(1e-4);
  });
});
