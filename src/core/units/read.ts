import { isUnit, unitSize } from './names.ts';
import { type CommaReading, readNumeral } from './numeral.ts';
import { fromDisplay, printTyped, type Quantity, type System, unitOf } from './quantities.ts';

/** What a typed text says: the one door by which a number comes in. Values are SI. */
export type Reading =
  | { readonly kind: 'value'; readonly value: number }
  | { readonly kind: 'empty' }
  /** A lone comma before three digits: both readings, the decimal one first. */
  | { readonly kind: 'ambiguous'; readonly readings: readonly { readonly value: number; readonly shown: string }[] }
  | { readonly kind: 'unreadable'; readonly why: string; readonly mend: string };

/**
 * Reads a cell: figures with spaces, one point or comma as the decimal sign; a unit (`250 kN`, `3600 mm`, `12 ft 6 in`); sums
 * (`455*1.1`, `(2+3)*4`); changes of the current value (`+10%`, `-5%`, `*1.1`, `/2`). A bare number is in the unit shown; a
 * share such as 1/550 in a percent field is the ratio that codes write so.
 *
 * @param current  SI value that a change refers to; null where there is none
 */
export function readQuantity(text: string, quantity: Quantity, system: System, current: number | null = null): Reading {
  if (text.trim() === '') return { kind: 'empty' };
  const asDecimal = readAs(text, quantity, system, current, 'decimal');
  if (!asDecimal.undecided) return asDecimal.reading;
  const asThousands = readAs(text, quantity, system, current, 'thousands');
  const readings = [asDecimal.reading, asThousands.reading].flatMap((reading) =>
    reading.kind === 'value'
      ? [
          {
            value: reading.value,
            shown: `${printTyped(reading.value, quantity, system)} ${unitOf(quantity, system)}`.trim(),
          },
        ]
      : [],
  );
  return readings.length === 2 ? { kind: 'ambiguous', readings } : asDecimal.reading;
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
  | {
      readonly kind: 'faults';
      readonly faults: readonly {
        readonly row: number;
        readonly text: string;
        readonly why: string;
        readonly mend: string;
      }[];
    };

/** Reads a pasted column: one cell whose comma is plain (1,25 or 1,250.5) decides for all that leave it open. */
export function readColumn(texts: readonly string[], quantity: Quantity, system: System): ColumnReading {
  const comma = decidedComma(texts);
  const faults: { row: number; text: string; why: string; mend: string }[] = [];
  let undecided = false;
  const values = (as: CommaReading) =>
    texts.map((text, row) => {
      if (text.trim() === '') return null;
      const { reading, undecided: open } = readAs(text, quantity, system, null, as);
      undecided ||= open;
      if (reading.kind === 'value') return reading.value;
      if (reading.kind === 'unreadable' && !faults.some((fault) => fault.row === row))
        faults.push({ row, text, why: reading.why, mend: reading.mend });
      return null;
    });
  const first = values(comma ?? 'decimal');
  if (faults.length > 0) return { kind: 'faults', faults };
  if (undecided && comma === null) return { kind: 'undecided', decimal: first, thousands: values('thousands') };
  return { kind: 'values', values: first };
}

/** What the cells of a column that are plain say of the comma; null where none does, or they disagree. */
function decidedComma(texts: readonly string[]): CommaReading | null {
  let found: CommaReading | null = null;
  for (const text of texts) {
    for (const figures of text.match(/[\d.,]*[.,][\d.,]*/g) ?? []) {
      const numeral = readNumeral(figures, 'decimal');
      if (numeral.kind !== 'number' || numeral.undecided) continue;
      const says: CommaReading = numeral.commaIsDecimal ? 'decimal' : 'thousands';
      if (found !== null && found !== says) return null;
      found = says;
    }
  }
  return found;
}

interface Attempt {
  readonly reading: Reading;
  readonly undecided: boolean;
}

function readAs(
  text: string,
  quantity: Quantity,
  system: System,
  current: number | null,
  comma: CommaReading,
): Attempt {
  const source = text
    .trim()
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/[×⋅]/g, '*')
    .replace(/÷/g, '/');
  const parser = new Parser(source, quantity, system, comma);
  try {
    return { reading: { kind: 'value', value: parser.whole(current) }, undecided: parser.undecided };
  } catch (error) {
    if (!(error instanceof Unreadable)) throw error;
    return { reading: { kind: 'unreadable', why: error.why, mend: error.mend }, undecided: false };
  }
}

class Unreadable extends Error {
  readonly why: string;
  readonly mend: string;
  constructor(why: string, mend: string) {
    super(why);
    this.why = why;
    this.mend = mend;
  }
}

/** A value on its way: plain figures still without a unit, or SI. */
interface Part {
  readonly value: number;
  readonly si: boolean;
}

/** Sums by recursive descent; nothing is ever evaluated as code. */
class Parser {
  undecided = false;
  private at = 0;
  private depth = 0;
  private readonly source: string;
  private readonly quantity: Quantity;
  private readonly system: System;
  private readonly comma: CommaReading;

  constructor(source: string, quantity: Quantity, system: System, comma: CommaReading) {
    this.source = source;
    this.quantity = quantity;
    this.system = system;
    this.comma = comma;
  }

  whole(current: number | null): number {
    const change = /^([+-])\s*(.+?)\s*%$/.exec(this.source);
    const factor = /^([*/])\s*(.+)$/.exec(this.source);
    if (change || factor) {
      if (current === null) throw this.fail('a change needs a value to start from', 'Type the value itself');
      const [, sign, rest] = (change ?? factor) as RegExpExecArray;
      const inner = new Parser(rest, 'ratio', this.system, this.comma);
      const amount = inner.finish();
      this.undecided ||= inner.undecided;
      if (amount.si) throw this.fail(`"${rest}" has a unit`, 'Type a plain factor');
      const share = sign === '-' ? -amount.value : amount.value;
      const changed = change
        ? (current * (100 + share)) / 100
        : sign === '*'
          ? current * amount.value
          : current / amount.value;
      return this.finite(changed);
    }
    if (this.quantity === 'percent' && /^1\s*\/\s*\d+(\.\d+)?$/.test(this.source)) {
      return this.finite(1 / Number(this.source.split('/')[1]));
    }
    return this.finite(this.toSi(this.finish()).value);
  }

  private finish(): Part {
    const part = this.sum();
    this.blank();
    if (this.at < this.source.length)
      throw this.fail(`"${this.source.slice(this.at)}" is not understood`, `Type a number in ${this.unit()}`);
    return part;
  }

  private sum(): Part {
    let left = this.term();
    for (;;) {
      this.blank();
      const sign = this.source[this.at];
      if (sign !== '+' && sign !== '-') return left;
      this.at++;
      const right = this.term();
      const [a, b] = left.si === right.si ? [left, right] : [this.toSi(left), this.toSi(right)];
      left = { value: sign === '+' ? a.value + b.value : a.value - b.value, si: a.si };
    }
  }

  private term(): Part {
    let left = this.factor();
    for (;;) {
      this.blank();
      const sign = this.source[this.at];
      if (sign !== '*' && sign !== '/') return left;
      this.at++;
      const right = this.factor();
      if (right.si && (left.si || sign === '/'))
        throw this.fail('two values with units cannot be multiplied or divided', 'Leave the unit off the factor');
      left = { value: sign === '*' ? left.value * right.value : left.value / right.value, si: left.si || right.si };
    }
  }

  private factor(): Part {
    this.blank();
    const sign = this.source[this.at];
    if (++this.depth > 200) throw this.fail('the sum is nested too deeply', 'Type a simpler sum');
    try {
      if (sign === '-' || sign === '+') {
        this.at++;
        const part = this.factor();
        return sign === '-' ? { ...part, value: -part.value } : part;
      }
      if (sign === '(') {
        this.at++;
        const part = this.sum();
        this.blank();
        if (this.source[this.at] !== ')') throw this.fail('a bracket is not closed', 'Close the bracket');
        this.at++;
        return part;
      }
      return this.measure();
    } finally {
      this.depth--;
    }
  }

  /** A number with its unit, and further ones that follow it directly (12 ft 6 in). */
  private measure(): Part {
    let total = this.numberWithUnit();
    for (;;) {
      this.blank();
      if (!total.si || !/[\d.,]/.test(this.source[this.at] ?? '')) return total;
      const more = this.numberWithUnit();
      if (!more.si)
        throw this.fail('a number without a unit follows one that has one', 'Give both a unit, or one number only');
      total = { value: total.value + more.value, si: true };
    }
  }

  private numberWithUnit(): Part {
    const figures = /^(?:\d|[.,]\d)[\d.,]*(?:[\s\u00a0\u2009\u202f]+\d{3}(?!\d)[\d.,]*)*(?:[eE][+-]?\d+)?/.exec(
      this.source.slice(this.at),
    );
    if (!figures) {
      const rest = this.source.slice(this.at);
      throw this.fail(
        rest === '' ? 'a number is missing' : `"${rest}" is no number`,
        `Type a number in ${this.unit()}`,
      );
    }
    this.at += figures[0].length;
    const numeral = readNumeral(figures[0], this.comma);
    if (numeral.kind === 'unreadable') throw this.fail(numeral.why, 'Use one point or comma as the decimal sign');
    this.undecided ||= numeral.undecided;
    this.blank();
    const name =
      /^(?:[A-Za-z]+|%|['"’”′″])(?:\s*\/\s*[A-Za-z]+(?:2|²|\^2)?|\s*[·.]\s*[A-Za-z]+|\s+(?:m|mm|cm|ft|in)(?![A-Za-z]))?/.exec(
        this.source.slice(this.at),
      );
    if (!name) return { value: numeral.value, si: false };
    const size = unitSize(name[0], this.quantity);
    if (size === null) {
      const why = isUnit(name[0]) ? `${name[0]} is a unit of another kind` : `"${name[0]}" is no unit known here`;
      throw this.fail(why, `Type the value in ${this.unit()}`);
    }
    this.at += name[0].length;
    return { value: numeral.value * size, si: true };
  }

  private toSi(part: Part): Part {
    return part.si ? part : { value: fromDisplay(part.value, this.quantity, this.system), si: true };
  }

  private finite(value: number): number {
    if (!Number.isFinite(value))
      throw this.fail('the result is not a finite number', `Type a number in ${this.unit()}`);
    return value;
  }

  private unit(): string {
    return unitOf(this.quantity, this.system) || 'plain figures';
  }

  private blank(): void {
    while (/[\s\u00a0\u2009\u202f]/.test(this.source[this.at] ?? '')) this.at++;
  }

  private fail(why: string, mend: string): Unreadable {
    return new Unreadable(why, mend);
  }
}
