/*
 * Twin of src/core/dynamics/yielding.ts with its bilinear and Bouc-Wen laws (beta = gamma, whole exponent), banded damping, no
 * dampers: the same solves, energies and peaks at every step, on the same numbers. Beside it the textbook way for the bilinear
 * frame: full Newton on the residual, from the tangent of the last state, until the residual is below the tolerance.
 *
 * stdin: law(0 bilinear, 1 Bouc-Wen) newton(0/1) n steps repeats h am af beta gamma exponent tolerance; a row each of m k height
 * cf cs strength kYield (n values); steps + 1 ground accelerations.
 * stdout: median and least microseconds a run; peak drifts; solves, input, damping, kinetic, strain (doubled).
 */
#define _GNU_SOURCE
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <time.h>

#define MOST 25
#define NODE_1 0.11270166537925831
#define NODE_3 0.8872983346207417
#define OUTER (5.0 / 18)
#define MIDDLE (8.0 / 18)

typedef struct {
  int n, steps, whole;
  double h, am, af, beta, gamma, tolerance;
  double *m, *k, *height, *cf, *cs, *strength, *kYield, *ground;
  double *u, *v, *a, *rhs, *next, *l, *perPivot, *fd, *total, *drift, *force, *z, *work, *trialDrift, *trialForce, *tangent;
  double *trialZ, *unloading, *intercept, *slope, *storeyForce, *coupling, *uAhead, *vAhead, *driftAhead, *rateAhead, *load;
  double *trialRate, *perGap, *perMass, *dMax, *dAt, *oMax, *uMax, *vMax, *tMax, *sMax, *yAt;
  double input, damping, kinetic, strain, solves;
} March;

static inline __attribute__((always_inline)) void trialBilinear(March *w, int i) {
  const double d = w->trialDrift[i], k = w->k[i], h = w->kYield[i], width = w->z[i];
  const double elastic = w->force[i] + k * (d - w->drift[i]), upper = h * d + width, lower = h * d - width;
  const int inside = elastic <= upper && elastic >= lower;
  w->trialForce[i] = inside ? elastic : elastic > upper ? upper : lower;
  w->tangent[i] = inside ? k : h;
}

static inline __attribute__((always_inline)) void commitBilinear(March *w, int i) {
  const double f0 = w->force[i], f1 = w->trialForce[i], step = w->trialDrift[i] - w->drift[i];
  const double above = f1 - f0 - w->kYield[i] * step;
  w->work[i] += 0.5 * ((f0 + f1) * step + above * (step - above * w->perGap[i]));
  w->drift[i] = w->trialDrift[i];
  w->force[i] = f1;
}

static inline __attribute__((always_inline)) void trialBoucWen(March *w, int i) {
  const double step = w->trialDrift[i] - w->drift[i], way = step > 0 ? 1 : step < 0 ? -1 : w->z[i] < 0 ? -1 : 1;
  const double k = w->k[i], kYield = w->kYield[i], y = way * step * k / w->strength[i];
  w->trialZ[i] = w->z[i];
  w->unloading[i] = 0;
  double slope = 1;
  if (way * w->z[i] < 0) {
    const double room = -way * w->z[i];
    w->unloading[i] = fmin(y, room);
    w->trialZ[i] = y < room ? way * (y - room) : 0;
  }
  const double rest = y - w->unloading[i];
  if (way * w->trialZ[i] >= 0) {
    const int n = w->whole;
    const double start = way * w->trialZ[i], room = 1 - start;
    double left = room, g = 0, gRate = 0, sum = 0, sumRate = 0;
    for (int stage = 0; stage < 4; stage++) {
      double ahead = 0;
      if (stage > 0) {
        const double part = stage < 3 ? 0.5 : 1;
        ahead = part * (g + rest * gRate);
        left = room * exp(-part * rest * g);
      }
      const double u = 1 - left;
      double power = 1;
      g = 1;
      for (int j = 1; j < n; j++) power *= u, g += power;
      gRate = (g - n * power) * ahead;
      const double weight = stage == 0 || stage == 3 ? 1.0 / 6 : 1.0 / 3;
      sum += weight * g;
      sumRate += weight * gRate;
    }
    const double gain = expm1(-rest * sum);
    w->trialZ[i] = way * (start - room * gain);
    slope = room * (1 + gain) * (sum + rest * sumRate);
  }
  w->trialForce[i] = kYield * w->trialDrift[i] + (1 - kYield / k) * w->strength[i] * w->trialZ[i];
  w->tangent[i] = kYield + (k - kYield) * slope;
}

static inline __attribute__((always_inline)) void commitBoucWen(March *w, int i) {
  const double d0 = w->drift[i], d1 = w->trialDrift[i], k = w->k[i], kYield = w->kYield[i], way = d1 > d0 ? 1 : -1;
  const double yieldDrift = w->strength[i] / k, from = way * w->z[i], to = way * w->trialZ[i];
  double integral = 0;
  if (from < 0) {
    const double part = fmin(to, 0) - from;
    integral = part * (from + 0.5 * part);
  }
  if (to > 0) {
    const double start = fmax(from, 0), part = to - start;
    integral += way * (d1 - d0) / yieldDrift - w->unloading[i];
    for (int node = 0; node < 3; node++) {
      const double u = start + part * (node == 0 ? NODE_1 : node == 1 ? 0.5 : NODE_3);
      double g = 1, power = 1;
      for (int j = 1; j < w->whole; j++) power *= u, g += power;
      integral -= (node == 1 ? MIDDLE : OUTER) * part / g;
    }
  }
  w->work[i] += 0.5 * kYield * (d0 + d1) * (d1 - d0) + (1 - kYield / k) * w->strength[i] * yieldDrift * integral;
  w->z[i] = w->trialZ[i];
  w->drift[i] = d1;
  w->force[i] = w->trialForce[i];
}

static inline __attribute__((always_inline)) int refactor(March *w, int from) {
  const double wf = 1 - w->af, b0 = wf * w->beta * w->h * w->h, g0 = wf * w->gamma * w->h, onMass = 1 - w->am;
  const int top = w->n - 1;
  double here = b0 * w->slope[from] + g0 * w->cs[from];
  w->coupling[from] = here;
  for (int i = from; i <= top; i++) {
    double above = 0;
    if (i < top) w->coupling[i + 1] = above = b0 * w->slope[i + 1] + g0 * w->cs[i + 1];
    double pivot = onMass * w->m[i] + g0 * w->cf[i] + here + above;
    if (i > 0) {
      w->l[i] = -here * w->perPivot[i - 1];
      pivot += w->l[i] * here;
    } else w->l[i] = 0;
    if (!(pivot > 0)) return 0;
    w->perPivot[i] = 1 / pivot;
    here = above;
  }
  return 1;
}

static inline __attribute__((always_inline)) void predict(March *w, double agOld, double agNew) {
  const double h = w->h, wf = 1 - w->af, b1 = (0.5 - w->beta) * h * h, g1 = (1 - w->gamma) * h, ag = wf * agNew + w->af * agOld;
  double uB = 0, vB = 0;
  for (int i = 0; i < w->n; i++) {
    const double a = w->a[i], v = w->v[i], u = w->u[i] + h * v + b1 * a, y = v + g1 * a;
    w->uAhead[i] = u, w->vAhead[i] = y, w->driftAhead[i] = u - uB, w->rateAhead[i] = y - vB;
    const double above = i < w->n - 1 ? w->storeyForce[i + 1] : 0;
    w->load[i] = w->af * (above - w->storeyForce[i]) - w->m[i] * (ag + w->am * a) - w->cf[i] * (wf * y + w->af * v);
    uB = u, vB = y;
  }
}

static inline __attribute__((always_inline)) void solveLines(March *w) {
  const double wf = 1 - w->af;
  const int top = w->n - 1;
  double s = w->intercept[0] + w->slope[0] * w->driftAhead[0] + w->cs[0] * w->rateAhead[0], r = 0;
  for (int i = 0; i < top; i++) {
    const double above = w->intercept[i + 1] + w->slope[i + 1] * w->driftAhead[i + 1] + w->cs[i + 1] * w->rateAhead[i + 1];
    r = w->load[i] + wf * (above - s) - w->l[i] * r;
    w->rhs[i] = r;
    s = above;
  }
  r = w->load[top] - wf * s - w->l[top] * r;
  double a = r * w->perPivot[top];
  w->next[top] = a;
  for (int i = top; i > 0; i--) w->next[i - 1] = a = w->rhs[i - 1] * w->perPivot[i - 1] - w->l[i] * a;
}

static inline __attribute__((always_inline)) void trial(March *w, int i, const int law) {
  if (law) trialBoucWen(w, i);
  else trialBilinear(w, i);
}

static inline __attribute__((always_inline)) int trials(March *w, const int law) {
  const double b0 = w->beta * w->h * w->h, g0 = w->gamma * w->h;
  double below = 0;
  int lowest = -1;
  for (int i = 0; i < w->n; i++) {
    const double a = w->next[i], d = w->driftAhead[i] + b0 * (a - below);
    w->trialRate[i] = w->rateAhead[i] + g0 * (a - below);
    below = a;
    w->trialDrift[i] = d;
    trial(w, i, law);
    if (fabs(w->trialForce[i] - w->intercept[i] - w->slope[i] * d) <= w->tolerance) continue;
    w->slope[i] = w->tangent[i];
    w->intercept[i] = w->trialForce[i] - w->tangent[i] * d;
    if (lowest < 0) lowest = i;
  }
  return lowest;
}

/* The textbook way: residual of the equations at the trial accelerations, its largest magnitude returned. */
static inline __attribute__((always_inline)) double residual(March *w, const int law) {
  const double b0 = w->beta * w->h * w->h, g0 = w->gamma * w->h, wf = 1 - w->af, onMass = 1 - w->am;
  double below = 0, largest = 0;
  for (int i = 0; i < w->n; i++) {
    const double a = w->next[i];
    w->trialDrift[i] = w->driftAhead[i] + b0 * (a - below);
    w->trialRate[i] = w->rateAhead[i] + g0 * (a - below);
    below = a;
    trial(w, i, law);
  }
  double above = 0;
  for (int i = w->n - 1; i >= 0; i--) {
    const double s = w->trialForce[i] + w->cs[i] * w->trialRate[i];
    const double r = w->load[i] + wf * (above - s) - onMass * w->m[i] * w->next[i] - wf * w->cf[i] * g0 * w->next[i];
    w->rhs[i] = r;
    above = s;
    largest = fmax(largest, fabs(r));
  }
  return largest;
}

static inline __attribute__((always_inline)) int solveNewton(March *w, const int law) {
  for (int i = 0; i < w->n; i++) w->next[i] = w->a[i];
  for (int count = 1; count <= MOST; count++) {
    if (residual(w, law) <= w->tolerance) return count - 1 > 0 ? count - 1 : 1;
    for (int i = 0; i < w->n; i++) w->slope[i] = w->tangent[i];
    if (!refactor(w, 0)) return 0;
    const int top = w->n - 1;
    double r = 0;
    for (int i = 0; i <= top; i++) w->rhs[i] = r = w->rhs[i] - w->l[i] * r;
    double d = w->rhs[top] * w->perPivot[top];
    w->next[top] += d;
    for (int i = top; i > 0; i--) {
      d = w->rhs[i - 1] * w->perPivot[i - 1] - w->l[i] * d;
      w->next[i - 1] += d;
    }
  }
  return 0;
}

static inline __attribute__((always_inline)) int solve(March *w, const int law) {
  for (int count = 1; count <= MOST; count++) {
    solveLines(w);
    const int changed = trials(w, law);
    if (changed < 0) return count;
    if (!refactor(w, changed > 0 ? changed - 1 : 0)) return 0;
  }
  return 0;
}

static inline __attribute__((always_inline)) void commit(March *w, int j, double agOld, double agNew, const int law) {
  const double b0 = w->beta * w->h * w->h, g0 = w->gamma * w->h;
  double above = 0, dashpotAbove = 0, overturning = 0, push = 0, dampingStep = 0, kinetic = 0, strain = 0;
  for (int i = w->n - 1; i >= 0; i--) {
    const double a = w->next[i], u = w->uAhead[i] + b0 * a, v = w->vAhead[i] + g0 * a, d = w->trialDrift[i], f = w->trialForce[i];
    if (law) commitBoucWen(w, i);
    else commitBilinear(w, i);
    const double dashpot = w->cs[i] * w->trialRate[i], fd = w->cf[i] * v + dashpot - dashpotAbove, m = w->m[i];
    w->storeyForce[i] = f + dashpot;
    dashpotAbove = dashpot;
    const double total = (above - f - fd) * w->perMass[i], du = u - w->u[i];
    dampingStep += (fd + w->fd[i]) * du;
    push += m * du;
    kinetic += m * v * v;
    strain += w->work[i];
    overturning += f * w->height[i];
    w->fd[i] = fd, w->total[i] = total, w->u[i] = u, w->v[i] = v, w->a[i] = a;
    const double dSize = fabs(d), sSize = fabs(f), oSize = fabs(overturning), uSize = fabs(u), vSize = fabs(v), tSize = fabs(total);
    if (dSize > w->dMax[i]) {
      w->dMax[i] = dSize, w->dAt[i] = j;
      if (w->yAt[i] == 0 && dSize * w->k[i] > w->strength[i]) w->yAt[i] = j;
    }
    if (sSize > w->sMax[i]) w->sMax[i] = sSize;
    if (oSize > w->oMax[i]) w->oMax[i] = oSize;
    if (uSize > w->uMax[i]) w->uMax[i] = uSize;
    if (vSize > w->vMax[i]) w->vMax[i] = vSize;
    if (tSize > w->tMax[i]) w->tMax[i] = tSize;
    above = f;
  }
  w->input -= (agOld + agNew) * push;
  w->damping += dampingStep;
  w->kinetic = kinetic;
  w->strain = 2 * strain;
}

static inline __attribute__((always_inline)) void march(March *w, const int law, const int newton) {
  for (int j = 1; j <= w->steps; j++) {
    const double agOld = w->ground[j - 1], agNew = w->ground[j];
    predict(w, agOld, agNew);
    const int used = newton ? solveNewton(w, law) : solve(w, law);
    if (!used) {
      fprintf(stderr, "step %d does not converge\n", j);
      exit(3);
    }
    w->solves += used;
    commit(w, j, agOld, agNew, law);
  }
}

static __attribute__((noinline)) void bilinearLines(March *w) { march(w, 0, 0); }
static __attribute__((noinline)) void bilinearNewton(March *w) { march(w, 0, 1); }
static __attribute__((noinline)) void boucWenLines(March *w) { march(w, 1, 0); }
static __attribute__((noinline)) void boucWenNewton(March *w) { march(w, 1, 1); }

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
  int law, newton, repeats;
  if (scanf("%d %d %d %d %d %lf %lf %lf %lf %lf %d %lf", &law, &newton, &w.n, &w.steps, &repeats, &w.h, &w.am, &w.af, &w.beta,
            &w.gamma, &w.whole, &w.tolerance) != 12)
    return 2;
  const int n = w.n;
  double **given[] = {&w.m, &w.k, &w.height, &w.cf, &w.cs, &w.strength, &w.kYield};
  for (int i = 0; i < 7; i++) *given[i] = row(n, 1);
  w.ground = row(w.steps + 1, 1);
  double **made[] = {&w.u, &w.v, &w.a, &w.rhs, &w.next, &w.l, &w.perPivot, &w.fd, &w.total, &w.drift, &w.force, &w.z, &w.work,
                     &w.trialDrift, &w.trialForce, &w.tangent, &w.trialZ, &w.unloading, &w.intercept, &w.slope, &w.storeyForce,
                     &w.coupling, &w.uAhead, &w.vAhead, &w.driftAhead, &w.rateAhead, &w.load, &w.trialRate, &w.perGap, &w.perMass, &w.dMax, &w.dAt,
                     &w.oMax, &w.uMax, &w.vMax, &w.tMax, &w.sMax, &w.yAt};
  const int count = sizeof made / sizeof *made;
  for (int i = 0; i < count; i++) *made[i] = row(n, 0);
  double *times = calloc(repeats, sizeof(double));
  for (int r = 0; r < repeats; r++) {
    for (int i = 0; i < count; i++) memset(*made[i], 0, n * sizeof(double));
    w.input = w.damping = w.solves = 0;
    for (int i = 0; i < n; i++) {
      w.a[i] = -w.ground[0];
      w.slope[i] = w.tangent[i] = w.k[i];
      w.perMass[i] = 1 / w.m[i];
      w.perGap[i] = 1 / (w.k[i] - w.kYield[i]);
      /* The offset of the bilinear law's lines stands in z. */
      if (!law) w.z[i] = w.strength[i] * (1 - w.kYield[i] / w.k[i]);
    }
    refactor(&w, 0);
    struct timespec t0, t1;
    clock_gettime(CLOCK_MONOTONIC, &t0);
    if (law) newton ? boucWenNewton(&w) : boucWenLines(&w);
    else newton ? bilinearNewton(&w) : bilinearLines(&w);
    clock_gettime(CLOCK_MONOTONIC, &t1);
    times[r] = (t1.tv_sec - t0.tv_sec) * 1e6 + (t1.tv_nsec - t0.tv_nsec) * 1e-3;
  }
  qsort(times, repeats, sizeof(double), ascending);
  printf("%.3f %.3f\n", times[repeats / 2], times[0]);
  for (int i = 0; i < n; i++) printf("%.17g ", w.dMax[i]);
  printf("\n%.17g %.17g %.17g %.17g %.17g\n", w.solves, w.input, w.damping, w.kinetic, w.strain);
  return 0;
}
