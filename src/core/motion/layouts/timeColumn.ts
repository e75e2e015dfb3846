import type { Mend } from '../motion.ts';
import { lastPlace } from '../numerals.ts';
import type { RecordAnswers, RecordFault } from '../reading.ts';
import { placeOf, type Table } from '../table.ts';
import type { Gap } from './gaps.ts';
import { LEAVE_OUT } from './layout.ts';

/** What a column of times says. */
export interface TimeColumn {
  /** Even spacing, in the column's own unit; null where there is none. */
  readonly interval: number | null;
  /** Gaps that the user had filled. */
  readonly gaps: readonly Gap[];
  readonly faults: readonly RecordFault[];
  readonly mends: readonly Mend[];
}

const NONE = { gaps: [], faults: [], mends: [] };

/** Lines that are named one by one in a message. */
const NAMED = 5;
/** Times whose print is looked at. */
const LOOKED_AT = 50;
/** Values that may be put into one gap. Own figure. */
const LONGEST_GAP = 10;
/** Share of the interval by which a time may be off whatever its print: single precision prints are. Own figure. */
const LOOSE = 0.01;
/** Shares of the steps that are alike where the print holds the interval exactly, and where it surely does. Own figures. */
const ALIKE = 0.75;
const MOSTLY = 0.9;

/**
 * The even spacing of a column of printed times: all of them within the rounding of the print of where they should be. A
 * fault where they are not, with the lines.
 *
 * @param times  NaN where a time is no number; those are passed over
 * @param column  the column of the table that they are; time i stands on row i
 */
export function timeColumn(times: Float64Array, column: number, table: Table, answers: RecordAnswers): TimeColumn {
  const known = knownOf(times);
  if (known.length < 2) return { ...NONE, interval: null };
  const [first, last] = [known[0], known[known.length - 1]];
  const print = printOf(known, (row) => placeOf(table, { row, column }).text);
  const mean = (times[last] - times[first]) / (last - first);
  const slack = Math.max(print, 1e-3 * mean) / (last - first);
  const candidates = mean > 0 ? roundOnes(mean, slack) : [];
  const even = candidates.find((interval) => spread(times, known, interval) <= 2 * LOOSE * interval);
  if (even !== undefined) return { ...NONE, interval: even };
  const { usual, share } = usualStep(times, known);
  // Where the print is coarse and most steps are alike, the others are no rounding: a line is lost or doubled.
  const rounded =
    share > MOSTLY && print > usual / 4
      ? undefined
      : candidates.find((interval) => spread(times, known, interval) <= rounding(interval, print));
  if (rounded !== undefined) return { ...NONE, interval: rounded };
  const within = usual > 0 ? Math.max(LOOSE * usual, (share > ALIKE ? 0.5 : 1.5) * print) : 0;
  const bad: number[] = [];
  for (let k = 1; k < known.length; k++) {
    const [from, to] = [known[k - 1], known[k]];
    if (!(Math.abs(times[to] - times[from] - (to - from) * usual) <= within)) bad.push(to);
  }
  return uneven(times, bad.length > 0 ? bad : [last], usual, (row) => table.rowLine[row], answers);
}

function knownOf(times: Float64Array): Int32Array {
  const known = new Int32Array(times.length);
  let count = 0;
  for (let i = 0; i < times.length; i++) if (!Number.isNaN(times[i])) known[count++] = i;
  return known.subarray(0, count);
}

/** The unit of the last figure that the times are printed with: the finest of fixed prints, the coarsest with exponents. */
function printOf(known: Int32Array, textOf: (i: number) => string): number {
  const step = Math.max(1, Math.floor(known.length / LOOKED_AT));
  const texts: string[] = [];
  for (let k = 0; k < known.length; k += step) texts.push(textOf(known[k]));
  texts.push(textOf(known[known.length - 1]));
  const places = texts.map(lastPlace).filter((place) => place > 0);
  if (places.length === 0) return 0;
  return texts.some((text) => /[ed]/i.test(text)) ? Math.max(...places) : Math.min(...places);
}

/** How far apart the times may lie about their even places by rounding: not at all where the print holds the interval. */
function rounding(interval: number, print: number): number {
  const parts = interval / print;
  return Math.abs(parts - Math.round(parts)) < 1e-6 * parts ? 0 : 1.02 * print;
}

/** Between the earliest and the latest time, each seen from its even place. */
function spread(times: Float64Array, known: Int32Array, interval: number): number {
  let [least, most] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (let k = 0; k < known.length; k++) {
    const off = times[known[k]] - known[k] * interval;
    if (off < least) least = off;
    if (off > most) most = off;
  }
  return most - least;
}

function uneven(
  times: Float64Array,
  bad: readonly number[],
  usual: number,
  lineOf: (i: number) => number,
  answers: RecordAnswers,
): TimeColumn {
  const line = lineOf(bad[0]);
  const taken = answers.mends?.time;
  const mended = (interval: number, why: string): TimeColumn => {
    const was = `uneven times from line ${line} on`;
    return { ...NONE, interval, mends: [{ line, was, is: `${short(interval)} s throughout`, why }] };
  };
  if (taken?.choice === 'even' && usual > 0) return mended(usual, 'the spacing was taken as even');
  if (taken?.choice === 'typed' && taken.value !== undefined && taken.value > 0 && Number.isFinite(taken.value)) {
    return mended(taken.value, 'the interval was typed');
  }
  const rises = usual > 0;
  const gaps = rises ? gapsOf(times, bad, usual) : [];
  const missing = gaps.reduce((sum, gap) => sum + gap.missing, 0);
  if (taken?.choice === 'fill' && missing > 0) {
    const mends = gaps.map((gap) => ({
      line: lineOf(gap.row),
      was: 'nothing',
      is: count(gap.missing),
      why: 'put on the straight line between the neighbours where the time leaps',
    }));
    return { ...NONE, interval: usual, gaps, mends };
  }
  const step = (i: number) => `${short(times[i] - previous(times, i))} s`;
  const others = bad.slice(1, NAMED).map((i) => `line ${lineOf(i)} (${step(i)})`);
  const more = bad.length > NAMED ? ` and ${bad.length - NAMED} more` : '';
  const likewise = others.length > 0 ? `; likewise ${others.join(', ')}${more}` : '';
  const even = {
    id: 'even',
    label: `Take the spacing as even, ${short(usual)} s`,
    detail: 'The values are kept in their order; the times are not used.',
  };
  const fill = {
    id: 'fill',
    label: `Put ${count(missing)} on the straight line between the neighbours`,
    detail: 'Every value keeps its time.',
  };
  const fault: RecordFault = {
    id: 'time',
    code: rises ? 'uneven-time' : 'time-not-rising',
    where: `line ${line}`,
    line,
    message: rises
      ? `the time goes on by ${step(bad[0])}, elsewhere by ${short(usual)} s${likewise}`
      : 'the time column does not rise',
    mend: 'Mend the times in the file, or choose the columns anew',
    choices: [
      ...(missing > 0 ? [fill] : []),
      ...(rises ? [even] : []),
      { id: 'typed', label: 'Type the interval', asksValue: true, valueUnit: 's' },
      LEAVE_OUT,
    ],
  };
  return { ...NONE, interval: rises ? usual : null, faults: [fault] };
}

/** The gaps of a column whose leaps are whole numbers of steps; none where one of them is no leap. */
function gapsOf(times: Float64Array, leaps: readonly number[], usual: number): Gap[] {
  const gaps = leaps.map((row) => {
    const steps = (times[row] - previous(times, row)) / usual;
    const whole = Math.abs(steps - Math.round(steps)) <= LOOSE * steps && !Number.isNaN(times[row - 1]);
    return { row, missing: whole ? Math.round(steps) - 1 : 0 };
  });
  return gaps.every(({ missing }) => missing >= 1 && missing <= LONGEST_GAP) ? gaps : [];
}

function count(missing: number): string {
  return missing === 1 ? '1 missing value' : `${missing} missing values`;
}

function previous(times: Float64Array, i: number): number {
  let before = i - 1;
  while (before > 0 && Number.isNaN(times[before])) before--;
  return times[before];
}

/** The middle one of the steps, and the share of steps that are like it. */
function usualStep(times: Float64Array, known: Int32Array): { readonly usual: number; readonly share: number } {
  const steps = new Float64Array(known.length - 1);
  for (let k = 1; k < known.length; k++) {
    steps[k - 1] = (times[known[k]] - times[known[k - 1]]) / (known[k] - known[k - 1]);
  }
  steps.sort();
  const middle = steps[steps.length >> 1];
  const usual = middle > 0 ? (roundOnes(middle, 1e-6 * middle)[0] ?? middle) : middle;
  const alike = steps.reduce((sum, step) => sum + (Math.abs(step - usual) <= LOOSE * usual ? 1 : 0), 0);
  return { usual, share: alike / steps.length };
}

/** Spacings within a slack of the mean one, the roundest first: decimals of few figures, whole numbers a second, longer decimals. */
function roundOnes(mean: number, slack: number): number[] {
  const decimals = Array.from({ length: 15 }, (_, i) => Number(mean.toPrecision(i + 1)));
  const rate = Math.round(1 / mean);
  const all = [...decimals.slice(0, 3), ...(rate > 0 ? [1 / rate] : []), ...decimals.slice(3), mean];
  return all.filter((round) => round > 0 && Math.abs(round - mean) <= Math.max(slack, 1e-12 * mean));
}

function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
