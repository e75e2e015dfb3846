/*
 * Twin of src/core/dynamics/stepping.ts: the same two sweeps, energies and peaks at every step, on the same numbers, once
 * with dashpots (banded damping) and once with a full damping matrix (the step's matrix comes inverted). Arrays a quantity,
 * restrict: faster in C than the records that suit JavaScript.
 *
 * stdin: full(0/1) n steps repeats h am af beta gamma; a row each of m k lever cf cs l perPivot rate (n values); n x n of the
 * inverse where full; steps + 1 ground accelerations.
 * stdout: median and least microseconds a run; peak drifts; input damping kinetic strain (doubled).
 */
#define _GNU_SOURCE
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

typedef struct {
  int full, n, steps;
  double h, am, af, beta, gamma;
  double *m, *k, *lever, *cf, *cs, *l, *perPivot, *rate, *inverse, *ground;
  double *u, *v, *a, *rhs, *next, *fd, *ca, *total, *dMax, *dAt, *oMax, *uMax, *vMax, *tMax;
  double input, damping, kinetic, strain;
} March;

/* Not inlined into one another, so that `full` is a constant in each of the two marches below. */
static inline __attribute__((always_inline)) void march(March *w, const int full) {
  const int n = w->n, top = n - 1;
  const double *restrict m = w->m, *restrict k = w->k, *restrict lever = w->lever, *restrict cf = w->cf, *restrict cs = w->cs;
  const double *restrict l = w->l, *restrict perPivot = w->perPivot, *restrict inverse = w->inverse, *restrict ground = w->ground;
  double *restrict u = w->u, *restrict v = w->v, *restrict a = w->a, *restrict rhs = w->rhs, *restrict next = w->next;
  double *restrict fd = w->fd, *restrict ca = w->ca, *restrict total = w->total, *restrict dMax = w->dMax, *restrict dAt = w->dAt;
  double *restrict oMax = w->oMax, *restrict uMax = w->uMax, *restrict vMax = w->vMax, *restrict tMax = w->tMax;
  const double h = w->h, am = w->am, af = w->af, wf = 1 - af;
  const double b0 = w->beta * h * h, b1 = (0.5 - w->beta) * h * h, g0 = w->gamma * h, g1 = (1 - w->gamma) * h;
  const double xv = wf * h, xa = wf * b1, ya = wf * g1, onMass = 1 - am, onStiffness = wf * b0, perDamping = 1 / (wf * g0);
  double input = 0, damping = 0, kinetic = 0, strain = 0, largestGap = 0, largestInput = 0;
  for (int j = 1; j <= w->steps; j++) {
    const double agOld = ground[j - 1], agNew = ground[j], ag = wf * agNew + af * agOld;
    double ai = a[0], y = v[0] + ya * ai, x = u[0] + xv * v[0] + xa * ai, q = k[0] * x + (full ? 0 : cs[0] * y), r = 0;
    for (int i = 0; i < top; i++) {
      const double aA = a[i + 1], vA = v[i + 1], yA = vA + ya * aA, xA = u[i + 1] + xv * vA + xa * aA;
      const double qA = k[i + 1] * (xA - x) + (full ? 0 : cs[i + 1] * (yA - y));
      r = qA - q - m[i] * (ag + am * ai) - (full ? fd[i] + ya * ca[i] : cf[i] * y + l[i] * r);
      rhs[i] = r;
      ai = aA, x = xA, y = yA, q = qA;
    }
    r = -q - m[top] * (ag + am * ai) - (full ? fd[top] + ya * ca[top] : cf[top] * y + l[top] * r);
    rhs[top] = r;
    if (full) {
      /* By columns: the compiler makes vector instructions of this form. */
      for (int i = 0; i < n; i++) next[i] = 0;
      for (int c = 0; c < n; c++)
        for (int i = 0; i < n; i++) next[i] += inverse[c * n + i] * rhs[c];
    }
    double an = full ? next[top] : r * perPivot[top];
    double un = u[top] + h * v[top] + b1 * ai + b0 * an, vn = v[top] + g1 * ai + g0 * an;
    double fsA = 0, fcA = 0, kaA = 0, overturning = 0, push = 0, dampingStep = 0;
    kinetic = 0, strain = 0;
    for (int i = top; i >= 0; i--) {
      double anB = 0, unB = 0, vnB = 0;
      if (i > 0) {
        const double aB = a[i - 1], vB = v[i - 1];
        anB = full ? next[i - 1] : rhs[i - 1] * perPivot[i - 1] - l[i] * an;
        unB = u[i - 1] + h * vB + b1 * aB + b0 * anB;
        vnB = vB + g1 * aB + g0 * anB;
      }
      const double mi = m[i], d = un - unB, fs = k[i] * d;
      double fdn;
      if (full) {
        const double ka = k[i] * (an - anB), can = perDamping * (rhs[i] - onMass * mi * an - onStiffness * (ka - kaA));
        fdn = fd[i] + g1 * ca[i] + g0 * can;
        ca[i] = can;
        kaA = ka;
      } else {
        const double fc = cs[i] * (vn - vnB);
        fdn = cf[i] * vn + fc - fcA;
        fcA = fc;
      }
      const double t = (fsA - fs - fdn) / mi, du = un - u[i];
      dampingStep += (fdn + fd[i]) * du;
      push += mi * du;
      kinetic += mi * vn * vn;
      strain += fs * d;
      overturning += lever[i] * d;
      fd[i] = fdn, total[i] = t, u[i] = un, v[i] = vn, a[i] = an;
      const double dSize = fabs(d), oSize = fabs(overturning), uSize = fabs(un), vSize = fabs(vn), tSize = fabs(t);
      if (dSize > dMax[i]) dMax[i] = dSize, dAt[i] = j;
      if (oSize > oMax[i]) oMax[i] = oSize;
      if (uSize > uMax[i]) uMax[i] = uSize;
      if (vSize > vMax[i]) vMax[i] = vSize;
      if (tSize > tMax[i]) tMax[i] = tSize;
      fsA = fs, an = anB, un = unB, vn = vnB;
    }
    input -= (agOld + agNew) * push;
    damping += dampingStep;
    const double gap = fabs(input - damping - kinetic - strain);
    if (gap > largestGap) largestGap = gap;
    if (input > largestInput) largestInput = input;
    if (!(gap < INFINITY)) break;
  }
  w->input = input, w->damping = damping, w->kinetic = kinetic, w->strain = strain;
}

static __attribute__((noinline)) void marchBanded(March *w) { march(w, 0); }
static __attribute__((noinline)) void marchFull(March *w) { march(w, 1); }

static double *row(int count, int given) {
  double *x = calloc(count, sizeof(double));
  for (int i = 0; given && i < count; i++)
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
  if (scanf("%d %d %d %d %lf %lf %lf %lf %lf", &w.full, &w.n, &w.steps, &repeats, &w.h, &w.am, &w.af, &w.beta, &w.gamma) != 9) return 2;
  const int n = w.n;
  double **given[] = {&w.m, &w.k, &w.lever, &w.cf, &w.cs, &w.l, &w.perPivot, &w.rate};
  for (int i = 0; i < 8; i++) *given[i] = row(n, 1);
  w.inverse = row(n * n, w.full);
  w.ground = row(w.steps + 1, 1);
  double **made[] = {&w.u, &w.v, &w.a, &w.rhs, &w.next, &w.fd, &w.ca, &w.total, &w.dMax, &w.dAt, &w.oMax, &w.uMax, &w.vMax, &w.tMax};
  const int count = sizeof made / sizeof *made;
  for (int i = 0; i < count; i++) *made[i] = row(n, 0);
  double *times = calloc(repeats, sizeof(double));
  for (int r = 0; r < repeats; r++) {
    for (int i = 0; i < count; i++) memset(*made[i], 0, n * sizeof(double));
    for (int i = 0; i < n; i++) w.a[i] = -w.ground[0], w.ca[i] = w.rate[i];
    struct timespec t0, t1;
    clock_gettime(CLOCK_MONOTONIC, &t0);
    if (w.full) marchFull(&w);
    else marchBanded(&w);
    clock_gettime(CLOCK_MONOTONIC, &t1);
    times[r] = (t1.tv_sec - t0.tv_sec) * 1e6 + (t1.tv_nsec - t0.tv_nsec) * 1e-3;
  }
  qsort(times, repeats, sizeof(double), ascending);
  printf("%.3f %.3f\n", times[repeats / 2], times[0]);
  for (int i = 0; i < n; i++) printf("%.17g ", w.dMax[i]);
  printf("\n%.17g %.17g %.17g %.17g\n", w.input, w.damping, w.kinetic, w.strain);
  return 0;
}
