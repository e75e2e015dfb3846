import type { Project } from '../document/project.ts';

/** How a change counts: an undo step of its own; folded into the step of the same name while that lasts (a drag); or none. */
export type Counts =
  | { readonly kind: 'step' }
  | { readonly kind: 'fold'; readonly into: string }
  | { readonly kind: 'silent' };

export interface UndoStep {
  /** Names the step: "storey 2 stiffness 455 to 470". */
  readonly label: string;
  /** The project on the other side of the step: before it in `past`, after it in `future`. */
  readonly project: Project;
}

/** Snapshots of the immutable project: unchanged parts are shared, so a step costs what changed. */
export interface History {
  /** Oldest first. */
  readonly past: readonly UndoStep[];
  /** Next to be redone last. */
  readonly future: readonly UndoStep[];
  /** Name of the fold that the newest step belongs to; null once anything else happened. */
  readonly folding: string | null;
}

export const NO_HISTORY: History = { past: [], future: [], folding: null };

/** Steps kept: far more than anyone takes back, few enough that samples of removed motions do not stay for ever. */
const UNDO_STEPS = 400;

/** History after the project `before` was changed. A silent change is made to every snapshot, so that no undo takes it back. */
export function record(
  history: History,
  label: string,
  before: Project,
  counts: Counts,
  change: (project: Project) => Project,
): History {
  if (counts.kind === 'silent') {
    const through = (step: UndoStep): UndoStep => ({ ...step, project: change(step.project) });
    return { ...history, past: history.past.map(through), future: history.future.map(through) };
  }
  const newest = history.past.at(-1);
  if (counts.kind === 'fold' && newest && history.folding === counts.into) {
    return { past: [...history.past.slice(0, -1), { ...newest, label }], future: [], folding: counts.into };
  }
  return {
    past: [...history.past, { label, project: before }].slice(-UNDO_STEPS),
    future: [],
    folding: counts.kind === 'fold' ? counts.into : null,
  };
}

export interface Travelled {
  readonly project: Project;
  readonly history: History;
}

/** One step back from `now`; null where there is none. */
export function stepBack(history: History, now: Project): Travelled | null {
  const step = history.past.at(-1);
  if (!step) return null;
  return {
    project: step.project,
    history: {
      past: history.past.slice(0, -1),
      future: [...history.future, { label: step.label, project: now }],
      folding: null,
    },
  };
}

/** One step forward again from `now`; null where there is none. */
export function stepForward(history: History, now: Project): Travelled | null {
  const step = history.future.at(-1);
  if (!step) return null;
  return {
    project: step.project,
    history: {
      past: [...history.past, { label: step.label, project: now }],
      future: history.future.slice(0, -1),
      folding: null,
    },
  };
}
