import type { Fault } from '../fault.ts';
import type { Heading } from './heading.ts';
import { type Layout, LEAVE_OUT, type Series } from './layouts/layout.ts';
import type { Mend } from './motion.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';
import { type Table, tableOf } from './table.ts';
import { lineText } from './text.ts';

export interface Settled {
  readonly table: Table;
  readonly series: Series;
  readonly faults: readonly RecordFault[];
  readonly warnings: readonly Fault[];
  readonly mends: readonly Mend[];
}

/** Characters of a line that are quoted. */
const QUOTED = 40;

/**
 * Text among the rows (a second record, a page heading): the record ends before it where the stated count says so, else the
 * user chooses. Text after the last row is said and passed over.
 */
export function settledText(
  whole: Table,
  layout: Layout,
  heading: Heading,
  answers: RecordAnswers,
  skip: number,
): Settled {
  const series = layout.read(whole, heading, answers);
  const all: Settled = { table: whole, series, faults: [], warnings: trailing(whole), mends: [] };
  if (whole.between.length === 0) return all;
  const [{ line }] = whole.between;
  const was = quoted(whole, line);
  const short = tableOf(whole.lines, skip, line);
  const cut = short.rows > 0 ? layout.read(short, heading, answers) : null;
  const choice = answers.mends?.text?.choice;
  if (cut !== null && (choice === 'stop' || cut.count?.value === cut.values.length)) {
    const mend = { line, was, is: 'the end of the record', why: 'text stands among the rows' };
    const warning: Fault = {
      code: 'not-read',
      where: `line ${line}`,
      message: `what follows the ${cut.values.length} values of the record was not read: ${was}`,
      mend: 'Put a second record into a file of its own',
    };
    return { table: short, series: cut, faults: [], warnings: [warning], mends: choice === 'stop' ? [mend] : [] };
  }
  if (choice === 'pass-over') {
    const mends = whole.between.map((text) => ({
      line: text.line,
      was: quoted(whole, text.line),
      is: 'nothing',
      why: 'text among the rows was passed over',
    }));
    return { ...all, mends };
  }
  const others = whole.between.length === 1 ? '' : `, and ${whole.between.length - 1} more such lines`;
  const fault: RecordFault = {
    id: 'text',
    code: 'text-between',
    where: `line ${line}`,
    line,
    message: `is text among the rows: ${was}${others}`,
    mend: 'Put a second record into a file of its own, or take the text out',
    choices: [
      ...(cut !== null
        ? [{ id: 'stop', label: `Read to line ${line - 1} only`, detail: `${cut.values.length} values.` }]
        : []),
      { id: 'pass-over', label: 'Pass over the text', detail: `${series.values.length} values, as one record.` },
      LEAVE_OUT,
    ],
  };
  return { ...all, faults: [fault] };
}

function trailing(table: Table): Fault[] {
  if (table.trailing === null) return [];
  return [
    {
      code: 'trailing-text',
      where: `line ${table.trailing}`,
      message: `is text after the last value and was passed over: ${quoted(table, table.trailing)}`,
      mend: 'Nothing to do if it is a note',
    },
  ];
}

function quoted({ lines }: Table, line: number): string {
  const text = lineText(lines, line - 1).trim();
  return `"${text.length > QUOTED ? `${text.slice(0, QUOTED)}…` : text}"`;
}
