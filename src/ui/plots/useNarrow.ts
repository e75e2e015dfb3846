import { useSyncExternalStore } from 'react';

/** The width under which the sheet takes its narrow form. */
const NARROW = '(max-width: 1199px)';

function subscribe(heard: () => void): () => void {
  const query = window.matchMedia(NARROW);
  query.addEventListener('change', heard);
  return () => query.removeEventListener('change', heard);
}

export function useNarrow(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(NARROW).matches);
}
