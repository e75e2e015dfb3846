import { evaluate, Unreadable } from './expression.ts';
import type { Signs } from './numeral.ts';
import { printTyped, type Quantity, type System, unitOf } from './quantities.ts';

/** What a typed text says: the one door by which a number comes in. Values are SI. */
export type Reading =
  | { readonly kind: 'value'; readonly value: number }
  | { readonly kind: 'empty' }
  /** It can be meant in two ways, such as a lone comma before three digits: both, the decimal reading first. */
  | { readonly kind: 'ambiguous'; readonly readings: readonly { readonly value: number; readonly shown: string }[] }
  | { readonly kind: 'unreadable'; readonly why: string; readonly mend: string };

/** No number and no sum that somebody types is longer. */
const LONGEST = 200;

/** Ratios of codes are written 1/N from here on (H/550, H/50); below, 1/2 in a percent field is half a percent. */
const SHARE_FROM = 50;

/**
 * Reads a cell: figures with spaces, one point or comma as the decimal sign; a unit (`250 kN`, `3600 mm`, `12 ft 6 in`, `12'-6"`);
 * sums (`455*1.1`, `(2+3)*4`); changes of the current value: with % behind a sign (`+10%`, `-5%`) or with * or / in front
 * (`*1.1`, `/2`). `+10` and `-5` are numbers. A bare number is in the unit shown; 1/550 in a percent field is the ratio that
 * codes write so.
 *
 * @param current  SI value that a change refers to; null where there is none
 */
export function readQuantity(text: string, quantity: Quantity, system: System, current: number | null = null): Reading {
  if (text.trim() === '') return { kind: 'empty' };
  try {
    const values = meanings(tidied(text), quantity, system, current, ['decimal', 'thousands']);
    return values.length === 1
      ? { kind: 'value', value: values[0] }
      : { kind: 'ambiguous', readings: values.map((value) => ({ value, shown: shownOf(value, quantity, system) })) };
  } catch (error) {
    return unreadable(error);
  }
}

/** A column read as one: values (null where a cell is empty), or what stops it. */
export type ColumnReading =
  | { readonly kind: 'values'; readonly values: readonly (number | null)[] }
  /** No cell tells how a comma is meant: both readings of the whole column. */
  | {
      readonly kind: 'undecided';
      readonly decimal: readonly (number | null)[];
      readonly thousands: readonly (number | null)[];
    }
  | { readonly kind: 'faults'; readonly faults: readonly ColumnFault[] };

export interface ColumnFault {
  /** From 0, at the top of the column. */
  readonly row: number;
  readonly text: string;
  readonly why: string;
  readonly mend: string;
}

/**
 * Reads a pasted column. Its cells decide together which sign is the decimal one: what only one convention can read (1,25 or
 * 1,250.5 or 1.250.000) settles the others. Where both can and they differ (1,250 and no other sign), both come back. A
 * change (+10%) has nothing to change here and is a fault.
 */
export function readColumn(texts: readonly string[], quantity: Quantity, system: System): ColumnReading {
  const as = (signs: Signs) => columnAs(texts, quantity, system, signs);
  const [point, comma] = [as('point'), as('comma')];
  if (point.faults.length === 0 && comma.faults.length === 0) {
    if (sameValues(point.values, comma.values) || !texts.some((text) => text.includes(','))) {
      return { kind: 'values', values: point.values };
    }
    return { kind: 'undecided', decimal: comma.values, thousands: point.values };
  }
  if (point.faults.length === 0) return { kind: 'values', values: point.values };
  if (comma.faults.length === 0) return settled(texts, comma.values, as('decimal').values);
  // No one convention fits all cells: each stands for itself.
  const decimal = as('decimal');
  if (decimal.faults.length > 0) return { kind: 'faults', faults: decimal.faults };
  const thousands = as('thousands');
  return sameValues(decimal.values, thousands.values)
    ? { kind: 'values', values: decimal.values }
    : { kind: 'undecided', decimal: decimal.values, thousands: thousands.values };
}

/**
 * The values where the comma is the decimal sign. A lone point before three digits would then part thousands, though by itself it
 * is a decimal point: unless a cell shows the point at that work (1.250,5), such a cell is refused rather than guessed.
 */
function settled(
  texts: readonly string[],
  values: readonly (number | null)[],
  alone: readonly (number | null)[],
): ColumnReading {
  if (texts.some((text) => /\d\.\d{3}[.,]\d/.test(text))) return { kind: 'values', values };
  const faults = texts.flatMap((text, row): ColumnFault[] =>
    values[row] === alone[row]
      ? []
      : [
          {
            row,
            text,
            why: `in a column whose decimal sign is the comma, "${text}" can be read in two ways`,
            mend: 'Write its decimal sign as a comma, or its thousands without a point',
          },
        ],
  );
  return faults.length > 0 ? { kind: 'faults', faults } : { kind: 'values', values };
}

function columnAs(
  texts: readonly string[],
  quantity: Quantity,
  system: System,
  signs: Signs,
): { readonly values: readonly (number | null)[]; readonly faults: readonly ColumnFault[] } {
  const faults: ColumnFault[] = [];
  const values = texts.map((text, row) => {
    if (text.trim() === '') return null;
    try {
      const [value, other] = meanings(tidied(text), quantity, system, null, [signs]);
      if (other === undefined) return value;
      const why = `is ${shownOf(value, quantity, system)} or ${shownOf(other, quantity, system)}`;
      throw new Unreadable(why, 'Write it as one plain number');
    } catch (error) {
      const { why, mend } = unreadable(error);
      faults.push({ row, text, why, mend });
      return null;
    }
  });
  return { values, faults };
}

function sameValues(a: readonly (number | null)[], b: readonly (number | null)[]): boolean {
  return a.every((value, row) => value === b[row]);
}

/** Every value that a text can mean, at least one and no two alike. @throws Unreadable */
function meanings(
  text: string,
  quantity: Quantity,
  system: System,
  current: number | null,
  ways: readonly Signs[],
): readonly number[] {
  const found: number[] = [];
  for (const signs of ways) {
    const { value, open } = valueIn(text, quantity, system, current, signs);
    found.push(value, ...otherMeanings(text, quantity, system, signs));
    if (!open) break;
  }
  return found.filter((value, i) => found.indexOf(value) === i);
}

function valueIn(text: string, quantity: Quantity, system: System, current: number | null, signs: Signs) {
  const change = /^([+-])([^-+*/()%]+)%$/.exec(text);
  if (change !== null || /^[*/]/.test(text)) {
    if (current === null) throw new Unreadable('a change needs a value to start from', 'Type the value itself');
    if (change === null) return evaluate(text, quantity, system, signs, current);
    const amount = evaluate(change[2], 'ratio', system, signs);
    const share = change[1] === '-' ? -amount.value : amount.value;
    return { value: (current * (100 + share)) / 100, open: amount.open };
  }
  const share = quantity === 'percent' ? /^1\s*\/\s*(\d+)$/.exec(text) : null;
  if (share !== null && Number(share[1]) >= SHARE_FROM) return { value: 1 / Number(share[1]), open: false };
  return evaluate(text, quantity, system, signs);
}

/** Second meanings beside that of the commas: a drift written 2/400, and feet less inches written with a dash. */
function otherMeanings(text: string, quantity: Quantity, system: System, signs: Signs): readonly number[] {
  const share = quantity === 'percent' ? /^(\d+)\s*\/\s*(\d+)$/.exec(text) : null;
  if (share !== null && share[1] !== '1' && Number(share[2]) >= SHARE_FROM)
    return [Number(share[1]) / Number(share[2])];
  if (/ft\s*-\s*[\d.,]+\s*in$/i.test(text)) {
    return [evaluate(text.replace(/(ft)\s*-/i, '$1 '), quantity, system, signs).value];
  }
  return [];
}

/** One sign each for what keyboards, spreadsheets and drawings write differently. @throws Unreadable */
function tidied(text: string): string {
  if (text.length > LONGEST) throw new Unreadable(`the text is ${text.length} signs long`, 'Type a number');
  const tidy = text
    .trim()
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/[×⋅]/g, '*')
    .replace(/÷/g, '/')
    .replace(/[’′ʼ]/g, "'")
    .replace(/[”″]/g, '"');
  if (/\d'\d{3}(?!\d|\s*(?:"|in))/.test(tidy)) {
    throw new Unreadable('an apostrophe parts the thousands', 'Leave it out, or put a space there');
  }
  // 12'-6" is how drawings write 12 feet 6 inches: no minus.
  return tidy.replace(/'\s*-\s*(?=[\d.,]+\s*")/g, "' ");
}

function shownOf(value: number, quantity: Quantity, system: System): string {
  return `${printTyped(value, quantity, system)} ${unitOf(quantity, system)}`.trim();
}

function unreadable(error: unknown): Extract<Reading, { kind: 'unreadable' }> {
  if (!(error instanceof Unreadable)) throw error;
  return { kind: 'unreadable', why: error.why, mend: error.mend };
}
