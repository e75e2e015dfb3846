import type { Run, RunCase, Want } from './dynamics/run.ts';
import type { Result } from './fault.ts';
import type { Frame } from './frame/frame.ts';
import type { Mode } from './frame/modes.ts';

/** Everything a run needs of the frame that does not depend on the motion: made once, used for each motion. */
export interface PreparedFrame {
  readonly frame: Frame;
  readonly modes: readonly Mode[];
  // (matrices and damping constants follow; see frame/)
}

/** Modes, matrices and damping of a frame, or why it cannot stand (unstable under gravity, damping not positive ...). */
export declare function prepareFrame(frame: Frame): Result<PreparedFrame>;

/** A run under way: call `advance` until it says true, then `finish`. Nothing is allocated in `advance`. */
export interface RunUnderWay {
  readonly steps: number;
  readonly done: number;
  /** Marches at most so many steps further; true when the run is over. */
  advance(steps: number): boolean;
  /** The result so far; status `cancelled` where it is not over. */
  finish(): Run;
}

export declare function startRun(prepared: PreparedFrame, runCase: RunCase, want: Want): RunUnderWay;
/** The whole run at once: the door for the batch command and the tests. Throws on a case that `caseOf` would refuse. */
export declare function runCase(runCase: RunCase, want: Want): Run;
/** 2 x the largest over the storeys of |Di(h) - Di(h/2)| over the largest drift of the run. */
export declare function stepErrorOf(run: Run, half: Run): number;
