/**
 * What is neither saved with the project nor undone: the cursor, the selection, the theme. CONTRACT (filled in by the
 * state room): `useSession(selector)`, `sessionStore`. System and theme are remembered in localStorage.
 */
export interface Selection {
  /** Storey index from the ground, and column key. */
  readonly storey: number;
  readonly column: string;
  /** Other corner of an extended block. */
  readonly anchorStorey: number;
  readonly anchorColumn: string;
}

export interface SessionState {
  readonly system: 'si' | 'us';
  readonly theme: 'system' | 'light' | 'dark';
  readonly selection: Selection | null;
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
  readonly dialog: 'none' | 'import' | 'tables' | 'keys' | 'analysis' | 'columns';
  /** A short word at the foot (an undo across steps, a file saved); null: none. */
  readonly toast: string | null;
}
