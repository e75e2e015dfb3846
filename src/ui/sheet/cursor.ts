import type { Histories } from '../../core/dynamics/run.ts';
import { resultsStore } from '../../state/results.ts';
import { sessionStore } from '../../state/session.ts';

/** The chosen motion's floors at the cursor [m], relative to the ground, from floor 1; null: the building is at rest. */
export type Pose = Float64Array | null;
export type PoseWriter = (pose: Pose) => void;

const writers = new Set<PoseWriter>();
let stopListening: (() => void) | null = null;
let scheduled = 0;
let pose: Float64Array = new Float64Array(0);

/** Floor displacements at a time, straight between the kept entries, into `out` (a new array where it does not fit). */
export function poseAt(histories: Histories, step: number, time: number, out: Float64Array): Float64Array {
  const { count, displacement } = histories;
  const floors = count > 0 ? displacement.length / count : 0;
  const into = out.length === floors ? out : new Float64Array(floors);
  const place = Math.min(count - 1, Math.max(0, time / (step * histories.every)));
  const before = Math.floor(place);
  const after = Math.min(count - 1, before + 1);
  const share = place - before;
  for (let floor = 0; floor < floors; floor++) {
    const from = displacement[floor * count + before] ?? 0;
    const to = displacement[floor * count + after] ?? 0;
    into[floor] = from + share * (to - from);
  }
  return into;
}

/** The pose now; the last histories stay in sight while newer ones are computed. */
function poseNow(): Pose {
  const histories = shown?.run.histories;
  if (shown === null || histories === null || histories === undefined) return null;
  pose = poseAt(histories, shown.run.step, sessionStore.getState().time, pose);
  return pose;
}

let shown = resultsStore.getState().chosen;

function schedule(): void {
  if (scheduled !== 0) return;
  scheduled = requestAnimationFrame(() => {
    scheduled = 0;
    const now = poseNow();
    for (const write of writers) write(now);
  });
}

function listen(): () => void {
  const stopTime = sessionStore.subscribe((state, before) => {
    if (state.time !== before.time) schedule();
  });
  const stopResults = resultsStore.subscribe((state) => {
    const next = state.chosen ?? (state.status === 'running' ? shown : null);
    if (next === shown) return;
    shown = next;
    schedule();
  });
  shown = resultsStore.getState().chosen;
  return () => {
    stopTime();
    stopResults();
  };
}

/** One frame loop for all that follows the cursor, outside of React: the writer is called at once and on every change. */
export function followCursor(write: PoseWriter): () => void {
  writers.add(write);
  stopListening ??= listen();
  write(poseNow());
  return () => {
    writers.delete(write);
    if (writers.size > 0) return;
    stopListening?.();
    stopListening = null;
  };
}
