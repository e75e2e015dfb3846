import type { Fault } from '../../fault.ts';
import type { RecordFault } from '../reading.ts';
import { type Layout, rowLength } from './layout.ts';

/** How far a printed time may be from its even place, as a share of the interval: the rounding of the print. */
const UNEVEN = 0.1;

/** Time in one column, acceleration in another; further columns are passed over (the answers may name others). */
export const timeAndAcceleration: Layout = {
  id: 'time-and-acceleration',
  name: 'time and acceleration in columns',
  recognise(table) {
    const { rows } = table;
    const columns = rows > 0 ? rowLength(table, 0) : 0;
    if (rows < 3 || columns < 2) return 0;
    const probe = Math.min(rows, 200);
    const steps: number[] = [];
    for (let r = 1; r < probe; r++) {
      if (rowLength(table, r) !== columns) return 0;
      steps.push(table.values[table.rowStart[r]] - table.values[table.rowStart[r - 1]]);
    }
    const sorted = steps.filter(Number.isFinite).sort((a, b) => a - b);
    const middle = sorted[sorted.length >> 1] ?? 0;
    const even = steps.filter((step) => Math.abs(step - middle) <= 0.5 * middle).length;
    return middle > 0 && even >= 0.8 * steps.length ? 0.9 : 0;
  },
  read(table, heading, answers) {
    const { time, acceleration } = answers.columns ?? { time: 0, acceleration: 1 };
    const { rows, rowStart, rowLine } = table;
    const faults: RecordFault[] = [];
    const values = new Float64Array(rows);
    const times = new Float64Array(rows);
    for (let r = 0; r < rows; r++) {
      const columns = rowLength(table, r);
      values[r] = acceleration < columns ? table.values[rowStart[r] + acceleration] : Number.NaN;
      times[r] = time < columns ? table.values[rowStart[r] + time] : Number.NaN;
      if (columns <= Math.max(time, acceleration) && faults.length < 50) {
        faults.push({
          id: `line-${rowLine[r]}-columns`,
          code: 'missing-value',
          where: `line ${rowLine[r]}`,
          line: rowLine[r],
          message: `holds ${columns} ${columns === 1 ? 'value' : 'values'}, the columns chosen need ${Math.max(time, acceleration) + 1}`,
          mend: 'Take the mean of the neighbours, or leave the file out',
          choices: [{ id: 'mean', label: 'Take the mean of its neighbours' }, LEAVE_OUT],
        });
      }
    }
    const spacing = intervalOf(times, rowLine, faults);
    return {
      values,
      placeOf: (r) => rowStart[r] + acceleration,
      interval: spacing ?? heading.interval,
      count: heading.count,
      firstRow: 0,
      faults,
      warnings: lateStart(times, spacing, rowLine),
    };
  },
};

export const LEAVE_OUT = { id: 'leave-out', label: 'Leave this file out' } as const;

/** The even spacing of the time column; faults where it goes back, stands still, or is uneven. */
function intervalOf(times: Float64Array, lines: Int32Array, faults: RecordFault[]): number | null {
  const known = Array.from(times.keys()).filter((i) => Number.isFinite(times[i]));
  const [first, last] = [known[0], known[known.length - 1]];
  if (known.length < 2 || last === first) return null;
  const mean = (times[last] - times[first]) / (last - first);
  const refuse = (i: number, code: string, message: string, mend: string, choices: RecordFault['choices']) =>
    faults.push({
      id: `time-line-${lines[i]}`,
      code,
      where: `line ${lines[i]}`,
      line: lines[i],
      message,
      mend,
      choices: [...choices, LEAVE_OUT],
    });
  if (!(mean > 0)) {
    refuse(
      last,
      'time-goes-back',
      `the time column runs from ${times[first]} to ${times[last]} s`,
      'Choose another column for the time',
      [],
    );
    return null;
  }
  for (const i of known) {
    const off = times[i] - (times[first] + (i - first) * mean);
    if (Math.abs(off) > UNEVEN * mean && faults.length < 50) {
      const message = `time ${times[i]} s is ${short(Math.abs(off))} s off the even spacing of ${short(mean)} s`;
      refuse(i, 'uneven-time', message, `Take the spacing as even, ${short(mean)} s, or leave the file out`, [
        {
          id: 'even',
          label: `Take the spacing as even, ${short(mean)} s`,
          detail: 'The values are kept in their order; the times are not used.',
        },
      ]);
      break;
    }
  }
  return tidy(mean, times[last] - times[first], last - first);
}

/** The roundest spacing that the printed times allow: 0.0099999 over 4000 rows is 0.01. */
function tidy(mean: number, span: number, steps: number): number {
  for (let digits = 1; digits <= 12; digits++) {
    const round = Number(mean.toPrecision(digits));
    if (Math.abs(round * steps - span) <= 1e-6 * span) return round;
  }
  return mean;
}

function lateStart(times: Float64Array, interval: number | null, lines: Int32Array): Fault[] {
  if (interval === null || !(Math.abs(times[0]) > 1e-9)) return [];
  return [
    {
      code: 'late-start',
      where: `line ${lines[0]}`,
      message: `the time column begins at ${times[0]} s; the first value is taken to act at t = 0`,
      mend: 'Add the missing samples to the file if the motion shall begin earlier',
    },
  ];
}

function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
