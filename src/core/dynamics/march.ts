import type { Storey } from '../frame/frame.ts';
import { type HistoryBuffers, historiesUpTo, historyBuffers, keepHistory } from './history.ts';
import type { Problem } from './problem.ts';
import { FIELD, STATE, SUM } from './record.ts';
import { residualsOf } from './residual.ts';
import type { Ending, MethodChoice, Run, Want } from './run.ts';
import { storeyEnergies } from './storeyEnergies.ts';
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
  const { steps } = problem;
  const work = workspace(problem);
  const { sums } = work;
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
        const from = done;
        done = work.advance(done, to);
        if (histories && done > from) keepHistory(histories, problem, work, done);
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
  if (sums[SUM.STOPPED] === STATE.NOT_CONVERGED) return { status: 'not-converged', storey: sums[SUM.CULPRIT], time };
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
  const { step, steps, prepared, residualFrom, linear } = problem;
  const { n, stiffness, height } = prepared.arrays;
  const column = (field: number) => Float64Array.from({ length: n }, (_, i) => records[i * FIELD.STRIDE + field]);
  const peakDrift = column(FIELD.PEAK_DRIFT);
  const energy = storeyEnergies(records, n);
  return {
    method,
    step,
    steps,
    ending,
    storeys: {
      peakDrift,
      peakDriftRatio: peakDrift.map((d, i) => d / height[i]),
      peakTime: column(FIELD.PEAK_STEP).map((at) => at * step),
      ...residualsOf(records, n, linear ? done - residualFrom : sums[SUM.SETTLED]),
      // Of an elastic storey without a damper, shear follows drift: its peak is k times the peak drift.
      peakShear: linear ? peakDrift.map((d, i) => stiffness[i] * d) : column(FIELD.PEAK_SHEAR),
      peakOverturning: column(FIELD.PEAK_OVERTURNING),
      dissipated: energy.dissipated,
      ductility: peakDrift.map((d, i) => ductilityOf(prepared.frame.storeys[i], d)),
      firstYield: column(FIELD.YIELD_STEP).map((at) => (at > 0 ? at * step : Number.NaN)),
      damperWork: column(FIELD.DAMPER_WORK),
    },
    base: { peakDampingForce: linear ? Number.NaN : sums[SUM.DAMPING_SHEAR] },
    floors: {
      peakDisplacement: column(FIELD.PEAK_U),
      peakVelocity: column(FIELD.PEAK_V),
      peakAcceleration: column(FIELD.PEAK_TOTAL),
    },
    energy: {
      input: sums[SUM.INPUT] / 2,
      kinetic: sums[SUM.KINETIC] / 2,
      strain: linear ? sums[SUM.STRAIN] / 2 : energy.strain,
      damping: sums[SUM.DAMPING] / 2,
      dampers: energy.dampers,
      hysteretic: energy.hysteretic,
      imbalance: sums[SUM.LARGEST_INPUT] > 0 ? sums[SUM.LARGEST_GAP] / sums[SUM.LARGEST_INPUT] : 0,
    },
    marching: linear
      ? { solves: done, mostSolves: Math.min(1, done), halvings: 0 }
      : { solves: sums[SUM.SOLVES], mostSolves: sums[SUM.MOST_SOLVES], halvings: sums[SUM.HALVINGS] },
    histories: histories ? historiesUpTo(histories, n, done) : null,
  };
}

/** Peak drift over yield drift; NaN for an elastic storey. */
function ductilityOf({ law, stiffness }: Storey, drift: number): number {
  return law.kind === 'elastic' ? Number.NaN : (drift * stiffness) / law.strength;
}
