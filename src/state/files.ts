import type { Fault } from '../core/fault.ts';

/** What came of opening a project file: it took the document's place, or nothing happened and these are its faults. */
export type Opened =
  | { readonly ok: true }
  | { readonly ok: false; readonly file: string; readonly faults: readonly Fault[] };

/** Opens the text of a project file in the place of the document, as one undo step; a file with faults changes nothing. */
export function openProject(file: string, _text: string): Opened {
  return { ok: false, file, faults: [] };
}

/** The project file of the document as committed, and the name it should be saved under. */
export function projectFile(): { readonly name: string; readonly text: string } {
  return { name: 'untitled.swaybook.json', text: '' };
}
