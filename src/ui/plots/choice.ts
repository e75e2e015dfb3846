import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import type { TimePanelKind } from '../strip/panelContent.ts';

/** What a square panel can show. */
export type SquareKind = 'force' | 'modes' | 'damping' | 'profile' | 'ductility' | 'residual' | 'storey-energy';

export const SQUARES: readonly { readonly kind: SquareKind; readonly name: string }[] = [
  { kind: 'force', name: 'Force and drift' },
  { kind: 'modes', name: 'Mode shapes' },
  { kind: 'damping', name: 'Damping by period' },
  { kind: 'profile', name: 'Drift profile' },
  { kind: 'ductility', name: 'Ductility profile' },
  { kind: 'residual', name: 'Residual drift profile' },
  { kind: 'storey-energy', name: 'Energy by storey' },
];

/** Which force of a storey its loop shows: that of its law, both together, that of its damper. */
export type LoopForce = 'law' | 'shear' | 'damper';

interface Choice {
  /** From the top of the time stack down. */
  readonly time: readonly TimePanelKind[];
  readonly square: readonly SquareKind[];
  readonly force: LoopForce;
  /** The first loading of the law is drawn behind the loop. */
  readonly backbone: boolean;
}

/** What each panel shows: kept while the page is open, so that another screen and back changes nothing. */
const choiceStore = createStore<Choice>(() => ({
  time: ['drift', 'base-shear', 'energy'],
  square: ['force', 'modes'],
  force: 'law',
  backbone: false,
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

export function chooseForce(force: LoopForce): void {
  choiceStore.setState({ force });
}

export function showBackbone(backbone: boolean): void {
  choiceStore.setState({ backbone });
}
