import { AIM } from '../dynamics/autoStep.ts';
import type { Evidence } from '../dynamics/evidence.ts';
import { printQuantity } from '../units/quantities.ts';

/** Energy imbalance that is looked at. Common practice. */
export const IMBALANCE = 0.01;

/**
 * How far the numbers of a suite can be trusted, in one sentence: "Drifts are converged to 0.4 %, storey shears to 0.2 % and floor
 * accelerations to 1.3 %; energy balances to 0.02 %."
 *
 * @param evidence  one a run of the suite; at least one
 */
export function evidenceSentence(evidence: readonly Evidence[]): string {
  const errors = evidence.flatMap(({ stepError }) => (stepError === null ? [] : [stepError]));
  const worst = Math.max(...errors);
  const parts: string[] = [];
  if (errors.length === 0) parts.push('The step error is not known');
  else if (worst < AIM) parts.push(`Drifts are converged to ${percent(worst)}${othersOf(evidence)}`);
  else parts.push(`Drifts are not converged: the step error is ${percent(worst)}`);
  const unknown = evidence.length - errors.length;
  if (errors.length > 0 && unknown > 0)
    parts.push(`the step error of ${unknown} of ${evidence.length} motions is not known`);
  const imbalance = Math.max(...evidence.map((one) => one.imbalance));
  parts.push(
    `energy ${imbalance < IMBALANCE ? 'balances to' : 'does not balance: it is off by'} ${percent(imbalance)}`,
  );
  return `${parts.join('; ')}.`;
}

/** What is known of the other peaks; drifts being converged says nothing of them where storeys yield. */
function othersOf(evidence: readonly Evidence[]): string {
  const known = evidence.flatMap(({ peakErrors }) => peakErrors ?? []);
  if (known.length === 0) return '';
  const shear = Math.max(...known.map((one) => one.shear));
  const acceleration = Math.max(...known.map((one) => one.acceleration));
  return `, storey shears to ${percent(shear)} and floor accelerations to ${percent(acceleration)}`;
}

function percent(value: number): string {
  if (value < 1e-4) return 'less than 0.01 %';
  return `${printQuantity(value, 'percent', 'si', value < 1e-3 ? 2 : 1)} %`;
}
