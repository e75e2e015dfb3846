import type { Problem } from './problem.ts';
import type { Histories } from './run.ts';
import { FIELD, SUM } from './stepping.ts';
import type { Workspace } from './workspace.ts';

/** Histories of one run may take so many bytes; beyond it only each k-th step is kept, and k is said. */
const HISTORY_LIMIT = 64 * 1024 * 1024;

export interface HistoryBuffers {
  readonly histories: Histories;
  /** The histories as far as step `done`, in arrays of their own where the run ended early. */
  upTo(done: number): Histories;
}

export function historyBuffers({ prepared, steps }: Problem): HistoryBuffers {
  const { n } = prepared.arrays;
  const rows = 3 * n + 7;
  const every = Math.max(1, Math.ceil((rows * 8 * (steps + 1)) / HISTORY_LIMIT));
  const count = Math.floor(steps / every) + 1;
  const one = () => new Float64Array(count);
  const all = () => new Float64Array(count * n);
  const histories: Histories = {
    every,
    count,
    ground: one(),
    displacement: all(),
    shear: all(),
    acceleration: all(),
    energy: { input: one(), kinetic: one(), strain: one(), damping: one(), dampers: one(), hysteretic: one() },
  };
  return {
    histories,
    upTo: (done) => (Math.floor(done / every) + 1 < count ? cut(histories, Math.floor(done / every) + 1) : histories),
  };
}

/** Writes step j, where it is one that is kept. */
export function keepHistory({ histories }: HistoryBuffers, problem: Problem, work: Workspace, j: number): void {
  const { every, count, ground, displacement, shear, acceleration, energy } = histories;
  if (j % every !== 0) return;
  const at = j / every;
  const { stiffness } = problem.prepared.arrays;
  const { records, sums } = work;
  ground[at] = problem.ground[j];
  let below = 0;
  for (let i = 0, from = 0, place = at; i < stiffness.length; i++, from += FIELD.STRIDE, place += count) {
    const u = records[from + FIELD.U];
    displacement[place] = u;
    shear[place] = stiffness[i] * (u - below);
    acceleration[place] = records[from + FIELD.TOTAL];
    below = u;
  }
  energy.input[at] = sums[SUM.INPUT] / 2;
  energy.kinetic[at] = sums[SUM.KINETIC] / 2;
  energy.strain[at] = sums[SUM.STRAIN] / 2;
  energy.damping[at] = sums[SUM.DAMPING] / 2;
}

/** The first `kept` instants of each row. */
function cut(h: Histories, kept: number): Histories {
  const rows = (x: Float64Array) => {
    const n = x.length / h.count;
    const out = new Float64Array(n * kept);
    for (let i = 0; i < n; i++) out.set(x.subarray(i * h.count, i * h.count + kept), i * kept);
    return out;
  };
  const { energy } = h;
  return {
    every: h.every,
    count: kept,
    ground: rows(h.ground),
    displacement: rows(h.displacement),
    shear: rows(h.shear),
    acceleration: rows(h.acceleration),
    energy: {
      input: rows(energy.input),
      kinetic: rows(energy.kinetic),
      strain: rows(energy.strain),
      damping: rows(energy.damping),
      dampers: rows(energy.dampers),
      hysteretic: rows(energy.hysteretic),
    },
  };
}
