import { sessionStore, setSession, setTime } from '../../state/session.ts';
import { togglePlay } from './play.ts';
import { shownRange, zoomed } from './timeRange.ts';

/** What the keys of the strip need to know of the run that is shown. */
export interface TimeKeysContext {
  /** End of the time axis [s]. */
  readonly end: number;
  /** One step [s]. */
  readonly step: number;
  /** When the drift of the chosen storey peaks [s]; null where it is not known. */
  readonly peak: number | null;
}

/** Keys of the time cursor; true where the key was one of them. */
export function timeKey(
  key: { readonly key: string; readonly shiftKey: boolean },
  { end, step, peak }: TimeKeysContext,
): boolean {
  const { time, range } = sessionStore.getState();
  const go = (to: number) => {
    setSession({ playing: false });
    setTime(Math.min(end, Math.max(0, to)));
  };
  // Steps are counted from the start, so that the cursor lands on what was computed.
  const at = Math.round(time / step);
  const steps = key.shiftKey ? 10 : 1;
  switch (key.key) {
    case ' ':
      togglePlay(end);
      return true;
    case 'ArrowLeft':
    case 'ArrowDown':
      go((at - steps) * step);
      return true;
    case 'ArrowRight':
    case 'ArrowUp':
      go((at + steps) * step);
      return true;
    case 'Home':
      go(0);
      return true;
    case 'End':
      go(end);
      return true;
    case 'p':
    case 'P':
      if (peak !== null) go(peak);
      return true;
    case '+':
    case '=':
      setSession({ range: zoomed(shownRange(range, end), time, 0.5, end) });
      return true;
    case '-':
      setSession({ range: zoomed(shownRange(range, end), time, 2, end) });
      return true;
    case '0':
      setSession({ range: null });
      return true;
    default:
      return false;
  }
}
