import { type HistoryBuffers, historiesUpTo, historyBuffers, keepHistory } from './history.ts';
import type { Problem } from './problem.ts';
import { FIELD, STATE, SUM } from './record.ts';
import { residualsOf } from './residual.ts';
import type { Ending, MethodChoice, Run, Want } from './run.ts';
import { stepTo } from './stepping.ts';
import { type Workspace, workspace } from './workspace.ts';

/** FIELD.A march under way: call `advance` until it says true, then `finish`. Nothing is allocated in `advance`. */
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
  const { steps, residualFrom, ground } = problem;
  const { n } = problem.prepared.arrays;
  const work = workspace(problem);
  const { records, matrix, scheme, sums } = work;
  const histories = want.histories ? historyBuffers(problem) : null;
  if (histories) keepHistory(histories, problem, work, 0);
  let done = 0;
  const over = () => done >= steps || sums[SUM.STOPPED] !== STATE.GOING;
  return {
    steps,
    get done() {
      return done;
    },
    advance(count) {
      const end = Math.min(steps, done + count);
      // Histories are kept between steps; without them nothing is looked at, and the steps run in one go.
      while (!over() && done < end) {
        const to = histories ? done + 1 : end;
        done = stepTo(records, matrix, n, ground, scheme, sums, residualFrom, done, to);
        if (histories) keepHistory(histories, problem, work, done);
      }
      return over();
    },
    finish: () => runOf(problem, choice, work, histories, done, endingOf(problem, work, done, over())),
  };
}

function endingOf(
  { step, prepared, stopDrift }: Problem,
  { records, sums }: Workspace,
  done: number,
  over: boolean,
): Ending | null {
  const time = done * step;
  if (sums[SUM.STOPPED] === STATE.COLLAPSED) {
    let [storey, worst] = [-1, 0];
    for (let i = 0; i < prepared.arrays.n; i++) {
      const share = records[i * FIELD.STRIDE + FIELD.PEAK_DRIFT] / stopDrift[i];
      if (records[i * FIELD.STRIDE + FIELD.PEAK_STEP] === done && share > worst) [storey, worst] = [i, share];
    }
    return { status: 'collapsed', storey, time };
  }
  if (sums[SUM.STOPPED] === STATE.DIVERGED) return { status: 'diverged', storey: -1, time };
  return over ? null : { status: 'cancelled', storey: -1, time };
}

function runOf(
  problem: Problem,
  method: MethodChoice,
  { records, sums }: Workspace,
  histories: HistoryBuffers | null,
  done: number,
  ending: Ending | null,
): Run {
  const { step, steps, prepared, residualFrom } = problem;
  const { n, stiffness, height } = prepared.arrays;
  const column = (field: number) => Float64Array.from({ length: n }, (_, i) => records[i * FIELD.STRIDE + field]);
  const peakDrift = column(FIELD.PEAK_DRIFT);
  return {
    method,
    step,
    steps,
    ending,
    storeys: {
      peakDrift,
      peakDriftRatio: peakDrift.map((d, i) => d / height[i]),
      peakTime: column(FIELD.PEAK_STEP).map((at) => at * step),
      ...residualsOf(records, n, done - residualFrom),
      // An elastic storey without a damper: shear follows drift, so its peak is k times the peak drift.
      peakShear: peakDrift.map((d, i) => stiffness[i] * d),
      peakOverturning: column(FIELD.PEAK_OVERTURNING),
      dissipated: new Float64Array(n),
      ductility: new Float64Array(n).fill(Number.NaN),
      firstYield: new Float64Array(n).fill(Number.NaN),
      damperWork: new Float64Array(n),
    },
    floors: {
      peakDisplacement: column(FIELD.PEAK_U),
      peakVelocity: column(FIELD.PEAK_V),
      peakAcceleration: column(FIELD.PEAK_TOTAL),
    },
    base: { peakDampingForce: Number.NaN },
    energy: {
      input: sums[SUM.INPUT] / 2,
      kinetic: sums[SUM.KINETIC] / 2,
      strain: sums[SUM.STRAIN] / 2,
      damping: sums[SUM.DAMPING] / 2,
      dampers: 0,
      hysteretic: 0,
      imbalance: sums[SUM.LARGEST_INPUT] > 0 ? sums[SUM.LARGEST_GAP] / sums[SUM.LARGEST_INPUT] : 0,
    },
    marching: { solves: done, mostSolves: Math.min(1, done), halvings: 0 },
    histories: histories ? historiesUpTo(histories, n, done) : null,
  };
}
