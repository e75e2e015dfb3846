import { digestOfBytes } from '../digest.ts';
import type { Fault } from '../fault.ts';
import { STANDARD_GRAVITY } from '../units/constants.ts';
import { type Heading, headingOf } from './heading.ts';
import { countAndInterval } from './layouts/countAndInterval.ts';
import type { Layout, Series } from './layouts/layout.ts';
import { LEAVE_OUT, timeAndAcceleration } from './layouts/timeAndAcceleration.ts';
import { values } from './layouts/values.ts';
import type { AccelerationUnit, Mend, Motion, Origin } from './motion.ts';
import type { LayoutId, RecordAnswers, RecordFact, RecordFault, RecordReading } from './reading.ts';
import { type BadValue, type Table, tableOf } from './table.ts';
import { linesOf } from './text.ts';
import { motionWarnings } from './warnings.ts';

/** The layouts there are: a new one is one file more and one line here. */
export const LAYOUTS: readonly Layout[] = [timeAndAcceleration, countAndInterval, values];

/** SI value of one unit of acceleration [m/s2]. */
export const UNIT_SIZE: Readonly<Record<AccelerationUnit, number>> = {
  g: STANDARD_GRAVITY,
  'm/s2': 1,
  'cm/s2': 1e-2,
  'mm/s2': 1e-3,
};

/**
 * Reads a record file, whatever it holds: never throws. What the file does not tell is in `asks`, what is wrong in `faults`
 * with the mends that make sense, best first; `motion` is there once nothing is open.
 *
 * @param file     its name, for the record's name and origin only
 * @param answers  what the user said: layout, unit, interval, columns, mends chosen by fault id
 */
export function readRecord(file: string, bytes: Uint8Array, answers: RecordAnswers): RecordReading {
  const lines = linesOf(bytes);
  if (lines.binary || lines.count === 0) return unreadable(file, lines.count === 0);
  const table = tableOf(lines, answers.headingLines ?? 0);
  if (table.rows === 0) return unreadable(file, false);
  const heading = headingOf(table.heading);
  const layout = chosen(table, heading, answers.layout);
  const series = layout.read(table, heading, answers);
  const mends: Mend[] = [];
  const faults: RecordFault[] = [];
  for (const fault of series.faults) if (!settled(fault, answers, mends, table, series)) faults.push(fault);
  for (const bad of table.bad) mendValue(bad, table, series, answers, mends, faults);
  if (table.moreBad > 0) faults.push(tooMany(table.moreBad));

  const interval = series.interval ?? answers.interval ?? null;
  contradiction('interval', series.interval, answers.interval, faults);
  contradiction('unit', heading.unit, answers.unit, faults);
  if (interval !== null && !(interval > 0 && Number.isFinite(interval))) faults.push(badInterval(interval));
  if (series.values.length < 2) faults.push(tooFew(series.values.length));
  const warnings: Fault[] = [...series.warnings];
  countFaults(series, answers, mends, faults, warnings);
  if (table.trailing !== null) {
    warnings.push({
      code: 'trailing-text',
      where: `line ${table.trailing}`,
      message: 'text after the last value is passed over',
      mend: 'Nothing to do if it is a note',
    });
  }

  const unit = heading.unit ?? answers.unit ?? null;
  const asks = [...(interval === null ? ['interval' as const] : []), ...(unit === null ? ['unit' as const] : [])];
  const name = nameOf(file, answers);
  let motion: Motion | null = null;
  if (faults.length === 0 && asks.length === 0 && interval !== null && unit !== null) {
    const size = UNIT_SIZE[unit];
    motion = {
      name,
      interval,
      acceleration: series.values.map((value) => value * size),
      origin: originOf(file, bytes, layout.id, heading, series, unit, interval, mends),
    };
    warnings.push(...motionWarnings(motion, unit));
  }
  return {
    file,
    layout: layout.id,
    name,
    interval,
    unit,
    statedCount: series.count,
    values: series.values,
    firstLine: table.rowLine[series.firstRow] ?? 1,
    perLine: table.rows > series.firstRow ? table.rowStart[series.firstRow + 1] - table.rowStart[series.firstRow] : 0,
    facts: factsOf(layout, heading, series, table),
    warnings,
    faults,
    asks,
    mends,
    motion,
  };
}

function chosen(table: Table, heading: Heading, answered: LayoutId | undefined): Layout {
  const asked = LAYOUTS.find(({ id }) => id === answered);
  if (asked) return asked;
  return LAYOUTS.reduce((best, layout) =>
    layout.recognise(table, heading) > best.recognise(table, heading) ? layout : best,
  );
}

/** A fault of a layout that the user settled: an uneven time taken as even, a missing value filled. */
function settled(
  fault: RecordFault,
  { mends: choices }: RecordAnswers,
  mends: Mend[],
  table: Table,
  series: Series,
): boolean {
  const choice = choices?.[fault.id]?.choice;
  if (choice === 'even') {
    mends.push({ line: fault.line ?? 0, was: fault.message, is: 'even spacing', why: 'the spacing was taken as even' });
    return true;
  }
  if (choice === 'mean') {
    const at = Array.from(table.rowLine).indexOf(fault.line ?? -1);
    const mean = meanAround(series.values, at);
    if (mean === null) return false;
    series.values[at] = mean;
    mends.push({ line: fault.line ?? 0, was: 'missing', is: String(mean), why: 'the mean of its neighbours' });
    return true;
  }
  return false;
}

function mendValue(
  bad: BadValue,
  table: Table,
  series: Series,
  { mends: choices }: RecordAnswers,
  mends: Mend[],
  faults: RecordFault[],
): void {
  const index = indexOf(series, bad.at);
  if (index < 0) return;
  const id = `line-${bad.line}-value-${bad.value}`;
  const asDecimal = commaRead(bad.text, table);
  const mean = meanAround(series.values, index);
  const made = choices?.[id];
  const settledBy =
    made?.choice === 'as-decimal' && asDecimal !== null
      ? { value: asDecimal, why: 'the comma was taken as a decimal point' }
      : made?.choice === 'typed' && made.value !== undefined && Number.isFinite(made.value)
        ? { value: made.value, why: 'typed in its place' }
        : made?.choice === 'mean' && mean !== null
          ? { value: mean, why: 'the mean of its neighbours' }
          : null;
  if (settledBy) {
    series.values[index] = settledBy.value;
    mends.push({ line: bad.line, was: bad.text, is: String(settledBy.value), why: settledBy.why });
    return;
  }
  const interval = series.interval;
  const when = interval === null ? '' : `, at ${Number((index * interval).toFixed(3))} s`;
  faults.push({
    id,
    code: 'not-a-number',
    where: `line ${bad.line}, value ${bad.value}`,
    line: bad.line,
    message: asDecimal !== null ? `${bad.text} has a comma` : `${bad.text} is no number`,
    mend: `Sample ${index + 1} of ${series.values.length}${when}: read it, type it, take the mean of its neighbours, or leave the file out`,
    choices: [
      ...(asDecimal === null
        ? []
        : [{ id: 'as-decimal', label: `Read it as ${asDecimal}`, detail: 'The comma taken as a decimal point.' }]),
      { id: 'typed', label: 'Type the value', asksValue: true },
      ...(mean === null
        ? []
        : [{ id: 'mean', label: `Take the mean of its neighbours, ${Number(mean.toPrecision(6))}` }]),
      LEAVE_OUT,
    ],
  });
}

/** The entry of a series that stands at a place of the table, or -1 (another column). */
function indexOf({ values: { length }, placeOf }: Series, place: number): number {
  let [low, high] = [0, length - 1];
  while (low <= high) {
    const middle = (low + high) >> 1;
    const at = placeOf(middle);
    if (at === place) return middle;
    if (at < place) low = middle + 1;
    else high = middle - 1;
  }
  return -1;
}

function commaRead(text: string, { decimal }: Table): number | null {
  if (decimal === 'comma' || !/^[+-]?\d*,\d+$/.test(text)) return null;
  const value = Number(text.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
}

function meanAround(x: Float64Array, i: number): number | null {
  const mean = (x[i - 1] + x[i + 1]) / 2;
  return Number.isFinite(mean) ? mean : null;
}

function contradiction(
  what: 'interval' | 'unit',
  said: number | string | null,
  answered: number | string | undefined,
  faults: RecordFault[],
): void {
  if (said === null || answered === undefined) return;
  const same =
    typeof said === 'number' && typeof answered === 'number'
      ? Math.abs(said - answered) <= 1e-9 * Math.abs(said)
      : said === answered;
  if (same) return;
  faults.push({
    id: `contradicts-${what}`,
    code: `contradicts-${what}`,
    where: what,
    line: null,
    message: `the file says ${said}, the answer says ${answered}`,
    mend: `Leave the ${what} to the file`,
    choices: [LEAVE_OUT],
  });
}

/** A stated count that the values do not match: fewer is a fault with a choice, more is taken and said. */
function countFaults(
  { count, values: { length } }: Series,
  { mends: choices }: RecordAnswers,
  mends: Mend[],
  faults: RecordFault[],
  warnings: Fault[],
): void {
  if (count === null || count === length || length < 2) return;
  if (length > count) {
    warnings.push({
      code: 'more-than-stated',
      where: 'count',
      message: `the heading says ${count} values, the file holds ${length}: all ${length} are taken`,
      mend: 'Look at the end of the trace',
    });
    return;
  }
  if (choices?.count?.choice === 'take') {
    mends.push({
      line: 0,
      was: `${count} values stated`,
      is: `${length} values`,
      why: 'the file holds no more; what is there was taken',
    });
    return;
  }
  faults.push({
    id: 'count',
    code: 'fewer-than-stated',
    where: 'count',
    line: null,
    message: `the heading says ${count} values, the file holds ${length}: it may be cut off`,
    mend: 'Take what is there, or leave the file out',
    choices: [{ id: 'take', label: `Take the ${length} values that are there` }, LEAVE_OUT],
  });
}

function badInterval(interval: number): RecordFault {
  return {
    id: 'interval',
    code: 'not-positive',
    where: 'interval',
    line: null,
    message: `is ${interval} s, must be above 0`,
    mend: 'Mend it in the file, or leave the file out',
    choices: [LEAVE_OUT],
  };
}

function tooFew(count: number): RecordFault {
  return {
    id: 'too-few',
    code: 'too-few',
    where: 'values',
    line: null,
    message: `there ${count === 1 ? 'is 1 value' : `are ${count} values`}, a motion needs at least 2`,
    mend: 'Choose another file',
    choices: [LEAVE_OUT],
  };
}

function tooMany(more: number): RecordFault {
  return {
    id: 'more',
    code: 'not-a-number',
    where: 'values',
    line: null,
    message: `${more} more values are no numbers`,
    mend: 'Mend the file, or say how many heading lines it has',
    choices: [LEAVE_OUT],
  };
}

function unreadable(file: string, empty: boolean): RecordReading {
  const fault: RecordFault = {
    id: 'no-figures',
    code: empty ? 'empty' : 'no-figures',
    where: 'file',
    line: null,
    message: empty ? 'the file is empty' : 'no line of figures is in it',
    mend: 'Choose a plain text file with acceleration values',
    choices: [LEAVE_OUT],
  };
  return {
    file,
    layout: 'values',
    name: nameOf(file, {}),
    interval: null,
    unit: null,
    statedCount: null,
    values: new Float64Array(),
    firstLine: 1,
    perLine: 0,
    facts: [],
    warnings: [],
    faults: [fault],
    asks: [],
    mends: [],
    motion: null,
  };
}

/** The file's name without its ending, as words. */
function nameOf(file: string, { name }: RecordAnswers): string {
  if (name !== undefined && name.trim() !== '') return name.trim();
  const words = file
    .replace(/\.[A-Za-z0-9]{1,5}$/, '')
    .replace(/[_\s-]+/g, ' ')
    .trim();
  return words === '' ? 'Record' : words.charAt(0).toUpperCase() + words.slice(1);
}

function factsOf(layout: Layout, heading: Heading, series: Series, table: Table): RecordFact[] {
  const first = table.rowLine[series.firstRow] ?? 1;
  const facts: RecordFact[] = [{ what: 'layout', value: layout.name, line: first, span: null }, ...heading.facts];
  const told = (what: RecordFact['what']) => facts.some((fact) => fact.what === what);
  if (!told('interval') && series.interval !== null)
    facts.push({ what: 'interval', value: `${series.interval} s`, line: table.rowLine[0] ?? 1, span: null });
  if (!told('count') && series.count !== null)
    facts.push({ what: 'count', value: String(series.count), line: table.rowLine[0] ?? 1, span: null });
  return facts;
}

function originOf(
  file: string,
  bytes: Uint8Array,
  layout: LayoutId,
  heading: Heading,
  series: Series,
  unit: AccelerationUnit,
  interval: number,
  mends: readonly Mend[],
): Origin {
  const { event, station, component } = heading;
  return {
    file,
    digest: digestOfBytes(bytes),
    layout,
    unit,
    unitFrom: heading.unit === null ? 'answer' : 'file',
    interval,
    intervalFrom: series.interval === null ? 'answer' : 'file',
    ...(event === null ? {} : { event }),
    ...(station === null ? {} : { station }),
    ...(component === null ? {} : { component }),
    ...(mends.length === 0 ? {} : { mends }),
  };
}
