import type { Engine } from '../engine/protocol.ts';
import { type Follower, follow } from './follow.ts';
import { samplesOf } from './samples.ts';
import { startBench } from './schemeBench.ts';

export { type Answers, type MotionRun, resultsStore, useResults } from './answers.ts';

let follower: Follower | null = null;

/** Follows the document and keeps the results store; the bench of schemes works with the same engine. Called once, by main.tsx. */
export function startResults(engine: Engine): void {
  follower?.end();
  follower = follow(engine, samplesOf);
  startBench(engine, samplesOf);
}

/** F9: run although it is expected to be slow, or again after a stop. */
export function runNow(): void {
  follower?.runNow();
}

/** Stops the question under way: the last answers stay in sight as stale. */
export function stop(): void {
  follower?.stop();
}
