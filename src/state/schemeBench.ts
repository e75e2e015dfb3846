import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import type { MethodChoice } from '../core/dynamics/run.ts';
import type { BenchEntry, BenchPlan, BenchResult } from '../core/dynamics/schemeBench.ts';

/** One scheme at one step: what is known beforehand, and what came of it. */
export interface BenchRow extends BenchPlan {
  /** waits, runs, done; unstable: beyond the limit, not run; failed: see `why`. */
  readonly state: 'waits' | 'done' | 'unstable' | 'failed';
  readonly result: BenchResult | null;
  readonly why: string | null;
}

/** Schemes and steps set side by side for the frame and the chosen motion as they stood when it was asked; never saved. */
export interface SchemeBenchState {
  readonly status: 'idle' | 'running' | 'done' | 'stopped';
  /** The motion that it was asked for; null while idle. */
  readonly motion: string | null;
  /** Digest of frame, tail and motion that it was asked for; see `benchIsOld`. */
  readonly key: string | null;
  readonly reference: BenchEntry | null;
  readonly rows: readonly BenchRow[];
  readonly progress: { readonly done: number; readonly of: number } | null;
}

/** What is set side by side; absent: BENCH_METHODS and BENCH_PARTS. */
export interface BenchChoice {
  readonly methods?: readonly MethodChoice[];
  readonly parts?: readonly number[];
}

export const schemeBenchStore = createStore<SchemeBenchState>(() => ({
  status: 'idle',
  motion: null,
  key: null,
  reference: null,
  rows: [],
  progress: null,
}));

export function useSchemeBench<T>(selector: (state: SchemeBenchState) => T): T {
  return useStore(schemeBenchStore, selector);
}

/** Sets schemes and steps side by side for the frame as committed and the chosen motion. */
export declare function runSchemeBench(choice?: BenchChoice): void;

/** Stops what is under way; rows that are done stay. */
export declare function stopSchemeBench(): void;

/** Whether the rows belong to another frame, motion or tail than the document holds now. */
export declare function benchIsOld(): boolean;
