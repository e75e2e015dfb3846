import type { Fault } from '../core/fault.ts';
import { objectOf } from './raw.ts';

/** No height, mass, stiffness, strength or damper of a building, nor of a model of one in other units, lies beyond [SI]. */
const LEAST = 1e-9;
const MOST = 1e21;

/**
 * Largest ratio of squared frequencies in a frame: the smallest frequency is then computed to 1e6 times the rounding of a double,
 * nine digits (the error of a singular value is that of the largest one).
 */
const WIDEST = 1e12;

/** Numbers that no building has, and storeys so unlike one another that the modes could not be computed; on whatever stands there. */
export function proportionFaults(storeys: readonly unknown[]): Fault[] {
  const faults: Fault[] = [];
  const rows: { readonly mass: number; readonly stiffness: number }[] = [];
  for (const [i, entry] of storeys.entries()) {
    const storey = objectOf(entry);
    const { mass, stiffness, height } = storey ?? {};
    const strength = objectOf(storey?.law)?.strength;
    const coefficient = objectOf(storey?.damper)?.coefficient;
    const cells = { height, mass, stiffness, 'law.strength': strength, 'damper.coefficient': coefficient };
    for (const [key, value] of Object.entries(cells)) {
      if (typeof value !== 'number' || !(value > 0 && value < Number.POSITIVE_INFINITY)) continue;
      if (isPossible(value)) continue;
      const message = `is ${value}, which no building has`;
      faults.push({
        code: 'out-of-range',
        where: `frame.storeys[${i}].${key}`,
        message,
        mend: 'Check its figures and unit',
        range: { value, rule: 'possible', bound: value < LEAST ? LEAST : MOST },
      });
    }
    if (isPossible(mass) && isPossible(stiffness)) rows.push({ mass, stiffness });
  }
  return rows.length === storeys.length && rows.length > 0 ? [...faults, ...unlikeFaults(rows)] : faults;
}

function isPossible(value: unknown): value is number {
  return typeof value === 'number' && value >= LEAST && value <= MOST;
}

/** The squared frequencies lie between the least stiffness over all mass, but for a factor of the storeys, and the largest k / m. */
function unlikeFaults(rows: readonly { readonly mass: number; readonly stiffness: number }[]): Fault[] {
  const quickness = rows.map(({ mass, stiffness }, i) => stiffness / Math.min(mass, rows[i - 1]?.mass ?? mass));
  const quickest = quickness.indexOf(Math.max(...quickness));
  const softest = rows.reduce((least, { stiffness }, i) => (stiffness < rows[least].stiffness ? i : least), 0);
  const total = rows.reduce((sum, { mass }) => sum + mass, 0);
  if (quickness[quickest] / (rows[softest].stiffness / total) <= WIDEST) return [];
  const message =
    quickest === softest
      ? `storey ${quickest + 1} is so light beside the others that the modes of the frame cannot be computed exactly`
      : `storey ${quickest + 1} is so stiff for its mass beside storey ${softest + 1} that the modes of the frame cannot be computed exactly`;
  return [
    {
      code: 'out-of-proportion',
      where: `frame.storeys[${quickest}].stiffness`,
      message,
      mend: 'Check figures and units of stiffness and weight there; a rigid storey is rigid enough at a thousand times the next',
    },
  ];
}
