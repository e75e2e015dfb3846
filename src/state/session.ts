import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';

export interface Selection {
  /** Storey index from the ground, and column key. */
  readonly storey: number;
  readonly column: string;
  /** Other corner of an extended block. */
  readonly anchorStorey: number;
  readonly anchorColumn: string;
}

/** The sections of the analysis dialog, by their titles. */
export type AnalysisPart = 'Method' | 'Step' | 'Damping' | 'P-Delta' | 'Limit';

/** What is neither saved with the project nor undone. System and theme are remembered in localStorage. */
export interface SessionState {
  readonly system: 'si' | 'us';
  readonly theme: 'system' | 'light' | 'dark';
  /** Frame and Response are the two ends of `sheet`. */
  readonly screen: 'sheet' | 'motions';
  readonly selection: Selection | null;
  /** How many projects were opened or begun in this session: with each, all that was computed before is of another building. */
  readonly opened: number;
  /** Storey whose histories are shown; null: the governing one. */
  readonly storey: number | null;
  /** Name of the chosen motion; null: the governing one of the governing storey, else the first. */
  readonly motion: string | null;
  /** Cursor on the time axis [s]: written up to once a frame; do not select it in a component, subscribe to it. */
  readonly time: number;
  readonly playing: boolean;
  /** Time range of the time panels [s]; null: all of it. */
  readonly range: readonly [number, number] | null;
  /** Motion lit everywhere by hovering; null: none. */
  readonly lit: string | null;
  readonly dialog: 'none' | 'import' | 'tables' | 'keys' | 'analysis' | 'columns' | 'evidence' | 'bench';
  /** Section of the analysis dialog that it opens at; null: its top. The dialog takes it when it opens. */
  readonly analysisPart: AnalysisPart | null;
  /** A short word at the foot (an undo across steps, a file saved); null: none. */
  readonly toast: string | null;
}

const REMEMBERED = 'swaybook.session';

export const sessionStore = createStore<SessionState>(() => ({
  system: 'si',
  theme: 'system',
  screen: 'sheet',
  selection: null,
  opened: 0,
  storey: null,
  motion: null,
  time: 0,
  playing: false,
  range: null,
  lit: null,
  dialog: 'none',
  analysisPart: null,
  toast: null,
  ...remembered(),
}));

export function useSession<T>(selector: (state: SessionState) => T): T {
  return useStore(sessionStore, selector);
}

export function setSession(change: Partial<SessionState>): void {
  sessionStore.setState(change);
  if (change.system !== undefined || change.theme !== undefined) remember();
}

/** Moves the cursor of the time axis [s]; up to once a frame. */
export function setTime(time: number): void {
  if (time !== sessionStore.getState().time) sessionStore.setState({ time });
}

function remember(): void {
  const { system, theme } = sessionStore.getState();
  try {
    localStorage.setItem(REMEMBERED, JSON.stringify({ system, theme }));
  } catch {
    // A browser that keeps nothing still works: the choice lasts as long as the page.
  }
}

function remembered(): Partial<SessionState> {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(REMEMBERED) ?? 'null');
    if (typeof kept !== 'object' || kept === null) return {};
    const { system, theme } = kept as Record<string, unknown>;
    return {
      ...(system === 'si' || system === 'us' ? { system } : {}),
      ...(theme === 'system' || theme === 'light' || theme === 'dark' ? { theme } : {}),
    };
  } catch {
    return {};
  }
}
