/** How the decimal comma of an undecided numeral such as 1,250 is taken. */
export type CommaReading = 'decimal' | 'thousands';

/** A numeral as it may be typed: figures with points, commas and spaces. */
export type Numeral =
  | { readonly kind: 'number'; readonly value: number; readonly undecided: boolean; readonly commaIsDecimal: boolean }
  | { readonly kind: 'unreadable'; readonly why: string };

const SPACES = /[\s\u00a0\u2009\u202f]/g;

/**
 * Reads figures with one point or comma as the decimal sign, or with thousands in threes. A lone comma before exactly three
 * digits (1,250) is undecided; the caller says how it is taken. 0,125 is not: nothing starts its thousands with a zero.
 */
export function readNumeral(text: string, comma: CommaReading): Numeral {
  const bare = text.replace(SPACES, '');
  const match = /^(\d[\d.,]*|[.,]\d+)(?:[eE]([+-]?\d{1,3}))?$/.exec(bare);
  if (!match) return { kind: 'unreadable', why: `"${text.trim()}" is no number` };
  const [, figures, exponent] = match;
  if (/ /.test(text.trim()) && !spacedInThrees(text))
    return { kind: 'unreadable', why: `"${text.trim()}" has a space that does not part thousands` };
  const commas = figures.split(',').length - 1;
  const points = figures.split('.').length - 1;
  const undecided = commas === 1 && points === 0 && /^[1-9]\d{0,2},\d{3}$/.test(figures) && exponent === undefined;
  let tidy: string | null;
  let commaIsDecimal = false;
  if (undecided) {
    commaIsDecimal = comma === 'decimal';
    tidy = commaIsDecimal ? figures.replace(',', '.') : figures.replace(',', '');
  } else if (commas > 0 && points > 0) {
    commaIsDecimal = figures.lastIndexOf(',') > figures.lastIndexOf('.');
    tidy = commaIsDecimal ? parted(figures, '.', ',') : parted(figures, ',', '.');
  } else if (commas === 1) {
    commaIsDecimal = true;
    tidy = figures.replace(',', '.');
  } else if (commas > 1) tidy = parted(figures, ',', '.');
  else if (points > 1) tidy = parted(figures, '.', ',');
  else tidy = figures;
  if (tidy === null)
    return { kind: 'unreadable', why: `"${text.trim()}" mixes points and commas in a way that is no number` };
  const value = Number(exponent === undefined ? tidy : `${tidy}e${exponent}`);
  if (!Number.isFinite(value)) return { kind: 'unreadable', why: `"${text.trim()}" is too large` };
  return { kind: 'number', value, undecided, commaIsDecimal };
}

/** Takes thousands signs out where they stand in threes, and makes the decimal sign a point; null where they do not. */
function parted(figures: string, thousands: string, decimal: string): string | null {
  const [whole, fraction, more] = figures.split(decimal);
  if (more !== undefined) return null;
  const groups = whole.split(thousands);
  if (fraction?.includes(thousands)) return null;
  if (groups.slice(1).some((group) => group.length !== 3) || groups[0].length < 1 || groups[0].length > 3) return null;
  return groups.join('') + (fraction === undefined ? '' : `.${fraction}`);
}

function spacedInThrees(text: string): boolean {
  return /^\s*\d{1,3}([\s\u00a0\u2009\u202f]\d{3})+([.,]\d+)?([eE][+-]?\d+)?\s*$/.test(text);
}
