import { basename, dirname, resolve } from 'node:path';
import { readRecord } from '../core/doors.ts';
import type { Result } from '../core/fault.ts';
import { type OpenedProject, readProject } from '../document/file.ts';
import { readBytes } from './files.ts';

/** Reads a project file, and the record files that it names, which are looked for from the folder it stands in. */
export function projectAt(path: string): Result<OpenedProject> {
  const bytes = readBytes(path);
  if (!bytes.ok) return bytes;
  const text = textOf(bytes.value);
  if (!text.ok) return text;
  return readProject(text.value, (name, answers) => {
    const record = readBytes(resolve(dirname(path), name));
    return record.ok
      ? { ok: true, value: readRecord(basename(name), record.value, answers) }
      : { ok: false, faults: record.faults.map((fault) => ({ ...fault, message: `${name} ${fault.message}` })) };
  });
}

function textOf(bytes: Uint8Array): Result<string> {
  try {
    return { ok: true, value: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    const message = 'is no text in UTF-8';
    return { ok: false, faults: [{ code: 'not-utf-8', where: 'file', message, mend: 'Save it again as UTF-8' }] };
  }
}
