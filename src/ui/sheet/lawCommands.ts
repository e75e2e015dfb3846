import type { System } from '../../core/units/quantities.ts';
import { setLaw } from '../../document/edits.ts';
import { writeAt } from '../../document/fields.ts';
import { lawLike } from '../../document/lawLike.ts';
import type { LawRow, Project } from '../../document/project.ts';
import { documentStore, edit, setDraft } from '../../state/document.ts';
import { commitField, commitOpenDraft } from '../controls/field.ts';
import type { LawKind } from './lawWords.ts';

/** Which storeys what is done in the panel of a law goes for. */
export type Scope = 'this' | 'selected' | 'all';

/** Laws as they were before an arrow passed over "elastic": their typed numbers come back with the next law. */
const before = new Map<string, LawRow>();

/** Chooses a law; walking along the list is one undo step. */
export function chooseLaw(kind: LawKind, storey: number, storeys: readonly number[]): void {
  commitOpenDraft();
  const { undoes } = documentStore.getState();
  const known = documentStore.getState().project.frame.storeys;
  if (!undoes?.startsWith(FOLD)) before.clear();
  for (const i of storeys) {
    const law = known[i]?.law;
    if (law !== undefined && law.kind !== 'elastic') before.set(String(i), law);
  }
  const label = `${FOLD} ${where(storeys)} ${kind}`;
  edit(label, (project) => setLaw(broughtBack(project, storeys), storeys, kind), {
    kind: 'fold',
    into: `law ${storey}`,
  });
}

const FOLD = 'law of';

function broughtBack(project: Project, storeys: readonly number[]): Project {
  const rows = project.frame.storeys.map((row, i) => {
    const law = storeys.includes(i) && row.law.kind === 'elastic' ? before.get(String(i)) : undefined;
    return law === undefined ? row : { ...row, law };
  });
  return { ...project, frame: { ...project.frame, storeys: rows } };
}

/** Gives storeys the law of one of them. */
export function sameFor(storey: number, storeys: readonly number[]): void {
  commitOpenDraft();
  const to = storeys.filter((i) => i !== storey);
  if (to.length === 0) return;
  edit(`${FOLD} ${where(storeys)} as storey ${storey + 1}`, (project) => lawLike(project, storey, to), {
    kind: 'fold',
    into: `law ${storey}`,
  });
}

/** Makes a typed number of a law one undo step, for all the storeys that it goes for and that have it. */
export function commitShape(path: string, key: string, storeys: readonly number[], system: System): void {
  if (storeys.length < 2) {
    commitField(path, system);
    return;
  }
  const { draft } = documentStore.getState();
  if (draft === null || draft.path !== path) return;
  setDraft(null);
  edit(`${key} of ${where(storeys)}`, (project) =>
    storeys.reduce((next, i) => {
      const law = next.frame.storeys[i]?.law;
      return law !== undefined && key in law ? writeAt(next, `frame.storeys[${i}].law.${key}`, draft.value) : next;
    }, project),
  );
}

function where(storeys: readonly number[]): string {
  const low = Math.min(...storeys) + 1;
  const high = Math.max(...storeys) + 1;
  return low === high ? `storey ${low}` : `storeys ${low} to ${high}`;
}
