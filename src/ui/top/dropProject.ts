import type { Refused } from './files.ts';
import { openFile } from './files.ts';

function isProject(name: string): boolean {
  return name.toLowerCase().endsWith('.json');
}

/** A project file dropped anywhere is opened; other files are left to the records. Returns how to stop. */
export function followProjectDrops(onRefused: (refused: Refused) => void): () => void {
  const over = (event: DragEvent) => {
    if (event.dataTransfer?.types.includes('Files')) event.preventDefault();
  };
  const drop = (event: DragEvent) => {
    const file = event.dataTransfer?.files[0];
    if (file === undefined) return;
    // Without this the browser would leave the page for the file.
    event.preventDefault();
    if (!isProject(file.name)) return;
    event.stopImmediatePropagation();
    void openFile(file, onRefused);
  };
  window.addEventListener('dragover', over);
  window.addEventListener('drop', drop, true);
  return () => {
    window.removeEventListener('dragover', over);
    window.removeEventListener('drop', drop, true);
  };
}
