import type { Envelope } from '../checks/envelope.ts';
import type { Limits } from '../checks/limits.ts';
import type { Analysis, Run } from '../dynamics/run.ts';
import type { Storey } from '../frame/frame.ts';
import type { PreparedFrame } from '../frame/prepare.ts';
import type { Origin } from '../motion/motion.ts';

/** What the tables, the response file and the note are written from. */
export interface ReportSource {
  readonly title: string;
  readonly prepared: PreparedFrame;
  /** All motions of the project in its order, those left out as well. */
  readonly motions: readonly ReportMotion[];
  /** Runs of the used motions, in the same order. */
  readonly runs: readonly ReportRun[];
  readonly envelope: Envelope;
  readonly analysis: Analysis;
  readonly limits: Limits;
}

export interface ReportMotion {
  readonly name: string;
  /** [s] */
  readonly interval: number;
  /** Number of samples. */
  readonly count: number;
  readonly scale: number;
  /** As stored, before the scale [m/s2]; null where it is not at hand. */
  readonly peakAcceleration: number | null;
  readonly used: boolean;
  readonly reason?: string;
  readonly origin?: Origin;
}

export interface ReportRun {
  readonly motion: string;
  readonly run: Run;
  /** Estimated error of the peak drifts from the step [-]; null where it is not known. */
  readonly stepError: number | null;
  /** Why the step is what it is, in words, where it was chosen by halving. */
  readonly stepWhy?: string;
}

/** Whether a storey can yield: it then has a yield drift, and a ductility. */
export function yields({ law }: Storey): boolean {
  return law.kind !== 'elastic';
}
