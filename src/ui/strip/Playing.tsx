import { useEffect, useLayoutEffect, useRef } from 'react';
import { printQuantity } from '../../core/units/quantities.ts';
import { sessionStore, setSession, useSession } from '../../state/session.ts';
import { Icon } from '../controls/Icon.tsx';
import { followTime } from './followTime.ts';
import { startPlayLoop, togglePlay } from './play.ts';
import { following, shownRange } from './timeRange.ts';

export interface PlayingProps {
  /** End of the time axis [s]. */
  readonly end: number;
}

/** Play, and the time of the cursor. The frame loop runs while this stands. */
export function Playing({ end }: PlayingProps) {
  const playing = useSession((state) => state.playing);
  const words = useRef<HTMLElement>(null);
  const last = useRef(end);
  last.current = end;
  useEffect(() => startPlayLoop(() => last.current), []);
  useLayoutEffect(
    () =>
      followTime((time) => {
        if (words.current !== null) words.current.textContent = `${printQuantity(Math.min(time, end), 'time', 'si')} s`;
        const { range, playing } = sessionStore.getState();
        if (!playing || range === null) return;
        const shown = shownRange(range, end);
        const next = following(shown, time, end);
        if (next !== shown) setSession({ range: next });
      }),
    [end],
  );
  return (
    <div className="playing">
      <button
        type="button"
        className="play"
        aria-label={playing ? 'Pause' : 'Play'}
        aria-keyshortcuts="Space"
        onClick={() => togglePlay(end)}
      >
        <Icon name={playing ? 'pause' : 'play'} size={14} />
      </button>
      <b ref={words} className="cursor-time" />
      <span className="unit">of {printQuantity(end, 'time', 'si')}</span>
    </div>
  );
}
