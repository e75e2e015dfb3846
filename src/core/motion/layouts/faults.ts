import type { Fault } from '../../fault.ts';
import type { RecordAnswers, RecordFault } from '../reading.ts';
import type { Table } from '../table.ts';
import { LEAVE_OUT, rowLength } from './layout.ts';

/** Share of rows of another length above which a file has no fixed rows at all. Own figure. */
const FREE = 0.05;

/**
 * Rows within the record that hold more or fewer values than the others: a value was lost, doubled or split, and all after it
 * would act at the wrong time. The last row may be short.
 *
 * @param kind  in columns only a longer row is odd: where a short one lacks a value, that is told by itself
 */
export function oddRows(
  table: Table,
  firstRow: number,
  answers: RecordAnswers,
  kind: 'any' | 'longer' = 'any',
): RecordFault[] {
  const { rows, columns, rowLine } = table;
  const odd: number[] = [];
  for (let r = firstRow; r < rows; r++) {
    const length = rowLength(table, r);
    if (length === columns || (length < columns && (kind === 'longer' || r === rows - 1))) continue;
    odd.push(r);
  }
  if (odd.length === 0 || odd.length > Math.max(1, FREE * (rows - firstRow))) return [];
  if (answers.mends?.['row-length']?.choice === 'as-it-stands') return [];
  const [first] = odd;
  const others = odd.length === 1 ? '' : `, and ${odd.length - 1} more such ${odd.length === 2 ? 'line' : 'lines'}`;
  const held = rowLength(table, first);
  return [
    {
      id: 'row-length',
      code: 'row-length',
      where: `line ${rowLine[first]}`,
      line: rowLine[first],
      message: `holds ${held} ${held === 1 ? 'value' : 'values'} where the other lines hold ${columns}${others}`,
      mend: 'Mend the line in the file, or read the values as they stand',
      choices: [
        LEAVE_OUT,
        {
          id: 'as-it-stands',
          label: 'Read the values as they stand',
          detail: 'One after the other, none added or taken.',
        },
      ],
    },
  ];
}

/** Figures above the rows, parted from them by text: they may be the record's own first values. */
export function looseFigures(table: Table, answers: RecordAnswers): RecordFault[] {
  const { above, columns } = table;
  if (answers.headingLines !== undefined || answers.mends?.['figures-above']?.choice === 'heading') return [];
  const alike = above.filter(({ values }) => values.length === columns);
  if (alike.length === 0) return [];
  const [{ line }] = alike;
  const lines = alike.length === 1 ? `line ${line}` : `lines ${line} to ${alike[alike.length - 1].line}`;
  return [
    {
      id: 'figures-above',
      code: 'figures-above',
      where: lines,
      line,
      message: 'holds figures like the rows, with text between them and the rows',
      mend: 'Pass them over as heading, or mend the file',
      choices: [{ id: 'heading', label: 'Pass them over as heading' }, LEAVE_OUT],
    },
  ];
}

/** More blank lines than these part a column into blocks, and are no lost values. Own figure. */
const LOST = 3;

/** A blank line within a column of values may be a value that was lost; `between` are the lines of text there. */
export function blankLines({ rows, columns, rowLine, between }: Table): Fault[] {
  if (columns !== 1) return [];
  const blank: number[] = [];
  for (let r = 1; r < rows && blank.length <= LOST; r++) {
    for (let line = rowLine[r - 1] + 1; line < rowLine[r] && blank.length <= LOST; line++) {
      if (!between.some((text) => text.line === line)) blank.push(line);
    }
  }
  if (blank.length === 0 || blank.length > LOST) return [];
  return [
    {
      code: 'blank-line',
      where: blank.length === 1 ? `line ${blank[0]}` : `lines ${blank.join(', ')}`,
      message: `${blank.length === 1 ? 'holds' : 'hold'} no value among the values; none was read for it`,
      mend: 'If a value is missing there, write it into the file',
    },
  ];
}
