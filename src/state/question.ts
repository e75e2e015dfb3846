import { digestOfText } from '../core/digest.ts';
import type { Analysis } from '../core/dynamics/run.ts';
import { stepOf } from '../core/dynamics/steps.ts';
import type { Case } from '../document/case.ts';
import type { RunRequest } from '../engine/protocol.ts';

/** One run that a question needs. */
export interface Ask {
  readonly motion: string;
  /** What the run is computed from: equal keys, equal bits. */
  readonly key: string;
  /** Storey-steps, for the expected time. */
  readonly weight: number;
  readonly request: RunRequest;
}

/** What a case asks of the engine. Titles, names and limits are no part of it: they make no run stale. */
export interface Question {
  readonly key: string;
  readonly case: Case;
  readonly asks: readonly Ask[];
}

export function questionOf(from: Case): Question {
  const frameKey = digestOfText(JSON.stringify(from.frame, (name, value) => (name === 'name' ? undefined : value)));
  const asks = from.motions.map(({ name, samples, interval, scale, count }): Ask => {
    const request: RunRequest = {
      frameKey,
      frame: from.frame,
      analysis: from.analysis,
      motion: { samples, interval, scale },
      want: { histories: false },
    };
    return { motion: name, request, key: keyOf(request), weight: weightOf(request, count) };
  });
  return { key: digestOfText(asks.map((ask) => ask.key).join()), case: from, asks };
}

/** The same run with its histories kept. */
export function withHistories({ request }: Ask): RunRequest {
  return { ...request, want: { histories: true } };
}

/** The same run at half the step, for the step error; null where the step is no number yet. */
export function atHalfStep({ request }: Ask): RunRequest | null {
  const { analysis } = request;
  const { step } = analysis;
  if (step === 'auto') return null;
  const half: Analysis = { ...analysis, step: typeof step === 'number' ? step / 2 : { parts: 2 * step.parts } };
  return { ...request, analysis: half };
}

function keyOf({ frameKey, analysis, motion }: RunRequest): string {
  return JSON.stringify([frameKey, analysis, motion.samples, motion.interval, motion.scale]);
}

function weightOf({ frame, analysis, motion }: RunRequest, count: number): number {
  const step = stepOf(analysis.step, motion.interval);
  const parts = step.ok ? step.value.parts : 1;
  return frame.storeys.length * (count * parts + (analysis.tail / motion.interval) * parts);
}
