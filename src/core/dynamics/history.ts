import { BOUC_WEN, FLAG } from './laws/laws.ts';
import type { Problem } from './problem.ts';
import { FIELD, SUM } from './record.ts';
import type { Histories } from './run.ts';
import { recoverableOf } from './storeyEnergies.ts';
import type { Workspace } from './workspace.ts';

const {
  U,
  TOTAL,
  P_OVER_H,
  DRIFT,
  FORCE,
  DAMPER_FORCE,
  DAMPER_WORK,
  WORK,
  LAW,
  K,
  K_YIELD,
  STRENGTH,
  TANGENT,
  STRIDE,
} = FIELD;

/** Histories of one run may take so many bytes; beyond it only each k-th step is kept, and k is said. */
const HISTORY_LIMIT = 64 * 1024 * 1024;

/** Instants gathered before they are written out row by row: one at a time, each value would go to a page of memory of its own. */
const BLOCK = 16;

export interface HistoryBuffers {
  readonly histories: Histories;
  /** Displacement, shear and acceleration of the last instants, an instant after the other: BLOCK x 3 n. */
  readonly block: Float64Array;
  /** Damper forces of the same instants: BLOCK x n. */
  readonly damper: Float64Array;
  /** Instants in the block. */
  gathered: number;
  /** Instants written out. */
  written: number;
}

export function historyBuffers({ prepared, steps, linear }: Problem): HistoryBuffers {
  const { n } = prepared.arrays;
  const rows = (linear ? 3 : 4.125) * n + 7;
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
    nonlinear: linear ? null : { damper: all(), yielding: new Uint8Array(count * n) },
  };
  return {
    histories,
    block: new Float64Array(BLOCK * 3 * n),
    damper: new Float64Array(BLOCK * n),
    gathered: 0,
    written: 0,
  };
}

/** Keeps step j, where it is one that is kept. */
export function keepHistory(buffers: HistoryBuffers, problem: Problem, work: Workspace, j: number): void {
  const { every, ground, energy } = buffers.histories;
  if (j % every !== 0) return;
  const at = j / every;
  const { records, sums } = work;
  ground[at] = problem.ground[j];
  energy.input[at] = sums[SUM.INPUT] / 2;
  energy.kinetic[at] = sums[SUM.KINETIC] / 2;
  energy.damping[at] = sums[SUM.DAMPING] / 2;
  if (problem.linear) {
    energy.strain[at] = sums[SUM.STRAIN] / 2;
    gatherLinear(buffers, problem, records);
  } else {
    gatherNonlinear(buffers, at, records);
  }
  buffers.gathered++;
  if (buffers.gathered === BLOCK) writeOut(buffers, problem.prepared.arrays.n);
}

/** Of an elastic storey without a damper shear is k x drift. */
function gatherLinear({ block, gathered }: HistoryBuffers, { prepared }: Problem, records: Float64Array): void {
  const { stiffness, n } = prepared.arrays;
  let below = 0;
  for (let i = 0, from = 0, place = 3 * n * gathered; i < n; i++, from += STRIDE, place++) {
    const u = records[from + U];
    block[place] = u;
    block[place + n] = stiffness[i] * (u - below);
    block[place + 2 * n] = records[from + TOTAL];
    below = u;
  }
}

function gatherNonlinear(
  { block, gathered, histories, damper }: HistoryBuffers,
  at: number,
  records: Float64Array,
): void {
  const n = damper.length / BLOCK;
  const { energy, nonlinear, count } = histories;
  let [strain, dampers, hysteretic] = [0, 0, 0];
  for (let i = 0, from = 0, place = 3 * n * gathered; i < n; i++, from += STRIDE, place++) {
    const recoverable = recoverableOf(records, from);
    strain += recoverable - 0.5 * records[from + P_OVER_H] * records[from + DRIFT] ** 2;
    dampers += records[from + DAMPER_WORK];
    hysteretic += records[from + WORK] - recoverable;
    block[place] = records[from + U];
    block[place + n] = records[from + FORCE] + records[from + DAMPER_FORCE];
    block[place + 2 * n] = records[from + TOTAL];
    damper[n * gathered + i] = records[from + DAMPER_FORCE];
    if (nonlinear !== null && isPastYield(records, from)) nonlinear.yielding[i * count + at] = 1;
  }
  energy.strain[at] = strain;
  energy.dampers[at] = dampers;
  energy.hysteretic[at] = hysteretic;
}

/**
 * On a line of the post-yield slope, and of a flag on the upper one; of a smooth law, on a tangent nearer to that slope than to
 * the initial one.
 */
function isPastYield(records: Float64Array, at: number): boolean {
  const [initial, yielding, tangent] = [records[at + K], records[at + K_YIELD], records[at + TANGENT]];
  if (yielding >= initial) return false;
  if (records[at + LAW] === BOUC_WEN) return tangent < 0.5 * (initial + yielding);
  if (tangent > yielding) return false;
  if (records[at + LAW] !== FLAG) return true;
  // The lower line of a flag, on which it goes back, has the same slope.
  const strength = records[at + STRENGTH];
  const upper = strength * (1 - yielding / initial) + yielding * Math.abs(records[at + DRIFT]);
  return Math.abs(records[at + FORCE]) > upper - 1e-9 * strength;
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
  const { count, displacement, shear, acceleration, nonlinear } = buffers.histories;
  for (let i = 0; i < n; i++) {
    const row = i * count + written;
    for (let k = 0, from = i; k < gathered; k++, from += 3 * n) {
      displacement[row + k] = block[from];
      shear[row + k] = block[from + n];
      acceleration[row + k] = block[from + 2 * n];
    }
    if (nonlinear === null) continue;
    for (let k = 0, from = i; k < gathered; k++, from += n) nonlinear.damper[row + k] = buffers.damper[from];
  }
  buffers.written += gathered;
  buffers.gathered = 0;
}

/** The first `kept` instants of each row. */
function cut(h: Histories, kept: number): Histories {
  const into = <T extends Float64Array | Uint8Array>(x: T, out: T): T => {
    for (let i = 0; i < x.length / h.count; i++) out.set(x.subarray(i * h.count, i * h.count + kept), i * kept);
    return out;
  };
  const rows = (x: Float64Array) => into(x, new Float64Array((x.length / h.count) * kept));
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
    nonlinear: h.nonlinear && {
      damper: rows(h.nonlinear.damper),
      yielding: into(h.nonlinear.yielding, new Uint8Array((h.nonlinear.yielding.length / h.count) * kept)),
    },
  };
}
