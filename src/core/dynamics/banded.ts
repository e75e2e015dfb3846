import type { Problem } from './problem.ts';
import { SUM, type System, type Workspace } from './workspace.ts';

/**
 * Steps `from` + 1 to `to` of a linear frame whose damping is banded. Nothing is allocated and nothing checked in here. Two
 * sweeps a step: upwards the right-hand side and the elimination, downwards the substitution, the new state, energies and
 * peaks, so that each number is read while it is still in a register.
 *
 * Symbols: h step; m mass, k net storey stiffness, cf cs dashpots to the ground and between floors; u v a the state at the
 * step before; x y the weighted displacement and velocity predictors; q storey force of the predictors; l pivots as in
 * linalg/tridiagonal; d drift. Energies are kept doubled and halved when they leave.
 *
 * @returns the last step done: `to`, or the step at which a storey passed its stop drift (SUM.stopped = 1) or the numbers left
 *          the finite range (2)
 */
export function marchBanded(
  problem: Problem,
  work: Workspace,
  system: System & { kind: 'banded' },
  from: number,
  to: number,
): number {
  const { ground, step: h, method, stopDrift, prepared } = problem;
  const { n, mass: m, netStiffness: k, stiffness: k0, height } = prepared.arrays;
  const { am, af, beta, gamma } = method;
  const { u, v, a, rhs, fd, total, sums } = work;
  const { storey: cs, floor: cf, factors } = system;
  const { multiplier: l, pivotInverse } = factors;
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

    let ai = a[0];
    let y = v[0] + ya * ai;
    let x = u[0] + xv * v[0] + xa * ai;
    let q = k[0] * x + cs[0] * y;
    let carry = 0;
    for (let i = 0; i < top; i++) {
      const aNext = a[i + 1];
      const vNext = v[i + 1];
      const yNext = vNext + ya * aNext;
      const xNext = u[i + 1] + xv * vNext + xa * aNext;
      const qNext = k[i + 1] * (xNext - x) + cs[i + 1] * (yNext - y);
      carry = qNext - q - m[i] * (ag + am * ai) - cf[i] * y - l[i] * carry;
      rhs[i] = carry;
      ai = aNext;
      x = xNext;
      y = yNext;
      q = qNext;
    }
    carry = -q - m[top] * (ag + am * ai) - cf[top] * y - l[top] * carry;

    let an = carry * pivotInverse[top];
    let un = u[top] + h * v[top] + b1 * ai + b0 * an;
    let vn = v[top] + g1 * ai + g0 * an;
    let fsAbove = 0;
    let fcAbove = 0;
    let overturning = 0;
    let motion = 0;
    let dampingStep = 0;
    let stopped = false;
    kinetic = 0;
    strain = 0;
    for (let i = top; i >= 0; i--) {
      let anBelow = 0;
      let unBelow = 0;
      let vnBelow = 0;
      if (i > 0) {
        const aOld = a[i - 1];
        const vOld = v[i - 1];
        anBelow = rhs[i - 1] * pivotInverse[i - 1] - l[i] * an;
        unBelow = u[i - 1] + h * vOld + b1 * aOld + b0 * anBelow;
        vnBelow = vOld + g1 * aOld + g0 * anBelow;
      }
      const mi = m[i];
      const d = un - unBelow;
      const fs = k[i] * d;
      const fc = cs[i] * (vn - vnBelow);
      const fdn = cf[i] * vn + fc - fcAbove;
      const totaln = (fsAbove - fs - fdn) / mi;
      const du = un - u[i];
      dampingStep += (fdn + fd[i]) * du;
      motion += mi * du;
      kinetic += mi * vn * vn;
      strain += fs * d;
      overturning += k0[i] * d * height[i];
      fd[i] = fdn;
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
      fcAbove = fc;
      an = anBelow;
      un = unBelow;
      vn = vnBelow;
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
