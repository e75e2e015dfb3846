import type { Run } from '../core/dynamics/run.ts';
import type { Endpoint, Engine, FromWorker, Outcome, ReadAnswer, Reply, RunRequest, WorkerJob } from './protocol.ts';
import { weightOf } from './weight.ts';

/** A worker that has a job and says nothing for so long is taken for dead [ms]. */
const SILENT = 2000;
/** A worker that never said anything is still being fetched and compiled; it is given so many times longer. */
const STARTING = 5;
/** A file is read in one piece: so much longer a byte [ms]. */
const READING = 1e-3;
/** The clock looks so many times within SILENT: a page that was asleep or busy counts once, not for the time that passed. */
const LOOKS = 8;
/** Work sent ahead to a worker, in storey-steps: some tens of milliseconds. More stays here, where it can still be shared out. */
const AHEAD = 4e6;
/** What a byte of a file weighs in storey-steps. */
const BYTE = 10;

interface Job {
  readonly id: number;
  readonly question: string;
  readonly priority: number;
  readonly weight: number;
  /** How long a worker may say nothing while it has this job [ms]. */
  readonly patience: number;
  readonly task:
    | { readonly kind: 'run'; readonly request: RunRequest }
    | { readonly kind: 'read'; readonly file: string; readonly bytes: ArrayBuffer; readonly answers: ReadAnswers };
  settle(outcome: Outcome | 'superseded'): void;
  readonly onProgress: ((share: number) => void) | undefined;
  /** It was with a worker that died: sent once more, alone, so that the culprit shows. */
  suspect: boolean;
}
type ReadAnswers = Parameters<Engine['read']>[3];

interface Slot {
  readonly end: Endpoint;
  /** Digests of the samples that were sent. */
  readonly motions: Set<string>;
  /** The frame that was sent last. */
  frameKey: string | null;
  readonly jobs: Map<number, Job>;
  drops: number[];
  /** It has said something. */
  spoke: boolean;
  looks: number;
}

export interface PoolOptions {
  /** Number of workers, at least 1; all are made at once, so that they are there when the first document is. */
  readonly size: number;
  readonly make: () => Endpoint;
  /** Made in the place of a worker that never said anything. */
  readonly fallback?: () => Endpoint;
  /** [ms] */
  readonly silent?: number;
}

/**
 * The engine over a fixed number of workers. A job is one motion or one file; the jobs of one keystroke cross in one message
 * a worker. A worker that dies, or is silent while it has a job, is replaced and its jobs are repeated once, each alone.
 */
export function createPool({ size, make, fallback, silent = SILENT }: PoolOptions): Engine {
  const samples = new Map<string, Float64Array>();
  const open = new Map<string, Job>();
  const slots: Slot[] = [];
  let waiting: Job[] = [];
  let ids = 0;
  let flushing = false;
  let ended = false;
  let clock: ReturnType<typeof setInterval> | null = null;

  function ask<T extends Run | ReadAnswer>(
    question: string,
    kind: 'run' | 'read',
    job: Omit<Job, 'id' | 'question' | 'settle' | 'suspect'>,
  ): Promise<Reply<T>> {
    if (ended) return Promise.resolve({ status: 'superseded' });
    cancel(question);
    return new Promise((resolve) => {
      const id = ++ids;
      const settle = (outcome: Outcome | 'superseded') => {
        if (open.get(question)?.id === id) open.delete(question);
        if (outcome === 'superseded') resolve({ status: 'superseded' });
        else if (outcome.kind === kind) resolve({ status: 'done', value: outcome.value as T, took: outcome.took });
        else
          resolve({ status: 'failed', message: outcome.kind === 'failed' ? outcome.message : 'a wrong answer came' });
      };
      const asked: Job = { ...job, id, question, settle, suspect: false };
      open.set(question, asked);
      waiting.push(asked);
      flushSoon();
    });
  }

  function cancel(question: string): void {
    const job = open.get(question);
    if (!job) return;
    waiting = waiting.filter((other) => other !== job);
    for (const slot of slots) if (slot.jobs.delete(job.id)) slot.drops.push(job.id);
    job.settle('superseded');
    flushSoon();
  }

  function flushSoon(): void {
    if (flushing) return;
    flushing = true;
    queueMicrotask(() => {
      flushing = false;
      if (!ended) flush();
    });
  }

  /** Shares out what waits, and sends each worker its part in one message. */
  function flush(): void {
    const shares = new Map<Slot, Job[]>(slots.map((slot) => [slot, []]));
    waiting.sort((a, b) => a.priority - b.priority || a.id - b.id);
    waiting = waiting.filter((job) => {
      const slot = slotFor(job);
      if (!slot) return true;
      slot.jobs.set(job.id, job);
      shares.set(slot, [...(shares.get(slot) ?? []), job]);
      return false;
    });
    for (const [slot, share] of shares) send(slot, share);
    watch();
  }

  /** The worker with the least to do before this job; null where each has enough ahead. */
  function slotFor(job: Job): Slot | null {
    let best: Slot | null = null;
    let least = AHEAD;
    for (const slot of slots) {
      if (job.suspect ? slot.jobs.size > 0 : hasSuspect(slot)) continue;
      const before = loadBefore(slot, job.priority);
      if (before === 0 && slot.jobs.size === 0) return slot;
      if (before < least) [best, least] = [slot, before];
    }
    return slots.length < size ? addSlot(make()) : best;
  }

  function addSlot(end: Endpoint): Slot {
    const slot: Slot = { end, motions: new Set(), frameKey: null, jobs: new Map(), drops: [], spoke: false, looks: 0 };
    slots.push(slot);
    end.listen((message) => hear(slot, message));
    end.onDeath((why) => died(slot, why));
    return slot;
  }

  function send(slot: Slot, share: readonly Job[]): void {
    const { drops: drop } = slot;
    if (share.length === 0 && drop.length === 0) return;
    slot.drops = [];
    if (slot.jobs.size === share.length) slot.looks = 0;
    const transfer: Transferable[] = [];
    try {
      const jobs = share.map((job) => crossing(slot, job, transfer));
      slot.end.post({ kind: 'work', drop, jobs }, transfer);
    } catch (error) {
      // What cannot be cloned never crossed: the worker is well, these jobs are not.
      slot.frameKey = null;
      for (const job of share) {
        slot.jobs.delete(job.id);
        job.settle({ id: job.id, kind: 'failed', message: `it could not be sent to the worker: ${String(error)}` });
      }
    }
  }

  /** The job as it crosses; sends its samples ahead, and its frame where it is not the one sent last. */
  function crossing(slot: Slot, { id, priority, task }: Job, transfer: Transferable[]): WorkerJob {
    if (task.kind === 'read') {
      const bytes = task.bytes.slice(0);
      transfer.push(bytes);
      return { kind: 'read', id, priority, file: task.file, bytes, answers: task.answers };
    }
    const { frameKey, prepared, analysis, motion, want } = task.request;
    const known = samples.get(motion.samples);
    if (known && !slot.motions.has(motion.samples)) {
      slot.motions.add(motion.samples);
      const copy = known.slice();
      slot.end.post({ kind: 'motion', digest: motion.samples, samples: copy }, [copy.buffer]);
    }
    const sent = slot.frameKey === frameKey ? null : prepared;
    slot.frameKey = frameKey;
    return { kind: 'run', id, priority, prepared: sent, analysis, motion, want };
  }

  function hear(slot: Slot, message: FromWorker): void {
    if (!slots.includes(slot)) return;
    slot.spoke = true;
    slot.looks = 0;
    if (message.kind === 'ready') return;
    for (const outcome of message.outcomes) {
      const job = slot.jobs.get(outcome.id);
      slot.jobs.delete(outcome.id);
      job?.settle(outcome);
    }
    if (message.progress) slot.jobs.get(message.progress.id)?.onProgress?.(message.progress.share);
    if (waiting.length > 0) flushSoon();
    watch();
  }

  function died(slot: Slot, why: string): void {
    const at = slots.indexOf(slot);
    if (at < 0) return;
    slots.splice(at, 1);
    slot.end.end();
    for (const job of slot.jobs.values()) {
      if (job.suspect && slot.spoke) {
        job.settle({ id: job.id, kind: 'failed', message: `the worker broke down twice on this job: ${why}` });
      } else {
        job.suspect = slot.spoke;
        waiting.push(job);
      }
    }
    if (!slot.spoke) {
      if (fallback) addSlot(fallback());
      else failAll(`no worker could be started: ${why}`);
    }
    flushSoon();
  }

  function failAll(message: string): void {
    const failed = waiting;
    waiting = [];
    for (const job of failed) job.settle({ id: job.id, kind: 'failed', message });
  }

  /** The clock runs only while a worker has a job. */
  function watch(): void {
    const needed = !ended && slots.some((slot) => slot.jobs.size > 0);
    if (needed) clock ??= setInterval(look, silent / LOOKS);
    else if (clock !== null) {
      clearInterval(clock);
      clock = null;
    }
  }

  function look(): void {
    for (const slot of [...slots]) {
      if (slot.jobs.size === 0) continue;
      slot.looks += 1;
      const longest = Math.max(...Array.from(slot.jobs.values(), (job) => job.patience));
      const patience = (slot.spoke ? 1 : STARTING) * silent + longest;
      if (slot.looks * (silent / LOOKS) >= patience) died(slot, `it was silent for ${(patience / 1000).toFixed(1)} s`);
    }
  }

  while (slots.length < size) addSlot(make());

  return {
    putMotion(digest, values) {
      samples.set(digest, values);
    },
    hasMotion: (digest) => samples.has(digest),
    dropMotion(digest) {
      samples.delete(digest);
      for (const slot of slots) if (slot.motions.delete(digest)) slot.end.post({ kind: 'forget', digest }, []);
    },
    run: (question, request, options = {}) =>
      ask<Run>(question, 'run', {
        priority: options.priority ?? 0,
        onProgress: options.onProgress,
        weight: weightOf(request, samples.get(request.motion.samples)?.length ?? 0),
        patience: 0,
        task: { kind: 'run', request },
      }),
    read: (question, file, bytes, answers) =>
      ask<ReadAnswer>(question, 'read', {
        priority: 0,
        onProgress: undefined,
        weight: BYTE * bytes.byteLength,
        patience: READING * bytes.byteLength,
        task: { kind: 'read', file, bytes, answers },
      }),
    cancel,
    dispose() {
      if (ended) return;
      ended = true;
      waiting = [];
      for (const job of [...open.values()]) job.settle('superseded');
      for (const slot of slots) {
        slot.jobs.clear();
        slot.end.end();
      }
      slots.length = 0;
      watch();
    },
  };
}

function hasSuspect(slot: Slot): boolean {
  for (const job of slot.jobs.values()) if (job.suspect) return true;
  return false;
}

/** Storey-steps that the worker does before a job of this priority. */
function loadBefore(slot: Slot, priority: number): number {
  let load = 0;
  for (const job of slot.jobs.values()) if (job.priority <= priority) load += job.weight;
  return load;
}
