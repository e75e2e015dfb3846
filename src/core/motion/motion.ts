/**
 * What a ground-acceleration record is once it has been read. Acceleration is linear between samples; sample 0 acts at
 * t = 0, sample n - 1 at (n - 1) x interval; after it the motion falls to zero over one more interval.
 */
export const ACCELERATION_UNITS = ['g', 'm/s2', 'cm/s2', 'mm/s2'] as const;
export type AccelerationUnit = (typeof ACCELERATION_UNITS)[number];

/** One change made to what stands in the file, kept with the motion and printed in the note. */
export interface Mend {
  /** Line of the file, from 1. */
  readonly line: number;
  /** The text that stood there. */
  readonly was: string;
  /** What was taken instead. */
  readonly is: string;
  readonly why: string;
}

/** Where a motion came from: kept in the project file under `origin`. */
export interface Origin {
  /** Name of the file, without its path. */
  readonly file?: string;
  /** SHA-256 of the file's bytes, hex. */
  readonly digest?: string;
  /** Id of the layout it was read by. */
  readonly layout?: string;
  /** Unit of the values in the file, and whether the file said so or the user was asked. */
  readonly unit?: AccelerationUnit;
  readonly unitFrom?: 'file' | 'answer';
  /** Sampling interval [s] as read or answered. */
  readonly interval?: number;
  readonly intervalFrom?: 'file' | 'answer';
  readonly event?: string;
  readonly station?: string;
  readonly component?: string;
  readonly mends?: readonly Mend[];
}

/** A motion ready to be used: SI samples and where they came from. */
export interface Motion {
  readonly name: string;
  /** Sampling interval [s], > 0. */
  readonly interval: number;
  /** Ground acceleration [m/s2]. */
  readonly acceleration: Float64Array;
  readonly origin: Origin;
}
