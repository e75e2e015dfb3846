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
  const [at, finer] = [run.storeys.peakDrift, half.storeys.peakDrift];
  let [change, largest] = [0, 0];
  for (let i = 0; i < at.length; i++) {
    change = Math.max(change, Math.abs(at[i] - finer[i]));
    largest = Math.max(largest, at[i]);
  }
  return largest > 0 ? (2 * change) / largest : 0;
}
