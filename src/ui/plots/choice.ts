import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import type { TimePanelKind } from '../strip/panelContent.ts';

/** What a square panel can show. */
export type SquareKind = 'force' | 'modes' | 'profile';

export const SQUARES: readonly { readonly kind: SquareKind; readonly name: string }[] = [
  { kind: 'force', name: 'Force and drift' },
  { kind: 'modes', name: 'Mode shapes' },
  { kind: 'profile', name: 'Drift profile' },
];

interface Choice {
  /** From the top of the time stack down. */
  readonly time: readonly TimePanelKind[];
  readonly square: readonly SquareKind[];
}

/** What each panel shows: kept while the page is open, so that another screen and back changes nothing. */
const choiceStore = createStore<Choice>(() => ({
  time: ['drift', 'base-shear', 'energy'],
  square: ['force', 'modes'],
}));

export function usePanelChoice<T>(selector: (choice: Choice) => T): T {
  return useStore(choiceStore, selector);
}

export function chooseTimePanel(slot: number, kind: TimePanelKind): void {
  choiceStore.setState(({ time }) => ({ time: time.map((own, i) => (i === slot ? kind : own)) }));
}

export function chooseSquare(slot: number, kind: SquareKind): void {
  choiceStore.setState(({ square }) => ({ square: square.map((own, i) => (i === slot ? kind : own)) }));
}
