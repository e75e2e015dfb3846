import type { Analysis, Run, Want } from '../core/dynamics/run.ts';
import type { PreparedFrame } from '../core/frame/prepare.ts';
import type { MotionMeasures, RecordAnswers, RecordReading } from '../core/motion/reading.ts';

/**
 * What crosses between the page and a worker: types only, plain data and transferred buffers. A job is one motion or one
 * file. The worker works in slices of at most 20 ms and returns to its message loop between them.
 */

/** One frame under one motion; the samples were sent before, by digest. */
export interface RunRequest {
  /** Digest of the frame: it crosses to a worker once. */
  readonly frameKey: string;
  /** Prepared by who asks: its modes are shown anyway, and no worker has to find them again. */
  readonly prepared: PreparedFrame;
  readonly analysis: Analysis;
  readonly motion: { readonly samples: string; readonly interval: number; readonly scale: number };
  readonly want: Want;
}

export type Reply<T> =
  /** took: time that the job had of its worker [ms]. */
  | { readonly status: 'done'; readonly value: T; readonly took: number }
  /** A newer job for the same question took its place, or it was cancelled. */
  | { readonly status: 'superseded' }
  /** The job threw, or its worker died twice. */
  | { readonly status: 'failed'; readonly message: string };

/** The engine as state sees it: the pool of workers, or the same thread (inline), with the same bits. */
export interface Engine {
  /** Keep samples [m/s2] for later jobs; sent to each worker once, when it first needs them. */
  putMotion(digest: string, samples: Float64Array): void;
  hasMotion(digest: string): boolean;
  dropMotion(digest: string): void;
  /** A newer job for the same question supersedes the older one. Lower priority numbers go first. Every promise settles. */
  run(
    question: string,
    request: RunRequest,
    options?: { readonly priority?: number; readonly onProgress?: (share: number) => void },
  ): Promise<Reply<Run>>;
  /** Read one record file off the main thread. The buffer is copied, so it can be read again with other answers. */
  read(question: string, file: string, bytes: ArrayBuffer, answers: RecordAnswers): Promise<Reply<ReadAnswer>>;
  /** Cancels the job of that question, if there is one. */
  cancel(question: string): void;
  /** Ends all workers; open promises settle as superseded. */
  dispose(): void;
}

export interface ReadAnswer {
  readonly reading: RecordReading;
  /** Digest of the SI samples of `reading.motion`; null while there is none. */
  readonly samples: string | null;
  /** The raw text as lines for the dialog: the first lines and those around each fault, with their numbers. */
  readonly excerpt: readonly { readonly line: number; readonly text: string }[];
  readonly lines: number;
  /** Measures of `reading.motion`; null while there is none. */
  readonly measures: MotionMeasures | null;
  /**
   * Acceleration [m/s2] and velocity [m/s] thinned for drawing, pairs of smallest and largest, as far as they were read; null
   * without interval or unit.
   */
  readonly preview: {
    /** Time of the last sample of the whole record [s]. */
    readonly end: number;
    /** Time of the first sample that could not be read [s]; null where all were. */
    readonly stopsAt: number | null;
    readonly time: Float64Array;
    readonly acceleration: Float64Array;
    readonly velocity: Float64Array;
  } | null;
}

/** A run as it crosses: without its frame where that is the one that crossed last to this worker. */
export interface RunJob extends Omit<RunRequest, 'prepared' | 'frameKey'> {
  readonly kind: 'run';
  readonly id: number;
  readonly priority: number;
  readonly prepared: PreparedFrame | null;
}

/** A file to read as it crosses; the bytes are transferred. */
export interface ReadJob {
  readonly kind: 'read';
  readonly id: number;
  readonly priority: number;
  readonly file: string;
  readonly bytes: ArrayBuffer;
  readonly answers: RecordAnswers;
}

export type WorkerJob = RunJob | ReadJob;

/** To a worker: samples to keep, samples to let go, or all that a keystroke asks of it: jobs to drop and jobs to do. */
export type ToWorker =
  | { readonly kind: 'motion'; readonly digest: string; readonly samples: Float64Array }
  | { readonly kind: 'forget'; readonly digest: string }
  | { readonly kind: 'work'; readonly drop: readonly number[]; readonly jobs: readonly WorkerJob[] };

/** What became of a job: its value and the time that it had of the worker [ms], or why it failed. */
export type Outcome =
  | { readonly id: number; readonly kind: 'run'; readonly value: Run; readonly took: number }
  | { readonly id: number; readonly kind: 'read'; readonly value: ReadAnswer; readonly took: number }
  | { readonly id: number; readonly kind: 'failed'; readonly message: string };

/** From a worker: that it is there; or one message a slice with all that came of it. */
export type FromWorker =
  | { readonly kind: 'ready' }
  | {
      readonly kind: 'news';
      readonly outcomes: readonly Outcome[];
      /** The job that the next slice goes on with, and how far it is, 0 to 1. */
      readonly progress: { readonly id: number; readonly share: number } | null;
    };

/** Anything with post and listen: a worker, a message port, or the jobs on the same thread. */
export interface Endpoint {
  post(message: ToWorker, transfer: Transferable[]): void;
  listen(hear: (message: FromWorker) => void): void;
  /** Called at most once, when the other side broke down by itself. */
  onDeath(died: (why: string) => void): void;
  end(): void;
}
