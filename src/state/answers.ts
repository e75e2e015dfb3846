import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import type { Caution } from '../core/checks/cautions.ts';
import type { Envelope } from '../core/checks/envelope.ts';
import type { Evidence } from '../core/dynamics/evidence.ts';
import type { Run } from '../core/dynamics/run.ts';
import type { Fault } from '../core/fault.ts';
import type { Mode } from '../core/frame/modes.ts';
import type { Case } from '../document/case.ts';

export interface MotionRun {
  readonly motion: string;
  readonly run: Run;
}

/** A whole answer: everything the sheet prints comes from here. */
export interface Answers {
  /** Digest of what it was computed from. */
  readonly key: string;
  readonly case: Case;
  readonly modes: readonly Mode[];
  /** One a used motion, in document order, without histories. */
  readonly runs: readonly MotionRun[];
  readonly envelope: Envelope;
  readonly cautions: readonly Caution[];
  /** How far each run can be trusted, by motion; its step error is null until the half-step run is in. */
  readonly evidence: Readonly<Record<string, Evidence>>;
  /** The same of the whole suite in one sentence, as the note prints it. */
  readonly evidenceSentence: string;
  /** Largest natural frequency x step / stability limit, shortest period, and the like, for the evidence line. */
  readonly step: {
    /** The largest step of the suite [s]. */
    readonly size: number;
    /** [s] */
    readonly shortestPeriod: number;
    /** size / shortestPeriod [-]. */
    readonly overShortest: number;
    /** Largest stable step [s]; null: any step is stable. */
    readonly limit: number | null;
  };
  /** [ms] of computing, and when it was done [ms since 1970]. */
  readonly took: number;
  readonly at: number;
}

/** Derived results, keyed by a digest of what they were computed from; never saved, never undone. */
export interface ResultsState {
  /**
   * empty: nothing to compute (no storey, or no motion in use), answers is null. current: answers belong to the document
   * as it stands (draft included). running: a newer question is under way, answers are the last ones, or null the first
   * time. stale: the document cannot run or a run failed (see faults), it was stopped, or it waits for F9 (see `waits`);
   * answers are the last ones, or null.
   */
  readonly status: 'empty' | 'current' | 'running' | 'stale';
  /** The question has been under way for 0.4 s: show that it runs. */
  readonly slow: boolean;
  /** Stale only because the run is expected to be long, or was stopped: F9 (`runNow`) starts it. */
  readonly waits: boolean;
  /** The last whole answer, or null. */
  readonly answers: Answers | null;
  /** Modes of the frame as it stands, even without motions; null where the frame cannot stand. */
  readonly modes: readonly Mode[] | null;
  /** How much stiffer than in those modes the frame can get, core/frame/stiffening.ts [-]. */
  readonly stiffening: number;
  /** Why the document does not run. */
  readonly faults: readonly Fault[];
  /** In words, which field changed since the answers shown: "storey 2 stiffness is now 470". */
  readonly changed: string | null;
  /** Motions done (with the parts of those under way) of those asked; startedAt in ms since 1970. */
  readonly progress: { readonly done: number; readonly of: number; readonly startedAt: number } | null;
  /** Runs of the question under way that are in so far; filled only once it is slow. */
  readonly arrived: readonly MotionRun[];
  /** Run with histories of the chosen motion; null while it is not there or old. */
  readonly chosen: MotionRun | null;
  /** Step error a motion, once known; null until then. */
  readonly stepErrors: Readonly<Record<string, number>> | null;
}

export const resultsStore = createStore<ResultsState>(() => ({
  status: 'empty',
  slow: false,
  waits: false,
  answers: null,
  modes: null,
  stiffening: 1,
  faults: [],
  changed: null,
  progress: null,
  arrived: [],
  chosen: null,
  stepErrors: null,
}));

export function useResults<T>(selector: (state: ResultsState) => T): T {
  return useStore(resultsStore, selector);
}
