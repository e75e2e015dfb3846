import type { Problem } from './problem.ts';
import { FIELD, SUM } from './record.ts';
import type { Histories } from './run.ts';
import type { Workspace } from './workspace.ts';

/** Histories of one run may take so many bytes; beyond it only each k-th step is kept, and k is said. */
const HISTORY_LIMIT = 64 * 1024 * 1024;

/** Instants gathered before they are written out row by row: one at a time, each value would go to a page of memory of its own. */
const BLOCK = 16;

export interface HistoryBuffers {
  readonly histories: Histories;
  /** Displacement, shear and acceleration of the last instants, an instant after the other: BLOCK x 3 n. */
  readonly block: Float64Array;
  /** Instants in the block. */
  gathered: number;
  /** Instants written out. */
  written: number;
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
    nonlinear: null,
  };
  return { histories, block: new Float64Array(BLOCK * 3 * n), gathered: 0, written: 0 };
}

/** Keeps step j, where it is one that is kept. */
export function keepHistory(buffers: HistoryBuffers, problem: Problem, work: Workspace, j: number): void {
  const { every, ground, energy } = buffers.histories;
  if (j % every !== 0) return;
  const at = j / every;
  const { stiffness } = problem.prepared.arrays;
  const { records, sums } = work;
  const { STRIDE, U, TOTAL } = FIELD;
  const { block } = buffers;
  const n = stiffness.length;
  let below = 0;
  for (let i = 0, from = 0, place = 3 * n * buffers.gathered; i < n; i++, from += STRIDE, place++) {
    const u = records[from + U];
    block[place] = u;
    block[place + n] = stiffness[i] * (u - below);
    block[place + 2 * n] = records[from + TOTAL];
    below = u;
  }
  ground[at] = problem.ground[j];
  energy.input[at] = sums[SUM.INPUT] / 2;
  energy.kinetic[at] = sums[SUM.KINETIC] / 2;
  energy.strain[at] = sums[SUM.STRAIN] / 2;
  energy.damping[at] = sums[SUM.DAMPING] / 2;
  buffers.gathered++;
  if (buffers.gathered === BLOCK) writeOut(buffers, n);
}

/** The histories as far as step `done`, in arrays of their own where the run ended early. */
export function historiesUpTo(buffers: HistoryBuffers, n: number, done: number): Histories {
  writeOut(buffers, n);
  const { histories } = buffers;
  const kept = Math.floor(done / histories.every) + 1;
  return kept < histories.count ? cut(histories, kept) : histories;
}

function writeOut(buffers: HistoryBuffers, n: number): void {
  const { block, gathered, written } = buffers;
  const { count, displacement, shear, acceleration } = buffers.histories;
  for (let i = 0; i < n; i++) {
    const row = i * count + written;
    for (let k = 0, from = i; k < gathered; k++, from += 3 * n) {
      displacement[row + k] = block[from];
      shear[row + k] = block[from + n];
      acceleration[row + k] = block[from + 2 * n];
    }
  }
  buffers.written += gathered;
  buffers.gathered = 0;
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
    nonlinear: h.nonlinear,
  };
}
