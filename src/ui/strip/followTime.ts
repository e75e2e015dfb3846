import { sessionStore } from '../../state/session.ts';

export type TimeWriter = (time: number) => void;

const writers = new Set<TimeWriter>();
let scheduled = 0;
let stopListening: (() => void) | null = null;

function schedule(): void {
  if (scheduled !== 0) return;
  scheduled = requestAnimationFrame(() => {
    scheduled = 0;
    const { time } = sessionStore.getState();
    for (const write of writers) write(time);
  });
}

/** For all that follows the cursor outside of React: the writer is called at once and then once a frame while the time moves. */
export function followTime(write: TimeWriter): () => void {
  writers.add(write);
  stopListening ??= sessionStore.subscribe((now, before) => {
    if (now.time !== before.time) schedule();
  });
  write(sessionStore.getState().time);
  return () => {
    writers.delete(write);
    if (writers.size > 0) return;
    stopListening?.();
    stopListening = null;
  };
}
