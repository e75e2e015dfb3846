import { resultsStore, useResults } from './answers.ts';
import { chosenMotionOf, chosenStoreyOf } from './chosen.ts';
import { documentStore, useDocument } from './document.ts';
import { sessionStore, useSession } from './session.ts';

/** Storey whose histories are shown, from 0; -1 with no storey. */
export function chosenStorey(): number {
  return chosenStoreyOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
}

/** Name of the chosen motion; null with none in use. */
export function chosenMotion(): string | null {
  return chosenMotionOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
}

export function useChosenStorey(): number {
  const project = useDocument((s) => s.project);
  const storey = useSession((s) => s.storey);
  const answers = useResults((s) => s.answers);
  return chosenStoreyOf({ project }, { storey }, { answers });
}

export function useChosenMotion(): string | null {
  const project = useDocument((s) => s.project);
  const motion = useSession((s) => s.motion);
  const answers = useResults((s) => s.answers);
  return chosenMotionOf({ project }, { motion }, { answers });
}
