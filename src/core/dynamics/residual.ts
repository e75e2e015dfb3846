import { FIELD } from './record.ts';

/**
 * Residual drift: signed mean over the last fundamental period of a run, and the largest distance from it [m], from what the
 * stepping loop summed. Both are zero where the run ended before its last period began.
 *
 * @param count  steps that were summed
 */
export function residualsOf(
  records: Float64Array,
  n: number,
  count: number,
): { residualDrift: Float64Array; residualSway: Float64Array } {
  const residualDrift = new Float64Array(n);
  const residualSway = new Float64Array(n);
  for (let i = 0; count > 0 && i < n; i++) {
    const at = i * FIELD.STRIDE;
    const mean = records[at + FIELD.DRIFT_SUM] / count;
    residualDrift[i] = mean;
    residualSway[i] = Math.max(records[at + FIELD.DRIFT_MOST] - mean, mean - records[at + FIELD.DRIFT_LEAST]);
  }
  return { residualDrift, residualSway };
}
