import { FIELD } from './stepping.ts';

/** Sums over the last fundamental period of a run, one entry a storey. */
export interface Residuals {
  count: number;
  readonly sum: Float64Array;
  readonly least: Float64Array;
  readonly most: Float64Array;
}

export function emptyResiduals(n: number): Residuals {
  return {
    count: 0,
    sum: new Float64Array(n),
    least: new Float64Array(n).fill(Number.POSITIVE_INFINITY),
    most: new Float64Array(n).fill(Number.NEGATIVE_INFINITY),
  };
}

/** Adds one step. @param records as in stepping.ts */
export function keepResiduals(residuals: Residuals, records: Float64Array): void {
  const { sum, least, most } = residuals;
  let below = 0;
  for (let i = 0; i < sum.length; i++) {
    const u = records[i * FIELD.STRIDE + FIELD.U];
    const drift = u - below;
    below = u;
    sum[i] += drift;
    if (drift < least[i]) least[i] = drift;
    if (drift > most[i]) most[i] = drift;
  }
  residuals.count++;
}

/** Signed mean drift, and the largest distance from it [m]. Both zero where the run ended before its last period began. */
export function residualsOf({ count, sum, least, most }: Residuals): {
  residualDrift: Float64Array;
  residualSway: Float64Array;
} {
  const residualDrift = sum.map((s) => (count > 0 ? s / count : 0));
  const residualSway = residualDrift.map((mean, i) => (count > 0 ? Math.max(most[i] - mean, mean - least[i]) : 0));
  return { residualDrift, residualSway };
}
