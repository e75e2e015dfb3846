import type { Fault } from '../../fault.ts';
import type { Heading, Said } from '../heading.ts';
import type { Mend } from '../motion.ts';
import type { LayoutId, RecordAnswers, RecordFact, RecordFault, RecordReading } from '../reading.ts';
import type { Cell, Table } from '../table.ts';
import type { UnitFound } from '../unitWords.ts';

/** The accelerations of a file as one layout reads them, in the file's unit; NaN where a value is no number. */
export interface Series {
  readonly values: Float64Array;
  /** Where entry i stands in the table. */
  readonly cellOf: (i: number) => Cell;
  readonly interval: Said<number> | null;
  /** How many values the file says it holds. */
  readonly count: Said<number> | null;
  readonly unit: UnitFound | null;
  /** First row of the table that holds accelerations. */
  readonly firstRow: number;
  readonly columns?: RecordReading['columns'];
  readonly facts: readonly RecordFact[];
  readonly faults: readonly RecordFault[];
  readonly warnings: readonly Fault[];
  readonly mends: readonly Mend[];
}

/** One record layout: recognised by what stands in the file, never by its name. */
export interface Layout {
  readonly id: LayoutId;
  /** In words, for the dialog. */
  readonly name: string;
  /** 0: not this one; the largest of all layouts reads the file. */
  recognise(table: Table, heading: Heading): number;
  read(table: Table, heading: Heading, answers: RecordAnswers): Series;
}

export const LEAVE_OUT = { id: 'leave-out', label: 'Leave this file out' } as const;

/** Values of a row. */
export function rowLength({ rowStart }: Table, row: number): number {
  return rowStart[row + 1] - rowStart[row];
}
