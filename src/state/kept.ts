import { type Fault, faultLine, type Result } from '../core/fault.ts';
import { migrated } from '../document/migrations.ts';
import { type LawRow, PROJECT_FORMAT, PROJECT_VERSION, type Project } from '../document/project.ts';
import type { Draft } from './document.ts';

/** The document as the browser's store holds it: a project on its way, with cells not typed or not readable, samples apart. */
export interface Envelope {
  readonly format: typeof PROJECT_FORMAT;
  readonly version: number;
  /** When it was written [ms since 1970]. */
  readonly at: number;
  readonly document: Project;
}

export function envelopeFor(document: Project, at: number): Envelope {
  return { format: PROJECT_FORMAT, version: PROJECT_VERSION, at, document };
}

/** When a stored envelope was written; null where it does not say. */
export function writtenAt(stored: unknown): number | null {
  const at = objectOf(stored)?.at;
  return typeof at === 'number' ? at : null;
}

/** The project in a stored envelope, or why it cannot be used. A field may hold anything typed; the shape must be whole. */
export function readEnvelope(stored: unknown): Result<Project> {
  const envelope = objectOf(stored);
  const current = migrated(
    envelope && { ...objectOf(envelope.document), format: envelope.format, version: envelope.version },
  );
  if (!current.ok) return current;
  const { format: _, version: __, ...document } = current.value;
  const faults = faultsOfShape(document).map((where): Fault => {
    const message = 'is missing or of another kind';
    return { code: 'wrong-kind', where, message, mend: 'The project is kept aside as it was' };
  });
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: document as unknown as Project };
}

/** The stored draft, or null where there is none that can be used. */
export function readDraft(stored: unknown): Draft | null {
  const draft = objectOf(stored);
  const fine = draft && typeof draft.path === 'string' && typeof draft.text === 'string' && isTyped(draft.value);
  return fine ? (draft as unknown as Draft) : null;
}

export function linesOf(faults: readonly Fault[]): string {
  return faults.map(faultLine).join(' ');
}

/** Places where a stored project has not the shape that the application relies on. */
function faultsOfShape(document: unknown): string[] {
  const wrong: string[] = [];
  const check = (where: string, fine: boolean) => {
    if (!fine) wrong.push(where);
  };
  const project = objectOf(document);
  const frame = objectOf(project?.frame);
  const analysis = objectOf(project?.analysis);
  const limits = objectOf(project?.limits);
  check('title', typeof project?.title === 'string');
  check('frame.pDelta', typeof frame?.pDelta === 'boolean');
  check('frame.damping', isDamping(objectOf(frame?.damping)));
  check('frame.storeys', Array.isArray(frame?.storeys));
  for (const [i, entry] of listOf(frame?.storeys).entries()) {
    const row = objectOf(entry);
    check(`frame.storeys[${i}].name`, typeof row?.name === 'string');
    for (const key of ['height', 'mass', 'stiffness']) check(`frame.storeys[${i}].${key}`, isTyped(row?.[key]));
    check(`frame.storeys[${i}].gravity`, row?.gravity === undefined || isTyped(row.gravity));
    check(`frame.storeys[${i}].law`, isLaw(objectOf(row?.law)));
    check(`frame.storeys[${i}].damper`, row?.damper === undefined || holds(objectOf(row.damper), DAMPER));
    check(`frame.storeys[${i}].role`, [undefined, 'storey', 'isolator'].includes(row?.role as string | undefined));
  }
  check('motions', Array.isArray(project?.motions));
  for (const [i, entry] of listOf(project?.motions).entries()) {
    const motion = objectOf(entry);
    for (const key of ['name', 'samples']) check(`motions[${i}].${key}`, typeof motion?.[key] === 'string');
    for (const key of ['interval', 'count']) check(`motions[${i}].${key}`, typeof motion?.[key] === 'number');
    check(`motions[${i}].used`, typeof motion?.used === 'boolean');
    check(`motions[${i}].scale`, isTyped(motion?.scale));
  }
  check('analysis.method', typeof objectOf(analysis?.method)?.kind === 'string');
  check('analysis.step', isTyped(analysis?.step) || isTyped(objectOf(analysis?.step)?.parts));
  for (const key of ['tail', 'stopDrift']) check(`analysis.${key}`, isTyped(analysis?.[key]));
  for (const key of ['drift', 'factor']) check(`limits.${key}`, isTyped(limits?.[key]));
  check('limits.isolator', limits?.isolator === undefined || isTyped(limits.isolator));
  check('limits.source', typeof limits?.source === 'string');
  return wrong;
}

/** Numbers of each law, and of a damper. */
const LAWS: Readonly<Record<LawRow['kind'], readonly string[]>> = {
  elastic: [],
  bilinear: ['strength', 'hardening'],
  'peak-oriented': ['strength', 'hardening'],
  'bouc-wen': ['strength', 'hardening', 'exponent', 'beta', 'gamma'],
  flag: ['strength', 'hardening', 'ratio'],
};
const DAMPER: readonly string[] = ['coefficient', 'exponent'];

function isLaw(law: Record<string, unknown> | null): boolean {
  const kind = law?.kind;
  return typeof kind === 'string' && Object.hasOwn(LAWS, kind) && holds(law, LAWS[kind as LawRow['kind']]);
}

function holds(part: Record<string, unknown> | null, numbers: readonly string[]): boolean {
  return part !== null && numbers.every((key) => isTyped(part[key]));
}

function isDamping(damping: Record<string, unknown> | null): boolean {
  switch (damping?.kind) {
    case 'none':
      return true;
    case 'rayleigh':
      return [damping.modes, damping.ratios].every((pair) => listOf(pair).length === 2 && listOf(pair).every(isTyped));
    case 'modal':
      return Array.isArray(damping.ratios) && damping.ratios.every(isTyped);
    case 'stiffness-proportional':
      return isTyped(damping.mode) && isTyped(damping.ratio);
    default:
      return false;
  }
}

function isTyped(value: unknown): boolean {
  return value === null || typeof value === 'number' || typeof value === 'string';
}

function objectOf(value: unknown): Record<string, unknown> | null {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
    ? (value as Record<string, unknown>)
    : null;
}

function listOf(value: unknown): readonly unknown[] {
  return Array.isArray(value) ? value : [];
}
