import type { Fault } from '../../fault.ts';
import type { Said } from '../heading.ts';
import type { RecordAnswers, RecordFault } from '../reading.ts';
import type { Table } from '../table.ts';
import { type ColumnName, columnNames } from './columnNames.ts';
import { oddRows } from './faults.ts';
import { fillGaps } from './gaps.ts';
import { type Layout, LEAVE_OUT, rowLength } from './layout.ts';
import { timeColumn } from './timeColumn.ts';

/** Rows that are looked at, and the share of them in which the time must go on as usual. Own figures. */
const PROBE = 200;
const ALIKE = 0.8;

// Not \b: names such as time_ms and acc_g are parted by underscores.
const TIME_WORD = /(?<![a-z])(?:time|zeit|temps|tiempo|tempo|t|sec|seconds?)(?![a-z])/i;
const MILLISECONDS = /(?<![a-z])(?:ms|msec|milliseconds?)(?![a-z])/i;
const ACCELERATION_WORD = /(?<![a-z])(?:acc|accel|accelerations?|accelerogram|ag|a)(?![a-z])/i;
const OTHER_WORD = /(?<![a-z])(?:vel|velocity|disp|displ|displacement|index|no|nr|n|sample|point)(?![a-z])/i;

/** Time in one column, acceleration in another; which, the names over them, the figures or the answers tell. */
export const timeAndAcceleration: Layout = {
  id: 'time-and-acceleration',
  name: 'time and acceleration in columns',
  recognise: (table) => {
    if (table.columns < 2) return 0;
    return timeColumnOf(table, columnNames(table)) !== null || numberingOf(table) !== null ? 0.9 : 0;
  },
  read: (table, heading, answers) => {
    const names = columnNames(table);
    const timed = answers.columns?.time ?? timeColumnOf(table, names);
    const numbering = timed === null ? numberingOf(table) : null;
    const time = timed ?? numbering ?? 0;
    const candidates = accelerationColumns(table, names, time);
    const acceleration = answers.columns?.acceleration ?? candidates[0] ?? (time === 0 ? 1 : 0);
    const times = columnOf(table, time);
    const scale = MILLISECONDS.test(names[time]?.name ?? '') ? 1e-3 : 1;
    if (scale !== 1) for (let i = 0; i < times.length; i++) times[i] *= scale;
    // Numbers of samples tell whether one is missing, and not the interval.
    const column = timeColumn(times, time, table, answers);
    const spacing = numbering === null ? column : { ...column, interval: null };
    const settled = withHeading(spacing.interval, heading.interval, table, answers);
    const { values, rowOf } = fillGaps(columnOf(table, acceleration), spacing.gaps);
    return {
      values,
      cellOf: (i) => ({ row: rowOf[i], column: acceleration }),
      interval: settled.interval,
      count: heading.count,
      unit: names[acceleration]?.unit ?? heading.unit,
      firstRow: 0,
      columns: { time, acceleration, names: names.map(({ name }) => name) },
      facts: [],
      faults: [...spacing.faults, ...settled.faults, ...oddRows(table, 0, answers, 'longer')],
      warnings: [
        ...(numbering === null ? lateStart(times, settled.interval?.value ?? null, table.rowLine[0]) : []),
        ...otherColumns(names, candidates, acceleration, answers),
      ],
      mends: spacing.mends,
    };
  },
};

function columnOf(table: Table, column: number): Float64Array {
  const { rows, rowStart, values } = table;
  const out = new Float64Array(rows);
  for (let r = 0; r < rows; r++) {
    out[r] = column >= 0 && column < rowLength(table, r) ? values[rowStart[r] + column] : Number.NaN;
  }
  return out;
}

/** The column that goes on evenly (one that falls is a time at fault): the one named time, else one that does not number. */
function timeColumnOf(table: Table, names: readonly ColumnName[]): number | null {
  const even = names.map((_, k) => k).filter((k) => usualStep(table, k) !== null);
  const named = even.find((k) => TIME_WORD.test(names[k].name));
  if (named !== undefined) return named;
  return even.find((k) => usualStep(table, k) !== 1) ?? null;
}

/** The column that numbers the samples 0, 1, 2 or 1, 2, 3; null where there is none. */
function numberingOf(table: Table): number | null {
  for (let k = 0; k < table.columns; k++) {
    const first = table.values[table.rowStart[0] + k];
    if ((first === 0 || first === 1) && usualStep(table, k) === 1) return k;
  }
  return null;
}

/** The usual step of a column that goes on by it in most of the rows looked at; null where it does not. */
function usualStep(table: Table, column: number): number | null {
  const { rows, columns, values, rowStart } = table;
  if (rows < 3) return null;
  const steps: number[] = [];
  for (let r = 1; r < Math.min(rows, PROBE); r++) {
    if (rowLength(table, r) !== columns || rowLength(table, r - 1) !== columns) continue;
    const step = values[rowStart[r] + column] - values[rowStart[r - 1] + column];
    if (!Number.isNaN(step)) steps.push(step);
  }
  if (steps.length < 2) return null;
  const middle = [...steps].sort((a, b) => a - b)[steps.length >> 1];
  // Times that are printed coarsely stand still every now and then.
  // A time that falls is one at fault.
  const falls =
    steps.filter((step) => Math.abs(step - middle) <= 0.01 * Math.abs(middle)).length >= ALIKE * steps.length;
  if (middle < 0) return falls ? middle : null;
  const usual = middle > 0 ? middle : steps.reduce((sum, step) => sum + step, 0) / steps.length;
  const alike = steps.filter((step) => step >= 0 && step <= 2.05 * usual).length;
  return usual > 0 && alike >= ALIKE * steps.length ? usual : null;
}

/** Whether a column holds numbers in most of the rows looked at, and no marks in words. */
function holdsNumbers(table: Table, column: number): boolean {
  const { rows, rowStart, values } = table;
  const probe = Math.min(rows, PROBE);
  let numbers = 0;
  for (let r = 0; r < probe; r++) {
    if (column < rowLength(table, r) && !Number.isNaN(values[rowStart[r] + column])) numbers++;
  }
  return 2 * numbers > probe;
}

/** Columns that may be the acceleration, the likeliest first. */
function accelerationColumns(table: Table, names: readonly ColumnName[], time: number): number[] {
  const others = names.map((_, k) => k).filter((k) => k !== time && holdsNumbers(table, k));
  const named = others.filter((k) => names[k].unit !== null || ACCELERATION_WORD.test(names[k].name));
  return named.length > 0 ? named : others.filter((k) => !OTHER_WORD.test(names[k].name));
}

/** The time column's spacing, unless the heading says another interval: then a choice. */
function withHeading(
  spacing: number | null,
  said: Said<number> | null,
  { rowLine }: Table,
  answers: RecordAnswers,
): { readonly interval: Said<number> | null; readonly faults: readonly RecordFault[] } {
  if (spacing === null) return { interval: said, faults: [] };
  const own: Said<number> = { value: spacing, line: rowLine[0], span: [0, 0] };
  if (said === null || Math.abs(said.value - spacing) <= 1e-4 * spacing) return { interval: own, faults: [] };
  const taken = answers.mends?.['two-intervals']?.choice;
  if (taken === 'times') return { interval: own, faults: [] };
  if (taken === 'heading') return { interval: said, faults: [] };
  const fault: RecordFault = {
    id: 'two-intervals',
    code: 'two-intervals',
    where: `line ${said.line}`,
    line: said.line,
    span: said.span,
    message: `says an interval of ${said.value} s, the time column goes on by ${spacing} s`,
    mend: 'Choose one of the two',
    choices: [
      { id: 'times', label: `Take ${spacing} s, as the time column goes on` },
      { id: 'heading', label: `Take ${said.value} s, as the heading says` },
      LEAVE_OUT,
    ],
  };
  return { interval: own, faults: [fault] };
}

function lateStart(times: Float64Array, interval: number | null, line: number): Fault[] {
  if (interval === null || Number.isNaN(times[0]) || Math.abs(times[0]) <= 1e-6 * interval) return [];
  return [
    {
      code: 'late-start',
      where: `line ${line}`,
      message: `the time column begins at ${times[0]} s; the first value is taken to act at t = 0`,
      mend: 'Nothing to do if the motion may begin there',
    },
  ];
}

function otherColumns(
  names: readonly ColumnName[],
  candidates: readonly number[],
  taken: number,
  answers: RecordAnswers,
): Fault[] {
  if (candidates.length < 2 || answers.columns !== undefined) return [];
  const words = (k: number) => (names[k].name === '' ? `column ${k + 1}` : `column ${k + 1} (${names[k].name})`);
  return [
    {
      code: 'several-columns',
      where: 'columns',
      message: `${words(taken)} was read as the acceleration; ${candidates
        .filter((k) => k !== taken)
        .map(words)
        .join(', ')} may be one too`,
      mend: 'Choose the column',
    },
  ];
}
