import { isUnit, unitSize } from './names.ts';
import { NUMERAL, readNumeral, type Signs } from './numeral.ts';
import { fromDisplay, type Quantity, type System, times, unitOf } from './quantities.ts';

/** What keeps a text from being read, and the mend. */
export class Unreadable extends Error {
  readonly why: string;
  readonly mend: string;
  constructor(why: string, mend: string) {
    super(why);
    this.why = why;
    this.mend = mend;
  }
}

export interface Evaluated {
  /** SI */
  readonly value: number;
  /** Whether a lone comma before three digits was taken as `signs` say. */
  readonly open: boolean;
}

/** A value on its way: plain figures still without a unit, or SI. */
interface Part {
  readonly value: number;
  readonly si: boolean;
}

const BLANK = /[\s\u00a0\u2009\u202f]/;
const NAME =
  /^(?:[A-Za-z]+|%|['"])(?:\s*\/\s*[A-Za-z]+(?:2|²|\^2)?|\s*[·.-]\s*(?:m|mm|cm|ft|in)(?![A-Za-z])|\s+(?:m|mm|cm|ft|in)(?![A-Za-z]))?/;
const DEEPEST = 100;

/**
 * The value [SI] of a sum of figures and units: + - * / and brackets, a unit behind any number, feet with inches behind
 * them. Plain figures are in the unit shown. Nothing is ever evaluated as code.
 *
 * @param from  SI value that stands before the text, for a text that begins with * or /; null where there is none
 * @throws Unreadable
 */
export function evaluate(
  source: string,
  quantity: Quantity,
  system: System,
  signs: Signs,
  from: number | null = null,
): Evaluated {
  return new Expression(source, quantity, system, signs).whole(from);
}

class Expression {
  private open = false;
  private at = 0;
  private depth = 0;
  private readonly source: string;
  private readonly quantity: Quantity;
  private readonly system: System;
  private readonly signs: Signs;

  constructor(source: string, quantity: Quantity, system: System, signs: Signs) {
    this.source = source;
    this.quantity = quantity;
    this.system = system;
    this.signs = signs;
  }

  whole(from: number | null): Evaluated {
    const part = this.sum(from === null ? this.factor() : { value: from, si: true });
    if (this.at < this.source.length) {
      throw new Unreadable(`"${this.source.slice(this.at)}" is not understood`, this.typeNumber());
    }
    const { value } = this.toSi(part);
    if (!Number.isFinite(value)) throw new Unreadable('the result is not a finite number', this.typeNumber());
    return { value, open: this.open };
  }

  private sum(first: Part): Part {
    let left = this.product(first);
    for (;;) {
      const sign = this.next();
      if (sign !== '+' && sign !== '-') return left;
      this.at++;
      const right = this.product(this.factor());
      const [a, b] = left.si === right.si ? [left, right] : [this.toSi(left), this.toSi(right)];
      left = { value: sign === '+' ? a.value + b.value : a.value - b.value, si: a.si };
    }
  }

  private product(first: Part): Part {
    let left = first;
    for (;;) {
      const sign = this.next();
      if (sign !== '*' && sign !== '/') return left;
      this.at++;
      const right = this.factor();
      if (right.si && (left.si || sign === '/')) {
        throw new Unreadable('a value with a unit stands where a plain factor must', 'Leave the unit off the factor');
      }
      left = { value: sign === '*' ? left.value * right.value : left.value / right.value, si: left.si || right.si };
    }
  }

  private factor(): Part {
    if (++this.depth > DEEPEST) throw new Unreadable('the sum is nested too deeply', 'Type a simpler sum');
    const part = this.signed();
    this.depth--;
    return part;
  }

  private signed(): Part {
    const sign = this.next();
    if (sign === '-' || sign === '+') {
      this.at++;
      const part = this.factor();
      return sign === '-' ? { ...part, value: -part.value } : part;
    }
    if (sign !== '(') return this.measure();
    this.at++;
    const part = this.sum(this.factor());
    if (this.next() !== ')') throw new Unreadable('a bracket is not closed', 'Close the bracket');
    this.at++;
    return part;
  }

  /** A number with its unit, and further ones that follow it directly (12 ft 6 in). */
  private measure(): Part {
    let total = this.numberWithUnit();
    while (total.si && /[\d.,]/.test(this.next())) {
      const more = this.numberWithUnit();
      if (!more.si) {
        throw new Unreadable(
          'a number without a unit follows one that has one',
          'Give both a unit, or one number only',
        );
      }
      total = { value: total.value + more.value, si: true };
    }
    return total;
  }

  private numberWithUnit(): Part {
    const rest = this.source.slice(this.at);
    const figures = NUMERAL.exec(rest)?.[0];
    if (figures === undefined) {
      throw new Unreadable(rest === '' ? 'a number is missing' : `"${rest}" is no number`, this.typeNumber());
    }
    this.at += figures.length;
    const numeral = readNumeral(figures, this.signs);
    if (numeral.kind === 'unreadable') throw new Unreadable(numeral.why, numeral.mend);
    this.open ||= numeral.open;
    this.next();
    const name = NAME.exec(this.source.slice(this.at))?.[0];
    if (name === undefined) return { value: numeral.value, si: false };
    const size = unitSize(name, this.quantity);
    if (size === null) throw this.wrongUnit(name);
    this.at += name.length;
    return { value: times(numeral.value, size), si: true };
  }

  private wrongUnit(name: string): Unreadable {
    if (name === '%') {
      const mend = 'Type a change alone, such as +10%, or a factor, such as *1.1';
      return new Unreadable('a percentage stands beside a value', mend);
    }
    const why = isUnit(name) ? `${name} is a unit of another kind` : `"${name}" is no unit known here`;
    return new Unreadable(why, this.typeNumber());
  }

  private toSi(part: Part): Part {
    return part.si ? part : { value: fromDisplay(part.value, this.quantity, this.system), si: true };
  }

  private typeNumber(): string {
    const unit = unitOf(this.quantity, this.system);
    return unit === '' || unit === 'ratio' ? 'Type a plain number' : `Type a number in ${unit}`;
  }

  /** The next sign that is not blank, where it now stands; empty at the end. */
  private next(): string {
    while (BLANK.test(this.source[this.at] ?? '')) this.at++;
    return this.source[this.at] ?? '';
  }
}
