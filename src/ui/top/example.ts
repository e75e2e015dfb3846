import { demoProject } from '../../document/demo.ts';
import { replace } from '../../state/document.ts';
import { putSamples } from '../../state/samples.ts';

/** The example clinic takes the document's place, as one undo step. */
export function openExample(): void {
  const { project, samples } = demoProject();
  for (const [digest, values] of samples) putSamples(digest, values);
  replace('example clinic opened', project);
}
