import { FIELD, STATE, SUM } from './record.ts';

const { MASS, PER_MASS, STIFFNESS, LEVER, FLOOR_DASHPOT, STOREY_DASHPOT, MULTIPLIER, PER_PIVOT } = FIELD;
const { U, V, A, RHS, NEXT, DAMPING_FORCE, DAMPING_RATE, TOTAL, STOP, STRIDE } = FIELD;
const { PEAK_DRIFT, PEAK_STEP, PEAK_OVERTURNING, PEAK_U, PEAK_V, PEAK_TOTAL } = FIELD;
const { DRIFT_SUM, DRIFT_LEAST, DRIFT_MOST } = FIELD;
const { INPUT, DAMPING, KINETIC, STRAIN, LARGEST_GAP, LARGEST_INPUT, STOPPED } = SUM;
const { COLLAPSED, DIVERGED } = STATE;

/** The inverse of the step's matrix, row-major n x n, and scratch of n for the right-hand side without gaps. */
export interface FullMatrix {
  readonly inverse: Float64Array;
  readonly side: Float64Array;
}

/** The numbers of a scheme at a step, as Method: am, af, beta, gamma and h [s]. */
export interface Scheme {
  readonly am: number;
  readonly af: number;
  readonly beta: number;
  readonly gamma: number;
  readonly h: number;
}

/**
 * Steps `from` + 1 to `to` of a linear frame, on records (record.ts). Nothing is allocated and nothing checked in here. Two sweeps a step: upwards the
 * right-hand side and the elimination, downwards the substitution, the new state, energies and peaks, each number used while
 * it is still in a register.
 *
 * Damping is either dashpots (tridiagonal C: `matrix` is null, the records hold the factors) or a full matrix. For a full one
 * the step's matrix A = (1 - am) M + (1 - af) (gamma h C + beta h^2 K) comes inverted, a step is one product with it, and C
 * itself is never needed: from A a(n+1) = r follows C a(n+1) = (r - (1 - am) M a(n+1) - (1 - af) beta h^2 K a(n+1)) /
 * ((1 - af) gamma h), and C v, C a are carried along by the scheme's own update of v.
 *
 * Symbols: h step; u v a displacement, velocity, acceleration relative to the ground at the step before; ag ground
 * acceleration; x y the weighted predictors of displacement and velocity; q storey force of the predictors; d drift; fs, fd
 * restoring and damping force. A name that ends in B or A is that of the floor below or above, in n the one at the new step.
 *
 * @param w        n records of STRIDE
 * @param matrix   the full matrix of the step, or null
 * @param ground   ag at each step, at least `to` + 1 entries [m/s2]
 * @param sums     SUMS entries
 * @param settling step after which drifts are summed for the residual
 * @returns the last step done: `to`, or the one at which sums[STOPPED] was set
 */
export function stepTo(
  w: Float64Array,
  matrix: FullMatrix | null,
  n: number,
  ground: Float64Array,
  scheme: Scheme,
  sums: Float64Array,
  settling: number,
  from: number,
  to: number,
): number {
  const { am, af, beta, gamma, h } = scheme;
  const full = matrix !== null;
  const wf = 1 - af;
  const b0 = beta * h * h;
  const b1 = (0.5 - beta) * h * h;
  const g0 = gamma * h;
  const g1 = (1 - gamma) * h;
  const xv = wf * h;
  const xa = wf * b1;
  const ya = wf * g1;
  const onMass = 1 - am;
  const onStiffness = wf * b0;
  const perDamping = 1 / (wf * g0);
  const top = (n - 1) * STRIDE;
  let input = sums[INPUT];
  let damping = sums[DAMPING];
  let kinetic = sums[KINETIC];
  let strain = sums[STRAIN];
  let largestGap = sums[LARGEST_GAP];
  let largestInput = sums[LARGEST_INPUT];
  let last = to;
  for (let j = from + 1; j <= to; j++) {
    const agOld = ground[j - 1];
    const agNew = ground[j];
    const ag = wf * agNew + af * agOld;

    let ai = w[A];
    let y = w[V] + ya * ai;
    let x = w[U] + xv * w[V] + xa * ai;
    let q = w[STIFFNESS] * x + w[STOREY_DASHPOT] * y;
    let r = 0;
    let p = 0;
    for (; p < top; p += STRIDE) {
      const aA = w[p + STRIDE + A];
      const vA = w[p + STRIDE + V];
      const yA = vA + ya * aA;
      const xA = w[p + STRIDE + U] + xv * vA + xa * aA;
      const qA = w[p + STRIDE + STIFFNESS] * (xA - x) + w[p + STRIDE + STOREY_DASHPOT] * (yA - y);
      const fd = full ? w[p + DAMPING_FORCE] + ya * w[p + DAMPING_RATE] : w[p + FLOOR_DASHPOT] * y;
      r = qA - q - w[p + MASS] * (ag + am * ai) - fd - w[p + MULTIPLIER] * r;
      w[p + RHS] = r;
      ai = aA;
      x = xA;
      y = yA;
      q = qA;
    }
    const fdTop = full ? w[p + DAMPING_FORCE] + ya * w[p + DAMPING_RATE] : w[p + FLOOR_DASHPOT] * y;
    r = -q - w[p + MASS] * (ag + am * ai) - fdTop - w[p + MULTIPLIER] * r;
    w[p + RHS] = r;
    if (full) productInto(matrix, w, n);

    let an = full ? w[p + NEXT] : r * w[p + PER_PIVOT];
    let un = w[p + U] + h * w[p + V] + b1 * ai + b0 * an;
    let vn = w[p + V] + g1 * ai + g0 * an;
    let fsA = 0;
    let fcA = 0;
    let kaA = 0;
    let overturning = 0;
    let push = 0;
    let dampingStep = 0;
    let stopped = false;
    const settles = j > settling;
    kinetic = 0;
    strain = 0;
    for (; p >= 0; p -= STRIDE) {
      let anB = 0;
      let unB = 0;
      let vnB = 0;
      if (p > 0) {
        const aB = w[p - STRIDE + A];
        const vB = w[p - STRIDE + V];
        anB = full ? w[p - STRIDE + NEXT] : w[p - STRIDE + RHS] * w[p - STRIDE + PER_PIVOT] - w[p + MULTIPLIER] * an;
        unB = w[p - STRIDE + U] + h * vB + b1 * aB + b0 * anB;
        vnB = vB + g1 * aB + g0 * anB;
      }
      const m = w[p + MASS];
      const k = w[p + STIFFNESS];
      const d = un - unB;
      const fs = k * d;
      let fdn = 0;
      if (full) {
        const ka = k * (an - anB);
        const ca = w[p + DAMPING_RATE];
        const can = perDamping * (w[p + RHS] - onMass * m * an - onStiffness * (ka - kaA));
        fdn = w[p + DAMPING_FORCE] + g1 * ca + g0 * can;
        w[p + DAMPING_RATE] = can;
        kaA = ka;
      } else {
        const fc = w[p + STOREY_DASHPOT] * (vn - vnB);
        fdn = w[p + FLOOR_DASHPOT] * vn + fc - fcA;
        fcA = fc;
      }
      const total = (fsA - fs - fdn) * w[p + PER_MASS];
      const du = un - w[p + U];
      dampingStep += (fdn + w[p + DAMPING_FORCE]) * du;
      push += m * du;
      kinetic += m * vn * vn;
      strain += fs * d;
      overturning += w[p + LEVER] * d;
      w[p + DAMPING_FORCE] = fdn;
      w[p + TOTAL] = total;
      w[p + U] = un;
      w[p + V] = vn;
      w[p + A] = an;
      const driftSize = Math.abs(d);
      if (driftSize > w[p + PEAK_DRIFT]) {
        w[p + PEAK_DRIFT] = driftSize;
        w[p + PEAK_STEP] = j;
        if (driftSize > w[p + STOP]) stopped = true;
      }
      if (settles) {
        w[p + DRIFT_SUM] += d;
        if (d < w[p + DRIFT_LEAST]) w[p + DRIFT_LEAST] = d;
        if (d > w[p + DRIFT_MOST]) w[p + DRIFT_MOST] = d;
      }
      const overturningSize = Math.abs(overturning);
      if (overturningSize > w[p + PEAK_OVERTURNING]) w[p + PEAK_OVERTURNING] = overturningSize;
      const uSize = Math.abs(un);
      if (uSize > w[p + PEAK_U]) w[p + PEAK_U] = uSize;
      const vSize = Math.abs(vn);
      if (vSize > w[p + PEAK_V]) w[p + PEAK_V] = vSize;
      const totalSize = Math.abs(total);
      if (totalSize > w[p + PEAK_TOTAL]) w[p + PEAK_TOTAL] = totalSize;
      fsA = fs;
      an = anB;
      un = unB;
      vn = vnB;
    }
    // Work of a force over a step is its mean times the displacement (the trapezoid rule): exact for average acceleration.
    input -= (agOld + agNew) * push;
    damping += dampingStep;
    const gap = Math.abs(input - damping - kinetic - strain);
    if (gap > largestGap) largestGap = gap;
    if (input > largestInput) largestInput = input;
    if (stopped || !(gap < Number.POSITIVE_INFINITY)) {
      sums[STOPPED] = stopped ? COLLAPSED : DIVERGED;
      last = j;
      break;
    }
  }
  sums[INPUT] = input;
  sums[DAMPING] = damping;
  sums[KINETIC] = kinetic;
  sums[STRAIN] = strain;
  sums[LARGEST_GAP] = largestGap;
  sums[LARGEST_INPUT] = largestInput;
  return last;
}

/** NEXT = inverse x RHS, four rows at a time, so that four sums run side by side. */
function productInto({ inverse, side }: FullMatrix, w: Float64Array, n: number): void {
  for (let i = 0, at = RHS; i < n; i++, at += STRIDE) side[i] = w[at];
  let i = 0;
  for (; i + 3 < n; i += 4) {
    const r0 = i * n;
    const r1 = r0 + n;
    const r2 = r1 + n;
    const r3 = r2 + n;
    let s0 = 0;
    let s1 = 0;
    let s2 = 0;
    let s3 = 0;
    for (let c = 0; c < n; c++) {
      const x = side[c];
      s0 += inverse[r0 + c] * x;
      s1 += inverse[r1 + c] * x;
      s2 += inverse[r2 + c] * x;
      s3 += inverse[r3 + c] * x;
    }
    const at = i * STRIDE + NEXT;
    w[at] = s0;
    w[at + STRIDE] = s1;
    w[at + 2 * STRIDE] = s2;
    w[at + 3 * STRIDE] = s3;
  }
  for (; i < n; i++) {
    let s = 0;
    for (let c = 0; c < n; c++) s += inverse[i * n + c] * side[c];
    w[i * STRIDE + NEXT] = s;
  }
}
