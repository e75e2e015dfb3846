/**
 * How the signs of a numeral are taken. `point`: the point is the decimal sign and commas part thousands; `comma`: the other way
 * round; both are strict. `decimal` and `thousands` take either sign as it stands, and a lone comma before exactly three
 * digits (1,250), which leaves it open, as their name says.
 */
export type Signs = 'point' | 'comma' | 'decimal' | 'thousands';

export type Numeral =
  /** `open`: a lone comma before exactly three digits, taken as the signs asked for say. */
  | { readonly kind: 'number'; readonly value: number; readonly open: boolean }
  | { readonly kind: 'unreadable'; readonly why: string; readonly mend: string };

/** Spaces that may part thousands: plain, no-break, thin, narrow no-break. */
const SPACE = '[ \\u00a0\\u2009\\u202f]';

/** Figures with one decimal sign at most, their whole part plain or in threes (a group of threes never begins with a zero). */
function pattern(decimal: string, thousands: string): RegExp {
  const whole = ['\\d+', `[1-9]\\d{0,2}(?:${thousands}\\d{3})+`, `[1-9]\\d{0,2}(?:${SPACE}\\d{3})+`].join('|');
  return new RegExp(`^(?:(${whole})(?:${decimal}(\\d*))?|${decimal}(\\d+))$`);
}

const POINT = pattern('\\.', ',');
const COMMA = pattern(',', '\\.');

/** Where in a text a numeral may stand: figures, signs, single spaces before threes, an exponent. */
export const NUMERAL = new RegExp(`^(?:\\d|[.,]\\d)[\\d.,]*(?:${SPACE}\\d{3}(?!\\d)[\\d.,]*)*(?:[eE][+-]?\\d+)?`);

/** Reads one numeral that NUMERAL has found. It has no minus, and no number is made of what does not fit. */
export function readNumeral(text: string, signs: Signs): Numeral {
  const [, figures, exponent = ''] = /^(.*?)([eE][+-]?\d+)?$/.exec(text.trim()) ?? [];
  const point = signs === 'comma' ? null : matched(POINT, figures ?? '', exponent);
  const comma = signs === 'point' ? null : matched(COMMA, figures ?? '', exponent);
  if (point === null && comma === null) {
    return {
      kind: 'unreadable',
      why: `"${text.trim()}" is no number that can be told from its points, commas and spaces`,
      mend: 'Use one point or comma as the decimal sign',
    };
  }
  // A lone point is the decimal sign; a lone comma before three digits may be either.
  const open = point !== null && comma !== null && point !== comma && figures?.includes(',') === true;
  const value = open && signs === 'decimal' ? comma : (point ?? comma);
  if (value === null || !Number.isFinite(value)) {
    return { kind: 'unreadable', why: `"${text.trim()}" is too large`, mend: 'Check its exponent and its figures' };
  }
  return { kind: 'number', value, open };
}

function matched(shape: RegExp, figures: string, exponent: string): number | null {
  const match = shape.exec(figures);
  if (match === null) return null;
  const [, whole = '0', fraction, fractionAlone] = match;
  return Number(`${whole.replace(/\D/g, '')}.${fraction ?? fractionAlone ?? ''}0${exponent}`);
}
