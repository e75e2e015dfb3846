import type { Fault } from '../../fault.ts';
import type { Heading } from '../heading.ts';
import type { LayoutId, RecordAnswers, RecordFault } from '../reading.ts';
import type { Table } from '../table.ts';

/** The accelerations of a file as one layout reads them, in the file's unit; NaN where a value is no number. */
export interface Series {
  readonly values: Float64Array;
  /** Index into the table's values of entry i. */
  readonly placeOf: (i: number) => number;
  /** [s]; null where the figures do not tell. */
  readonly interval: number | null;
  /** How many values the file says it holds; null where it does not say. */
  readonly count: number | null;
  /** First row of the table that holds accelerations. */
  readonly firstRow: number;
  readonly faults: readonly RecordFault[];
  readonly warnings: readonly Fault[];
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

/** Values of a row. */
export function rowLength({ rowStart }: Table, row: number): number {
  return rowStart[row + 1] - rowStart[row];
}
