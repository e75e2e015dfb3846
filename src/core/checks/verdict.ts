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
  const { drift, ratio, governingStorey: at, leftOut, motions, isolator } = envelope;
  if (drift === null || ratio === null) return unfinished(envelope, runs);
  const of = leftOut.length > 0 ? `, ${motions.length} of ${motions.length + leftOut.length} motions` : '';
  const without = leftOut.length > 0 ? `left out: ${leftOut.join(', ')}` : '';
  const storeys = at < 0 ? null : storeyWords(envelope, drift[envelope.measure][at]);
  const apart = isolator?.ratio ?? null;
  if (apart !== null && !(at >= 0 && ratio[at] >= apart)) {
    const detail = at < 0 ? '' : `storey ${at + 1} at ${printRatio(ratio[at])}: ${storeys}`;
    return {
      over: apart > 1,
      headline: `The isolator governs: ${printRatio(apart)} of its limit${of}`,
      detail: joined(detail, without),
    };
  }
  if (storeys === null) return { over: false, headline: 'No storey is compared with a limit', detail: without };
  const next = secondLargest(ratio, at);
  const then = next < 0 ? '' : `next, storey ${next + 1} at ${printRatio(ratio[next])}`;
  const under = apart === null ? '' : `isolator at ${printRatio(apart)} of its limit`;
  return {
    over: ratio[at] > 1,
    headline: `Storey ${at + 1} governs: ${printRatio(ratio[at])} of the limit${of}`,
    detail: joined(storeys, then, under, without),
  };
}

function joined(...words: readonly string[]): string {
  return words.filter((part) => part !== '').join('; ');
}

/** "mean 1.60 % × 0.5 = 0.80 %, limit 1.50 %" */
function storeyWords({ measure, factor, limit, motions }: Envelope, computed: number): string {
  const percent = (value: number) => printQuantity(value, 'percent', 'si', 2);
  const factored = factor === 1 ? '' : ` × ${factor} = ${percent(factor * computed)} %`;
  const who = motions.length === 1 ? '' : `${worded(measure)} `;
  return `${who}${percent(computed)} %${factored}, limit ${percent(limit)} %`;
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
      return `storey ${ending.storey + 1} lost its stability at ${time} s, drift ${printQuantity(storeys.peakDriftRatio[ending.storey], 'percent', 'si', 1)} %`;
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
    if (i !== largest && !Number.isNaN(ratio[i]) && (next < 0 || ratio[i] > ratio[next])) next = i;
  }
  return next;
}
