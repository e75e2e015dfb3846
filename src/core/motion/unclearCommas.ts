import { LEAVE_OUT } from './layouts/layout.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';
import type { Table } from './table.ts';
import { textBetween } from './text.ts';

/** Values and rows that are looked at. */
const PROBE = 2000;

/** Commas that can be taken two ways, with nothing in the file that tells: it is not read without a word. */
export function unclearCommas(table: Table, { mends }: RecordAnswers): RecordFault[] {
  const choice = mends?.commas?.choice;
  if (wholeNumbers(table) && choice !== 'separators') {
    return [
      fault(
        table,
        'commas may part whole numbers here, or be the decimal signs of half as many',
        'Write the file with decimal points, or with semicolons between the values',
        { id: 'separators', label: `Read ${table.columns} whole numbers a line` },
      ),
    ];
  }
  const seen = thousands(table);
  if (seen !== null && choice !== 'decimals') {
    return [
      fault(
        table,
        `commas may part thousands here, or be decimal signs: ${seen}`,
        'Write the thousands without commas, or the decimals with points',
        { id: 'decimals', label: 'Read the commas as decimal signs', detail: `${seen} is ${seen.replace(',', '.')}.` },
      ),
    ];
  }
  return [];
}

function fault({ rowLine }: Table, message: string, mend: string, choice: RecordFault['choices'][number]): RecordFault {
  const line = rowLine[0];
  return {
    id: 'commas',
    code: 'unclear-commas',
    where: `line ${line}`,
    line,
    message,
    mend,
    choices: [LEAVE_OUT, choice],
  };
}

/** Rows of whole numbers between commas, an even number a row, may be decimal commas between commas (`0,01,0,02`). */
function wholeNumbers({ comma, columns, values }: Table): boolean {
  if (comma !== 'separator' || columns < 4 || columns % 2 !== 0) return false;
  for (let i = 0; i < Math.min(values.length, PROBE); i++) if (!Number.isInteger(values[i])) return false;
  return true;
}

/**
 * Decimal commas that all stand before exactly three figures, after a whole part that thousands may have (`1,250`, never
 * `0,125`), beside whole numbers that have none: the first of them, else null.
 */
function thousands({ comma, lines, rows, rowLine }: Table): string | null {
  if (comma !== 'decimal') return null;
  let seen: string | null = null;
  for (let r = 0; r < Math.min(rows, PROBE); r++) {
    const line = rowLine[r] - 1;
    const text = textBetween(lines.codes, lines.start[line], Math.min(lines.end[line], lines.start[line] + 400));
    for (const [value] of text.matchAll(/[^\s;"]+/g)) {
      if (!value.includes(',')) continue;
      if (!/^[+-]?[1-9]\d{0,2},\d{3}$/.test(value)) return null;
      seen ??= value;
    }
  }
  return seen;
}
