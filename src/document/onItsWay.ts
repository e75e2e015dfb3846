import type { Fault, Result } from '../core/fault.ts';
import { fieldOf, writeAt } from './fields.ts';
import { type OpenedProject, readProject } from './file.ts';
import type { DampingRow, Project, Typed } from './project.ts';

/** What a document may still have open: cells not typed or not readable, modes that are not there, a reason not given. */
const OPEN_CODES: ReadonlySet<string> = new Set([
  'not-typed',
  'unreadable',
  'unknown-kind',
  'no-such-mode',
  'same-mode',
  'rayleigh-on-one-storey',
  'no-reason',
]);

/** A number that any reader takes, by the last key of the cell whose own content is held back. */
const SOUND: Readonly<Record<string, number>> = { step: 0.01, tail: 0, parts: 1 };

/**
 * Reads the text of a project file as the browser does: like `readProject`, but a document that was saved on its way is opened
 * as it stands, with its open cells; `caseOf` then lists them. Any other fault refuses the file, with the full list.
 */
export function readProjectOnItsWay(text: string): Result<OpenedProject> {
  const strict = readProject(text);
  if (strict.ok || !strict.faults.every(isOpen)) return strict;
  const raw: Project = JSON.parse(text.replace(/^\ufeff/, ''));
  const empty = raw.frame.storeys.length === 0;
  const places = strict.faults.map((fault) => fault.where);
  const holdsDamping = empty || places.some((place) => place.startsWith('frame.damping'));
  const held = places.filter((place) => place !== 'frame.storeys' && !place.startsWith('frame.damping'));
  let sound: Project = empty ? { ...raw, frame: { ...raw.frame, storeys: [STOREY] } } : raw;
  if (holdsDamping) sound = { ...sound, frame: { ...sound.frame, damping: { kind: 'none' } } };
  for (const place of held) sound = writeAt(sound, place, soundFor(place));
  const read = readProject(JSON.stringify(sound));
  if (!read.ok || (holdsDamping && !isDamping(raw.frame.damping))) return strict;
  let { project } = read.value;
  if (empty) project = { ...project, frame: { ...project.frame, storeys: [] } };
  if (holdsDamping) project = { ...project, frame: { ...project.frame, damping: raw.frame.damping } };
  for (const place of held) project = writeAt(project, place, valueAt(raw, place));
  return { ok: true, value: { project, samples: read.value.samples } };
}

const STOREY = { name: '', height: 1, mass: 1, stiffness: 1, law: { kind: 'elastic' } } as const;

function isOpen({ code, where }: Fault): boolean {
  if (where === 'frame.storeys') return code === 'wrong-count';
  if (where === 'frame.damping') return code === 'rayleigh-on-one-storey';
  if (!OPEN_CODES.has(code)) return false;
  try {
    const { quantity } = fieldOf(where);
    return quantity !== 'text' || code === 'no-reason';
  } catch {
    return false;
  }
}

function soundFor(place: string): Typed {
  if (place.endsWith('.reason')) return 'held back';
  return SOUND[place.split('.').at(-1) ?? ''] ?? 1;
}

function valueAt(raw: unknown, place: string): Typed {
  let node = raw;
  for (const key of place.split(/[.[\]]+/).filter((part) => part !== '')) {
    node = typeof node === 'object' && node !== null ? (node as Record<string, unknown>)[key] : undefined;
  }
  return typeof node === 'number' || typeof node === 'string' ? node : null;
}

/** A damping of a known kind with its own keys and no other, whatever is typed in it. */
function isDamping(damping: unknown): damping is DampingRow {
  if (typeof damping !== 'object' || damping === null) return false;
  const { kind, ...rest } = damping as Record<string, unknown>;
  const keys: Readonly<Record<string, readonly string[]>> = {
    none: [],
    rayleigh: ['modes', 'ratios', 'stiffness'],
    modal: ['ratios'],
    'stiffness-proportional': ['mode', 'ratio'],
  };
  const allowed = keys[String(kind)];
  const pairs =
    kind !== 'rayleigh' || [rest.modes, rest.ratios].every((pair) => Array.isArray(pair) && pair.length === 2);
  const lists = kind !== 'modal' || (Array.isArray(rest.ratios) && rest.ratios.length > 0);
  const initial = rest.stiffness === undefined || rest.stiffness === 'initial';
  return allowed !== undefined && Object.keys(rest).every((key) => allowed.includes(key)) && pairs && lists && initial;
}
