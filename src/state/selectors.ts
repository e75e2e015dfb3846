import { type DocumentState, documentStore, useDocument } from './document.ts';
import { type ResultsState, resultsStore, useResults } from './results.ts';
import { type SessionState, sessionStore, useSession } from './session.ts';

/** Storey whose histories are shown: the one the reader chose, else the governing one, else the lowest; -1 with no storey. */
export function chosenStoreyOf(
  { project }: Pick<DocumentState, 'project'>,
  { storey }: Pick<SessionState, 'storey'>,
  { answers }: Pick<ResultsState, 'answers'>,
): number {
  const top = project.frame.storeys.length - 1;
  const governing = answers?.envelope.governingStorey ?? -1;
  return Math.min(storey ?? Math.max(governing, 0), top);
}

/**
 * Name of the chosen motion: the one the reader chose while it is used, else the one that governs the governing storey,
 * else the first that is used; null with none.
 */
export function chosenMotionOf(
  { project }: Pick<DocumentState, 'project'>,
  { motion }: Pick<SessionState, 'motion'>,
  { answers }: Pick<ResultsState, 'answers'>,
): string | null {
  const used = (name: string | null | undefined) => project.motions.some((m) => m.used && m.name === name);
  if (motion !== null && used(motion)) return motion;
  const { envelope } = answers ?? {};
  if (envelope?.drift && envelope.governingStorey >= 0) {
    const governing = envelope.motions[envelope.drift.governing[envelope.governingStorey]];
    if (used(governing)) return governing;
  }
  return project.motions.find((m) => m.used)?.name ?? null;
}

export function chosenStorey(): number {
  return chosenStoreyOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
}

export function chosenMotion(): string | null {
  return chosenMotionOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
}

export function useChosenStorey(): number {
  const project = useDocument((s) => s.project);
  const storey = useSession((s) => s.storey);
  const answers = useResults((s) => s.answers);
  return chosenStoreyOf({ project }, { storey }, { answers });
}

export function useChosenMotion(): string | null {
  const project = useDocument((s) => s.project);
  const motion = useSession((s) => s.motion);
  const answers = useResults((s) => s.answers);
  return chosenMotionOf({ project }, { motion }, { answers });
}

/** The project with the draft in its place, for what must answer while a cell is edited (the frame drawing, derived facts). */
export { effectiveProject } from './document.ts';
