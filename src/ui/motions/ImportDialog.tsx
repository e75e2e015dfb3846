import { useCallback, useEffect, useRef, useState } from 'react';
import {
  addReadyRecords,
  clearRecords,
  type ImportFile,
  importStore,
  isReady,
  leaveRecordOut,
  useImports,
} from '../../state/importQueue.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { FileList } from './import/FileList.tsx';
import { Foot } from './import/Foot.tsx';
import { Offer } from './import/Offer.tsx';
import { PasteFoot, PasteSamples } from './import/PasteSamples.tsx';
import { Preview } from './import/Preview.tsx';
import { takePasted } from './import/pick.ts';
import { RawText } from './import/RawText.tsx';
import { Stopped } from './import/Stopped.tsx';
import { ThingsToLookAt } from './import/ThingsToLookAt.tsx';
import { type MendChoice, useMend } from './import/useMend.ts';
import { WhatWasRead } from './import/WhatWasRead.tsx';
import { listed, summaryOf } from './import/words.ts';
import './import/import.css';

/** Record files on their way in: each beside what was read of it, until it is added. */
export function ImportDialog({ onClose }: { readonly onClose: () => void }) {
  const files = useImports((state) => state.files);
  const shownId = useImports((state) => state.shown);
  const shown = files.find(({ id }) => id === shownId);
  const mend = useMend(shown);
  const [pasting, setPasting] = useState(false);
  const body = useRef<HTMLDivElement>(null);

  const close = useCallback(() => {
    clearRecords();
    onClose();
  }, [onClose]);
  const add = useCallback(() => {
    const names = addReadyRecords();
    if (names.length === 0) return;
    setSession({ toast: `${listed(names)} added`, motion: names[0] });
    // What could not be added stays in the list, so that nothing of it is lost.
    if (importStore.getState().files.every(({ leftOut }) => leftOut)) close();
  }, [close]);
  useDialogKeys({ add, mend, body });
  const offering = files.length === 0 && !pasting;

  return (
    <Dialog
      title="Add records"
      width={offering ? 640 : 1300}
      sticky
      onClose={close}
      foot={
        pasting ? (
          <PasteFoot onBack={() => setPasting(false)} />
        ) : (
          <Foot files={files} mend={mend} onAdd={add} onCancel={close} />
        )
      }
    >
      <div ref={body} className="import">
        {!offering && !pasting && (
          <p className="quiet import-summary" role="status">
            {summaryOf(files)}
          </p>
        )}
        {offering && <Offer onPaste={() => setPasting(true)} />}
        {pasting && <PasteSamples onDone={() => setPasting(false)} />}
        {!offering && !pasting && (
          <div className="import-parts">
            <FileList files={files} shown={shownId} onPaste={() => setPasting(true)} />
            {shown && <RawText file={shown} />}
            {shown && <Understood file={shown} mend={mend} />}
          </div>
        )}
      </div>
    </Dialog>
  );
}

/** The right side: what was read, or what stopped it. */
function Understood({ file, mend }: { readonly file: ImportFile; readonly mend: MendChoice | null }) {
  const system = useSession((state) => state.system);
  const { answer, leftOut } = file;
  return (
    <section className="import-got" aria-label="What was read" aria-busy={file.status === 'reading'}>
      <h3 className="import-caption">{mend === null ? 'What was read' : 'What stopped it'}</h3>
      {file.status === 'failed' && <p className="import-stopped-words">{file.failure}</p>}
      {leftOut && (
        <div className="import-left-out">
          <p>This file is left out.</p>
          <Button size="low" onClick={() => leaveRecordOut(file.id, false)}>
            Take it in again
          </Button>
        </div>
      )}
      {answer !== null && !leftOut && (
        <>
          {mend !== null && <Stopped key={mend.fault.id} answer={answer} mend={mend} system={system} />}
          {(answer.reading.values.length > 0 || Object.keys(file.answers).length > 0) && (
            <WhatWasRead key={file.id} file={file} answer={answer} system={system} />
          )}
          {mend === null && <Preview answer={answer} system={system} />}
          <ThingsToLookAt file={file} />
        </>
      )}
    </section>
  );
}

const PARTS = ['.import-files', '.import-raw', '.import-got', '.import-foot'];
const STOPS = 'button:not(:disabled), input:not(:disabled), select, textarea, [tabindex="0"]';

interface Keys {
  readonly add: () => void;
  readonly mend: MendChoice | null;
  readonly body: React.RefObject<HTMLDivElement | null>;
}

/** Ctrl+Enter adds (or mends what stopped the file shown), F6 goes to the next part, a pasted text is read. */
function useDialogKeys({ add, mend, body }: Keys): void {
  useEffect(() => {
    const dialog = body.current?.closest('dialog');
    if (!dialog) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) {
        const pasting = dialog.querySelector<HTMLFormElement>('.import-paste');
        if (document.activeElement instanceof HTMLInputElement) document.activeElement.blur();
        if (pasting) pasting.requestSubmit();
        else if (importStore.getState().files.some(isReady)) add();
        else mend?.apply();
      } else if (event.key === 'F6') goOn(dialog, event.shiftKey);
      else if (event.key === 'Enter' && event.target instanceof Element && event.target.closest('.import-mends')) {
        mend?.apply();
      } else return;
      event.preventDefault();
    };
    const onPaste = (event: ClipboardEvent) => {
      if (event.target instanceof Element && event.target.matches('input, textarea')) return;
      const text = event.clipboardData?.getData('text/plain') ?? '';
      if (text.trim() !== '') takePasted(text);
    };
    dialog.addEventListener('keydown', onKeyDown);
    document.addEventListener('paste', onPaste);
    return () => {
      dialog.removeEventListener('keydown', onKeyDown);
      document.removeEventListener('paste', onPaste);
    };
  }, [add, mend, body]);
}

function goOn(dialog: HTMLElement, back: boolean): void {
  const parts = PARTS.flatMap((selector) => dialog.querySelector<HTMLElement>(selector) ?? []);
  const at = parts.findIndex((part) => part.contains(document.activeElement));
  const next = parts[(at + (back ? -1 : 1) + parts.length) % parts.length];
  next?.querySelector<HTMLElement>(STOPS)?.focus();
}
