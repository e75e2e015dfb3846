import type { Run } from './run.ts';

/**
 * Estimated error of the peak drifts from the step: 2 x the largest over the storeys of |Di(h) - Di(h/2)| over the largest
 * drift of the run. 4/3 would be the smooth second-order value (Richardson); 2 allows for peaks between samples and for
 * yielding. Definition: the project-file page.
 *
 * @param run   at step h
 * @param half  the same case at step h / 2
 */
export function stepErrorOf(run: Run, half: Run): number {
  return changeOf(run.storeys.peakDrift, half.storeys.peakDrift);
}

/** Estimated errors of the other peaks [-], each as `stepErrorOf` has it for drifts: over the largest of its own kind. */
export interface PeakErrors {
  readonly shear: number;
  readonly overturning: number;
  readonly displacement: number;
  /** Of total floor accelerations: where storeys yield they come right later than the drifts. */
  readonly acceleration: number;
}

export function peakErrorsOf(run: Run, half: Run): PeakErrors {
  return {
    shear: changeOf(run.storeys.peakShear, half.storeys.peakShear),
    overturning: changeOf(run.storeys.peakOverturning, half.storeys.peakOverturning),
    displacement: changeOf(run.floors.peakDisplacement, half.floors.peakDisplacement),
    acceleration: changeOf(run.floors.peakAcceleration, half.floors.peakAcceleration),
  };
}

function changeOf(at: Float64Array, finer: Float64Array): number {
  let [change, largest] = [0, 0];
  for (let i = 0; i < at.length; i++) {
    change = Math.max(change, Math.abs(at[i] - finer[i]));
    largest = Math.max(largest, at[i]);
  }
  return largest > 0 ? (2 * change) / largest : 0;
}
