import { useId } from 'react';
import { unitOf } from '../../core/units/quantities.ts';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { useSession } from '../../state/session.ts';
import { commitField, giveUpField, quantityOf, shownText, typeField, wordsOf } from './field.ts';

export interface NumberFieldProps {
  /** The field as a path of the project file: `limits.drift`, `motions[1].scale`. */
  readonly path: string;
  /** Accessible name. */
  readonly label: string;
  /** [px] */
  readonly width?: number;
  /** Show the unit behind the field; default yes. */
  readonly unit?: boolean;
  /** Say below the field what is wrong with it; default yes. */
  readonly words?: boolean;
  readonly className?: string;
  readonly disabled?: boolean;
  /** Makes what was typed a step; default: of this field alone. */
  readonly onCommit?: (path: string) => void;
}

/**
 * A number of the document in a field of its own. Typing sets the draft, so the answers follow; Enter, Tab or leaving
 * makes it one undo step, Esc gives it up. Text that cannot be read stays, underlined, with words.
 */
export function NumberField({
  path,
  label,
  width = 72,
  unit = true,
  words = true,
  className = '',
  disabled = false,
  onCommit,
}: NumberFieldProps) {
  const system = useSession((state) => state.system);
  const commit = () => (onCommit === undefined ? commitField(path, system) : onCommit(path));
  const project = useDocument(effectiveProject);
  const typed = useDocument((state) => (state.draft?.path === path ? state.draft.text : null));
  const fault = useResults((state) => state.faults.find((entry) => entry.where === path));
  const id = useId();
  const said = wordsOf(project, path, system, fault);
  const quantity = quantityOf(path);
  return (
    <span className={`number-field ${className}`}>
      <input
        className={`field number ${said === null ? '' : 'unread'}`}
        style={{ width }}
        autoComplete="off"
        spellCheck={false}
        aria-label={label}
        aria-invalid={said !== null}
        aria-describedby={said === null ? undefined : id}
        disabled={disabled}
        value={typed ?? shownText(project, path, system)}
        onFocus={(event) => event.target.select()}
        onChange={(event) => typeField(path, event.target.value, system)}
        onBlur={(event) => {
          if (document.activeElement !== event.target) commit();
        }}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          else if (event.key === 'Escape' && typed !== null) giveUpField(path);
          else return;
          // Esc gives up the edit, and not the dialog around it.
          event.preventDefault();
          event.stopPropagation();
          event.currentTarget.select();
        }}
      />
      {unit && quantity !== null && <span className="unit">{unitOf(quantity, system)}</span>}
      {said !== null && (
        <span id={id} className={words ? 'field-words' : 'spoken'}>
          {said}
        </span>
      )}
    </span>
  );
}
