import type { Fault, Result } from '../core/fault.ts';
import { readProjectOnItsWay, writeProject } from '../document/file.ts';
import { documentStore, replace } from './document.ts';
import { putSamples, samplesOf } from './samples.ts';

/** What came of opening a project file: it took the document's place, or nothing happened and these are its faults. */
export type Opened =
  | { readonly ok: true }
  | { readonly ok: false; readonly file: string; readonly faults: readonly Fault[] };

export interface ProjectFile {
  readonly name: string;
  readonly text: string;
}

/**
 * Opens the text of a project file in the place of the document, as one undo step; a file with faults changes nothing. A
 * document saved on its way is opened with its open cells: it lists them and does not run.
 */
export function openProject(file: string, text: string): Opened {
  const read = readProjectOnItsWay(text);
  if (!read.ok) return { ok: false, file, faults: read.faults };
  for (const [digest, values] of read.value.samples) putSamples(digest, values);
  replace(`open ${file}`, read.value.project);
  return { ok: true };
}

/**
 * The project file of the document as committed, and the name it should be saved under. Refused where samples are missing:
 * a file without them would not hold the project.
 */
export function projectFile(): Result<ProjectFile> {
  const { project } = documentStore.getState();
  const faults = project.motions.flatMap(({ name, samples }, i): Fault[] => {
    if (samplesOf(samples)) return [];
    const message = `the samples of ${name} are not in this browser's store`;
    return [{ code: 'samples-missing', where: `motions[${i}]`, message, mend: 'Load its record again, or remove it' }];
  });
  if (faults.length > 0) return { ok: false, faults };
  const text = writeProject(project, (digest) => samplesOf(digest) ?? new Float64Array());
  return { ok: true, value: { name: `${fileName(project.title)}.swaybook.json`, text } };
}

/** A title as every file system takes it. */
function fileName(title: string): string {
  const name = title
    .replace(/[\p{Cc}\\/:*?"<>|]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim()
    .replace(/^\.+|\.+$/g, '');
  return name === '' ? 'untitled' : name.slice(0, 80).trim();
}
