import { marchBanded } from './banded.ts';
import { marchFull } from './full.ts';
import { type HistoryBuffers, historyBuffers, keepHistory } from './history.ts';
import type { Problem } from './problem.ts';
import { emptyResiduals, keepResiduals, type Residuals, residualsOf } from './residual.ts';
import type { Ending, MethodChoice, Run, Want } from './run.ts';
import { SUM, type Workspace, workspace } from './workspace.ts';

/** A march under way: call `advance` until it says true, then `finish`. Nothing is allocated in `advance`. */
export interface March {
  readonly steps: number;
  readonly done: number;
  /** Marches at most so many steps further; true when the run is over. */
  advance(steps: number): boolean;
  /** The result so far, in buffers of its own; `cancelled` where it is not over. */
  finish(): Run;
}

/** The one stepping loop: check, allocate, loop, return. */
export function march(problem: Problem, choice: MethodChoice, want: Want): Run {
  const underWay = startMarch(problem, choice, want);
  underWay.advance(Number.POSITIVE_INFINITY);
  return underWay.finish();
}

/** As `march`, in slices of the caller's choosing: the same bits. */
export function startMarch(problem: Problem, choice: MethodChoice, want: Want): March {
  const { steps, residualFrom } = problem;
  const work = workspace(problem);
  const residuals = emptyResiduals(problem.prepared.arrays.n);
  const histories = want.histories ? historyBuffers(problem) : null;
  if (histories) keepHistory(histories, problem, work, 0);
  let done = 0;
  let over = steps === 0;
  const bulkEnd = histories ? 0 : Math.min(steps, residualFrom);
  return {
    steps,
    get done() {
      return done;
    },
    advance(count) {
      const end = Math.min(steps, done + count);
      if (!over && done < Math.min(end, bulkEnd)) done = stepTo(problem, work, done, Math.min(end, bulkEnd));
      while (!over && work.sums[SUM.stopped] === 0 && done < end) {
        done = stepTo(problem, work, done, done + 1);
        if (histories) keepHistory(histories, problem, work, done);
        if (done > residualFrom) keepResiduals(residuals, work.u);
      }
      over = done >= steps || work.sums[SUM.stopped] !== 0;
      return over;
    },
    finish: () => runOf(problem, choice, work, residuals, histories, done, endingOf(problem, work, done, over)),
  };
}

function stepTo(problem: Problem, work: Workspace, from: number, to: number): number {
  const { system } = work;
  return system.kind === 'banded'
    ? marchBanded(problem, work, system, from, to)
    : marchFull(problem, work, system, from, to);
}

function endingOf({ step, stopDrift, prepared }: Problem, work: Workspace, done: number, over: boolean): Ending | null {
  const time = done * step;
  if (work.sums[SUM.stopped] === 1) {
    const { drift, driftAt } = work.peaks;
    let storey = -1;
    let worst = 0;
    for (let i = 0; i < prepared.arrays.n; i++) {
      const share = drift[i] / stopDrift[i];
      if (driftAt[i] === done && share > worst) [storey, worst] = [i, share];
    }
    return { status: 'collapsed', storey, time };
  }
  if (work.sums[SUM.stopped] === 2) return { status: 'diverged', storey: -1, time };
  return over ? null : { status: 'cancelled', storey: -1, time };
}

function runOf(
  problem: Problem,
  method: MethodChoice,
  { peaks, sums }: Workspace,
  residuals: Residuals,
  histories: HistoryBuffers | null,
  done: number,
  ending: Ending | null,
): Run {
  const { step, steps, prepared } = problem;
  const { n, stiffness, height } = prepared.arrays;
  const copy = (x: Float64Array) => Float64Array.from(x);
  return {
    method,
    step,
    steps,
    ending,
    storeys: {
      peakDrift: copy(peaks.drift),
      peakDriftRatio: peaks.drift.map((d, i) => d / height[i]),
      peakTime: peaks.driftAt.map((at) => at * step),
      ...residualsOf(residuals),
      // An elastic storey without a damper: shear follows drift, so its peak is k times the peak drift.
      peakShear: peaks.drift.map((d, i) => stiffness[i] * d),
      peakOverturning: copy(peaks.overturning),
      dissipated: new Float64Array(n),
    },
    floors: {
      peakDisplacement: copy(peaks.displacement),
      peakVelocity: copy(peaks.velocity),
      peakAcceleration: copy(peaks.acceleration),
    },
    energy: {
      input: sums[SUM.input] / 2,
      kinetic: sums[SUM.kinetic] / 2,
      strain: sums[SUM.strain] / 2,
      damping: sums[SUM.damping] / 2,
      dampers: 0,
      hysteretic: 0,
      imbalance: sums[SUM.largestInput] > 0 ? sums[SUM.largestGap] / sums[SUM.largestInput] : 0,
    },
    histories: histories ? histories.upTo(done) : null,
  };
}
