import { STANDARD_GRAVITY } from './constants.ts';

/**
 * Quantities and the two systems they are shown in: the one door by which a number leaves SI for the screen or the page.
 * weight: the SI value is a mass [kg], shown as mass x g. percent: the SI value is a fraction.
 */
export type Quantity =
  | 'length'
  | 'drift'
  | 'displacement'
  | 'weight'
  | 'force'
  | 'stiffness'
  | 'moment'
  | 'energy'
  | 'acceleration'
  | 'velocity'
  | 'time'
  | 'percent'
  | 'ratio'
  | 'count'
  | 'frequency';

export type System = 'si' | 'us';

/** Exact: international yard and pound agreement (1959); kip = 1000 pounds-force. */
export const FOOT = 0.3048;
export const INCH = 0.0254;
export const POUND_FORCE = 0.45359237 * STANDARD_GRAVITY;
export const KIP = 1000 * POUND_FORCE;

interface Shown {
  readonly unit: string;
  /** SI value of one shown unit. */
  readonly size: number;
  /** Decimals of an answer, where a column does not set its own. */
  readonly decimals: number;
}

const SHOWN: Readonly<Record<Quantity, Readonly<Record<System, Shown>>>> = {
  length: { si: { unit: 'm', size: 1, decimals: 2 }, us: { unit: 'ft', size: FOOT, decimals: 2 } },
  drift: { si: { unit: 'mm', size: 1e-3, decimals: 0 }, us: { unit: 'in', size: INCH, decimals: 2 } },
  displacement: { si: { unit: 'mm', size: 1e-3, decimals: 0 }, us: { unit: 'in', size: INCH, decimals: 2 } },
  weight: {
    si: { unit: 'kN', size: 1e3 / STANDARD_GRAVITY, decimals: 0 },
    us: { unit: 'kip', size: KIP / STANDARD_GRAVITY, decimals: 0 },
  },
  force: { si: { unit: 'kN', size: 1e3, decimals: 0 }, us: { unit: 'kip', size: KIP, decimals: 0 } },
  stiffness: { si: { unit: 'kN/mm', size: 1e6, decimals: 0 }, us: { unit: 'kip/in', size: KIP / INCH, decimals: 0 } },
  moment: { si: { unit: 'MN m', size: 1e6, decimals: 1 }, us: { unit: 'kip ft', size: KIP * FOOT, decimals: 0 } },
  energy: { si: { unit: 'kJ', size: 1e3, decimals: 0 }, us: { unit: 'kip in', size: KIP * INCH, decimals: 0 } },
  acceleration: same('g', STANDARD_GRAVITY, 2),
  velocity: { si: { unit: 'm/s', size: 1, decimals: 2 }, us: { unit: 'in/s', size: INCH, decimals: 1 } },
  time: same('s', 1, 2),
  percent: same('%', 0.01, 2),
  ratio: same('ratio', 1, 2),
  count: same('', 1, 0),
  frequency: same('Hz', 1, 1),
};

function same(unit: string, size: number, decimals: number): Record<System, Shown> {
  const shown = { unit, size, decimals };
  return { si: shown, us: shown };
}

/** The unit a heading carries: "kN/mm", "ft". */
export function unitOf(quantity: Quantity, system: System): string {
  return SHOWN[quantity][system].unit;
}

export function toDisplay(value: number, quantity: Quantity, system: System): number {
  return value / SHOWN[quantity][system].size;
}

export function fromDisplay(value: number, quantity: Quantity, system: System): number {
  return times(value, SHOWN[quantity][system].size);
}

/** value x size, by dividing where size is a whole part of one: 3300 mm are then the double that 3.3 is. */
export function times(value: number, size: number): number {
  const parts = 1 / size;
  return size < 1 && Number.isInteger(parts) ? value / parts : value * size;
}

/** Thousands: narrow no-break space, from four digits; minus: U+2212. */
const THOUSANDS = '\u202f';
const MINUS = '\u2212';

/** An answer at fixed decimals; `none` where there is no number. */
export function printQuantity(
  value: number | null | undefined,
  quantity: Quantity,
  system: System,
  decimals?: number,
): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return 'none';
  return grouped(toDisplay(value, quantity, system).toFixed(decimals ?? SHOWN[quantity][system].decimals));
}

/**
 * What stands in a cell: the shortest decimal that reads back to the same SI number (to the last bit or the one beside it),
 * with thousands. Where the conversion makes no short one (a number typed in the other system), fifteen significant digits.
 */
export function printTyped(value: number, quantity: Quantity, system: System): string {
  if (!Number.isFinite(value)) return 'none';
  const shown = toDisplay(value, quantity, system);
  for (let digits = 1; digits <= 15; digits++) {
    const text = plain(Number(shown.toPrecision(digits)));
    if (Math.abs(fromDisplay(Number(text), quantity, system) - value) <= 4e-16 * Math.abs(value)) return grouped(text);
  }
  return grouped(plain(Number(shown.toPrecision(15))));
}

/** Digits that a person types at most; more come only of a conversion. */
const TYPED_DIGITS = 12;

/**
 * The same for the eye: a number that was typed in the other system, and so has no short form, stands with ten significant digits
 * (it reads back equal to 5e-10).
 */
export function printShort(value: number, quantity: Quantity, system: System): string {
  const full = printTyped(value, quantity, system);
  if (full.replace(/e.*$/, '').replace(/\D/g, '').replace(/^0+/, '').length <= TYPED_DIGITS) return full;
  return grouped(plain(Number(toDisplay(value, quantity, system).toPrecision(10))));
}

/** A ratio to a limit: two decimals, three in (1, 1.005), so that 1.00 is shown only if it is not over. */
export function printRatio(value: number): string {
  if (!Number.isFinite(value)) return 'none';
  if (value > 1 && value < 1.005) return value < 1.0005 ? '1.001' : value.toFixed(3);
  return grouped(value.toFixed(2));
}

/** Decimal digits without an exponent, where they are still readable that way. */
function plain(value: number): string {
  const text = String(value);
  if (!text.includes('e-') || Math.abs(value) < 1e-12) return text;
  const decimals = 16 - Math.floor(Math.log10(Math.abs(value)));
  return value.toFixed(decimals).replace(/\.?0+$/, '');
}

/** Thousands in the whole part, a real minus; minus zero is zero. */
function grouped(text: string): string {
  const negative = text.startsWith('-');
  const [whole, fraction] = (negative ? text.slice(1) : text).split('.');
  const spaced = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, THOUSANDS) : whole;
  const body = fraction === undefined ? spaced : `${spaced}.${fraction}`;
  return negative && /[1-9]/.test(body) ? MINUS + body : body;
}
