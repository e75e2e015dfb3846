import { useEffect, useRef } from 'react';
import { Button } from '../../controls/Button.tsx';
import { takePasted } from './pick.ts';

const FORM = 'paste-samples';

/** A text area in the place of a file. */
export function PasteSamples({ onDone }: { readonly onDone: () => void }) {
  const area = useRef<HTMLTextAreaElement>(null);
  useEffect(() => area.current?.focus(), []);
  return (
    <form
      id={FORM}
      className="import-paste"
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        // Without this the dialog would close, with all the files in it.
        event.preventDefault();
        onDone();
      }}
      onSubmit={(event) => {
        event.preventDefault();
        const text = area.current?.value ?? '';
        if (text.trim() === '') return;
        takePasted(text);
        onDone();
      }}
    >
      <label htmlFor={`${FORM}-text`}>
        Samples, one a line, in rows, or time and acceleration in columns; a heading may stay
      </label>
      <textarea id={`${FORM}-text`} ref={area} className="field mono" spellCheck={false} required />
    </form>
  );
}

/** The foot of the dialog while samples are pasted. */
export function PasteFoot({ onBack }: { readonly onBack: () => void }) {
  return (
    <div className="import-foot">
      <Button kind="primary" type="submit" form={FORM}>
        Read the samples
      </Button>
      <Button onClick={onBack}>Back</Button>
      <span className="small import-keys">
        <kbd className="keycap">Ctrl</kbd> <kbd className="keycap">Enter</kbd> reads, <kbd className="keycap">Esc</kbd>{' '}
        goes back
      </span>
    </div>
  );
}
