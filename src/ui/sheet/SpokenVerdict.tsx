import { useRef } from 'react';
import { verdictOf } from '../../core/checks/verdict.ts';
import { useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';

/** The verdict for screen readers: said once a finished edit and its run, not once a keystroke. */
export function SpokenVerdict() {
  const editing = useDocument((state) => state.draft !== null);
  const status = useResults((state) => state.status);
  const answers = useResults((state) => state.answers);
  const said = useRef('');
  if (!editing && status === 'current' && answers !== null && answers.runs.length > 0) {
    const { headline, detail } = verdictOf(answers.envelope, answers.runs);
    said.current = `${headline}; ${detail}`;
  }
  if (!editing && status === 'stale') said.current = 'The answers are out of date';
  return (
    <span className="spoken" aria-live="polite">
      {said.current}
    </span>
  );
}
