import { useLayoutEffect, useRef } from 'react';
import { useFileDrop } from './useFileDrop.ts';

/** Files dropped anywhere are taken; a frame over the page, and over an open dialog, says so while they are held over it. */
export function FileDrop({ openProject }: { readonly openProject: (file: File) => void }) {
  const over = useFileDrop(openProject);
  return over ? <DropFrame /> : null;
}

function DropFrame() {
  const frame = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => frame.current?.showPopover(), []);
  return (
    <div ref={frame} popover="manual" className="drop-frame">
      <b>Records and projects can be dropped anywhere</b>
    </div>
  );
}
