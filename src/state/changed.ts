import { fieldOf } from '../document/fields.ts';
import { documentStore } from './document.ts';

/** What changed last, in words: "Storey 2, stiffness is now 470", or the newest step. */
export function changedSince(): string | null {
  const { project, draft, undoes, redoes } = documentStore.getState();
  if (draft) return `${fieldOf(draft.path).label(project)} is now ${draft.text === '' ? 'empty' : draft.text}`;
  return undoes ?? redoes;
}
