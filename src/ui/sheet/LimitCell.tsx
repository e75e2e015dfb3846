import { useId } from 'react';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { useSession } from '../../state/session.ts';
import { commitField, giveUpField, shownText, typeField, wordsOf } from '../controls/field.ts';

const PATH = 'limits.drift';

/** The allowable drift as a typed cell on the axis; its line runs from here to the ground. */
export function LimitCell({ x, beside }: { readonly x: number; readonly beside: boolean }) {
  const system = useSession((state) => state.system);
  const project = useDocument(effectiveProject);
  const typed = useDocument((state) => (state.draft?.path === PATH ? state.draft.text : null));
  const fault = useResults((state) => state.faults.find((entry) => entry.where === PATH));
  const wrong = wordsOf(project, PATH, system, fault);
  const id = useId();
  return (
    <div className={`limit-cell ${beside ? 'beside' : ''}`} style={{ left: x }}>
      <label htmlFor={id}>limit</label>
      <input
        id={id}
        className={wrong === null ? '' : 'unread'}
        autoComplete="off"
        spellCheck={false}
        aria-label="Limit of the storey drift ratio, percent"
        aria-invalid={wrong !== null}
        title={wrong ?? undefined}
        value={typed ?? shownText(project, PATH, system)}
        onFocus={(event) => event.target.select()}
        onChange={(event) => typeField(PATH, event.target.value, system)}
        onBlur={(event) => {
          if (document.activeElement !== event.target) commitField(PATH, system);
        }}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commitField(PATH, system);
          else if (event.key === 'Escape' && typed !== null) giveUpField(PATH);
          else return;
          event.stopPropagation();
          event.currentTarget.select();
        }}
      />
    </div>
  );
}
