import { digestOfBytes } from '../digest.ts';
import type { Fault } from '../fault.ts';
import { STANDARD_GRAVITY } from '../units/constants.ts';
import { badValues } from './badValues.ts';
import { type Heading, headingFacts, headingOf } from './heading.ts';
import { countAndInterval } from './layouts/countAndInterval.ts';
import type { Layout, Series } from './layouts/layout.ts';
import { timeAndAcceleration } from './layouts/timeAndAcceleration.ts';
import { values } from './layouts/values.ts';
import type { AccelerationUnit, Mend, Motion, Origin } from './motion.ts';
import type { RecordAnswers, RecordFact, RecordFault, RecordReading } from './reading.ts';
import { countedValues } from './sampleCount.ts';
import { settledInterval, settledUnit } from './settled.ts';
import { type Table, tableOf } from './table.ts';
import { linesOf } from './text.ts';
import { settledText } from './textBetween.ts';
import { unclearCommas } from './unclearCommas.ts';
import { nothingRead, tooFew } from './unreadable.ts';
import { motionWarnings } from './warnings.ts';

/** The layouts there are: a new one is one file more and one line here. */
const LAYOUTS: readonly Layout[] = [timeAndAcceleration, countAndInterval, values];

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
  const name = nameOf(file, answers);
  const lines = linesOf(bytes);
  if (lines.count === 0 || lines.binary) return nothingRead(file, name, lines.binary ? 'binary' : 'empty');
  const asked = Math.max(0, Math.min(lines.count, Math.floor(answers.headingLines ?? 0) || 0));
  const found = tableOf(lines, asked);
  const skip = Math.max(asked, bareHead(found));
  const whole = skip > asked ? tableOf(lines, skip) : found;
  if (whole.rows === 0) return nothingRead(file, name, 'no-figures');
  const heading = headingOf(whole.heading);
  const layout = layoutOf(whole, heading, answers);
  const text = settledText(whole, layout, heading, answers, skip);
  const { table, series } = text;
  const interval = settledInterval(series, heading, answers);
  const unit = settledUnit(series, heading, answers);
  const counted = countedValues(series, table.columns, answers);
  const bad = badValues(table, { ...series, values: counted.values }, interval.value, answers);
  const parts = [text, series, interval, unit, counted, bad];
  const faults: RecordFault[] = [
    ...unclearCommas(table, answers),
    ...parts.flatMap((part) => part.faults),
    ...(counted.values.length < 2 ? [tooFew(counted.values.length)] : []),
  ];
  const mends: Mend[] = [
    ...text.mends,
    ...series.mends,
    ...interval.mends,
    ...unit.mends,
    ...counted.mends,
    ...bad.mends,
  ];
  const warnings: Fault[] = [
    ...counted.warnings,
    ...series.warnings,
    ...interval.warnings,
    ...unit.warnings,
    ...text.warnings,
    ...factorWarning(heading),
    ...otherQuantity(whole.heading),
  ];
  const asks: RecordReading['asks'] = [
    ...(interval.value === null && interval.faults.length === 0 ? ['interval' as const] : []),
    ...(unit.value === null && unit.faults.length === 0 ? ['unit' as const] : []),
  ];
  let motion: Motion | null = null;
  if (faults.length === 0 && interval.value !== null && unit.value !== null) {
    const size = UNIT_SIZE[unit.value];
    const acceleration = counted.values.map((value) => value * size);
    const from = { unitFrom: unit.from, intervalFrom: interval.from };
    const origin = originOf(file, bytes, layout, heading, {
      unit: unit.value,
      interval: interval.value,
      ...from,
      mends,
    });
    motion = { name, interval: interval.value, acceleration, origin };
    warnings.push(...motionWarnings(motion, unit.value));
  }
  return {
    file,
    layout: layout.id,
    name,
    interval: interval.value,
    unit: unit.value,
    statedCount: series.count?.value ?? null,
    values: counted.values,
    firstLine: table.rowLine[Math.min(series.firstRow, table.rows - 1)],
    perLine: table.columns,
    ...(series.columns ? { columns: series.columns } : {}),
    facts: factsOf(layout, heading, series, table),
    warnings,
    faults,
    asks,
    mends,
    motion,
  };
}

/**
 * The line, from 1, of a first row of bare count and interval over two columns, `400 0.005` over times and values: it looks
 * like a row and is none where as many rows follow and go on by that interval. 0 where there is no such line.
 */
function bareHead({ columns, rows, values, rowLine }: Table): number {
  if (columns !== 2 || rows < 4 || values[0] !== rows - 1) return 0;
  const step = values[4] - values[2];
  return Math.abs(values[1] - step) <= 1e-6 * Math.abs(step) ? rowLine[0] : 0;
}

/** The layout that was answered, else the one that fits best. */
function layoutOf(table: Table, heading: Heading, { layout: answered, columns }: RecordAnswers): Layout {
  const asked = LAYOUTS.find(({ id }) => id === answered);
  if (asked) return asked;
  if (columns !== undefined) return timeAndAcceleration;
  return LAYOUTS.reduce((best, layout) =>
    layout.recognise(table, heading) > best.recognise(table, heading) ? layout : best,
  );
}

/** The file's name without its ending, as words. */
function nameOf(file: string, { name }: RecordAnswers): string {
  if (name !== undefined && name.trim() !== '') return name.trim();
  const words = file
    .replace(/\.[A-Za-z0-9]{1,5}$/, '')
    .split(/[_\s-]+/)
    .join(' ')
    .trim();
  return words === '' ? 'Record' : words.charAt(0).toUpperCase() + words.slice(1);
}

function factorWarning({ factor }: Heading): Fault[] {
  if (factor === null) return [];
  return [
    {
      code: 'factor',
      where: `line ${factor.line}`,
      message: `speaks of a factor on the values (${factor.value}); none was applied`,
      mend: 'If the values are not yet in their unit, give the record a scale',
    },
  ];
}

/** A heading that speaks of velocity or displacement and never of acceleration. */
function otherQuantity(heading: Table['heading']): Fault[] {
  if (heading.some(({ text }) => /acc/i.test(text))) return [];
  for (const { line, text } of heading) {
    const word = /\b(?:velocity|velocities|displacements?)\b/i.exec(text)?.[0].toLowerCase();
    if (word === undefined) continue;
    return [
      {
        code: 'other-quantity',
        where: `line ${line}`,
        message: `speaks of ${word}, and no line of acceleration; the values were read as acceleration`,
        mend: 'Make sure that the file holds ground acceleration',
      },
    ];
  }
  return [];
}

function factsOf(layout: Layout, heading: Heading, series: Series, table: Table): RecordFact[] {
  const { interval, count, unit } = series;
  const first = table.rowLine[Math.min(series.firstRow, table.rows - 1)];
  return [
    { what: 'layout', value: layout.name, line: first, span: null },
    ...headingFacts({ ...heading, interval, count, unit }),
    ...series.facts,
  ];
}

function originOf(
  file: string,
  bytes: Uint8Array,
  layout: Layout,
  { event, station, component }: Heading,
  read: Pick<Required<Origin>, 'unit' | 'unitFrom' | 'interval' | 'intervalFrom' | 'mends'>,
): Origin {
  const { mends, ...rest } = read;
  return {
    file,
    digest: digestOfBytes(bytes),
    layout: layout.id,
    ...rest,
    ...(event === null ? {} : { event: event.value }),
    ...(station === null ? {} : { station: station.value }),
    ...(component === null ? {} : { component: component.value }),
    ...(mends.length === 0 ? {} : { mends }),
  };
}
