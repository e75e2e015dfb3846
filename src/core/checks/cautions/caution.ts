import type { Analysis, Run } from '../../dynamics/run.ts';
import type { Frame } from '../../frame/frame.ts';
import type { PreparedFrame } from '../../frame/prepare.ts';
import { printQuantity } from '../../units/quantities.ts';
import type { Envelope } from '../envelope.ts';
import type { Limits } from '../limits.ts';

/** What the screen and the note print under Cautions: subject, fact, number. */
export interface Caution {
  /** Stable name, e.g. `limit-exceeded`. */
  readonly code: string;
  /** The sentence, with numbers, without a full stop. */
  readonly text: string;
  /** Where a click on it goes. */
  readonly cause:
    | { readonly kind: 'storey'; readonly storey: number }
    | { readonly kind: 'motion'; readonly motion: string }
    | { readonly kind: 'analysis' }
    | { readonly kind: 'damping' }
    | { readonly kind: 'limit' };
}

export interface MotionRun {
  readonly motion: string;
  readonly run: Run;
}

export interface CautionInput {
  readonly envelope: Envelope;
  readonly limits: Limits;
  readonly analysis: Analysis;
  readonly prepared: PreparedFrame;
  readonly runs: readonly MotionRun[];
  /** The used motions, in the order of the runs; `lastOverPeak` where the samples are at hand. */
  readonly motions: readonly { readonly name: string; readonly interval: number; readonly lastOverPeak?: number }[];
  /** Step error a motion; null while it is not known. */
  readonly stepErrors: Readonly<Record<string, number>> | null;
  /** Runs at half the step, as far as they are in. */
  readonly halves?: readonly MotionRun[];
}

export function percent(value: number, decimals: number): string {
  return `${printQuantity(value, 'percent', 'si', decimals)} %`;
}

/** Indices from 0 to length - 1 that it holds for. */
export function indices(length: number, holds: (i: number) => boolean): number[] {
  return Array.from({ length }, (_, i) => i).filter(holds);
}

/** The first storey that drift limits and checks between storeys look at: an isolator is left out of them (project-file page, Roles). */
export function firstChecked({ storeys }: Pick<Frame, 'storeys'>): number {
  return storeys[0]?.role === 'isolator' ? 1 : 0;
}
