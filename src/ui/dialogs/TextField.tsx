import { effectiveProject, useDocument } from '../../state/document.ts';
import { useSession } from '../../state/session.ts';
import { commitField, giveUpField, shownText, typeField } from '../controls/field.ts';

export interface TextFieldProps {
  /** The field as a path of the project file: `limits.source`, `motions[1].name`. */
  readonly path: string;
  /** Accessible name. */
  readonly label: string;
  readonly className?: string;
  readonly placeholder?: string;
  readonly invalid?: boolean;
}

/** Words of the document in a field of their own: typed as a draft, one undo step when the field is left. */
export function TextField({ path, label, className = '', placeholder, invalid = false }: TextFieldProps) {
  const system = useSession((state) => state.system);
  const project = useDocument(effectiveProject);
  return (
    <input
      className={`field ${className} ${invalid ? 'unread' : ''}`}
      autoComplete="off"
      aria-label={label}
      aria-invalid={invalid}
      placeholder={placeholder}
      value={shownText(project, path, system)}
      onChange={(event) => typeField(path, event.target.value, system)}
      onBlur={() => commitField(path, system)}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commitField(path, system);
        else if (event.key === 'Escape') giveUpField(path);
        else return;
        event.stopPropagation();
        if (event.key === 'Escape') event.preventDefault();
      }}
    />
  );
}
