import type { Histories, Run } from '../../core/dynamics/run.ts';
import { resultsStore } from '../../state/results.ts';
import { chosenMotion } from '../../state/selectors.ts';
import { sessionStore } from '../../state/session.ts';

/** The chosen motion's floors at the cursor [m], relative to the ground, from floor 1; null: the building is at rest. */
export type Pose = Float64Array | null;
/** Of each storey at the cursor, ground up: it has not yielded, it has, it is past yield. */
export const MARK = { none: 0, yielded: 1, yielding: 2 } as const;
export type PoseWriter = (pose: Pose, marks: Uint8Array) => void;

const writers = new Set<PoseWriter>();
let stopListening: (() => void) | null = null;
let scheduled = 0;
let pose: Float64Array = new Float64Array(0);
let marks: Uint8Array = new Uint8Array(0);

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

/**
 * What is known of each storey's yielding at a time, into `out` (a new array where it does not fit). Without histories a storey is
 * marked that yields at any time of the run.
 */
export function marksAt(run: Run, time: number, out: Uint8Array): Uint8Array {
  const { firstYield } = run.storeys;
  const storeys = firstYield.length;
  const into = out.length === storeys ? out : new Uint8Array(storeys);
  const { histories } = run;
  const yielding = histories?.nonlinear?.yielding;
  const count = histories?.count ?? 0;
  const entry = histories === null ? 0 : Math.round(time / (run.step * histories.every));
  const at = Math.min(count - 1, Math.max(0, entry));
  for (let storey = 0; storey < storeys; storey++) {
    const since = firstYield[storey] ?? Number.NaN;
    if (Number.isNaN(since)) into[storey] = MARK.none;
    else if (histories === null) into[storey] = MARK.yielded;
    else if (yielding?.[storey * count + at] === 1) into[storey] = MARK.yielding;
    else into[storey] = since <= time ? MARK.yielded : MARK.none;
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

/** Marks of the motion whose histories are shown, else of the chosen one. */
function marksNow(): Uint8Array {
  const name = shown === null ? chosenMotion() : null;
  const run = shown?.run ?? resultsStore.getState().answers?.runs.find(({ motion }) => motion === name)?.run;
  marks = run === undefined ? marks.fill(MARK.none) : marksAt(run, sessionStore.getState().time, marks);
  return marks;
}

let shown = resultsStore.getState().chosen;

function schedule(): void {
  if (scheduled !== 0) return;
  scheduled = requestAnimationFrame(() => {
    scheduled = 0;
    const now = poseNow();
    const yielded = marksNow();
    for (const write of writers) write(now, yielded);
  });
}

function listen(): () => void {
  const stopTime = sessionStore.subscribe((state, before) => {
    if (state.time !== before.time) schedule();
  });
  const stopResults = resultsStore.subscribe((state, before) => {
    const next = state.chosen ?? (state.status === 'running' ? shown : null);
    if (next === shown && (next !== null || state.answers === before.answers)) return;
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
  write(poseNow(), marksNow());
  return () => {
    writers.delete(write);
    if (writers.size > 0) return;
    stopListening?.();
    stopListening = null;
  };
}
