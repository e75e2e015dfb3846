import { offerRecords } from '../../../state/importQueue.ts';
import { setSession } from '../../../state/session.ts';
import { listed } from './words.ts';

/** Lets the user pick record files; the dialog shows what was read of them. */
export function pickRecords(): void {
  const input = document.createElement('input');
  input.type = 'file';
  input.multiple = true;
  input.onchange = () => void takeRecords([...(input.files ?? [])]);
  input.click();
}

/** Reads files in the dialog; one that the browser cannot open (a folder, say) is named at the foot. */
export async function takeRecords(files: readonly File[]): Promise<void> {
  const taken = await Promise.all(
    files.map(async (file) => {
      try {
        return { file: file.name, bytes: await file.arrayBuffer() };
      } catch {
        return { file: file.name, bytes: null };
      }
    }),
  );
  const lost = taken.filter(({ bytes }) => bytes === null).map(({ file }) => file);
  if (lost.length > 0) setSession({ toast: `${listed(lost)} could not be opened as a file` });
  const records = taken.flatMap(({ file, bytes }) => (bytes === null ? [] : [{ file, bytes }]));
  if (records.length === 0) return;
  offerRecords(records);
  setSession({ dialog: 'import' });
}

/** Reads a pasted text as if it were a file. */
export function takePasted(text: string): void {
  offerRecords([{ file: 'Pasted samples', bytes: new TextEncoder().encode(text).buffer }]);
  setSession({ dialog: 'import' });
}
