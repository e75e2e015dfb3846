import type { Fault } from '../fault.ts';
import type { AccelerationUnit, Mend, Motion } from './motion.ts';

export type LayoutId = 'count-and-interval' | 'time-and-acceleration' | 'values';

/** What the user said about a file in the import dialog, or the project file said beside `file`. */
export interface RecordAnswers {
  readonly layout?: LayoutId;
  readonly unit?: AccelerationUnit;
  /** [s] */
  readonly interval?: number;
  readonly name?: string;
  /** Heading lines to pass over, for layouts that cannot tell. */
  readonly headingLines?: number;
  /** Columns of the time-and-acceleration layout, from 0. */
  readonly columns?: { readonly time: number; readonly acceleration: number };
  /** Choices taken for faults that can be mended: fault id -> choice id (and a typed value where the choice asks for one). */
  readonly mends?: Readonly<Record<string, { readonly choice: string; readonly value?: number }>>;
}

/** Something that stops a record (or a part of it) and the mends that make sense, best first. */
export interface RecordFault extends Fault {
  /** Stable within one file, e.g. `line-418-value-3` or `count`. */
  readonly id: string;
  readonly line: number | null;
  /** Columns of that line [from, to) that are at fault; absent where it is the whole line. */
  readonly span?: readonly [number, number];
  /** What helps to judge it, beside the mend: which sample, at what time. */
  readonly detail?: string;
  readonly choices: readonly {
    readonly id: string;
    readonly label: string;
    readonly detail?: string;
    readonly asksValue?: boolean;
    /** Unit of the value that is asked for; absent: the unit of the file. */
    readonly valueUnit?: 's';
  }[];
}

/** One fact found in the file, with where it was found: shown in the dialog beside the raw text. */
export interface RecordFact {
  readonly what: 'interval' | 'unit' | 'count' | 'name' | 'layout' | 'event' | 'station' | 'component';
  readonly value: string;
  /** Line of the file, from 1; null: from the file name or answered. */
  readonly line: number | null;
  /** Columns of that line [from, to), for underlining; null where it has none. */
  readonly span: readonly [number, number] | null;
}

/** All that was understood of one file. */
export interface RecordReading {
  readonly file: string;
  readonly layout: LayoutId;
  readonly name: string;
  /** Null: the file does not say and it was not answered. */
  readonly interval: number | null;
  readonly unit: AccelerationUnit | null;
  /** As the file's own heading says; null where it does not say. */
  readonly statedCount: number | null;
  /** Values as they stand in the file, in its unit (mends applied). */
  readonly values: Float64Array;
  /** Line on which the values begin, from 1, and how many values a line holds. */
  readonly firstLine: number;
  readonly perLine: number;
  /** Of the time-and-acceleration layout: the columns that were read, from 0, and what stands over all of them. */
  readonly columns?: { readonly time: number; readonly acceleration: number; readonly names: readonly string[] };
  readonly facts: readonly RecordFact[];
  /** To look at, nothing stops: velocity that does not end at zero, count that disagrees and was settled, coarse interval ... */
  readonly warnings: readonly Fault[];
  /** Open faults: while there is one, `motion` is null. */
  readonly faults: readonly RecordFault[];
  /** What must still be answered. */
  readonly asks: readonly ('interval' | 'unit')[];
  readonly mends: readonly Mend[];
  /** The motion, once nothing is open. */
  readonly motion: Motion | null;
}

/** Measures of a motion as read, integrated from rest with no correction (SI). */
export interface MotionMeasures {
  readonly peakAcceleration: number;
  readonly peakAccelerationTime: number;
  readonly peakVelocity: number;
  readonly peakDisplacement: number;
  readonly endVelocity: number;
  readonly ariasIntensity: number;
  /** When 5 % of the Arias intensity have come [s], and how long it takes from there to 95 % [s]. */
  readonly start5to95: number;
  readonly duration5to95: number;
}
