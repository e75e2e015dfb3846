import { useEffect, useState } from 'react';
import { setSession } from '../../../state/session.ts';
import { takeRecords } from './pick.ts';
import { listed } from './words.ts';

/**
 * Record files dropped anywhere on the page go to the import dialog. A project file (.json) goes to its opener where it comes
 * alone; among records it is left, with a word. True while files are held over the page.
 */
export function useFileDrop(openProject: (file: File) => void): boolean {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const holdsFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') === true;
    const enter = (event: DragEvent) => {
      if (!holdsFiles(event)) return;
      // Without this the browser would leave the page for the file.
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent) => {
      setOver(false);
      if (!holdsFiles(event)) return;
      event.preventDefault();
      const files = [...(event.dataTransfer?.files ?? [])];
      const projects = files.filter(({ name }) => name.toLowerCase().endsWith('.json'));
      const records = files.filter((file) => !projects.includes(file));
      if (records.length > 0) void takeRecords(records);
      if (projects.length === 0) return;
      if (files.length === 1) openProject(files[0]);
      else {
        const names = listed(projects.map(({ name }) => name));
        setSession({ toast: `${names}: drop a project file alone to open it` });
      }
    };
    window.addEventListener('dragenter', enter);
    window.addEventListener('dragover', enter);
    window.addEventListener('dragleave', leave);
    window.addEventListener('drop', drop);
    return () => {
      window.removeEventListener('dragenter', enter);
      window.removeEventListener('dragover', enter);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('drop', drop);
    };
  }, [openProject]);
  return over;
}
