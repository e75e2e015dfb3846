import type { Fault } from '../../core/fault.ts';
import { openProject, projectFile } from '../../state/files.ts';
import { setSession } from '../../state/session.ts';
import { commitOpenDraft } from '../controls/field.ts';

/** Why a project was not opened or not saved: all of it at once. */
export interface Refused {
  /** "clinic.swaybook.json was not opened" */
  readonly title: string;
  readonly faults: readonly Fault[];
}

/** Lets the user pick a project file and opens it; null where none was picked or it was opened. */
export function pickProject(onRefused: (refused: Refused) => void): void {
  const input = document.createElement('input');
  input.type = 'file';
  input.accept = '.json,application/json';
  input.onchange = () => {
    const file = input.files?.[0];
    if (file !== undefined) void openFile(file, onRefused);
  };
  input.click();
}

/** Opens a file as a project, or says everything that is wrong in it. */
export async function openFile(file: File, onRefused: (refused: Refused) => void): Promise<void> {
  const opened = openProject(file.name, await file.text());
  if (!opened.ok) onRefused({ title: `${opened.file} was not opened`, faults: opened.faults });
  else setSession({ toast: `${file.name} is open; undo brings the other one back` });
}

/** Gives the project file to the browser to keep, or says why there can be none. */
export function saveProject(onRefused: (refused: Refused) => void): void {
  commitOpenDraft();
  const made = projectFile();
  if (!made.ok) {
    onRefused({ title: 'The project was not saved', faults: made.faults });
    return;
  }
  const { name, text } = made.value;
  const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // The download has begun by the next turn; the text need not stay in memory.
  setTimeout(() => URL.revokeObjectURL(url), 1000);
  setSession({ toast: `${name} is saved with the downloads` });
}
