import type { Caution } from '../core/checks/cautions.ts';
import type { Envelope } from '../core/checks/envelope.ts';
import type { Run } from '../core/dynamics/run.ts';
import type { Fault } from '../core/fault.ts';
import type { Mode } from '../core/frame/modes.ts';
import type { Case } from '../document/case.ts';

/**
 * Derived results, keyed by a digest of what they were computed from; never saved, never undone. CONTRACT (filled in by
 * the state room): `useResults(selector)`, `resultsStore`, `startResults(engine)` called once by main.tsx.
 */
export interface MotionRun {
  readonly motion: string;
  readonly run: Run;
}

/** A whole answer: everything the sheet prints comes from here. */
export interface Answers {
  readonly key: string;
  readonly case: Case;
  readonly modes: readonly Mode[];
  readonly runs: readonly MotionRun[];
  readonly envelope: Envelope;
  readonly cautions: readonly Caution[];
  /** Largest natural frequency x step / stability limit, shortest period, and the like, for the evidence line. */
  readonly step: {
    readonly size: number;
    readonly shortestPeriod: number;
    readonly overShortest: number;
    readonly limit: number | null;
  };
  /** [ms] of computing, and when it was done [ms since 1970]. */
  readonly took: number;
  readonly at: number;
}

export interface ResultsState {
  /**
   * empty: nothing to compute yet. current: answers belong to the document as it stands (draft included). running: a
   * newer question is under way, answers are the last ones. stale: the document cannot run (see faults) or was stopped.
   */
  readonly status: 'empty' | 'current' | 'running' | 'stale';
  /** The last whole answer, or null. */
  readonly answers: Answers | null;
  /** Modes of the frame as it stands, even without motions; null where the frame cannot stand. */
  readonly modes: readonly Mode[] | null;
  /** Why the document does not run. */
  readonly faults: readonly Fault[];
  /** In words, which field changed since the answers shown: "storey 2 stiffness is now 470". */
  readonly changed: string | null;
  readonly progress: { readonly done: number; readonly of: number; readonly startedAt: number } | null;
  /** Run with histories of the chosen motion; null while it is not there or old. */
  readonly chosen: MotionRun | null;
  /** Step error a motion, once known; null until then. */
  readonly stepErrors: Readonly<Record<string, number>> | null;
}

export interface ResultsActions {
  /** F9: run although it is expected to be slow, or again after a stop. */
  runNow(): void;
  stop(): void;
}
