import { LEAVE_OUT } from './layouts/layout.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';
import type { Table } from './table.ts';

/** Values that are looked at. */
const PROBE = 2000;

/**
 * Rows of whole numbers between commas, an even number a row, may be decimal commas between commas (`0,01,0,02`): nothing in
 * the file tells, so the file is not read without a word.
 */
export function unclearCommas({ comma, columns, values, rowLine }: Table, { mends }: RecordAnswers): RecordFault[] {
  if (comma !== 'separator' || columns < 4 || columns % 2 !== 0) return [];
  if (mends?.commas?.choice === 'separators') return [];
  for (let i = 0; i < Math.min(values.length, PROBE); i++) if (!Number.isInteger(values[i])) return [];
  return [
    {
      id: 'commas',
      code: 'unclear-commas',
      where: `line ${rowLine[0]}`,
      line: rowLine[0],
      message: 'commas may part whole numbers here, or be the decimal signs of half as many',
      mend: 'Write the file with decimal points, or with semicolons between the values',
      choices: [LEAVE_OUT, { id: 'separators', label: `Read ${columns} whole numbers a line` }],
    },
  ];
}
