import { damperForce, yieldDrift } from '../core/frame/storeyFacts.ts';
import { printQuantity, printRatio, printTyped, type System, toDisplay, unitOf } from '../core/units/quantities.ts';
import { fieldOf, readAt } from './fields.ts';
import type { Project, StoreyRow, Typed } from './project.ts';

/** Drift velocity at which a damper's force is told [m/s]: of the order that storeys of buildings reach. */
const TOLD_VELOCITY = 0.1;

/**
 * What follows from a cell of a storey, in words and in the units shown: the level of its floor, its ratio to the storey above, the
 * drift at which it yields, the force of its damper. Empty where nothing follows.
 *
 * @param path  field of a storey, `frame.storeys[1].law.strength`; or its law, `frame.storeys[1].law`
 */
export function cellFacts(project: Project, path: string, system: System): string {
  const [, index, key] = /^frame\.storeys\[(\d+)\]\.([\w.]+)$/.exec(path) ?? [];
  const storey = Number(index);
  const row = project.frame.storeys[storey];
  if (row === undefined || key === undefined) return '';
  switch (key) {
    case 'name':
      return '';
    case 'height':
      return levelOf(project, storey, system);
    case 'stiffness':
      return joined(comparison(project, storey, key), yieldWords(row, system));
    case 'law':
    case 'law.strength':
      return joined(
        key === 'law' ? '' : comparison(project, storey, key),
        yieldWords(row, system),
        hardeningWords(row, system),
      );
    case 'law.hardening':
      return hardeningWords(row, system);
    case 'damper.coefficient':
    case 'damper.exponent':
      return damperWords(row, system);
    default:
      return comparison(project, storey, key);
  }
}

function joined(...facts: readonly string[]): string {
  return facts.filter((fact) => fact !== '').join('; ');
}

function levelOf({ frame }: Project, storey: number, system: System): string {
  let level = 0;
  for (const { height } of frame.storeys.slice(0, storey + 1)) level += numberOf(height) ?? Number.NaN;
  return Number.isFinite(level)
    ? `its floor at +${printQuantity(level, 'length', system)} ${unitOf('length', system)}`
    : '';
}

/** "0.99 of the storey above" */
function comparison(project: Project, storey: number, key: string): string {
  const at = (index: number) => above0(readAt(project, `frame.storeys[${index}].${key}`));
  const value = at(storey);
  if (value === null || fieldOf(`frame.storeys[${storey}].${key}`).quantity === 'text') return '';
  const above = at(storey + 1);
  if (above !== null) return `${printRatio(value / above)} of the storey above`;
  const below = storey > 0 ? at(storey - 1) : null;
  return below === null ? '' : `${printRatio(value / below)} of the storey below`;
}

/** "yields at 19.8 mm, 0.47 %" */
function yieldWords({ law, stiffness, height, role }: StoreyRow, system: System): string {
  const strength = law.kind === 'elastic' ? null : above0(law.strength);
  const k = above0(stiffness);
  if (strength === null || k === null) return '';
  const drift = yieldDrift(strength, k);
  const words = `yields at ${printQuantity(drift, 'drift', system, system === 'si' ? 1 : 2)} ${unitOf('drift', system)}`;
  const h = above0(height);
  // An isolator's displacement is not compared with its height.
  return h === null || role === 'isolator' ? words : `${words}, ${printQuantity(drift / h, 'percent', system)} %`;
}

/** "14 kN/mm after yield" */
function hardeningWords({ law, stiffness }: StoreyRow, system: System): string {
  const k = above0(stiffness);
  const hardening = law.kind === 'elastic' ? null : numberOf(law.hardening);
  if (k === null || hardening === null || !(hardening >= 0 && hardening < 1)) return '';
  if (hardening === 0) return 'no stiffness after yield';
  const after = printTyped(Number(toDisplay(hardening * k, 'stiffness', system).toPrecision(3)), 'ratio', system);
  return `${after} ${unitOf('stiffness', system)} after yield`;
}

/** "480 kN at 0.1 m/s" */
function damperWords({ damper }: StoreyRow, system: System): string {
  const coefficient = damper === undefined ? null : above0(damper.coefficient);
  const exponent = damper === undefined ? null : above0(damper.exponent);
  if (coefficient === null || exponent === null) return '';
  const force = damperForce({ coefficient, exponent }, TOLD_VELOCITY);
  return `${printQuantity(force, 'force', system)} ${unitOf('force', system)} at ${printQuantity(TOLD_VELOCITY, 'velocity', system, 1)} ${unitOf('velocity', system)}`;
}

function numberOf(value: Typed): number | null {
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}

function above0(value: Typed): number | null {
  const number = numberOf(value);
  return number !== null && number > 0 ? number : null;
}
