import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { digestOfText } from '../core/digest.ts';
import { MOST_STEPS } from '../core/dynamics/autoStep.ts';
import type { MethodChoice, Run } from '../core/dynamics/run.ts';
import {
  BENCH_METHODS,
  BENCH_PARTS,
  type BenchEntry,
  type BenchPlan,
  type BenchResult,
  benchPlan,
  benchReference,
  benchResult,
} from '../core/dynamics/schemeBench.ts';
import { type Case, caseOf } from '../document/case.ts';
import type { Engine } from '../engine/protocol.ts';
import { documentStore, effectiveProject } from './document.ts';
import { engineInUse } from './engineInUse.ts';
import { lendingTo } from './lending.ts';
import { questionOf, type RunAsk } from './question.ts';
import { type Recent, recentRuns } from './recent.ts';
import { samplesOf } from './samples.ts';
import { chosenMotion } from './selectors.ts';

/** One scheme at one step: what is known beforehand, and what came of it. */
export interface BenchRow extends BenchPlan {
  /** unstable: beyond the limit, and not run. failed: see `why`. */
  readonly state: 'waits' | 'done' | 'unstable' | 'failed';
  readonly result: BenchResult | null;
  readonly why: string | null;
}

/** Schemes and steps set side by side for the frame and the chosen motion as they stood when it was asked; never saved. */
export interface SchemeBenchState {
  readonly status: 'idle' | 'running' | 'done' | 'stopped';
  /** The motion that it was asked for; null while idle. */
  readonly motion: string | null;
  /** Digest of frame, tail and motion that it was asked for: old where it is not `benchKey()`. */
  readonly key: string | null;
  /** The run that the errors are measured against. */
  readonly reference: BenchEntry | null;
  readonly rows: readonly BenchRow[];
  /** Runs done of those asked, the reference with them. */
  readonly progress: { readonly done: number; readonly of: number } | null;
}

/** What is set side by side; absent: BENCH_METHODS and BENCH_PARTS. */
export interface BenchChoice {
  readonly methods?: readonly MethodChoice[];
  readonly parts?: readonly number[];
}

const IDLE: SchemeBenchState = { status: 'idle', motion: null, key: null, reference: null, rows: [], progress: null };

export const schemeBenchStore = createStore<SchemeBenchState>(() => IDLE);

export function useSchemeBench<T>(selector: (state: SchemeBenchState) => T): T {
  return useStore(schemeBenchStore, selector);
}

/** After the answers and their evidence. */
const PRIORITY = 20;

interface Timed {
  readonly run: Run;
  /** [ms] */
  readonly took: number;
}

let bench: { readonly engine: Engine; readonly of: ReturnType<typeof schemeBench> } | null = null;

/** Sets schemes and steps side by side for the frame and the chosen motion. @returns why it cannot, in words, or null */
export function runSchemeBench(choice: BenchChoice = {}): string | null {
  const engine = engineInUse();
  if (!engine) return 'there is no engine';
  if (bench?.engine !== engine) bench = { engine, of: schemeBench(engine) };
  return bench.of.run(choice);
}

/** Stops what is under way; rows that are done stay. */
export function stopSchemeBench(): void {
  bench?.of.stop();
}

/** What the bench would be asked for as the document stands; null where no motion is in use. */
export function benchKey(): string | null {
  const { frame, analysis, motions } = effectiveProject(documentStore.getState());
  const chosen = chosenMotion();
  const motion = motions.find(({ name, used }) => used && name === chosen);
  if (!motion) return null;
  const { samples, interval, scale } = motion;
  const { tail, stopDrift } = analysis;
  const text = JSON.stringify([frame, tail, stopDrift, samples, interval, scale], (name, value) =>
    name === 'name' ? undefined : value,
  );
  return digestOfText(text);
}

function schemeBench(engine: Engine) {
  const known: Recent<Timed> = recentRuns();
  const lending = lendingTo(engine, samplesOf);
  /** Names of the jobs that are with the engine. */
  const underWay = new Set<string>();
  let round = 0;

  function run({ methods = BENCH_METHODS, parts = BENCH_PARTS }: BenchChoice): string | null {
    const result = caseOf(effectiveProject(documentStore.getState()));
    if (!result.ok) return result.faults[0].message;
    const name = chosenMotion();
    const motion = result.value.motions.find((one) => one.name === name);
    if (!motion) return 'no motion is in use';
    if (!lending.ready(motion.samples)) return `the samples of ${motion.name} are not in this browser's store`;
    const fitting = parts.filter((n) => n * motion.count <= MOST_STEPS);
    const asked = benchReference(fitting);
    const reference = { ...asked, parts: Math.min(asked.parts, Math.floor(MOST_STEPS / motion.count)) };
    stop();
    round += 1;
    const plan = benchPlan(result.value.prepared, motion.interval, methods, fitting);
    const rows = plan.map(
      (one): BenchRow => ({ ...one, state: one.stable ? 'waits' : 'unstable', result: null, why: null }),
    );
    schemeBenchStore.setState({
      status: 'running',
      motion: motion.name,
      key: benchKey(),
      reference,
      rows,
      progress: null,
    });
    const at = (entry: BenchEntry) => askOf(result.value, motion.name, entry);
    const entries = [reference, ...rows.filter(({ stable }) => stable)];
    const failures = new Map<string, string>();
    const mine = round;
    const came = () => mine === round && show(reference, at, entries, failures);
    for (const [i, entry] of entries.entries()) send(`bench ${i}`, at(entry), failures, came);
    came();
    return null;
  }

  function send(name: string, { key, request }: RunAsk, failures: Map<string, string>, came: () => void): void {
    if (known.has(key)) return;
    underWay.add(name);
    void engine.run(name, request, { priority: PRIORITY }).then((reply) => {
      if (reply.status === 'superseded') return;
      underWay.delete(name);
      if (reply.status === 'done') known.set(key, { run: reply.value, took: reply.took });
      else failures.set(key, reply.message);
      came();
    });
  }

  /** Rows are filled once the reference is in. */
  function show(
    reference: BenchEntry,
    at: (entry: BenchEntry) => RunAsk,
    entries: readonly BenchEntry[],
    failures: ReadonlyMap<string, string>,
  ): void {
    const finest = known.get(at(reference).key);
    const lost = failures.get(at(reference).key);
    const rows = schemeBenchStore.getState().rows.map((row): BenchRow => {
      if (row.state !== 'waits') return row;
      const { key } = at(row);
      const why = lost === undefined ? failures.get(key) : `the run that it is measured against failed: ${lost}`;
      if (why !== undefined) return { ...row, state: 'failed', why };
      const timed = known.get(key);
      if (!timed || !finest) return row;
      return { ...row, state: 'done', result: benchResult(timed.run, finest.run, timed.took) };
    });
    const done = entries.filter((entry) => known.has(at(entry).key) || failures.has(at(entry).key)).length;
    const over = done === entries.length;
    const progress = over ? null : { done, of: entries.length };
    schemeBenchStore.setState({ rows, progress, status: over ? 'done' : 'running' });
  }

  function stop(): void {
    if (schemeBenchStore.getState().status !== 'running') return;
    round += 1;
    for (const name of underWay) engine.cancel(name);
    underWay.clear();
    schemeBenchStore.setState({ status: 'stopped', progress: null });
  }

  return { run, stop };
}

function askOf(from: Case, name: string, { method, parts }: BenchEntry): RunAsk {
  const motions = from.motions.filter((motion) => motion.name === name);
  // The step of the analysis is another: only the parts that are asked for count.
  const analysis = { ...from.analysis, method, step: { parts } };
  return questionOf({ ...from, motions, analysis }).asks[0].at(parts);
}
