import { useState } from 'react';
import { Button } from '../../controls/Button.tsx';
import { takePasted } from './pick.ts';

/** A text area in the place of a file. */
export function PasteSamples({ onDone }: { readonly onDone: () => void }) {
  const [text, setText] = useState('');
  const read = () => {
    takePasted(text);
    onDone();
  };
  return (
    <div className="import-paste">
      <label htmlFor="import-paste">
        Samples, one a line, in rows, or time and acceleration in columns; a heading may stay
      </label>
      <textarea
        id="import-paste"
        className="field mono"
        spellCheck={false}
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      <div className="import-more">
        <Button kind="primary" disabled={text.trim() === ''} onClick={read}>
          Read the samples
        </Button>
        <Button onClick={onDone}>Back</Button>
      </div>
    </div>
  );
}
