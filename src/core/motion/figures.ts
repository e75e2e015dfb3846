/** Which sign parts decimals, for a whole file. */
export type DecimalSign = 'point' | 'comma';

const SPACE = 32;
const TAB = 9;
const COMMA = 44;
const SEMICOLON = 59;
const POINT = 46;
const PLUS = 43;
const MINUS = 45;

/** Powers of ten that a double holds exactly: a mantissa under 2^53 over one of them is rounded once, as the standard asks. */
const TENS = Array.from({ length: 23 }, (_, i) => 10 ** i);

/** Receives the tokens of a line; kept in arrays that are used again, so that a million values make no objects. */
export class Tokens {
  count = 0;
  /** Tokens that are no numbers. */
  bad = 0;
  from = new Int32Array(64);
  to = new Int32Array(64);
  value = new Float64Array(64);

  clear(): void {
    this.count = 0;
    this.bad = 0;
  }

  push(from: number, to: number, value: number): void {
    if (this.count === this.value.length) this.grow();
    this.from[this.count] = from;
    this.to[this.count] = to;
    this.value[this.count++] = value;
    if (Number.isNaN(value)) this.bad++;
  }

  private grow(): void {
    const size = 2 * this.value.length;
    const [from, to, value] = [new Int32Array(size), new Int32Array(size), new Float64Array(size)];
    from.set(this.from);
    to.set(this.to);
    value.set(this.value);
    [this.from, this.to, this.value] = [from, to, value];
  }
}

/**
 * Splits bytes [start, end) at blanks, tabs, semicolons and (where the decimal sign is a point) commas, and reads each token as
 * a number: Fortran's D exponent and an exponent without its letter (.12345-3) included. A number that touches the next one
 * (0.00630-0.01234, or 0.123450.23456 in rows of fixed width) is parted from it.
 */
export function tokensInto(bytes: Uint8Array, start: number, end: number, decimal: DecimalSign, tokens: Tokens): void {
  tokens.clear();
  let i = start;
  while (i < end) {
    const b = bytes[i];
    if (
      b === SPACE ||
      b === TAB ||
      b === SEMICOLON ||
      b === 0xa0 ||
      b === 12 ||
      b === 26 ||
      (b === COMMA && decimal === 'point')
    ) {
      i++;
      continue;
    }
    const from = i;
    while (i < end) {
      const c = bytes[i];
      if (
        c === SPACE ||
        c === TAB ||
        c === SEMICOLON ||
        c === 0xa0 ||
        c === 12 ||
        c === 26 ||
        (c === COMMA && decimal === 'point')
      )
        break;
      i++;
    }
    numbersOf(bytes, from, i, decimal, tokens);
  }
}

function numbersOf(bytes: Uint8Array, from: number, to: number, decimal: DecimalSign, tokens: Tokens): void {
  const value = numberOf(bytes, from, to, decimal);
  if (!Number.isNaN(value)) {
    tokens.push(from, to, value);
    return;
  }
  const parts = touching(bytes, from, to, decimal);
  if (parts === null) tokens.push(from, to, Number.NaN);
  else for (const [a, b] of parts) tokens.push(a, b, numberOf(bytes, a, b, decimal));
}

/** Parts a token that is several numbers of fixed width: all with a point, and as many figures after it as the last has. */
function touching(
  bytes: Uint8Array,
  from: number,
  to: number,
  decimal: DecimalSign,
): readonly (readonly [number, number])[] | null {
  const sign = decimal === 'comma' ? COMMA : POINT;
  const points: number[] = [];
  for (let i = from; i < to; i++) if (bytes[i] === sign) points.push(i);
  if (points.length < 2) return null;
  const after = to - points[points.length - 1];
  const parts: [number, number][] = [];
  let at = from;
  for (const point of points) {
    const stop = Math.min(to, point + after);
    if (stop <= at || Number.isNaN(numberOf(bytes, at, stop, decimal))) return null;
    parts.push([at, stop]);
    at = stop;
  }
  return at === to ? parts : null;
}

/** Reads [from, to) as one number; NaN where it is none, or not finite. */
export function numberOf(bytes: Uint8Array, from: number, to: number, decimal: DecimalSign): number {
  const sign = decimal === 'comma' ? COMMA : POINT;
  let i = from;
  let negative = false;
  if (bytes[i] === MINUS || bytes[i] === PLUS) negative = bytes[i++] === MINUS;
  let mantissa = 0;
  let figures = 0;
  let significant = 0;
  let decimals = 0;
  let point = false;
  for (; i < to; i++) {
    const c = bytes[i];
    if (c >= 48 && c <= 57) {
      figures++;
      if (significant > 0 || c > 48) significant++;
      if (significant <= 15) mantissa = mantissa * 10 + (c - 48);
      if (point) decimals++;
    } else if (c === sign && !point) point = true;
    else break;
  }
  if (figures === 0) return Number.NaN;
  let exponent = 0;
  if (i < to) {
    const c = bytes[i] | 32;
    const lettered = c === 101 || c === 100;
    if (lettered) i++;
    else if (!point || (bytes[i] !== PLUS && bytes[i] !== MINUS)) return Number.NaN;
    let minus = false;
    if (bytes[i] === MINUS || bytes[i] === PLUS) minus = bytes[i++] === MINUS;
    const first = i;
    for (; i < to && bytes[i] >= 48 && bytes[i] <= 57 && i - first < 4; i++) exponent = exponent * 10 + (bytes[i] - 48);
    if (i === first || i < to) return Number.NaN;
    // Without its letter an exponent has one or two figures (Fortran); more would be the next number touching.
    if (!lettered && i - first > 2) return Number.NaN;
    if (minus) exponent = -exponent;
  }
  const power = exponent - decimals;
  let value: number;
  if (significant <= 15 && power <= 0 && power >= -22) value = mantissa / TENS[-power];
  else if (significant <= 15 && power >= 0 && power <= 22) value = mantissa * TENS[power];
  else value = Math.abs(byLibrary(bytes, from, to, sign));
  if (!(value < Number.POSITIVE_INFINITY)) return Number.NaN;
  return negative ? -value : value;
}

function byLibrary(bytes: Uint8Array, from: number, to: number, sign: number): number {
  let text = '';
  for (let i = from; i < to; i++) {
    const c = bytes[i];
    const next = c | 32;
    if (c === sign) text += '.';
    else if (next === 100) text += 'e';
    else if ((c === PLUS || c === MINUS) && i > from && (bytes[i - 1] | 32) !== 101 && (bytes[i - 1] | 32) !== 100)
      text += `e${String.fromCharCode(c)}`;
    else text += String.fromCharCode(c);
  }
  return Number(text);
}
