import type { Fault, Result } from '../core/fault.ts';
import { PROJECT_FORMAT, PROJECT_VERSION } from './project.ts';

/** One migration a version: from that version to the next, on the raw object. */
type Migration = (raw: Record<string, unknown>) => Record<string, unknown>;
export const MIGRATIONS: ReadonlyMap<number, Migration> = new Map([
  // 2 added limits.isolator, which may be left out: what a file of version 1 says means the same.
  [1, (raw: Record<string, unknown>) => raw],
]);

/** Brings a raw project file up to the present version, or says why not: another format, a later or an unknown version. */
export function migrated(
  raw: unknown,
  migrations: ReadonlyMap<number, Migration> = MIGRATIONS,
  present: number = PROJECT_VERSION,
): Result<Record<string, unknown>> {
  if (typeof raw !== 'object' || raw === null || Array.isArray(raw)) {
    return refused('wrong-kind', 'file', 'holds no object at its top', 'Choose a project file (.swaybook.json)');
  }
  let file = raw as Record<string, unknown>;
  if (file.format !== PROJECT_FORMAT) {
    return refused(
      'wrong-format',
      'format',
      `is ${JSON.stringify(file.format)}, must be "${PROJECT_FORMAT}"`,
      'Choose a project file (.swaybook.json)',
    );
  }
  const { version } = file;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    return refused(
      'wrong-version',
      'version',
      `is ${JSON.stringify(version)}, must be a whole number from 1`,
      `Put ${present} there if the file is of this version`,
    );
  }
  if (version > present) {
    return refused(
      'later-version',
      'version',
      `the file is of version ${version}, written by a later release; this one reads up to version ${present}`,
      'Open it with a newer release',
    );
  }
  for (let v = version; v < present; v++) {
    const step = migrations.get(v);
    if (!step) throw new RangeError(`migrated: no migration from version ${v}`);
    file = { ...step(file), version: v + 1 };
  }
  return { ok: true, value: file };
}

function refused(
  code: string,
  where: string,
  message: string,
  mend: string,
): { readonly ok: false; readonly faults: readonly Fault[] } {
  return { ok: false, faults: [{ code, where, message, mend }] };
}
