import type { RecordAnswers } from '../core/motion/reading.ts';
import { addMotions as withMotions } from '../document/edits.ts';
import type { MotionEntry } from '../document/project.ts';
import type { Engine, ReadAnswer, Reply } from '../engine/protocol.ts';
import { documentStore, edit } from './document.ts';
import { putSamples } from './samples.ts';

export type { ReadAnswer, Reply } from '../engine/protocol.ts';

let reader: Pick<Engine, 'read' | 'cancel'> | null = null;

/** The engine reads the record files. Called once, by main.tsx. */
export function startImports(engine: Pick<Engine, 'read' | 'cancel'>): void {
  reader = engine;
}

/**
 * Reads one record file off the main thread. A newer reading of the same question (the same file with other answers)
 * supersedes this one; the bytes are copied, so they can be read again.
 */
export async function readRecordFile(
  question: string,
  file: string,
  bytes: ArrayBuffer,
  answers: RecordAnswers,
): Promise<Reply<ReadAnswer>> {
  if (!reader) return { status: 'failed', message: 'the engine was not started' };
  return reader.read(`read ${question}`, file, bytes, answers);
}

/** The dialog was closed: the reading is no longer wanted. */
export function cancelReading(question: string): void {
  reader?.cancel(`read ${question}`);
}

/**
 * Adds the motions of files that were read without an open fault, as one undo step; others are passed over. A name that is
 * taken gets a number. Returns the names they got.
 */
export function addMotions(answers: readonly ReadAnswer[]): readonly string[] {
  const entries: MotionEntry[] = [];
  for (const { reading, samples } of answers) {
    if (!reading.motion || !samples) continue;
    const { name, acceleration, interval, origin } = reading.motion;
    putSamples(samples, acceleration);
    entries.push({ name, interval, samples, count: acceleration.length, scale: 1, used: true, origin });
  }
  if (entries.length === 0) return [];
  const label = entries.length === 1 ? `add motion ${entries[0].name}` : `add ${entries.length} motions`;
  edit(label, (project) => withMotions(project, entries));
  return documentStore
    .getState()
    .project.motions.slice(-entries.length)
    .map((motion) => motion.name);
}
