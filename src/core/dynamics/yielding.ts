import { damperTrial } from './dampers.ts';
import { commitOf, trialOf } from './laws/laws.ts';
import { FIELD, STATE, SUM } from './record.ts';
import { invertInto, shiftInverse } from './stepMatrix.ts';

const { MASS, PER_MASS, FLOOR_DASHPOT, STOREY_DASHPOT, MULTIPLIER, PER_PIVOT, U, V, A, RHS, NEXT, STRIDE } = FIELD;
const {
  DAMPING_FORCE,
  DAMPING_RATE,
  FULL_FORCE,
  TOTAL,
  STOP,
  PEAK_DRIFT,
  PEAK_STEP,
  PEAK_OVERTURNING,
  PEAK_U,
  PEAK_V,
} = FIELD;
const { PEAK_TOTAL, DRIFT_SUM, DRIFT_LEAST, DRIFT_MOST, HEIGHT, P_OVER_H, LAW, K, STRENGTH, DRIFT, FORCE, WORK } =
  FIELD;
const { TRIAL_DRIFT, TRIAL_FORCE, TANGENT, INTERCEPT, SLOPE, FORCE_TOLERANCE, DAMPER, TRIAL_RATE, TRIAL_DAMPER } =
  FIELD;
const { DAMPER_INTERCEPT, DAMPER_SLOPE, DAMPER_FORCE, DAMPER_WORK, PEAK_RATE, STOREY_FORCE, TANGENT_FACTOR } = FIELD;
const { COUPLING, U_AHEAD, V_AHEAD, DRIFT_AHEAD, RATE_AHEAD, LOAD, PEAK_SHEAR, YIELD_STEP } = FIELD;
const { INPUT, DAMPING, KINETIC, STRAIN, LARGEST_GAP, LARGEST_INPUT, STOPPED, SOLVES, MOST_SOLVES, HALVINGS } = SUM;
const { CULPRIT, DAMPING_SHEAR, YIELDED } = SUM;
const { COLLAPSED, DIVERGED, NOT_CONVERGED } = STATE;
const ELASTIC = 0;

/** Numbers of the scheme at the step under way, for the functions of this file: a number handed over as such would be boxed. */
// biome-ignore format: a table
const AM = 0, AF = 1, BETA = 2, GAMMA = 3, H = 4, AG_OLD = 5, AG_NEW = 6, NOWS = 7;

/** Solves after which a step is halved. Own choice: steps that converge need 1 to 5. */
const MOST = 25;
/** A step is halved so often and no further: to its 1024th part. Own choice. */
const DEEPEST = 10;

/** All that the step of a nonlinear frame works on, made once. */
export interface NonlinearWork {
  readonly n: number;
  /** n records. */
  readonly w: Float64Array;
  readonly now: Float64Array;
  /** Of the step [s]. */
  readonly h: number;
  /** Where damping is a full matrix: it, the inverse of the step's matrix, scratch. */
  readonly full: FullWork | null;
  readonly sums: Float64Array;
}

export interface FullWork {
  /** C, row-major n x n [N s/m]. */
  readonly damping: Float64Array;
  /** Inverse of the step's matrix with the couplings in the records, row-major n x n. */
  readonly inverse: Float64Array;
  /** Scratch of n each. */
  readonly side: Float64Array;
  readonly column: Float64Array;
  /** Updates of the inverse since it was last made afresh. */
  readonly updates: Int32Array;
}

export function nowOf(am: number, af: number, beta: number, gamma: number, h: number): Float64Array {
  const now = new Float64Array(NOWS);
  now.set([am, af, beta, gamma, h]);
  return now;
}

/**
 * Steps `from` + 1 to `to` of a frame whose storeys yield or have dampers. Nothing is allocated and nothing checked in here.
 *
 * Each storey is taken as a straight line, force = INTERCEPT + SLOPE x drift, which makes the step one linear solve; then each
 * law is asked for its force at the drift found. Where a law is off its line, the line becomes the law's tangent there and the
 * step is solved again. A step begins with the lines of the last one: a piecewise linear law seldom leaves its line, and where
 * it does, the next solve is exact, so most steps need one solve. For smooth laws and dampers this is Newton's method. A step
 * that does not converge is halved, and the halves again.
 * Source: Newton-Raphson iteration within a step, Chopra, Dynamics of Structures, section 5.7 (from memory); keeping the
 * branch from step to step, own.
 *
 * @param ground   ag at each step, at least `to` + 1 entries [m/s2]
 * @param settling step after which drifts are summed for the residual
 * @returns the last step done: `to`, or the one at which sums[STOPPED] was set (the one before where a step did not converge)
 */
export function yieldTo(work: NonlinearWork, ground: Float64Array, settling: number, from: number, to: number): number {
  const { now, sums, h } = work;
  const whole = 1 << DEEPEST;
  for (let j = from + 1; j <= to; j++) {
    const agOld = ground[j - 1];
    const rise = ground[j] - agOld;
    let at = 0;
    let part = whole;
    let solves = 0;
    while (at < whole) {
      now[AG_OLD] = agOld + rise * (at / whole);
      now[AG_NEW] = agOld + rise * ((at + part) / whole);
      const used = solve(work);
      solves += used > 0 ? used : MOST;
      if (used > 0) {
        at += part;
        commit(work, j, j > settling && at === whole);
        if (sums[STOPPED] !== 0) break;
      } else {
        sums[HALVINGS]++;
        if (part === 1) {
          sums[STOPPED] = NOT_CONVERGED;
          break;
        }
        part >>= 1;
        now[H] = h * (part / whole);
        refactor(work, 0);
      }
    }
    sums[SOLVES] += solves;
    if (solves > sums[MOST_SOLVES]) sums[MOST_SOLVES] = solves;
    if (part < whole) {
      now[H] = h;
      refactor(work, 0);
    }
    if (sums[STOPPED] !== 0) return sums[STOPPED] === NOT_CONVERGED ? j - 1 : j;
  }
  return to;
}

/** The step's matrix from row `from` up, from the lines as they stand; false where it is not positive definite. */
export function refactor({ n, w, now, full }: NonlinearWork, from: number): boolean {
  const wf = 1 - now[AF];
  const b0 = wf * now[BETA] * now[H] * now[H];
  const g0 = wf * now[GAMMA] * now[H];
  const onMass = 1 - now[AM];
  if (full !== null) {
    couple(w, n, b0, g0);
    return invertInto(full, w, n, onMass, g0);
  }
  let p = from * STRIDE;
  const top = (n - 1) * STRIDE;
  let here = b0 * (w[p + SLOPE] - w[p + P_OVER_H]) + g0 * (w[p + STOREY_DASHPOT] + w[p + DAMPER_SLOPE]);
  w[p + COUPLING] = here;
  for (; p <= top; p += STRIDE) {
    let above = 0;
    if (p < top) {
      const q = p + STRIDE;
      above = b0 * (w[q + SLOPE] - w[q + P_OVER_H]) + g0 * (w[q + STOREY_DASHPOT] + w[q + DAMPER_SLOPE]);
      w[q + COUPLING] = above;
    }
    let pivot = onMass * w[p + MASS] + g0 * w[p + FLOOR_DASHPOT] + here + above;
    if (p > 0) {
      const multiplier = -here * w[p - STRIDE + PER_PIVOT];
      w[p + MULTIPLIER] = multiplier;
      pivot += multiplier * here;
    } else w[p + MULTIPLIER] = 0;
    if (!(pivot > 0)) return false;
    w[p + PER_PIVOT] = 1 / pivot;
    here = above;
  }
  return true;
}

function couple(w: Float64Array, n: number, b0: number, g0: number): void {
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    w[p + COUPLING] = b0 * (w[p + SLOPE] - w[p + P_OVER_H]) + g0 * (w[p + STOREY_DASHPOT] + w[p + DAMPER_SLOPE]);
  }
}

/** Iterates until every law and damper is on its line. @returns the solves it took, 0 where it does not converge */
function solve(work: NonlinearWork): number {
  predict(work);
  for (let count = 1; count <= MOST; count++) {
    if (work.full === null) solveBanded(work);
    else solveFull(work, work.full);
    const changed = trials(work);
    if (changed < 0) return count;
    work.sums[CULPRIT] = changed;
    if (!renew(work, changed)) return 0;
  }
  return 0;
}

/** The parts of the new step that do not depend on its accelerations. */
function predict({ n, w, now, full }: NonlinearWork): void {
  const h = now[H];
  const am = now[AM];
  const af = now[AF];
  const wf = 1 - af;
  const b1 = (0.5 - now[BETA]) * h * h;
  const g1 = (1 - now[GAMMA]) * h;
  const ag = wf * now[AG_NEW] + af * now[AG_OLD];
  const top = (n - 1) * STRIDE;
  let uB = 0;
  let vB = 0;
  for (let p = 0; p <= top; p += STRIDE) {
    const a = w[p + A];
    const v = w[p + V];
    const u = w[p + U] + h * v + b1 * a;
    const y = v + g1 * a;
    w[p + U_AHEAD] = u;
    w[p + V_AHEAD] = y;
    w[p + DRIFT_AHEAD] = u - uB;
    w[p + RATE_AHEAD] = y - vB;
    let damping = w[p + FLOOR_DASHPOT] * (wf * y + af * v);
    if (full !== null) damping += w[p + FULL_FORCE] + wf * g1 * w[p + DAMPING_RATE];
    const above = p < top ? w[p + STRIDE + STOREY_FORCE] : 0;
    w[p + LOAD] = af * (above - w[p + STOREY_FORCE]) - w[p + MASS] * (ag + am * a) - damping;
    uB = u;
    vB = y;
  }
}

/** The force of a storey's lines at the new step, its acceleration apart. */
function solveBanded({ n, w, now }: NonlinearWork): void {
  const wf = 1 - now[AF];
  const top = (n - 1) * STRIDE;
  let s = 0;
  {
    const d = w[DRIFT_AHEAD];
    const v = w[RATE_AHEAD];
    s = w[INTERCEPT] + (w[SLOPE] - w[P_OVER_H]) * d + w[DAMPER_INTERCEPT] + (w[DAMPER_SLOPE] + w[STOREY_DASHPOT]) * v;
  }
  let r = 0;
  let p = 0;
  for (; p < top; p += STRIDE) {
    const q = p + STRIDE;
    const above =
      w[q + INTERCEPT] +
      (w[q + SLOPE] - w[q + P_OVER_H]) * w[q + DRIFT_AHEAD] +
      w[q + DAMPER_INTERCEPT] +
      (w[q + DAMPER_SLOPE] + w[q + STOREY_DASHPOT]) * w[q + RATE_AHEAD];
    r = w[p + LOAD] + wf * (above - s) - w[p + MULTIPLIER] * r;
    w[p + RHS] = r;
    s = above;
  }
  r = w[p + LOAD] - wf * s - w[p + MULTIPLIER] * r;
  w[p + RHS] = r;
  let a = r * w[p + PER_PIVOT];
  w[p + NEXT] = a;
  for (; p > 0; p -= STRIDE) {
    a = w[p - STRIDE + RHS] * w[p - STRIDE + PER_PIVOT] - w[p + MULTIPLIER] * a;
    w[p - STRIDE + NEXT] = a;
  }
}

function solveFull({ n, w, now }: NonlinearWork, { inverse, side }: FullWork): void {
  const wf = 1 - now[AF];
  let s = 0;
  for (let i = n - 1, p = (n - 1) * STRIDE; i >= 0; i--, p -= STRIDE) {
    const own =
      w[p + INTERCEPT] +
      (w[p + SLOPE] - w[p + P_OVER_H]) * w[p + DRIFT_AHEAD] +
      w[p + DAMPER_INTERCEPT] +
      (w[p + DAMPER_SLOPE] + w[p + STOREY_DASHPOT]) * w[p + RATE_AHEAD];
    const r = w[p + LOAD] + wf * (s - own);
    w[p + RHS] = r;
    side[i] = r;
    s = own;
  }
  for (let i = 0, p = 0, row = 0; i < n; i++, p += STRIDE, row += n) {
    let sum = 0;
    for (let c = 0; c < n; c++) sum += inverse[row + c] * side[c];
    w[p + NEXT] = sum;
  }
}

/** Asks each law and damper; where one is off its line, the line is renewed. @returns the lowest storey that was off, or -1 */
function trials({ n, w, now }: NonlinearWork): number {
  const b0 = now[BETA] * now[H] * now[H];
  const g0 = now[GAMMA] * now[H];
  let below = 0;
  let lowest = -1;
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    const a = w[p + NEXT];
    const d = w[p + DRIFT_AHEAD] + b0 * (a - below);
    const rate = w[p + RATE_AHEAD] + g0 * (a - below);
    below = a;
    w[p + TRIAL_DRIFT] = d;
    w[p + TRIAL_RATE] = rate;
    let off = false;
    if (w[p + LAW] === ELASTIC) w[p + TRIAL_FORCE] = w[p + K] * d;
    else {
      trialOf(w, p);
      const f = w[p + TRIAL_FORCE];
      const slope = w[p + SLOPE];
      if (!(Math.abs(f - w[p + INTERCEPT] - slope * d) <= w[p + FORCE_TOLERANCE])) {
        off = true;
        const tangent = w[p + TANGENT];
        w[p + SLOPE] = tangent;
        w[p + INTERCEPT] = f - tangent * d;
      }
    }
    if (w[p + DAMPER] > 0 && damperTrial(w, p) !== 0) off = true;
    if (off && lowest < 0) lowest = i;
  }
  return lowest;
}

/** The matrix again after the lines changed from storey `lowest` up. */
function renew(work: NonlinearWork, lowest: number): boolean {
  const { full, now, w, n } = work;
  if (full === null) return refactor(work, lowest > 0 ? lowest - 1 : 0);
  const wf = 1 - now[AF];
  const b0 = wf * now[BETA] * now[H] * now[H];
  const g0 = wf * now[GAMMA] * now[H];
  return shiftInverse(full, w, n, b0, g0, 1 - now[AM]);
}

/** Takes the step: state, laws, energies, peaks. */
function commit(work: NonlinearWork, j: number, settles: boolean): void {
  const { n, w, now, full, sums } = work;
  const b0 = now[BETA] * now[H] * now[H];
  const g0 = now[GAMMA] * now[H];
  const g1 = (1 - now[GAMMA]) * now[H];
  const wf = 1 - now[AF];
  const onMass = 1 - now[AM];
  const perDamping = 1 / (wf * g0);
  let above = 0;
  let dashpotAbove = 0;
  let pullAbove = 0;
  let overturning = 0;
  let push = 0;
  let dampingStep = 0;
  let dampingShear = 0;
  let kinetic = 0;
  let strain = 0;
  let stopped = false;
  let dirty = -1;
  for (let i = n - 1, p = (n - 1) * STRIDE; i >= 0; i--, p -= STRIDE) {
    const a = w[p + NEXT];
    const u = w[p + U_AHEAD] + b0 * a;
    const v = w[p + V_AHEAD] + g0 * a;
    const d = w[p + TRIAL_DRIFT];
    const rate = w[p + TRIAL_RATE];
    const f = w[p + TRIAL_FORCE];
    const before = w[p + DRIFT];
    if (w[p + LAW] === ELASTIC) {
      w[p + WORK] += 0.5 * (w[p + FORCE] + f) * (d - before);
      w[p + DRIFT] = d;
      w[p + FORCE] = f;
    } else commitOf(w, p);
    let damper = 0;
    if (w[p + DAMPER] > 0) {
      damper = w[p + TRIAL_DAMPER];
      w[p + DAMPER_WORK] += 0.5 * (w[p + DAMPER_FORCE] + damper) * (d - before);
      w[p + DAMPER_FORCE] = damper;
      const rateSize = Math.abs(rate);
      if (rateSize > w[p + PEAK_RATE]) w[p + PEAK_RATE] = rateSize;
    }
    const shear = f + damper;
    const geometric = w[p + P_OVER_H] * d;
    const restoring = shear - geometric;
    const dashpot = w[p + STOREY_DASHPOT] * rate;
    w[p + STOREY_FORCE] = restoring + dashpot;
    const m = w[p + MASS];
    let fd = w[p + FLOOR_DASHPOT] * v + dashpot - dashpotAbove;
    dashpotAbove = dashpot;
    if (full !== null) {
      const pull = w[p + COUPLING] * (a - (i > 0 ? w[p - STRIDE + NEXT] : 0));
      const ca = perDamping * (w[p + RHS] - onMass * m * a - pull + pullAbove);
      const carried = w[p + FULL_FORCE] + g1 * w[p + DAMPING_RATE] + g0 * ca;
      w[p + FULL_FORCE] = carried;
      w[p + DAMPING_RATE] = ca;
      fd += carried;
      pullAbove = pull;
    }
    const total = (above - restoring - fd) * w[p + PER_MASS];
    const du = u - w[p + U];
    dampingStep += (fd + w[p + DAMPING_FORCE]) * du;
    dampingShear += fd;
    push += m * du;
    kinetic += m * v * v;
    strain += w[p + WORK] + w[p + DAMPER_WORK] - 0.5 * geometric * d;
    overturning += shear * w[p + HEIGHT];
    w[p + DAMPING_FORCE] = fd;
    w[p + TOTAL] = total;
    w[p + U] = u;
    w[p + V] = v;
    w[p + A] = a;
    const size = Math.abs(d);
    if (size > w[p + PEAK_DRIFT]) {
      w[p + PEAK_DRIFT] = size;
      w[p + PEAK_STEP] = j;
      if (size > w[p + STOP]) stopped = true;
      if (w[p + YIELD_STEP] === 0 && size * w[p + K] > w[p + STRENGTH]) {
        w[p + YIELD_STEP] = j;
        sums[YIELDED] = 1;
      }
    }
    if (settles) {
      w[p + DRIFT_SUM] += d;
      if (d < w[p + DRIFT_LEAST]) w[p + DRIFT_LEAST] = d;
      if (d > w[p + DRIFT_MOST]) w[p + DRIFT_MOST] = d;
    }
    const shearSize = Math.abs(shear);
    if (shearSize > w[p + PEAK_SHEAR]) w[p + PEAK_SHEAR] = shearSize;
    const overturningSize = Math.abs(overturning);
    if (overturningSize > w[p + PEAK_OVERTURNING]) w[p + PEAK_OVERTURNING] = overturningSize;
    const uSize = Math.abs(u);
    if (uSize > w[p + PEAK_U]) w[p + PEAK_U] = uSize;
    const vSize = Math.abs(v);
    if (vSize > w[p + PEAK_V]) w[p + PEAK_V] = vSize;
    const totalSize = Math.abs(total);
    if (totalSize > w[p + PEAK_TOTAL]) w[p + PEAK_TOTAL] = totalSize;
    above = restoring;
    if (w[p + TANGENT_FACTOR] !== 0) {
      const next = w[p + TANGENT_FACTOR] * (w[p + TANGENT] - w[p + P_OVER_H]);
      if (next !== w[p + STOREY_DASHPOT]) {
        w[p + STOREY_DASHPOT] = next;
        dirty = i;
      }
    }
  }
  const input = sums[INPUT] - (now[AG_OLD] + now[AG_NEW]) * push;
  const damping = sums[DAMPING] + dampingStep;
  sums[INPUT] = input;
  sums[DAMPING] = damping;
  sums[KINETIC] = kinetic;
  sums[STRAIN] = 2 * strain;
  const gap = Math.abs(input - damping - kinetic - 2 * strain);
  if (gap > sums[LARGEST_GAP]) sums[LARGEST_GAP] = gap;
  if (input > sums[LARGEST_INPUT]) sums[LARGEST_INPUT] = input;
  if (sums[YIELDED] !== 0 && Math.abs(dampingShear) > sums[DAMPING_SHEAR]) sums[DAMPING_SHEAR] = Math.abs(dampingShear);
  if (stopped || !(gap < Number.POSITIVE_INFINITY)) sums[STOPPED] = stopped ? COLLAPSED : DIVERGED;
  // Only a tangent that turns negative can fail here; the next solve then does not converge and says so.
  else if (dirty >= 0) refactor(work, dirty > 0 ? dirty - 1 : 0);
}
