import { digestOfText } from '../core/digest.ts';
import { type LeastParts, leastParts, mostParts } from '../core/dynamics/autoStep.ts';
import { stepOf } from '../core/dynamics/steps.ts';
import type { Case } from '../document/case.ts';
import type { RunRequest } from '../engine/protocol.ts';
import { weightOf } from '../engine/weight.ts';

/** One motion of a question: its run at each number of parts of the interval that may be asked. */
export interface Ask {
  readonly motion: string;
  /** Names the motion, whatever the frame: the number of parts that did for it is remembered under it. */
  readonly record: string;
  /** Parts of the step as typed, or where the search for one begins. */
  readonly first: number;
  /** The most parts that the search tries; `first` where the step was typed. */
  readonly most: number;
  /** What asked for `first`; null where the step was typed. */
  readonly least: LeastParts | null;
  at(parts: number): RunAsk;
}

export interface RunAsk {
  /** What the run is computed from: equal keys, equal bits. */
  readonly key: string;
  /** Storey-steps of a linear frame, for the expected time. */
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
  const asks = from.motions.map((motion) => askOf(from, motion, frameKey));
  const step = from.analysis.step === 'auto' ? 'auto' : 'typed';
  return { key: digestOfText(`${step} ${asks.map((ask) => ask.at(ask.first).key).join()}`), case: from, asks };
}

/** The same run with its histories kept. */
export function withHistories(request: RunRequest): RunRequest {
  return { ...request, want: { histories: true } };
}

function askOf({ prepared, analysis }: Case, motion: Case['motions'][number], frameKey: string): Ask {
  const { name, samples, interval, scale, count } = motion;
  const { method, step, tail, stopDrift } = analysis;
  const made = new Map<number, RunAsk>();
  return {
    motion: name,
    record: JSON.stringify([name, samples, interval]),
    ...rangeOf(),
    at(parts) {
      const known = made.get(parts);
      if (known) return known;
      const request: RunRequest = {
        frameKey,
        prepared,
        analysis: { ...analysis, step: { parts } },
        motion: { samples, interval, scale },
        want: { histories: false },
      };
      const key = JSON.stringify([frameKey, method, tail, stopDrift, samples, interval, scale, parts]);
      const one = { key, request, weight: weightOf(request, count) };
      made.set(parts, one);
      return one;
    },
  };

  function rangeOf(): Pick<Ask, 'first' | 'most' | 'least'> {
    if (step === 'auto') {
      const least = leastParts(prepared, method, interval);
      return { first: least.parts, most: Math.max(least.parts, mostParts(count, interval, tail)), least };
    }
    const typed = stepOf(step, interval);
    const parts = typed.ok ? typed.value.parts : 1;
    return { first: parts, most: parts, least: null };
  }
}
