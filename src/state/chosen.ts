import type { Envelope } from '../core/checks/envelope.ts';
import type { DocumentState } from './document.ts';
import type { SessionState } from './session.ts';

interface HasEnvelope {
  readonly answers: { readonly envelope: Envelope } | null;
}

/** Storey whose histories are shown: the one the reader chose, else the governing one, else the lowest; -1 with no storey. */
export function chosenStoreyOf(
  { project }: Pick<DocumentState, 'project'>,
  { storey }: Pick<SessionState, 'storey'>,
  { answers }: HasEnvelope,
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
  { answers }: HasEnvelope,
): string | null {
  const used = (name: string) => project.motions.some((m) => m.used && m.name === name);
  if (motion !== null && used(motion)) return motion;
  const envelope = answers?.envelope;
  if (envelope?.drift && envelope.governingStorey >= 0) {
    const governing = envelope.motions[envelope.drift.governing[envelope.governingStorey]];
    if (used(governing)) return governing;
  }
  return project.motions.find((m) => m.used)?.name ?? null;
}
