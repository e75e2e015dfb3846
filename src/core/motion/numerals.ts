import type { Lines } from './text.ts';

/** What a comma is in a file: parts values, parts decimals, or neither (a comma within a value spoils it). */
export type Comma = 'separator' | 'decimal' | 'neither';

const TAB = 9;
const FORM_FEED = 12;
const END_OF_TEXT = 26;
const SPACE = 32;
const QUOTE = 34;
const PLUS = 43;
const COMMA = 44;
const MINUS = 45;
const POINT = 46;
const SEMICOLON = 59;
const NO_BREAK_SPACE = 160;

/** The values of one line; its arrays are used again for the next one, so that a million values make no objects. */
export class Tokens {
  count = 0;
  /** Tokens that are no numbers. */
  bad = 0;
  from = new Int32Array(64);
  to = new Int32Array(64);
  /** NaN where the token is no finite number. */
  value = new Float64Array(64);

  /** Width of the fields of numbers that touch, where the line has such; else 0. */
  private width = 0;

  /** The values of a line in a file whose comma is known. Two separators with nothing between them hold an empty, bad token. */
  read({ codes }: Lines, start: number, end: number, comma: Comma): void {
    this.split(codes, start, end, comma, true);
    if (this.width > 0 && !this.aligned()) this.split(codes, start, end, comma, false);
  }

  private split(codes: Lines['codes'], start: number, end: number, comma: Comma, touching: boolean): void {
    this.count = 0;
    this.bad = 0;
    this.width = 0;
    const decimal = comma === 'decimal' ? COMMA : POINT;
    const parts = comma === 'separator';
    // Separators since the last token; the first of a line has a place of its own before it.
    let separators = 0;
    let any = false;
    for (let i = start; i < end; ) {
      const c = codes[i];
      if (c === SPACE || c === TAB || c === FORM_FEED || c === END_OF_TEXT || c === QUOTE || c === NO_BREAK_SPACE) {
        i++;
        continue;
      }
      // A comma between quoted values parts them, whatever it is within one.
      if (c === SEMICOLON || (c === COMMA && (parts || (codes[i - 1] === QUOTE && codes[i + 1] === QUOTE)))) {
        separators++;
        i++;
        continue;
      }
      for (let k = any ? 1 : 0; k < separators; k++) this.push(i, i, Number.NaN);
      separators = 0;
      any = true;
      const from = i;
      while (i < end) {
        const d = codes[i];
        if (d <= SPACE || d === QUOTE || d === SEMICOLON || (d === COMMA && parts) || d === NO_BREAK_SPACE) break;
        i++;
      }
      // A control character would never be passed.
      if (i === from) i++;
      let to = i;
      // Beside decimal commas a comma at the end of a value parts it from the next.
      if (comma === 'decimal') while (to > from && codes[to - 1] === COMMA) to--;
      if (to === from) continue;
      const value = numberOf(codes, from, to, decimal);
      if (touching && Number.isNaN(value) && this.part(codes, from, to, decimal)) continue;
      this.push(from, to, value);
    }
  }

  /** Whether all values of the line end on the edges of fields of the width found. */
  private aligned(): boolean {
    for (let t = 1; t < this.count; t++) if ((this.to[t] - this.to[0]) % this.width !== 0) return false;
    return true;
  }

  /**
   * A token that is several numbers of fixed width that touch (`-12.34567-98.76543`, `0.123450.23456`): each ends as many
   * signs after its point as the last one, and all but the first, which may have had blanks before it, are as wide as each
   * other.
   */
  private part(codes: Lines['codes'], from: number, to: number, decimal: number): boolean {
    let [points, last] = [0, 0];
    for (let i = from; i < to; i++) {
      if (codes[i] !== decimal) continue;
      points++;
      last = i;
    }
    if (points < 2) return false;
    const after = to - last;
    const before = this.count;
    let [at, width] = [from, 0];
    for (let i = from; i < to; i++) {
      if (codes[i] !== decimal) continue;
      const stop = i + after;
      const value = stop > to || stop <= at ? Number.NaN : numberOf(codes, at, stop, decimal);
      const fits = at === from || width === 0 || stop - at === width;
      if (Number.isNaN(value) || !fits) return this.backTo(before);
      if (at !== from) width = stop - at;
      this.push(at, stop, value);
      at = stop;
      i = stop - 1;
    }
    if (at !== to || this.to[before] - this.from[before] > width) return this.backTo(before);
    // Two widths on one line are no fields: nothing is aligned to the larger.
    this.width = this.width === 0 || this.width === width ? width : codes.length;
    return true;
  }

  private backTo(count: number): false {
    this.count = count;
    return false;
  }

  private push(from: number, to: number, value: number): void {
    if (this.count === this.value.length) this.grow();
    this.from[this.count] = from;
    this.to[this.count] = to;
    this.value[this.count++] = value;
    if (Number.isNaN(value)) this.bad++;
  }

  private grow(): void {
    const size = 2 * this.value.length;
    const { from, to, value } = this;
    this.from = new Int32Array(size);
    this.to = new Int32Array(size);
    this.value = new Float64Array(size);
    this.from.set(from);
    this.to.set(to);
    this.value.set(value);
  }
}

/** Powers of ten that a double holds exactly: a mantissa below 2^53 times or over one of them is rounded once, as IEEE 754 asks. */
const TENS = Array.from({ length: 23 }, (_, i) => 10 ** i);
/** Figures that a double surely holds. */
const EXACT = 15;

/**
 * Reads [from, to) as one decimal number: Fortran's D exponent and an exponent without its letter (`.12345-3`) included.
 *
 * @param decimal  code of the decimal sign
 * @returns NaN where it is none, or not finite
 */
export function numberOf(codes: Lines['codes'], from: number, to: number, decimal: number): number {
  let i = from;
  let negative = false;
  const sign = codes[i];
  if (i < to && (sign === MINUS || sign === PLUS)) {
    negative = sign === MINUS;
    i++;
  }
  let mantissa = 0;
  let figures = 0;
  let significant = 0;
  let decimals = 0;
  let point = false;
  for (; i < to; i++) {
    const c = codes[i];
    if (c >= 48 && c <= 57) {
      figures++;
      if (significant > 0 || c > 48) significant++;
      if (significant <= EXACT) mantissa = mantissa * 10 + (c - 48);
      if (point) decimals++;
    } else if (c === decimal && !point) point = true;
    else break;
  }
  if (figures === 0) return Number.NaN;
  const exponent = i < to ? exponentOf(codes, i, to, point) : 0;
  if (Number.isNaN(exponent)) return Number.NaN;
  const power = exponent - decimals;
  let value: number;
  if (significant <= EXACT && power <= 0 && power >= -22) value = mantissa / TENS[-power];
  else if (significant <= EXACT && power > 0 && power <= 22) value = mantissa * TENS[power];
  else value = byLibrary(codes, from, to, decimal);
  if (!Number.isFinite(value)) return Number.NaN;
  return negative ? -value : value;
}

/** The exponent that [i, to) is; NaN where it is none. Without its letter it has a sign, and follows a point (Fortran). */
function exponentOf(codes: Lines['codes'], from: number, to: number, point: boolean): number {
  let i = from;
  const letter = codes[i] | 32;
  const lettered = letter === 101 || letter === 100;
  if (lettered) i++;
  else if (!point) return Number.NaN;
  let negative = false;
  if (i < to && (codes[i] === MINUS || codes[i] === PLUS)) negative = codes[i++] === MINUS;
  else if (!lettered) return Number.NaN;
  const first = i;
  let exponent = 0;
  for (; i < to && codes[i] >= 48 && codes[i] <= 57; i++) exponent = Math.min(exponent * 10 + (codes[i] - 48), 9999);
  if (i === first || i < to) return Number.NaN;
  return negative ? -exponent : exponent;
}

/** Magnitude, for numbers with too many figures or too large an exponent for one exact step. */
function byLibrary(codes: Lines['codes'], from: number, to: number, decimal: number): number {
  let text = '';
  for (let i = from; i < to; i++) {
    const c = codes[i];
    const letter = c | 32;
    const signed = c === PLUS || c === MINUS;
    if (c === decimal) text += '.';
    else if (letter === 100 || letter === 101) text += 'e';
    else if (signed && i === from) text += '';
    else if (signed && !text.endsWith('e')) text += `e${String.fromCharCode(c)}`;
    else text += String.fromCharCode(c);
  }
  return Number(text);
}

/** The unit of the last figure written: 0.01 for `1.25`, 0.1 for `1.25E+01`; 0 where the text is no number. */
export function lastPlace(text: string): number {
  const match = /^[+-]?\d*(?:[.,](\d*))?(?:[eEdD]?([+-]?\d+))?$/.exec(text.trim());
  if (!match) return 0;
  return 10 ** (Number(match[2] ?? 0) - (match[1]?.length ?? 0));
}
