import { useState } from 'react';

export interface FieldProps {
  /** Accessible name. */
  readonly label: string;
  /** The text as it stands; another one takes the place of what was typed. */
  readonly value: string;
  /** Takes the text in, or says why it cannot be taken. */
  readonly take: (text: string) => string | null;
  /** [px] */
  readonly width: number;
  readonly placeholder?: string;
}

/** A typed answer: taken by Enter or by leaving, given up by Esc; what cannot be taken stays, with words. */
export function Field({ label, value, take, width, placeholder }: FieldProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const [why, setWhy] = useState<string | null>(null);
  const end = () => {
    if (draft === null) return;
    const refused = draft === value ? null : take(draft);
    setWhy(refused);
    if (refused === null) setDraft(null);
  };
  return (
    <span className="import-field">
      <input
        className={`field ${why === null ? '' : 'unread'}`}
        style={{ width }}
        aria-label={label}
        aria-invalid={why !== null}
        autoComplete="off"
        spellCheck={false}
        placeholder={placeholder}
        value={draft ?? value}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={end}
        onKeyDown={(event) => {
          if (event.key === 'Enter' && !event.ctrlKey && !event.metaKey) end();
          else if (event.key === 'Escape' && draft !== null) {
            setDraft(null);
            setWhy(null);
            // Esc gives up the text here; the next one closes the dialog.
            event.preventDefault();
          }
        }}
      />
      {why !== null && <span className="field-words">{why}</span>}
    </span>
  );
}
