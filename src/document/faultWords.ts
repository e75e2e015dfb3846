import type { Fault, RangeRule } from '../core/fault.ts';
import { printTyped, type Quantity, type System, toDisplay, unitOf } from '../core/units/quantities.ts';
import { fieldOf } from './fields.ts';
import type { Project } from './project.ts';

/** What a fault says on the screen: the cell and its fault in the same units. */
export interface FaultWords {
  readonly message: string;
  readonly mend: string;
}

/**
 * The words of a fault in the units shown. A value out of its range, and the bound, are said in the units of their cell: whoever
 * follows the mend to the letter then types a right value. Files and the batch command keep the fault's own words, in SI.
 */
export function faultWords({ where, message, mend, range }: Fault, system: System): FaultWords {
  const quantity = range === undefined ? null : quantityAt(where);
  if (range === undefined || quantity === null) return { message, mend };
  const value = withUnit(sixFigures(range.value, quantity, system), quantity, system);
  if (range.rule === 'possible') return { message: `is ${value}, which no building has`, mend };
  const bound = range.bound === 0 ? '0' : withUnit(sixFigures(range.bound, quantity, system), quantity, system);
  const full = withUnit(printTyped(range.value, quantity, system), quantity, system);
  // 99.999999 % must not be told to stay under 100 % as "100 %".
  const is = value === bound ? full : value;
  return { message: `is ${is}, must be ${range.rule} ${bound}`, mend: typeWords(range.rule, bound) };
}

/** "Type a number below 100 %" */
export function typeWords(rule: Exclude<RangeRule, 'possible'>, bound: string): string {
  return `Type a number ${rule === 'above' || rule === 'below' ? rule : `of ${rule}`} ${bound}`;
}

/** A fault and its mend in one line: "is −5 kN, must be above 0: Type a number above 0". */
export function faultAndMend(fault: Fault, system: System): string {
  const { message, mend } = faultWords(fault, system);
  return `${message}: ${mend}`;
}

/** A fault as one sentence with its place, said once: "storey 3, height is not typed yet". */
export function faultSentence(project: Project, fault: Fault, system: System): string {
  const { message } = faultWords(fault, system);
  if (/^(is|has|makes) /.test(message)) return `${placeWords(project, fault.where)} ${message}`;
  return namesItsPlace(fault) ? message : `${placeWords(project, fault.where)}: ${message}`;
}

/** Whether the sentence of a fault says by itself what it is about. */
function namesItsPlace({ where, message }: Fault): boolean {
  return /^storey \d/.test(message) || !/^(frame\.storeys\[|motions\[|limits)/.test(where);
}

/** A place of the project in words, never as its path: "storey 2, law". */
export function placeWords(project: Project, where: string): string {
  try {
    const label = fieldOf(where).label(project);
    return /^(Storey|Damping|Time|Parts|Free|Drift|Spectral|Allowable|Factor|Source|Title)\b/.test(label)
      ? label.charAt(0).toLowerCase() + label.slice(1)
      : label;
  } catch {
    return partWords(project, where);
  }
}

/** A part that nobody types into as a whole. */
function partWords(project: Project, where: string): string {
  const [, index, part] = /^frame\.storeys\[(\d+)\](?:\.(\w+))?/.exec(where) ?? [];
  if (index !== undefined) {
    const storey = `storey ${Number(index) + 1}`;
    return part === undefined || part === 'role' ? storey : `${storey}, ${part}`;
  }
  const motion = /^motions\[(\d+)\]/.exec(where)?.[1];
  if (motion !== undefined) return project.motions[Number(motion)]?.name ?? `motion ${Number(motion) + 1}`;
  const known = Object.entries(PARTS).find(([path]) => where.startsWith(path));
  return known?.[1] ?? 'the project';
}

const PARTS: Readonly<Record<string, string>> = {
  'frame.damping': 'damping',
  frame: 'the frame',
  'analysis.method': 'method',
  'analysis.step': 'time step',
  analysis: 'the analysis',
  limits: 'the limits',
};

function quantityAt(where: string): Quantity | null {
  try {
    const { quantity } = fieldOf(where);
    return quantity === 'text' ? null : quantity;
  } catch {
    return null;
  }
}

function sixFigures(value: number, quantity: Quantity, system: System): string {
  const shown = Number(toDisplay(value, quantity, system).toPrecision(6));
  return printTyped(shown, 'ratio', system);
}

function withUnit(text: string, quantity: Quantity, system: System): string {
  const unit = quantity === 'ratio' ? '' : unitOf(quantity, system);
  return unit === '' ? text : `${text} ${unit}`;
}
