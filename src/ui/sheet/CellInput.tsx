import { useLayoutEffect, useRef } from 'react';
import { sessionStore } from '../../state/session.ts';
import { commitField, typeField } from '../controls/field.ts';

export interface CellInputProps {
  readonly path: string;
  readonly text: string;
  readonly unread: boolean;
  readonly label: string;
}

/** The field inside a cell that is being edited. The grid answers Enter, Tab, Esc and the arrows. */
export function CellInput({ path, text, unread, label }: CellInputProps) {
  const input = useRef<HTMLInputElement>(null);
  useLayoutEffect(() => {
    const field = input.current;
    field?.focus({ preventScroll: true });
    // One character was typed over the cell: go on behind it. Anything longer was opened: it stands selected.
    if (field !== null && field.value.length > 1) field.select();
    else field?.setSelectionRange(field.value.length, field.value.length);
  }, []);
  return (
    <input
      ref={input}
      className={`cell-input ${unread ? 'unread' : ''}`}
      autoComplete="off"
      spellCheck={false}
      aria-label={label}
      aria-invalid={unread}
      value={text}
      onChange={(event) => typeField(path, event.target.value, sessionStore.getState().system)}
      onBlur={(event) => {
        // The window lost the focus, or a reading is being chosen in the line above: the edit goes on.
        if (document.activeElement === event.target) return;
        if (event.relatedTarget instanceof Element && event.relatedTarget.closest('[data-keeps-edit]') !== null) return;
        commitField(path, sessionStore.getState().system);
      }}
    />
  );
}
