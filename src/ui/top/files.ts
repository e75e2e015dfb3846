import { type Fault, faultLine } from '../../core/fault.ts';
import { openProject, projectFile } from '../../state/files.ts';
import { setSession } from '../../state/session.ts';
import { commitOpenDraft } from '../controls/field.ts';

/** A project file that could not be opened, with everything that is wrong in it. */
export interface Refused {
  readonly file: string;
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
  if (!opened.ok) onRefused({ file: opened.file, faults: opened.faults });
  else setSession({ toast: `${file.name} is open; undo brings the other one back` });
}

/** Gives the project file to the browser to keep. */
export function saveProject(): void {
  commitOpenDraft();
  const file = projectFile();
  if (!file.ok) {
    setSession({ toast: `not saved: ${file.faults.map(faultLine).join(' ')}` });
    return;
  }
  const { name, text } = file.value;
  const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // The download has begun by the next turn; the text need not stay in memory.
  setTimeout(() => URL.revokeObjectURL(url), 1000);
  setSession({ toast: `${name} is saved with the downloads` });
}
