import type { Engine } from '../engine/protocol.ts';
import { putEngine } from './engineInUse.ts';
import { type Follower, follow } from './follow.ts';
import { samplesOf } from './samples.ts';

export { type Answers, type MotionRun, resultsStore, useResults } from './answers.ts';

let follower: Follower | null = null;

/** Follows the document and keeps the results store. Called once, by main.tsx. */
export function startResults(engine: Engine): void {
  follower?.end();
  follower = follow(engine, samplesOf);
  putEngine(engine);
}

/** F9: run although it is expected to be slow, or again after a stop. */
export function runNow(): void {
  follower?.runNow();
}

/** Stops the question under way: the last answers stay in sight as stale. */
export function stop(): void {
  follower?.stop();
}
