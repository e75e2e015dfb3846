import { type RunUnderWay, startRun } from '../core/doors.ts';
import type { Run } from '../core/dynamics/run.ts';
import type { PreparedFrame } from '../core/frame/prepare.ts';
import type { FromWorker, Outcome, ReadJob, RunJob, ToWorker } from './protocol.ts';
import type { readFile } from './reading.ts';
import type { Turns } from './turns.ts';

/** A slice ends after so many milliseconds at the first chance; with a chunk of steps on top it stays under 20. */
const SLICE = 12;
/**
 * The march is left about so often to look at the clock [ms]. Steps of a frame that begins to yield cost several times what they
 * did before, so the next chunk is as long as the last one allows, and grows by no more than GROWTH.
 */
const CHUNK = 4;
const GROWTH = 4;
const FIRST_STEPS = 64;
/** A sign of life at least so often while a job is under way [ms]. */
const SIGN_OF_LIFE = 100;
/** Shorter arrays are cheaper to copy than to transfer [bytes]. */
const WORTH_TRANSFER = 4096;

interface RunUnderHand {
  readonly job: RunJob;
  readonly prepared: PreparedFrame;
  march: RunUnderWay | null;
  /** Steps of the next chunk. */
  steps: number;
  /** [ms] so far. */
  took: number;
}
type UnderHand = RunUnderHand | { readonly job: ReadJob; readonly read: typeof readFile };

/**
 * The far side of the protocol, the same in a worker and on the page's own thread: takes messages, works through its jobs in
 * slices, lowest priority number first, and returns to the message loop between slices.
 */
export function jobs(
  post: (message: FromWorker, transfer: Transferable[]) => void,
  turns: Turns,
): (message: ToWorker) => void {
  const motions = new Map<string, Float64Array>();
  let prepared: PreparedFrame | null = null;
  /** Files that wait for their reader. */
  const unread = new Set<number>();
  let queue: UnderHand[] = [];
  let waiting = false;
  let lastPost = 0;

  function receive(message: ToWorker): void {
    switch (message.kind) {
      case 'motion':
        motions.set(message.digest, message.samples);
        return;
      case 'forget':
        motions.delete(message.digest);
        return;
      case 'work':
        if (message.drop.length > 0) queue = queue.filter(({ job }) => !message.drop.includes(job.id));
        for (const id of message.drop) unread.delete(id);
        for (const job of message.jobs) {
          if (job.kind === 'run') queue.push(underHand(job));
          else void fetchReader(job);
        }
        order();
    }
  }

  function order(): void {
    queue.sort((a, b) => a.job.priority - b.job.priority || a.job.id - b.job.id);
    turn();
  }

  /** The reader of records is loaded with the first file: most sessions never need it, and the first answer must not wait for it. */
  async function fetchReader(job: ReadJob): Promise<void> {
    unread.add(job.id);
    try {
      const { readFile: read } = await import('./reading.ts');
      if (unread.delete(job.id)) queue.push({ job, read });
      order();
    } catch (error) {
      if (unread.delete(job.id)) post({ kind: 'news', outcomes: [failure(job.id, error)], progress: null }, []);
    }
  }

  function underHand(job: RunJob): RunUnderHand {
    if (job.prepared) prepared = job.prepared;
    if (!prepared) throw new TypeError('a run without its frame, and none was sent before');
    return { job, prepared, march: null, steps: FIRST_STEPS, took: 0 };
  }

  function turn(): void {
    if (waiting || queue.length === 0) return;
    waiting = true;
    turns.next(slice);
  }

  function slice(): void {
    waiting = false;
    const outcomes: Outcome[] = [];
    const transfer: Transferable[] = [];
    const start = performance.now();
    while (queue.length > 0 && performance.now() - start < SLICE) {
      const outcome = workOn(queue[0], transfer);
      if (!outcome) continue;
      queue.shift();
      outcomes.push(outcome);
    }
    const now = performance.now();
    if (outcomes.length > 0 || now - lastPost > SIGN_OF_LIFE) {
      lastPost = now;
      post({ kind: 'news', outcomes, progress: progressOf(queue[0]) }, transfer);
    }
    turn();
  }

  /** A chunk of steps of a run, or a whole file; null while the job is not over. */
  function workOn(under: UnderHand, transfer: Transferable[]): Outcome | null {
    const { id } = under.job;
    try {
      if (!('march' in under)) {
        const { file, bytes, answers } = under.job;
        const before = performance.now();
        const value = under.read(file, new Uint8Array(bytes), answers);
        transfer.push(...buffersOf(value));
        return { id, kind: 'read', value, took: performance.now() - before };
      }
      const run = marchOn(under);
      if (!run) return null;
      if (run.histories) transfer.push(...buffersOf(run.histories));
      return { id, kind: 'run', value: run, took: under.took };
    } catch (error) {
      return failure(id, error);
    }
  }

  function marchOn(under: RunUnderHand): Run | null {
    const before = performance.now();
    under.march ??= start(under);
    const begun = performance.now();
    const over = under.march.advance(under.steps);
    const end = performance.now();
    const took = end - begun;
    under.took += end - before;
    // The clock may be as coarse as 0.1 ms: grow until the chunk is long enough to be measured.
    under.steps = Math.max(1, Math.ceil(under.steps * Math.min(GROWTH, CHUNK / Math.max(took, 1e-3))));
    return over ? under.march.finish() : null;
  }

  function start({ job, prepared }: RunUnderHand): RunUnderWay {
    const acceleration = motions.get(job.motion.samples);
    if (!acceleration) throw new TypeError(`samples ${job.motion.samples} were not sent`);
    const { interval, scale } = job.motion;
    return startRun(
      prepared,
      { frame: prepared.frame, analysis: job.analysis, motion: { interval, scale, acceleration } },
      job.want,
    );
  }

  return receive;
}

function failure(id: number, error: unknown): Outcome {
  return { id, kind: 'failed', message: error instanceof Error ? error.message : String(error) };
}

function progressOf(under: UnderHand | undefined): { readonly id: number; readonly share: number } | null {
  if (!under) return null;
  const share = 'march' in under && under.march ? under.march.done / Math.max(1, under.march.steps) : 0;
  return { id: under.job.id, share };
}

/** The larger buffers behind the typed arrays of plain data, each once. */
function buffersOf(value: unknown, found = new Set<ArrayBuffer>()): Set<ArrayBuffer> {
  if (ArrayBuffer.isView(value)) {
    if (value.buffer instanceof ArrayBuffer && value.buffer.byteLength >= WORTH_TRANSFER) found.add(value.buffer);
  } else if (Array.isArray(value)) {
    for (const entry of value) buffersOf(entry, found);
  } else if (typeof value === 'object' && value !== null) {
    for (const entry of Object.values(value)) buffersOf(entry, found);
  }
  return found;
}
