import type { Project, Typed } from '../document/project.ts';

/**
 * The document store: the project (undoable, saved) and the draft of the field being edited. CONTRACT (filled in by the
 * state room): `useDocument(selector)` for React, `documentStore` (zustand vanilla) for the rest.
 */
export interface Draft {
  /** Which field, as a path of the project file: `frame.storeys[2].stiffness`, `limits.drift`, `motions[1].scale`. */
  readonly path: string;
  /** The text as it stands in the field. */
  readonly text: string;
  /** What it reads as: a number (SI), null (empty), or the raw text where it cannot be read or is ambiguous. */
  readonly value: Typed;
}

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
}

/** How a change counts: an undo step of its own; folded into the step of the same name while that lasts (a drag); or none. */
export type Counts =
  | { readonly kind: 'step' }
  | { readonly kind: 'fold'; readonly into: string }
  | { readonly kind: 'silent' };

export interface DocumentActions {
  /** The one way to change the project. `label` names the step for undo ("storey 2 stiffness 455 to 470"). */
  edit(label: string, change: (project: Project) => Project, counts?: Counts): void;
  setDraft(draft: Draft | null): void;
  /** Writes the draft's value into the project as one undo step and ends the draft. */
  commitDraft(label: string): void;
  undo(): void;
  redo(): void;
  /** Another project takes the place of this one (open, new, demo): undoable as one step. */
  replace(label: string, project: Project): void;
}

/** The project with the draft in its place: what the calculation sees. Same object for the same project and draft. */
export declare function effectiveProject(state: DocumentState): Project;
