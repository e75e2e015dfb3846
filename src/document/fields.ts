import { printQuantity, type Quantity, type System, unitOf } from '../core/units/quantities.ts';
import type { Project, Typed } from './project.ts';
import { clearDamper, setDamper, setLaw } from './storeyParts.ts';

/** What is known of one field that a user types into, by its path in the project file. */
export interface Field {
  readonly quantity: Quantity | 'text';
  /** "Storey 2, stiffness" */
  label(project: Project): string;
  /** What it is and its usual range, in a few words and in the units shown. */
  hint(system: System): string;
}

interface Known {
  readonly pattern: RegExp;
  readonly quantity: Field['quantity'];
  readonly label: (project: Project, index: number) => string;
  readonly what: string;
  /** Usual range [SI], and the decimals it is said with. Common practice for regular buildings, from memory. */
  readonly usual?: readonly [from: number, to: number, decimals: number];
}

const storey = (what: string) => (_: Project, index: number) => `Storey ${index + 1}, ${what}`;
const plain = (what: string) => () => what;
const DAMPING = [0.02, 0.05, 0] as const;

/** Every field that can be typed into. */
const KNOWN: readonly Known[] = [
  { pattern: /^title$/, quantity: 'text', label: plain('Title'), what: 'job and frame' },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.name$/,
    quantity: 'text',
    label: storey('name'),
    what: 'what the storey is called',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.height$/,
    quantity: 'length',
    label: storey('height'),
    what: 'floor to floor',
    usual: [2.5, 6, 1],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.mass$/,
    quantity: 'weight',
    label: storey('weight'),
    what: 'seismic weight of the floor on top of this storey',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.stiffness$/,
    quantity: 'stiffness',
    label: storey('stiffness'),
    what: 'storey shear over storey drift',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.gravity$/,
    quantity: 'force',
    label: storey('gravity load'),
    what: 'at this floor, for P-Delta; the weight where left empty',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.strength$/,
    quantity: 'force',
    label: storey('strength'),
    what: 'storey shear at which it yields, usually at 0.3 to 1 % of the height',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.hardening$/,
    quantity: 'percent',
    label: storey('hardening'),
    what: 'stiffness after yield over the initial one',
    usual: [0, 0.1, 0],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.exponent$/,
    quantity: 'ratio',
    label: storey('Bouc-Wen exponent'),
    what: '1 or more; the higher, the sharper the yield',
    usual: [1, 5, 0],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.beta$/,
    quantity: 'ratio',
    label: storey('Bouc-Wen beta'),
    what: '1/2 or more; with gamma it makes 1',
    usual: [0.5, 0.9, 1],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.gamma$/,
    quantity: 'ratio',
    label: storey('Bouc-Wen gamma'),
    what: '1 less beta; 1/2 unloads at the initial stiffness',
    usual: [0.1, 0.5, 1],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.law\.ratio$/,
    quantity: 'ratio',
    label: storey('flag height'),
    what: 'height of the flag over the strength, at most 1 - hardening',
    usual: [0.2, 0.9, 1],
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.damper\.coefficient$/,
    quantity: 'force',
    label: storey('damper force at 1 m/s'),
    what: 'the coefficient c of F = c |v|^a: the force at a drift velocity of 1 m/s; no damper where left empty',
  },
  {
    pattern: /^frame\.storeys\[(\d+)\]\.damper\.exponent$/,
    quantity: 'ratio',
    label: storey('damper exponent'),
    what: '0.15 to 2; 1 is linear viscous',
    usual: [0.3, 1, 1],
  },
  {
    pattern: /^frame\.damping\.ratios\[(\d+)\]$/,
    quantity: 'percent',
    label: (_, i) => `Damping ratio ${i + 1}`,
    what: 'share of critical',
    usual: DAMPING,
  },
  {
    pattern: /^frame\.damping\.modes\[(\d+)\]$/,
    quantity: 'count',
    label: (_, i) => `Damping, mode ${i + 1}`,
    what: 'number of a mode of this frame',
  },
  {
    pattern: /^frame\.damping\.ratio$/,
    quantity: 'percent',
    label: plain('Damping ratio'),
    what: 'share of critical',
    usual: DAMPING,
  },
  {
    pattern: /^frame\.damping\.mode$/,
    quantity: 'count',
    label: plain('Damping, mode'),
    what: 'number of a mode of this frame',
  },
  {
    pattern: /^motions\[(\d+)\]\.scale$/,
    quantity: 'ratio',
    label: (project, i) => `${project.motions[i]?.name ?? `Motion ${i + 1}`}, factor`,
    what: 'on the acceleration; any sign, not zero',
  },
  {
    pattern: /^motions\[(\d+)\]\.name$/,
    quantity: 'text',
    label: (_, i) => `Motion ${i + 1}, name`,
    what: 'unique in the project',
  },
  {
    pattern: /^motions\[(\d+)\]\.reason$/,
    quantity: 'text',
    label: (_, i) => `Motion ${i + 1}, why it is left out`,
    what: 'asked for where a motion is left out',
  },
  { pattern: /^analysis\.step$/, quantity: 'time', label: plain('Time step'), what: 'a whole part of every interval' },
  {
    pattern: /^analysis\.step\.parts$/,
    quantity: 'count',
    label: plain('Parts of the interval'),
    what: 'whole, from 1',
  },
  {
    pattern: /^analysis\.tail$/,
    quantity: 'time',
    label: plain('Free vibration after the record'),
    what: 'some periods show the residual drift',
  },
  {
    pattern: /^analysis\.stopDrift$/,
    quantity: 'percent',
    label: plain('Drift at which a run is stopped'),
    what: 'a yielding or P-Delta run that passes it is stopped as collapsed',
    usual: [0.1, 0.1, 0],
  },
  {
    pattern: /^analysis\.method\.beta$/,
    quantity: 'ratio',
    label: plain('Newmark beta'),
    what: '1/4 average, 1/6 linear acceleration',
  },
  {
    pattern: /^analysis\.method\.gamma$/,
    quantity: 'ratio',
    label: plain('Newmark gamma'),
    what: '1/2 keeps second order; more adds damping',
  },
  {
    pattern: /^analysis\.method\.spectralRadius$/,
    quantity: 'ratio',
    label: plain('Spectral radius'),
    what: '1 keeps high modes, 0 removes them',
  },
  {
    pattern: /^analysis\.method\.alpha$/,
    quantity: 'ratio',
    label: plain('HHT alpha'),
    what: '-1/3 to 0; more negative damps more',
  },
  {
    pattern: /^limits\.drift$/,
    quantity: 'percent',
    label: plain('Allowable storey drift'),
    what: 'from the code or the brief',
    usual: [0.005, 0.025, 1],
  },
  {
    pattern: /^limits\.factor$/,
    quantity: 'ratio',
    label: plain('Factor on the computed drift'),
    what: '1 unless a clause compares another drift',
  },
  {
    pattern: /^limits\.source$/,
    quantity: 'text',
    label: plain('Source of the limit'),
    what: 'clause, earthquake level and which drift it limits',
  },
  {
    pattern: /^limits\.isolator$/,
    quantity: 'displacement',
    label: plain('Allowable isolator displacement'),
    what: 'of the isolator row; not compared where left empty',
    usual: [0.2, 0.6, 0],
  },
];

/** @throws RangeError for a path that nobody types into */
export function fieldOf(path: string): Field {
  for (const known of KNOWN) {
    const match = known.pattern.exec(path);
    if (match === null) continue;
    return {
      quantity: known.quantity,
      label: (project) => known.label(project, Number(match[1] ?? 0)),
      hint: (system) => hintOf(known, system),
    };
  }
  throw new RangeError(`fieldOf: ${path}, expected a field of the project file`);
}

/** "floor to floor, usually 2.5 to 6.0 m" */
function hintOf({ what, usual, quantity }: Known, system: System): string {
  if (usual === undefined || quantity === 'text') return what;
  const [from, to, decimals] = usual;
  const say = (value: number) => printQuantity(value, quantity, system, decimals);
  return `${what}, usually ${from === to ? say(from) : `${say(from)} to ${say(to)}`} ${unitOf(quantity, system)}`;
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
 * The project with another value at a path; all that did not change is shared. An empty optional field (gravity, reason, isolator
 * limit) is taken out. Parts of a storey come and go with their first cell: a damper with its coefficient, and an elastic storey
 * that is given a strength becomes bilinear; an elastic one stays as it is where its strength or hardening is emptied.
 * @throws RangeError where the path leads nowhere
 */
export function writeAt(project: Project, path: string, value: Typed): Project {
  const [, storey, part, key] = PART.exec(path) ?? [];
  return part === undefined
    ? write(project, path, value)
    : writePart(project, path, Number(storey), part === 'law' ? 'law' : 'damper', key, value);
}

/** A number of a storey's law or damper. */
const PART = /^frame\.storeys\[(\d+)\]\.(law|damper)\.(\w+)$/;

function writePart(
  project: Project,
  path: string,
  index: number,
  part: 'law' | 'damper',
  key: string,
  value: Typed,
): Project {
  const row = project.frame.storeys[index];
  if (row === undefined) throw new RangeError(`writeAt: ${path}, there are ${project.frame.storeys.length} entries`);
  if (part === 'damper') {
    if (key !== 'coefficient' && key !== 'exponent') throw new RangeError(`writeAt: ${path}, a damper has no ${key}`);
    if (key === 'coefficient' && value === null) return clearDamper(project, [index]);
    if (row.damper === undefined && value === null) return project;
    return setDamper(project, [index], { ...(row.damper ?? NO_DAMPER), [key]: value });
  }
  if (row.law.kind === 'bouc-wen' && (key === 'beta' || key === 'gamma') && typeof value === 'number') {
    // They make 1: the one that is typed settles the other. Rounded, so that 1 - 0.9 is 0.1.
    const rest = Number((1 - value).toPrecision(12));
    // A gamma that no beta goes with is at fault itself, and not the beta that nobody typed.
    if (key === 'gamma' && rest < 0.5) return write(project, path, value);
    const other = path.replace(/\w+$/, key === 'beta' ? 'gamma' : 'beta');
    return write(write(project, path, value), other, rest);
  }
  if (key !== 'kind' && key in row.law) return write(project, path, value);
  if (row.law.kind !== 'elastic' || (key !== 'strength' && key !== 'hardening')) {
    throw new RangeError(`writeAt: ${path}, the ${row.law.kind} law has no ${key}`);
  }
  return value === null ? project : write(setLaw(project, [index], 'bilinear'), path, value);
}

/** What a damper is until both of its cells are typed. */
const NO_DAMPER = { coefficient: null, exponent: 1 } as const;

function write(project: Project, path: string, value: Typed): Project {
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

const OPTIONAL: ReadonlySet<string> = new Set(['gravity', 'reason', 'isolator']);

function keysOf(path: string): string[] {
  return path.split(/[.[\]]+/).filter((key) => key !== '');
}
