import type { Fault } from '../core/fault.ts';
import { printTyped, unitOf } from '../core/units/quantities.ts';
import { fieldOf, readAt, writeAt } from './fields.ts';
import type { Project } from './project.ts';

/** References that a document on its way may hold out of range, the empty sheet among them. */
const REFERENCES: ReadonlySet<string> = new Set([
  'no-storey',
  'no-such-mode',
  'same-mode',
  'rayleigh-on-one-storey',
  'isolator-not-first',
  'no-reason',
]);

/**
 * Whether a fault only says that the document is on its way: a number not typed, the raw text of a cell that cannot be read, a
 * reference out of range. A browser opens such a document, lists its faults and does not run it.
 */
export function isOnItsWay({ code, where }: Fault): boolean {
  return REFERENCES.has(code) || ((code === 'not-typed' || code === 'unreadable') && holdsNumber(where));
}

/** Whether a place is a field that a number is typed into. */
function holdsNumber(where: string): boolean {
  try {
    return fieldOf(where).quantity !== 'text';
  } catch {
    return false;
  }
}

/**
 * The project with every number that its cell refuses as the text it was typed as, with its unit: in a file such a number would be
 * a mistake, but the text of a cell is work on its way.
 */
export function refusedAsTyped(project: Project, faults: readonly Fault[]): Project {
  let typed = project;
  for (const fault of faults) {
    const { where } = fault;
    if (isOnItsWay(fault) || !holdsNumber(where)) continue;
    const value = readAt(project, where);
    const { quantity } = fieldOf(where);
    if (typeof value !== 'number' || quantity === 'text') continue;
    // A percentage behind a sign would be read as a change.
    const unit = quantity === 'ratio' || quantity === 'percent' ? '' : unitOf(quantity, 'si');
    typed = writeAt(typed, where, `${printTyped(value, quantity, 'si')} ${unit}`.trim());
  }
  return typed;
}
