import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { emptyProject } from '../document/empty.ts';
import { writeAt } from '../document/fields.ts';
import type { Project, Typed } from '../document/project.ts';
import { sessionStore, setSession } from './session.ts';
import { type Counts, type History, NO_HISTORY, record, stepBack, stepForward, type Travelled } from './undo.ts';

export type { Counts } from './undo.ts';

/** The field being edited, as far as it has been typed. */
export interface Draft {
  /** Which field, as a path of the project file: `frame.storeys[2].stiffness`, `limits.drift`, `motions[1].scale`. */
  readonly path: string;
  /** The text as it stands in the field. */
  readonly text: string;
  /** What it reads as: a number (SI), null (empty), or the raw text where it cannot be read or is ambiguous. */
  readonly value: Typed;
}

/** The project (undoable, saved) and the draft of the field being edited. */
export interface DocumentState {
  /** As committed. */
  readonly project: Project;
  /** The field being edited, or null. */
  readonly draft: Draft | null;
  /** What undo and redo would take back or bring again, in words; null where there is nothing. */
  readonly undoes: string | null;
  readonly redoes: string | null;
  /** When the browser's store last took the document [ms since 1970]; null: not yet. */
  readonly savedAt: number | null;
  /** Why it could not be saved, in words; null: all well. */
  readonly saveFault: string | null;
  /** What was kept but could not be read, and where it is now, in words; null: nothing. */
  readonly setAside: string | null;
}

export const documentStore = createStore<DocumentState>(() => ({
  project: emptyProject(),
  draft: null,
  undoes: null,
  redoes: null,
  savedAt: null,
  saveFault: null,
  setAside: null,
}));

export function useDocument<T>(selector: (state: DocumentState) => T): T {
  return useStore(documentStore, selector);
}

let history: History = NO_HISTORY;

/** The one way to change the project. `label` names the step for undo ("storey 2 stiffness 455 to 470"). */
export function edit(label: string, change: (project: Project) => Project, counts: Counts = { kind: 'step' }): void {
  commit(label, change, counts, documentStore.getState().draft);
}

/** The text of the field being edited as it stands now; null: the edit is given up. */
export function setDraft(draft: Draft | null): void {
  if (draft !== documentStore.getState().draft) documentStore.setState({ draft });
}

/** Writes the draft's value into the project as one undo step and ends the draft. */
export function commitDraft(label: string): void {
  const { draft } = documentStore.getState();
  if (draft) commit(label, (project) => writeAt(project, draft.path, draft.value), { kind: 'step' }, null);
}

/** Takes the newest step back; a draft that is open is given up. */
export function undo(): void {
  travel(stepBack(history, documentStore.getState().project));
}

export function redo(): void {
  travel(stepForward(history, documentStore.getState().project));
}

/** Another project takes the place of this one (open, new, demo): undoable as one step. What was chosen in the old one is let go. */
export function replace(label: string, project: Project): void {
  const opened = sessionStore.getState().opened + 1;
  setSession({ opened, time: 0, range: null, playing: false, storey: null, motion: null });
  commit(label, () => project, { kind: 'step' }, null);
}

/** The kept document of the last session, or the demo: no undo step, nothing to take back. */
export function restore(project: Project, draft: Draft | null = null): void {
  history = NO_HISTORY;
  documentStore.setState({ project, draft, undoes: null, redoes: null });
}

const effective = new WeakMap<Project, { readonly draft: Draft; readonly project: Project }>();

/** The project with the draft in its place: what the calculation sees. Same object for the same project and draft. */
export function effectiveProject({ project, draft }: Pick<DocumentState, 'project' | 'draft'>): Project {
  if (!draft) return project;
  const known = effective.get(project);
  if (known?.draft === draft) return known.project;
  const written = writeAt(project, draft.path, draft.value);
  effective.set(project, { draft, project: written });
  return written;
}

function commit(label: string, change: (project: Project) => Project, counts: Counts, draft: Draft | null): void {
  const before = documentStore.getState().project;
  const project = change(before);
  if (project !== before) history = record(history, label, before, counts, change);
  show(project, draft);
}

function travel(travelled: Travelled | null): void {
  if (!travelled) return;
  history = travelled.history;
  show(travelled.project, null);
}

function show(project: Project, draft: Draft | null): void {
  documentStore.setState({
    project,
    draft,
    undoes: history.past.at(-1)?.label ?? null,
    redoes: history.future.at(-1)?.label ?? null,
  });
}
