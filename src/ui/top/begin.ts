import { demoProject } from '../../document/demo.ts';
import { emptyProject } from '../../document/empty.ts';
import { replace } from '../../state/document.ts';
import { putSamples } from '../../state/samples.ts';
import { setSession } from '../../state/session.ts';

/** The example clinic takes the document's place, as one undo step. */
export function openExample(): void {
  const { project, samples } = demoProject();
  for (const [digest, values] of samples) putSamples(digest, values);
  replace('example clinic opened', project);
}

/** An empty sheet takes the document's place, as one undo step. */
export function openEmpty(): void {
  replace('empty sheet opened', emptyProject());
  setSession({
    screen: 'sheet',
    selection: null,
    storey: null,
    motion: null,
    toast: 'An empty sheet; undo brings the other project back',
  });
}
