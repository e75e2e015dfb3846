/*
 * Twin of src/core/dynamics/banded.ts: the same two sweeps, energies and peaks at every step, on the same numbers.
 * Input on stdin (text): n steps repeats h am af beta gamma, then a row each of m k k0 height cf cs l pivotInverse (n values),
 * then steps + 1 ground accelerations. Output: median and least microseconds a run, then the peak drifts and the energies.
 */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

typedef struct {
  int n, steps;
  double h, am, af, beta, gamma;
  double *m, *k, *k0, *height, *cf, *cs, *l, *pivotInverse, *ground;
  double *u, *v, *a, *rhs, *fd, *total, *dMax, *driftAt, *oMax, *uMax, *vMax, *aMax;
  double input, damping, kinetic, strain, largestGap, largestInput;
} March;

static void march(March *w) {
  const int n = w->n, top = n - 1;
  const double *restrict m = w->m, *restrict k = w->k, *restrict k0 = w->k0, *restrict height = w->height;
  const double *restrict cf = w->cf, *restrict cs = w->cs, *restrict l = w->l, *restrict pivotInverse = w->pivotInverse;
  const double *restrict ground = w->ground;
  double *restrict u = w->u, *restrict v = w->v, *restrict a = w->a, *restrict rhs = w->rhs, *restrict fd = w->fd, *restrict total = w->total;
  double *restrict dMax = w->dMax, *restrict driftAt = w->driftAt, *restrict oMax = w->oMax, *restrict uMax = w->uMax,
         *restrict vMax = w->vMax, *restrict aMax = w->aMax;
  const double h = w->h, am = w->am, af = w->af, wf = 1 - af;
  const double b0 = w->beta * h * h, b1 = (0.5 - w->beta) * h * h, g0 = w->gamma * h, g1 = (1 - w->gamma) * h;
  const double xv = wf * h, xa = wf * b1, ya = wf * g1;
  double input = 0, damping = 0, kinetic = 0, strain = 0, largestGap = 0, largestInput = 0;
  for (int j = 1; j <= w->steps; j++) {
    const double agOld = ground[j - 1], agNew = ground[j], ag = wf * agNew + af * agOld;
    double ai = a[0], y = v[0] + ya * ai, x = u[0] + xv * v[0] + xa * ai, q = k[0] * x + cs[0] * y, carry = 0;
    for (int i = 0; i < top; i++) {
      const double aNext = a[i + 1], vNext = v[i + 1];
      const double yNext = vNext + ya * aNext, xNext = u[i + 1] + xv * vNext + xa * aNext;
      const double qNext = k[i + 1] * (xNext - x) + cs[i + 1] * (yNext - y);
      carry = qNext - q - m[i] * (ag + am * ai) - cf[i] * y - l[i] * carry;
      rhs[i] = carry;
      ai = aNext;
      x = xNext;
      y = yNext;
      q = qNext;
    }
    carry = -q - m[top] * (ag + am * ai) - cf[top] * y - l[top] * carry;
    double an = carry * pivotInverse[top];
    double un = u[top] + h * v[top] + b1 * ai + b0 * an, vn = v[top] + g1 * ai + g0 * an;
    double fsAbove = 0, fcAbove = 0, overturning = 0, motion = 0, dampingStep = 0;
    kinetic = 0;
    strain = 0;
    for (int i = top; i >= 0; i--) {
      double anBelow = 0, unBelow = 0, vnBelow = 0;
      if (i > 0) {
        const double aOld = a[i - 1], vOld = v[i - 1];
        anBelow = rhs[i - 1] * pivotInverse[i - 1] - l[i] * an;
        unBelow = u[i - 1] + h * vOld + b1 * aOld + b0 * anBelow;
        vnBelow = vOld + g1 * aOld + g0 * anBelow;
      }
      const double mi = m[i], d = un - unBelow, fs = k[i] * d, fc = cs[i] * (vn - vnBelow);
      const double fdn = cf[i] * vn + fc - fcAbove, totaln = (fsAbove - fs - fdn) / mi, du = un - u[i];
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
      const double dAbs = fabs(d), oAbs = fabs(overturning), uAbs = fabs(un), vAbs = fabs(vn), tAbs = fabs(totaln);
      if (dAbs > dMax[i]) {
        dMax[i] = dAbs;
        driftAt[i] = j;
      }
      if (oAbs > oMax[i]) oMax[i] = oAbs;
      if (uAbs > uMax[i]) uMax[i] = uAbs;
      if (vAbs > vMax[i]) vMax[i] = vAbs;
      if (tAbs > aMax[i]) aMax[i] = tAbs;
      fsAbove = fs;
      fcAbove = fc;
      an = anBelow;
      un = unBelow;
      vn = vnBelow;
    }
    input -= (agOld + agNew) * motion;
    damping += dampingStep;
    const double gap = fabs(input - damping - kinetic - strain);
    if (gap > largestGap) largestGap = gap;
    if (input > largestInput) largestInput = input;
    if (!(gap < INFINITY)) break;
  }
  w->input = input;
  w->damping = damping;
  w->kinetic = kinetic;
  w->strain = strain;
  w->largestGap = largestGap;
  w->largestInput = largestInput;
}

static double *row(int n, int given) {
  double *x = calloc(n, sizeof(double));
  for (int i = 0; given && i < n; i++)
    if (scanf("%lf", x + i) != 1) exit(2);
  return x;
}

static int ascending(const void *p, const void *q) {
  const double a = *(const double *)p, b = *(const double *)q;
  return (a > b) - (a < b);
}

int main(void) {
  March w = {0};
  int repeats;
  if (scanf("%d %d %d %lf %lf %lf %lf %lf", &w.n, &w.steps, &repeats, &w.h, &w.am, &w.af, &w.beta, &w.gamma) != 8) return 2;
  const int n = w.n;
  double **given[] = {&w.m, &w.k, &w.k0, &w.height, &w.cf, &w.cs, &w.l, &w.pivotInverse};
  for (int i = 0; i < 8; i++) *given[i] = row(n, 1);
  w.ground = row(w.steps + 1, 1);
  double **made[] = {&w.u, &w.v, &w.a, &w.rhs, &w.fd, &w.total, &w.dMax, &w.driftAt, &w.oMax, &w.uMax, &w.vMax, &w.aMax};
  for (int i = 0; i < 12; i++) *made[i] = row(n, 0);
  double *times = calloc(repeats, sizeof(double));
  for (int r = 0; r < repeats; r++) {
    for (int i = 0; i < 12; i++) memset(*made[i], 0, n * sizeof(double));
    for (int i = 0; i < n; i++) w.a[i] = -w.ground[0];
    struct timespec t0, t1;
    clock_gettime(CLOCK_MONOTONIC, &t0);
    march(&w);
    clock_gettime(CLOCK_MONOTONIC, &t1);
    times[r] = (t1.tv_sec - t0.tv_sec) * 1e6 + (t1.tv_nsec - t0.tv_nsec) * 1e-3;
  }
  qsort(times, repeats, sizeof(double), ascending);
  printf("%.3f %.3f\n", times[repeats / 2], times[0]);
  for (int i = 0; i < n; i++) printf("%.17g ", w.dMax[i]);
  printf("\n%.17g %.17g %.17g %.17g\n", w.input, w.damping, w.kinetic, w.strain);
  return 0;
}
