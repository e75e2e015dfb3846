import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import type { RecordAnswers } from '../core/motion/reading.ts';
import { addMotions, cancelReading, type ReadAnswer, readRecordFile } from './imports.ts';

/** One record file on its way in: what it holds, what was answered, what was read of it. */
export interface ImportFile {
  readonly id: string;
  /** Its name, without a path. */
  readonly file: string;
  readonly bytes: ArrayBuffer;
  readonly answers: RecordAnswers;
  /** `reading` while the newest answers are not read yet; the reading before stays in sight meanwhile. */
  readonly status: 'reading' | 'read' | 'failed';
  readonly answer: ReadAnswer | null;
  /** Why it failed, where it did. */
  readonly failure: string | null;
  readonly leftOut: boolean;
}

interface ImportQueue {
  readonly files: readonly ImportFile[];
  /** Id of the file that is shown; null where there is none. */
  readonly shown: string | null;
}

/** Larger files are refused: nothing that a logger writes as text is near it [bytes]. */
const LARGEST = 256 * 1024 * 1024;

/** The record files of the import dialog; neither saved nor undone. */
export const importStore = createStore<ImportQueue>(() => ({ files: [], shown: null }));

export function useImports<T>(selector: (state: ImportQueue) => T): T {
  return useStore(importStore, selector);
}

let given = 0;

/** Takes record files in, shows the first of them and reads them all. */
export function offerRecords(records: readonly { readonly file: string; readonly bytes: ArrayBuffer }[]): void {
  if (records.length === 0) return;
  const files = records.map(({ file, bytes }): ImportFile => {
    given += 1;
    const fresh = { id: String(given), file, bytes, answers: {}, answer: null, leftOut: false };
    return bytes.byteLength > LARGEST
      ? { ...fresh, status: 'failed', failure: 'The file is larger than 256 MB: cut it into parts.' }
      : { ...fresh, status: 'reading', failure: null };
  });
  importStore.setState((state) => ({ files: [...state.files, ...files], shown: files[0].id }));
  for (const { id, status } of files) if (status === 'reading') void read(id);
}

/** Reads a file again with these answers in the place of those before. */
export function answerRecord(id: string, answers: RecordAnswers): void {
  change(id, { answers, status: 'reading', leftOut: false });
  void read(id);
}

/** Names a record. One that was read takes the name at once: it need not be read again. */
export function nameRecord(id: string, name: string): void {
  const file = importStore.getState().files.find((entry) => entry.id === id);
  if (file === undefined) return;
  const answers = { ...file.answers, name };
  if (file.status !== 'read' || file.answer === null) {
    answerRecord(id, answers);
    return;
  }
  const { reading } = file.answer;
  const motion = reading.motion === null ? null : { ...reading.motion, name };
  change(id, { answers, answer: { ...file.answer, reading: { ...reading, name, motion } } });
}

export function showRecord(id: string): void {
  importStore.setState({ shown: id });
}

/** A file that is left out stays in the list and is not added. */
export function leaveRecordOut(id: string, leftOut: boolean): void {
  change(id, { leftOut });
}

/** Takes a file off the list. */
export function removeRecord(id: string): void {
  cancelReading(id);
  importStore.setState(({ files, shown }) => {
    const at = files.findIndex((file) => file.id === id);
    const left = files.filter((file) => file.id !== id);
    return { files: left, shown: shown === id ? (left[Math.min(at, left.length - 1)]?.id ?? null) : shown };
  });
}

/** Lets go of all files: the dialog was closed. */
export function clearRecords(): void {
  for (const { id } of importStore.getState().files) cancelReading(id);
  importStore.setState({ files: [], shown: null });
}

/** Whether a file was read without anything open. */
export function isReady({ status, answer, leftOut }: ImportFile): boolean {
  return status === 'read' && !leftOut && answer?.reading.motion != null;
}

/** Adds the motions of the files that are ready, as one undo step, and takes them off the list. Returns the names they got. */
export function addReadyRecords(): readonly string[] {
  const { files } = importStore.getState();
  const ready = files.filter(isReady);
  const names = addMotions(ready.flatMap(({ answer }) => (answer === null ? [] : [answer])));
  const left = files.filter((file) => !isReady(file));
  importStore.setState({ files: left, shown: left[0]?.id ?? null });
  return names;
}

async function read(id: string): Promise<void> {
  const file = importStore.getState().files.find((entry) => entry.id === id);
  if (file === undefined) return;
  const { answers } = file;
  const reply = await readRecordFile(id, file.file, file.bytes, answers);
  // A newer reading of the same file is under way, or the file was taken off the list.
  if (importStore.getState().files.find((entry) => entry.id === id)?.answers !== answers) return;
  switch (reply.status) {
    case 'done':
      change(id, { status: 'read', answer: reply.value, failure: null });
      return;
    case 'failed':
      change(id, { status: 'failed', failure: `The file could not be read: ${reply.message}.` });
      return;
    case 'superseded':
      change(id, { status: 'failed', failure: 'The reading was given up.' });
  }
}

function change(id: string, changed: Partial<ImportFile>): void {
  importStore.setState(({ files }) => ({
    files: files.map((file) => (file.id === id ? { ...file, ...changed } : file)),
  }));
}
