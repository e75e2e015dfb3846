import type { Quantity } from '../core/units/quantities.ts';
import type { Project, Typed } from './project.ts';

/** What is known of one field that a user types into, by its path in the project file. */
export interface Field {
  readonly quantity: Quantity | 'text';
  /** "Storey 2, stiffness" */
  label(project: Project): string;
  /** What it is and its usual range, in a few words. */
  readonly hint: string;
}

interface Known {
  readonly pattern: RegExp;
  readonly quantity: Field['quantity'];
  readonly label: (project: Project, index: number) => string;
  readonly hint: string;
}

const storey = (what: string) => (_: Project, index: number) => `Storey ${index + 1}, ${what}`;
const plain = (what: string) => () => what;

/** Every field that can be typed into. Usual ranges are common practice for regular buildings, from memory. */
const KNOWN: readonly Known[] = [
  { pattern: /^title$/, quantity: 'text', label: plain('Title'), hint: 'job and frame' },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.name$/,
    quantity: 'text',
    label: storey('name'),
    hint: 'what the storey is called',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.height$/,
    quantity: 'length',
    label: storey('height'),
    hint: 'floor to floor, usually 2.5 to 6 m',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.mass$/,
    quantity: 'weight',
    label: storey('weight'),
    hint: 'seismic weight of the floor on top of this storey',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.stiffness$/,
    quantity: 'stiffness',
    label: storey('stiffness'),
    hint: 'storey shear over storey drift',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.gravity$/,
    quantity: 'force',
    label: storey('gravity load'),
    hint: 'at this floor, for P-Delta; the weight where left empty',
  },
  {
    pattern: /^frame\.damping\.ratios\[(\d+)\]$/,
    quantity: 'percent',
    label: (_, i) => `Damping ratio ${i + 1}`,
    hint: 'share of critical, usually 2 to 5 %',
  },
  {
    pattern: /^frame\.damping\.modes\[(\d+)\]$/,
    quantity: 'count',
    label: (_, i) => `Damping, mode ${i + 1}`,
    hint: 'number of a mode of this frame',
  },
  {
    pattern: /^frame\.damping\.ratio$/,
    quantity: 'percent',
    label: plain('Damping ratio'),
    hint: 'share of critical, usually 2 to 5 %',
  },
  {
    pattern: /^frame\.damping\.mode$/,
    quantity: 'count',
    label: plain('Damping, mode'),
    hint: 'number of a mode of this frame',
  },
  {
    pattern: /^motions\[(\d+)\]\.scale$/,
    quantity: 'ratio',
    label: (project, i) => `${project.motions[i]?.name ?? `Motion ${i + 1}`}, factor`,
    hint: 'on the acceleration; any sign, not zero',
  },
  {
    pattern: /^motions\[(\d+)\]\.name$/,
    quantity: 'text',
    label: (_, i) => `Motion ${i + 1}, name`,
    hint: 'unique in the project',
  },
  {
    pattern: /^motions\[(\d+)\]\.reason$/,
    quantity: 'text',
    label: (_, i) => `Motion ${i + 1}, why it is left out`,
    hint: 'asked for where a motion is left out',
  },
  { pattern: /^analysis\.step$/, quantity: 'time', label: plain('Time step'), hint: 'a whole part of every interval' },
  {
    pattern: /^analysis\.step\.parts$/,
    quantity: 'count',
    label: plain('Parts of the interval'),
    hint: 'whole, from 1',
  },
  {
    pattern: /^analysis\.tail$/,
    quantity: 'time',
    label: plain('Free vibration after the record'),
    hint: 'some periods show the residual drift',
  },
  {
    pattern: /^analysis\.stopDrift$/,
    quantity: 'percent',
    label: plain('Drift at which a run is stopped'),
    hint: 'yielding or P-Delta runs; usually 10 %',
  },
  {
    pattern: /^analysis\.method\.beta$/,
    quantity: 'ratio',
    label: plain('Newmark beta'),
    hint: '1/4 average, 1/6 linear acceleration',
  },
  {
    pattern: /^analysis\.method\.gamma$/,
    quantity: 'ratio',
    label: plain('Newmark gamma'),
    hint: '1/2 keeps second order; more adds damping',
  },
  {
    pattern: /^analysis\.method\.spectralRadius$/,
    quantity: 'ratio',
    label: plain('Spectral radius'),
    hint: '1 keeps high modes, 0 removes them',
  },
  {
    pattern: /^analysis\.method\.alpha$/,
    quantity: 'ratio',
    label: plain('HHT alpha'),
    hint: '-1/3 to 0; more negative damps more',
  },
  {
    pattern: /^limits\.drift$/,
    quantity: 'percent',
    label: plain('Allowable storey drift'),
    hint: 'from the code or the brief, usually 0.5 to 2.5 %',
  },
  {
    pattern: /^limits\.factor$/,
    quantity: 'ratio',
    label: plain('Factor on the computed drift'),
    hint: '1 unless a clause compares another drift',
  },
  {
    pattern: /^limits\.source$/,
    quantity: 'text',
    label: plain('Source of the limit'),
    hint: 'clause, earthquake level and which drift it limits',
  },
];

/** @throws RangeError for a path that nobody types into */
export function fieldOf(path: string): Field {
  for (const { pattern, quantity, label, hint } of KNOWN) {
    const match = pattern.exec(path);
    if (match) return { quantity, hint, label: (project) => label(project, Number(match[1] ?? 0)) };
  }
  throw new RangeError(`fieldOf: ${path}, expected a field of the project file`);
}

/** The value at a path; null where there is none (an optional field left out). */
export function readAt(project: Project, path: string): Typed {
  let node: unknown = project;
  for (const key of keysOf(path)) {
    if (typeof node !== 'object' || node === null) return null;
    node = (node as Record<string, unknown>)[key];
  }
  return typeof node === 'number' || typeof node === 'string' ? node : null;
}

/**
 * The project with another value at a path; all that did not change is shared. An empty optional field (gravity, reason) is
 * taken out.
 * @throws RangeError where the path leads nowhere
 */
export function writeAt(project: Project, path: string, value: Typed): Project {
  const keys = keysOf(path);
  const into = (node: unknown, at: number): unknown => {
    if (at === keys.length) return value;
    const key = keys[at];
    if (Array.isArray(node)) {
      const index = Number(key);
      if (!(index < node.length)) throw new RangeError(`writeAt: ${path}, there are ${node.length} entries`);
      return node.map((entry, i) => (i === index ? into(entry, at + 1) : entry));
    }
    if (at > 0 && (typeof node !== 'object' || node === null)) {
      // A number that becomes an object of parts, as analysis.step does.
      return { [key]: into(undefined, at + 1) };
    }
    const record = node as Record<string, unknown>;
    if (value === null && at === keys.length - 1 && OPTIONAL.has(key)) {
      const { [key]: _, ...rest } = record;
      return rest;
    }
    return { ...record, [key]: into(record[key], at + 1) };
  };
  return into(project, 0) as Project;
}

const OPTIONAL: ReadonlySet<string> = new Set(['gravity', 'reason']);

function keysOf(path: string): string[] {
  return path.split(/[.[\]]+/).filter((key) => key !== '');
}
