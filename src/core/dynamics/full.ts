import type { Problem } from './problem.ts';
import { SUM, type System, type Workspace } from './workspace.ts';

/**
 * As `marchBanded`, for modal damping, whose C is a full matrix. The matrix of the step, A = (1 - am) M + (1 - af) (gamma h C
 * + beta h^2 K), was inverted beforehand, so a step is one product with A^-1. C itself is never needed: from A a(n+1) = r
 * follows C a(n+1) = (r - (1 - am) M a(n+1) - (1 - af) beta h^2 K a(n+1)) / ((1 - af) gamma h), three terms on the
 * tridiagonal, and C v, C a are carried along by the scheme's own update of v.
 *
 * @returns the last step done, as marchBanded
 */
export function marchFull(
  problem: Problem,
  work: Workspace,
  system: System & { kind: 'full' },
  from: number,
  to: number,
): number {
  const { ground, step: h, method, stopDrift, prepared } = problem;
  const { n, mass: m, netStiffness: k, stiffness: k0, height } = prepared.arrays;
  const { am, af, beta, gamma } = method;
  const { u, v, a, rhs, fd, total, next, sums } = work;
  const { inverse, ca } = system;
  const {
    drift: dMax,
    driftAt,
    overturning: oMax,
    displacement: uMax,
    velocity: vMax,
    acceleration: aMax,
  } = work.peaks;
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
  const top = n - 1;
  let input = sums[SUM.input];
  let damping = sums[SUM.damping];
  let largestGap = sums[SUM.largestGap];
  let largestInput = sums[SUM.largestInput];
  let kinetic = sums[SUM.kinetic];
  let strain = sums[SUM.strain];
  let last = to;
  for (let j = from + 1; j <= to; j++) {
    const agOld = ground[j - 1];
    const agNew = ground[j];
    const ag = wf * agNew + af * agOld;

    let x = u[0] + xv * v[0] + xa * a[0];
    let q = k[0] * x;
    for (let i = 0; i < top; i++) {
      const xNext = u[i + 1] + xv * v[i + 1] + xa * a[i + 1];
      const qNext = k[i + 1] * (xNext - x);
      rhs[i] = qNext - q - m[i] * (ag + am * a[i]) - fd[i] - ya * ca[i];
      x = xNext;
      q = qNext;
    }
    rhs[top] = -q - m[top] * (ag + am * a[top]) - fd[top] - ya * ca[top];

    productInto(inverse, rhs, next, n);

    let an = next[top];
    let un = u[top] + h * v[top] + b1 * a[top] + b0 * an;
    let fsAbove = 0;
    let kaAbove = 0;
    let overturning = 0;
    let motion = 0;
    let dampingStep = 0;
    let stopped = false;
    kinetic = 0;
    strain = 0;
    for (let i = top; i >= 0; i--) {
      let anBelow = 0;
      let unBelow = 0;
      if (i > 0) {
        anBelow = next[i - 1];
        unBelow = u[i - 1] + h * v[i - 1] + b1 * a[i - 1] + b0 * anBelow;
      }
      const mi = m[i];
      const d = un - unBelow;
      const fs = k[i] * d;
      const ka = k[i] * (an - anBelow);
      const vn = v[i] + g1 * a[i] + g0 * an;
      const can = perDamping * (rhs[i] - onMass * mi * an - onStiffness * (ka - kaAbove));
      const fdn = fd[i] + g1 * ca[i] + g0 * can;
      const totaln = (fsAbove - fs - fdn) / mi;
      const du = un - u[i];
      dampingStep += (fdn + fd[i]) * du;
      motion += mi * du;
      kinetic += mi * vn * vn;
      strain += fs * d;
      overturning += k0[i] * d * height[i];
      fd[i] = fdn;
      ca[i] = can;
      total[i] = totaln;
      u[i] = un;
      v[i] = vn;
      a[i] = an;
      const dAbs = Math.abs(d);
      if (dAbs > dMax[i]) {
        dMax[i] = dAbs;
        driftAt[i] = j;
        if (dAbs > stopDrift[i]) stopped = true;
      }
      const oAbs = Math.abs(overturning);
      if (oAbs > oMax[i]) oMax[i] = oAbs;
      const uAbs = Math.abs(un);
      if (uAbs > uMax[i]) uMax[i] = uAbs;
      const vAbs = Math.abs(vn);
      if (vAbs > vMax[i]) vMax[i] = vAbs;
      const tAbs = Math.abs(totaln);
      if (tAbs > aMax[i]) aMax[i] = tAbs;
      fsAbove = fs;
      kaAbove = ka;
      an = anBelow;
      un = unBelow;
    }
    input -= (agOld + agNew) * motion;
    damping += dampingStep;
    const gap = Math.abs(input - damping - kinetic - strain);
    if (gap > largestGap) largestGap = gap;
    if (input > largestInput) largestInput = input;
    if (stopped || !(gap < Number.POSITIVE_INFINITY)) {
      sums[SUM.stopped] = stopped ? 1 : 2;
      last = j;
      break;
    }
  }
  sums[SUM.input] = input;
  sums[SUM.damping] = damping;
  sums[SUM.kinetic] = kinetic;
  sums[SUM.strain] = strain;
  sums[SUM.largestGap] = largestGap;
  sums[SUM.largestInput] = largestInput;
  return last;
}

/** out = A x, A row-major n x n; four rows at a time, so that four sums run side by side. */
function productInto(a: Float64Array, x: Float64Array, out: Float64Array, n: number): void {
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
      const xc = x[c];
      s0 += a[r0 + c] * xc;
      s1 += a[r1 + c] * xc;
      s2 += a[r2 + c] * xc;
      s3 += a[r3 + c] * xc;
    }
    out[i] = s0;
    out[i + 1] = s1;
    out[i + 2] = s2;
    out[i + 3] = s3;
  }
  for (; i < n; i++) {
    let s = 0;
    for (let c = 0; c < n; c++) s += a[i * n + c] * x[c];
    out[i] = s;
  }
}
