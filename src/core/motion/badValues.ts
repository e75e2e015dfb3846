import { printQuantity } from '../units/quantities.ts';
import { LEAVE_OUT, type Series } from './layouts/layout.ts';
import type { Mend } from './motion.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';
import { type Place, placeOf, type Table } from './table.ts';

/** Faults of spoilt values that are listed one by one. */
const LISTED = 50;
/** No acceleration in any unit is larger: a slip that would overflow. Own figure. */
const LARGEST = 1e12;

/**
 * Entries of a series that are no numbers: those for which a mend was chosen are mended in place, the others are faults, the
 * first fifty one by one.
 *
 * @param interval  [s], to say when a sample acts; null where it is not known
 */
export function badValues(
  table: Table,
  series: Series,
  interval: number | null,
  answers: RecordAnswers,
): { readonly mends: readonly Mend[]; readonly faults: readonly RecordFault[] } {
  const { values } = series;
  const mends: Mend[] = [];
  const faults: RecordFault[] = [];
  let bad = 0;
  let more = 0;
  for (let i = 0; i < values.length; i++) {
    if (Math.abs(values[i]) <= LARGEST) continue;
    bad++;
    if (faults.length === LISTED) {
      more++;
      continue;
    }
    const place = placeOf(table, series.cellOf(i));
    const mend = mendOf(place, values, i, table, answers);
    if (mend) {
      values[i] = mend.value;
      mends.push({ line: place.line, was: place.text, is: String(mend.value), why: mend.why });
    } else faults.push(faultOf(place, values, i, table, interval));
  }
  if (2 * bad >= values.length && bad > 3) return { mends: [], faults: [mostlyBad(bad, values.length)] };
  if (more > 0) faults.push(moreFault(more));
  return { mends, faults };
}

function idOf({ line, value }: Place): string {
  return `line-${line}-value-${value}`;
}

function mendOf(
  place: Place,
  values: Float64Array,
  i: number,
  table: Table,
  { mends }: RecordAnswers,
): { readonly value: number; readonly why: string } | null {
  const made = mends?.[idOf(place)];
  const [asDecimal, mean] = [commaRead(place.text, table), meanAround(values, i)];
  const asThousands = thousandsRead(place.text, table);
  switch (made?.choice) {
    case 'as-decimal':
      return asDecimal === null ? null : { value: asDecimal, why: 'the comma was taken as a decimal point' };
    case 'as-thousands':
      return asThousands === null ? null : { value: asThousands, why: 'the comma was taken to part thousands' };
    case 'typed':
      return made.value !== undefined && Number.isFinite(made.value)
        ? { value: made.value, why: 'typed in its place' }
        : null;
    case 'mean':
      return mean === null ? null : { value: mean, why: 'the mean of its neighbours was taken' };
    default:
      return null;
  }
}

function faultOf(place: Place, values: Float64Array, i: number, table: Table, interval: number | null): RecordFault {
  const { line, value, text, span } = place;
  const [asDecimal, mean] = [commaRead(text, table), meanAround(values, i)];
  const asThousands = thousandsRead(text, table);
  const when = interval === null ? '' : `, at ${Number((i * interval).toPrecision(12))} s`;
  const neighbours = mean === null ? '' : `; the neighbours are ${signed(values[i - 1])} and ${signed(values[i + 1])}`;
  const what = wrongWith(text, values[i], asDecimal);
  return {
    id: idOf(place),
    code: 'not-a-number',
    where: `line ${line}, value ${value}`,
    line,
    span,
    message: what,
    detail: `${asDecimal === null ? '' : 'The other values have a decimal point. '}Sample ${counted(i + 1)} of ${counted(values.length)}${when}.`,
    mend:
      asDecimal === null ? 'Write the number that belongs there' : `Write it as ${asDecimal}, if that is what it means`,
    choices: [
      ...(asDecimal === null
        ? []
        : [
            {
              id: 'as-decimal',
              label: `Read it as ${signed(asDecimal)}`,
              detail: `The comma taken as a decimal point${neighbours}.`,
            },
          ]),
      ...(asThousands === null
        ? []
        : [
            {
              id: 'as-thousands',
              label: `Read it as ${signed(asThousands)}`,
              detail: `The comma taken to part thousands${neighbours}.`,
            },
          ]),
      { id: 'typed', label: 'Type the value', asksValue: true },
      ...(mean === null ? [] : [{ id: 'mean', label: `Take the mean of its neighbours, ${signed(mean)}` }]),
      LEAVE_OUT,
    ],
  };
}

/** As it is shown: with a true minus. */
function signed(value: number): string {
  return String(value).replace('-', '\u2212');
}

function counted(value: number): string {
  return printQuantity(value, 'count', 'si');
}

function wrongWith(text: string, value: number, asDecimal: number | null): string {
  if (text === '') return 'there is no value';
  if (!Number.isNaN(value)) return `${text} is larger than any acceleration`;
  return asDecimal === null ? `${text} is no number` : `${text} has a comma`;
}

/** A value with one comma among points, read with the comma as its decimal sign. */
function commaRead(text: string, { comma }: Table): number | null {
  if (comma === 'decimal' || !/^[+-]?\d*,\d+(?:[eE][+-]?\d{1,3})?$/.test(text)) return null;
  const value = Number(text.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
}

/** A value with commas before threes of figures and a point after them, `-1,016.2`, read without its commas. */
function thousandsRead(text: string, { comma }: Table): number | null {
  if (comma === 'decimal' || !/^[+-]?\d{1,3}(?:,\d{3})+\.\d*$/.test(text)) return null;
  return Number(text.replaceAll(',', ''));
}

/** To as many figures as its neighbours have: their sum is not worth more. */
function meanAround(values: Float64Array, i: number): number | null {
  const mean = Number(((values[i - 1] + values[i + 1]) / 2).toPrecision(12));
  return Number.isFinite(mean) ? mean : null;
}

function mostlyBad(bad: number, all: number): RecordFault {
  return {
    id: 'mostly-bad',
    code: 'mostly-bad',
    where: 'values',
    line: null,
    message: `${bad} of ${all} values are no numbers`,
    mend: 'Choose the columns or the heading lines anew, or another file',
    choices: [LEAVE_OUT],
  };
}

function moreFault(more: number): RecordFault {
  return {
    id: 'more',
    code: 'not-a-number',
    where: 'values',
    line: null,
    message: `${more} more ${more === 1 ? 'value is no number' : 'values are no numbers'}`,
    mend: 'Settle those listed: the next ones are listed then',
    choices: [LEAVE_OUT],
  };
}
