import { damperTrial } from './dampers.ts';
import { commit as bilinearCommit, trial as bilinearTrial } from './laws/bilinear.ts';
import { commit as elasticCommit } from './laws/elastic.ts';
import { BILINEAR, commitOf, ELASTIC, trialOf } from './laws/laws.ts';
import type { FullWork, NonlinearWork } from './nonlinearWork.ts';
import { FIELD, NOW, STATE, SUM } from './record.ts';
import { freshLines, refactor, renew } from './stepMatrix.ts';

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
const { PEAK_TOTAL, DRIFT_SUM, DRIFT_LEAST, DRIFT_MOST, HEIGHT, P_OVER_H, LAW, K, STRENGTH, WORK } = FIELD;
const { TRIAL_DRIFT, TRIAL_FORCE, TANGENT, INTERCEPT, SLOPE, FORCE_TOLERANCE, DAMPER, TRIAL_RATE, TRIAL_DAMPER } =
  FIELD;
const { DAMPER_FORCE, DAMPER_WORK, PEAK_RATE, STOREY_FORCE, TANGENT_FACTOR } = FIELD;
const { COUPLING, LAST_DRIFT, LINE, LINE_DRIFT, LINE_RATE, NEXT_U, NEXT_V, PEAK_SHEAR, YIELD_STEP } = FIELD;
const { INPUT, DAMPING, KINETIC, STRAIN, LARGEST_GAP, LARGEST_INPUT, STOPPED, SOLVES, MOST_SOLVES, HALVINGS } = SUM;
const { CULPRIT, DAMPING_SHEAR, YIELDED, SETTLED } = SUM;
const { AM, AF, BETA, GAMMA, H, AG_OLD, AG_NEW } = NOW;
const { COLLAPSED, DIVERGED, NOT_CONVERGED } = STATE;

/** Solves after which a step is halved. Own choice: steps that converge need 1 to 5. */
const MOST = 25;
/** A step is halved so often and no further: to its 1024th part. Own choice. */
const DEEPEST = 10;

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
      solves += Math.abs(used);
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
        freshLines(work);
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

/**
 * Iterates until every law and damper is on its line.
 * @returns the solves it took; 0, or that many below zero, where it does not converge or there is no matrix to solve with
 */
function solve(work: NonlinearWork): number {
  if (work.holds[0] === 0) return 0;
  for (let count = 1; count <= MOST; count++) {
    loads(work);
    if (work.full !== null) solveFull(work, work.full);
    const own = substitute(work);
    const changed = work.smooth ? ask(work, own) : own;
    if (changed === work.n) return count;
    work.sums[CULPRIT] = changed;
    if (!renew(work, changed)) return -count;
  }
  return -MOST;
}

/** Upwards: the right-hand side from the lines as they stand, eliminated as it is made where C is tridiagonal. */
function loads({ n, w, now }: NonlinearWork): void {
  const h = now[H];
  const am = now[AM];
  const af = now[AF];
  const wf = 1 - af;
  const b1 = (0.5 - now[BETA]) * h * h;
  const g1 = (1 - now[GAMMA]) * h;
  const ag = wf * now[AG_NEW] + af * now[AG_OLD];
  const top = (n - 1) * STRIDE;
  let a = w[A];
  let v = w[V];
  let y = v + g1 * a;
  let x = w[U] + h * v + b1 * a;
  let q = wf * (w[LINE] + w[LINE_DRIFT] * x + w[LINE_RATE] * y) + af * w[STOREY_FORCE];
  let r = 0;
  let p = 0;
  for (; p < top; p += STRIDE) {
    const above = p + STRIDE;
    const aA = w[above + A];
    const vA = w[above + V];
    const yA = vA + g1 * aA;
    const xA = w[above + U] + h * vA + b1 * aA;
    const qA =
      wf * (w[above + LINE] + w[above + LINE_DRIFT] * (xA - x) + w[above + LINE_RATE] * (yA - y)) +
      af * w[above + STOREY_FORCE];
    r = qA - q - w[p + MASS] * (ag + am * a) - w[p + FLOOR_DASHPOT] * (wf * y + af * v) - w[p + MULTIPLIER] * r;
    w[p + RHS] = r;
    a = aA;
    v = vA;
    x = xA;
    y = yA;
    q = qA;
  }
  r = -q - w[p + MASS] * (ag + am * a) - w[p + FLOOR_DASHPOT] * (wf * y + af * v) - w[p + MULTIPLIER] * r;
  w[p + RHS] = r;
}

/** For a full C: its part of the step before taken off the right-hand side (the multipliers are zero), and NEXT = inverse x RHS. */
function solveFull(work: NonlinearWork, full: FullWork): void {
  const { n, w, now } = work;
  const { side } = full;
  const ahead = (1 - now[AF]) * (1 - now[GAMMA]) * now[H];
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    const r = w[p + RHS] - w[p + FULL_FORCE] - ahead * w[p + DAMPING_RATE];
    w[p + RHS] = r;
    w[p + NEXT] = 0;
    side[i] = r;
  }
  addProduct(work, full);
  if (!work.smooth) return;
  // Lines as steep as a stuck damper's cancel in the right-hand side; one step of iterative refinement gives the figures back.
  // Source: Golub & Van Loan, Matrix Computations, section 3.5 (section number from memory).
  const onMass = 1 - now[AM];
  const onDamping = (1 - now[AF]) * now[GAMMA] * now[H];
  for (let i = 0, p = 0, at = 0, pull = 0; i < n; i++, p += STRIDE) {
    const above = i < n - 1 ? w[p + STRIDE + COUPLING] * (w[p + STRIDE + NEXT] - w[p + NEXT]) : 0;
    if (i === 0) pull = w[p + COUPLING] * w[p + NEXT];
    let damped = 0;
    for (let c = 0, q = 0; c < n; c++, at++, q += STRIDE) damped += full.damping[at] * w[q + NEXT];
    const dashpot = w[p + FLOOR_DASHPOT] * w[p + NEXT];
    side[i] = w[p + RHS] - onMass * w[p + MASS] * w[p + NEXT] - onDamping * (damped + dashpot) - pull + above;
    pull = above;
  }
  addProduct(work, full);
}

/** NEXT += inverse x side. */
function addProduct({ n, w }: NonlinearWork, { inverse, side }: FullWork): void {
  for (let i = 0, p = 0, at = 0; i < n; i++, p += STRIDE) {
    let sum = 0;
    for (let c = 0; c < n; c++, at++) sum += inverse[at] * side[c];
    w[p + NEXT] += sum;
  }
}

/**
 * Downwards: the new accelerations and where they lead; there the elastic and bilinear laws are asked, and where one is off its
 * line, the line is renewed. Nothing is called here that is not inlined: after a call, even one not taken, each access looks up
 * anew where the array begins and ends (in Chromium the march took twice as long). The other laws have a loop of their own.
 * @returns the lowest storey that was off, or `n`
 */
function substitute({ n, w, now, full }: NonlinearWork): number {
  const h = now[H];
  const b0 = now[BETA] * h * h;
  const b1 = (0.5 - now[BETA]) * h * h;
  const g0 = now[GAMMA] * h;
  const g1 = (1 - now[GAMMA]) * h;
  const banded = full === null;
  let lowest = n;
  let p = (n - 1) * STRIDE;
  let an = banded ? w[p + RHS] * w[p + PER_PIVOT] : w[p + NEXT];
  let un = w[p + U] + h * w[p + V] + b1 * w[p + A] + b0 * an;
  let vn = w[p + V] + g1 * w[p + A] + g0 * an;
  for (let i = n - 1; i >= 0; i--, p -= STRIDE) {
    let anB = 0;
    let unB = 0;
    let vnB = 0;
    if (i > 0) {
      const below = p - STRIDE;
      const aB = w[below + A];
      const vB = w[below + V];
      anB = banded ? w[below + RHS] * w[below + PER_PIVOT] - w[p + MULTIPLIER] * an : w[below + NEXT];
      unB = w[below + U] + h * vB + b1 * aB + b0 * anB;
      vnB = vB + g1 * aB + g0 * anB;
    }
    w[p + NEXT] = an;
    w[p + NEXT_U] = un;
    w[p + NEXT_V] = vn;
    w[p + TRIAL_DRIFT] = un - unB;
    w[p + TRIAL_RATE] = vn - vnB;
    an = anB;
    un = unB;
    vn = vnB;
    if (w[p + LAW] === ELASTIC) w[p + TRIAL_FORCE] = w[p + K] * w[p + TRIAL_DRIFT];
    else if (w[p + LAW] === BILINEAR) {
      bilinearTrial(w, p);
      if (isOff(w, p)) lowest = i;
    }
  }
  return lowest;
}

/** Asks the other laws, and the dampers. @returns the lowest storey that was off, or `lowest` */
function ask({ n, w }: NonlinearWork, lowest: number): number {
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    let off = false;
    if (w[p + LAW] > BILINEAR) {
      trialOf(w, p);
      off = isOff(w, p);
    }
    if (w[p + DAMPER] > 0 && damperTrial(w, p) !== 0) off = true;
    if (off && i < lowest) lowest = i;
  }
  return lowest;
}

/** Whether the law's force is off its line; the line is then its tangent. */
function isOff(w: Float64Array, p: number): boolean {
  const f = w[p + TRIAL_FORCE];
  const d = w[p + TRIAL_DRIFT];
  if (Math.abs(f - w[p + INTERCEPT] - w[p + SLOPE] * d) <= w[p + FORCE_TOLERANCE]) return false;
  const tangent = w[p + TANGENT];
  w[p + SLOPE] = tangent;
  w[p + INTERCEPT] = f - tangent * d;
  return true;
}

/** Takes the step: state, laws, energies, peaks. */
function commit(work: NonlinearWork, j: number, settles: boolean): void {
  const { n, w, now, full, sums, smooth } = work;
  if (smooth) take(work);
  if (full !== null) dampFully(work, full);
  let above = 0;
  let dashpotAbove = 0;
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
    const u = w[p + NEXT_U];
    const v = w[p + NEXT_V];
    const d = w[p + TRIAL_DRIFT];
    const rate = w[p + TRIAL_RATE];
    const f = w[p + TRIAL_FORCE];
    if (w[p + LAW] === BILINEAR) bilinearCommit(w, p);
    else if (w[p + LAW] === ELASTIC) elasticCommit(w, p);
    const damper = smooth ? w[p + DAMPER_FORCE] : 0;
    const shear = f + damper;
    const geometric = w[p + P_OVER_H] * d;
    const restoring = shear - geometric;
    const dashpot = w[p + STOREY_DASHPOT] * rate;
    w[p + STOREY_FORCE] = restoring + dashpot;
    const m = w[p + MASS];
    let fd = w[p + FLOOR_DASHPOT] * v + dashpot - dashpotAbove;
    dashpotAbove = dashpot;
    if (full !== null) fd += w[p + FULL_FORCE];
    const total = (above - restoring - fd) * w[p + PER_MASS];
    const du = u - w[p + U];
    dampingStep += (fd + w[p + DAMPING_FORCE]) * du;
    dampingShear += fd;
    push += m * du;
    kinetic += m * v * v;
    strain += w[p + WORK] - 0.5 * geometric * d;
    if (smooth) strain += w[p + DAMPER_WORK];
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
  if (settles) sums[SETTLED]++;
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
  // Only a tangent that turns negative can fail here; the next step then begins with its half.
  else if (dirty >= 0) renew(work, dirty);
}

/**
 * C v and C a of the new step, where C is a full matrix, as products: from the solve's own equation they would take in what the
 * updated inverse is off by, step after step.
 */
function dampFully({ n, w }: NonlinearWork, { damping, side, column }: FullWork): void {
  for (let i = 0, p = 0; i < n; i++, p += STRIDE) {
    side[i] = w[p + NEXT_V];
    column[i] = w[p + NEXT];
  }
  for (let i = 0, p = 0, at = 0; i < n; i++, p += STRIDE) {
    let force = 0;
    let rate = 0;
    for (let c = 0; c < n; c++, at++) {
      force += damping[at] * side[c];
      rate += damping[at] * column[c];
    }
    w[p + FULL_FORCE] = force;
    w[p + DAMPING_RATE] = rate;
  }
}

/** Moves the other laws and the dampers to their trials, and adds the work of the way there. */
function take({ n, w }: NonlinearWork): void {
  for (let p = 0; p < n * STRIDE; p += STRIDE) {
    if (w[p + DAMPER] > 0) {
      const way = w[p + TRIAL_DRIFT] - w[p + LAST_DRIFT];
      w[p + DAMPER_WORK] += 0.5 * (w[p + DAMPER_FORCE] + w[p + TRIAL_DAMPER]) * way;
      w[p + DAMPER_FORCE] = w[p + TRIAL_DAMPER];
      w[p + LAST_DRIFT] = w[p + TRIAL_DRIFT];
      const rateSize = Math.abs(w[p + TRIAL_RATE]);
      if (rateSize > w[p + PEAK_RATE]) w[p + PEAK_RATE] = rateSize;
    }
    if (w[p + LAW] > BILINEAR) commitOf(w, p);
  }
}
