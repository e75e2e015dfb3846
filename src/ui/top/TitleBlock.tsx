import { useState } from 'react';
import { edit, useDocument } from '../../state/document.ts';

/** The title of the work, edited in place, and whether the browser has kept it. */
export function TitleBlock() {
  const title = useDocument((state) => state.project.title);
  const savedAt = useDocument((state) => state.savedAt);
  const fault = useDocument((state) => state.saveFault);
  const [typed, setTyped] = useState<string | null>(null);
  const commit = () => {
    if (typed !== null && typed !== title) edit('title changed', (project) => ({ ...project, title: typed }));
    setTyped(null);
  };
  return (
    <div className="title-block">
      <input
        aria-label="Title"
        placeholder="Untitled frame"
        value={typed ?? title}
        spellCheck={false}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Escape') setTyped(null);
          if (event.key === 'Enter') commit();
        }}
      />
      <small className={fault === null ? '' : 'alarm'} title={fault ?? undefined}>
        {fault !== null
          ? `not kept: ${fault}`
          : savedAt === null
            ? 'not kept yet'
            : `kept in this browser ${clock(savedAt)}`}
      </small>
    </div>
  );
}

/** Hours and minutes of a time [ms since 1970]. */
function clock(at: number): string {
  const time = new Date(at);
  return `${String(time.getHours()).padStart(2, '0')}:${String(time.getMinutes()).padStart(2, '0')}`;
}
