import type { Run } from '../dynamics/run.ts';
import { printQuantity, printRatio } from '../units/quantities.ts';
import type { Envelope } from './envelope.ts';
import { worded } from './wording.ts';

/** The answer in one sentence. */
export interface Verdict {
  /** The limit is exceeded, or a motion did not finish. */
  readonly over: boolean;
  /** "Storey 2 governs: 1.07 of the limit" */
  readonly headline: string;
  /** "mean 1.60 %, limit 1.50 %; next, storey 1 at 0.81" */
  readonly detail: string;
}

/** @param runs  those that the envelope was made from, in the same order; at least one */
export function verdictOf(
  envelope: Envelope,
  runs: readonly { readonly motion: string; readonly run: Run }[],
): Verdict {
  const { drift, ratio, governingStorey: at, measure, factor, limit, leftOut, motions } = envelope;
  if (drift === null || ratio === null) return unfinished(envelope, runs);
  const of = leftOut.length > 0 ? `, ${motions.length} of ${motions.length + leftOut.length} motions` : '';
  const percent = (value: number) => printQuantity(value, 'percent', 'si', 2);
  const computed = drift[measure][at];
  const factored = factor === 1 ? '' : ` × ${factor} = ${percent(factor * computed)} %`;
  const next = secondLargest(ratio, at);
  const who = motions.length === 1 ? '' : `${worded(measure)} `;
  const then = next < 0 ? '' : `; next, storey ${next + 1} at ${printRatio(ratio[next])}`;
  const without = leftOut.length > 0 ? `; left out: ${leftOut.join(', ')}` : '';
  return {
    over: ratio[at] > 1,
    headline: `Storey ${at + 1} governs: ${printRatio(ratio[at])} of the limit${of}`,
    detail: `${who}${percent(computed)} %${factored}, limit ${percent(limit)} %${then}${without}`,
  };
}

function unfinished(
  { incomplete }: Envelope,
  runs: readonly { readonly motion: string; readonly run: Run }[],
): Verdict {
  const { motion, run } = runs.find((entry) => entry.run.ending !== null) ?? runs[0];
  const others = incomplete.length > 1 ? ` (and ${incomplete.length - 1} more)` : '';
  return { over: true, headline: `${motion} did not finish${others}`, detail: endingWords(run) };
}

/** Why a run ended early: storey, time, and how far it had gone. */
export function endingWords({ ending, storeys }: Run): string {
  if (ending === null) return 'it ran to its end';
  const time = printQuantity(ending.time, 'time', 'si', 2);
  switch (ending.status) {
    case 'collapsed':
      return `storey ${ending.storey + 1} passed the drift at which a run is stopped at ${time} s, drift ${printQuantity(storeys.peakDriftRatio[ending.storey], 'percent', 'si', 1)} %`;
    case 'diverged':
      return `the numbers left the finite range at ${time} s`;
    case 'not-converged':
      return `storey ${ending.storey + 1} found no equilibrium at ${time} s, however short the step`;
    case 'cancelled':
      return `it was stopped at ${time} s`;
  }
}

function secondLargest(ratio: Float64Array, largest: number): number {
  let next = -1;
  for (let i = 0; i < ratio.length; i++) {
    if (i !== largest && (next < 0 || ratio[i] > ratio[next])) next = i;
  }
  return next;
}
