import { sessionStore, setSession, setTime } from '../../state/session.ts';

/** Where motion is to be reduced the cursor moves so many times a second. */
const REDUCED_STEPS = 4;

/** A page that was out of sight goes on where it was: no frame counts for more [s]. */
const LONGEST_FRAME = 0.25;

/** The time after a stretch of real time, and what of that stretch was not used yet. */
export function advanced(
  time: number,
  elapsed: number,
  reduced: boolean,
): { readonly time: number; readonly left: number } {
  if (!reduced) return { time: time + elapsed, left: 0 };
  const steps = Math.floor(elapsed * REDUCED_STEPS);
  return { time: time + steps / REDUCED_STEPS, left: elapsed - steps / REDUCED_STEPS };
}

/**
 * The one frame loop: while the session plays, the cursor goes on in real time; at the end it stops.
 *
 * @param endOf  end of the time axis as it stands now [s]
 * @returns      how to end it
 */
export function startPlayLoop(endOf: () => number): () => void {
  const reduced = window.matchMedia('(prefers-reduced-motion: reduce)');
  let frame = 0;
  let last = 0;
  let left = 0;
  const tick = (now: number) => {
    frame = 0;
    const { playing, time } = sessionStore.getState();
    if (!playing) return;
    const elapsed = left + Math.min(LONGEST_FRAME, (now - last) / 1000);
    last = now;
    const next = advanced(time, elapsed, reduced.matches);
    left = next.left;
    const end = endOf();
    if (next.time >= end) {
      setTime(end);
      setSession({ playing: false });
      return;
    }
    setTime(next.time);
    frame = requestAnimationFrame(tick);
  };
  const begin = () => {
    last = performance.now();
    left = 0;
    frame ||= requestAnimationFrame(tick);
  };
  const stopListening = sessionStore.subscribe((now, before) => {
    if (now.playing && !before.playing) begin();
  });
  return () => {
    stopListening();
    cancelAnimationFrame(frame);
    setSession({ playing: false });
  };
}

/** Plays, from the start where the cursor stands at the end; or stops. */
export function togglePlay(end: number): void {
  const { playing, time } = sessionStore.getState();
  if (!playing && time >= end - 1e-9) setTime(0);
  setSession({ playing: !playing });
}
