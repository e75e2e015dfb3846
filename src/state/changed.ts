import { documentStore } from './document.ts';

/** What changed last, in words: the field that is being edited, or the newest step. */
export function changedSince(): string | null {
  const { draft, undoes, redoes } = documentStore.getState();
  if (draft) return `${draft.path} is now ${draft.text === '' ? 'empty' : draft.text}`;
  return undoes ?? redoes;
}
