import { STANDARD_GRAVITY } from './constants.ts';
import { FOOT, INCH, KIP, POUND_FORCE, type Quantity } from './quantities.ts';

/** Units understood in a typed text: SI value of one, by name. Factors: the SI brochure, and the 1959 agreement for foot and pound. */
type Names = Readonly<Record<string, number>>;

const LENGTH: Names = { m: 1, cm: 1e-2, mm: 1e-3, ft: FOOT, "'": FOOT, in: INCH, '"': INCH };
const FORCE: Names = { N: 1, kN: 1e3, MN: 1e6, lbf: POUND_FORCE, lb: POUND_FORCE, kip: KIP, kips: KIP };
/** Masses, and forces as the mass they weigh. */
const WEIGHT: Names = {
  ...Object.fromEntries(Object.entries(FORCE).map(([name, size]) => [name, size / STANDARD_GRAVITY])),
  kg: 1,
  t: 1e3,
};
const ACCELERATION: Names = {
  g: STANDARD_GRAVITY,
  'm/s2': 1,
  'cm/s2': 1e-2,
  'mm/s2': 1e-3,
  gal: 1e-2,
  'in/s2': INCH,
  'ft/s2': FOOT,
};
const VELOCITY: Names = { 'm/s': 1, 'cm/s': 1e-2, 'mm/s': 1e-3, 'in/s': INCH, 'ft/s': FOOT };
const MOMENT: Names = by(FORCE, LENGTH, ' ');

const NAMES: Readonly<Record<Quantity, Names>> = {
  length: LENGTH,
  drift: LENGTH,
  displacement: LENGTH,
  weight: WEIGHT,
  force: FORCE,
  stiffness: by(FORCE, LENGTH, '/'),
  moment: MOMENT,
  energy: { ...MOMENT, J: 1, kJ: 1e3, MJ: 1e6 },
  acceleration: ACCELERATION,
  velocity: VELOCITY,
  time: { s: 1, ms: 1e-3 },
  percent: { '%': 1e-2 },
  ratio: {},
  count: {},
  frequency: { Hz: 1 },
};

function by(above: Names, below: Names, sign: '/' | ' '): Names {
  const out: Record<string, number> = {};
  for (const [a, size] of Object.entries(above)) {
    for (const [b, part] of Object.entries(below)) {
      if (!/^[a-z]+$/i.test(b)) continue;
      out[`${a}${sign}${b}`] = sign === '/' ? size / part : size * part;
      if (sign === ' ') out[`${a}${b}`] = size * part;
    }
  }
  return out;
}

/** SI value of one unit of that name for a quantity, or null where the quantity has no such unit. Capitals count only in mega and milli. */
export function unitSize(name: string, quantity: Quantity): number | null {
  const names = NAMES[quantity];
  const tidy = tidied(name);
  if (Object.hasOwn(names, tidy)) return names[tidy];
  const alike = Object.keys(names).filter(
    (known) => known.toLowerCase() === tidy.toLowerCase() && samePrefix(known, tidy),
  );
  return alike.length === 1 ? names[alike[0]] : null;
}

/** Whether any quantity knows this unit: tells a unit of another kind from a misspelt one. */
export function isUnit(name: string): boolean {
  return (Object.keys(NAMES) as Quantity[]).some((quantity) => unitSize(name, quantity) !== null);
}

/** Mega stays a capital and milli does not become one, unless the whole name is in capitals. */
function samePrefix(known: string, typed: string): boolean {
  if (known[0] === 'M') return typed[0] === 'M';
  return known[0] !== 'm' || typed[0] === 'm' || typed === typed.toUpperCase();
}

function tidied(name: string): string {
  return name
    .replace(/\s*\/\s*/g, '/')
    .replace(/[²]|\^2/g, '2')
    .replace(/\s*[·.-]\s*|\s+/g, ' ')
    .trim();
}
