"""Tight integration of a yielding shear frame: one smooth piece after the other, by scipy's DOP853.

Pieces end at every sample of the motion, at every change of branch, at every turn of a storey with a Bouc-Wen law or a damper
of a power other than 1, and at every zero of a Bouc-Wen storey's z. Between them the equations are smooth. Relative tolerance
1e-10. Ends are looked for on the dense output at eight places a step (a step is an eighth of the interval at most) and at each
turn of a drift between them, and found by Brent's method; so are the peaks.

Definitions (damping, P-Delta, dampers, residual, energies, peaks) are those of the project file; nothing is taken from the program.
"""
import math

import numpy as np
from scipy.integrate import DOP853
from scipy.linalg import eigh
from scipy.optimize import brentq, minimize_scalar

from storey_laws import law_of

G = 9.80665
RTOL = 1e-10
# A damper's force is taken as linear below this drift velocity [m/s]: a storey that turns is under it for less than a microsecond.
SLOW = 1e-6
# Functions that end a piece count as passed beyond this [m, m/s or -].
TOUCH = 1e-13
PLACES = 8


class Frame:
    def __init__(self, frame, slow):
        rows = frame["storeys"]
        self.n = len(rows)
        column = lambda key: np.array([float(row[key]) for row in rows])
        self.mass, self.height, self.stiffness = column("mass"), column("height"), column("stiffness")
        gravity = np.array([row.get("gravity", row["mass"] * G) for row in rows])
        above = np.cumsum(gravity[::-1])[::-1]
        self.p_over_h = above / self.height if frame["pDelta"] else np.zeros(self.n)
        self.laws = [law_of(row) for row in rows]
        self.smooth = [i for i in range(self.n) if self.laws[i].smooth]
        self.at_z = {i: j for j, i in enumerate(self.smooth)}
        dampers = [row.get("damper", {"coefficient": 0.0, "exponent": 1.0}) for row in rows]
        self.damper = np.array([d["coefficient"] for d in dampers])
        self.exponent = np.array([d["exponent"] for d in dampers])
        self.slow = slow
        self.slow_slope = self.damper * slow ** (self.exponent - 1)
        self.turning = [
            i for i in range(self.n) if self.laws[i].smooth or (self.damper[i] > 0 and self.exponent[i] != 1)
        ]
        self.isolator = np.array([row.get("role") == "isolator" for row in rows])
        net = self.stiffness - self.p_over_h
        assert (net > 0).all(), "unstable under gravity"
        T = np.eye(self.n) - np.eye(self.n, k=-1)
        squares, self.shapes = eigh(T.T @ np.diag(net) @ T, np.diag(self.mass))
        self.frequencies = np.sqrt(squares)
        self.period = 2 * math.pi / self.frequencies[0]
        self.damp(frame["damping"], net)

    def damp(self, damping, net):
        """Floor dashpots, storey dashpots, factor on the tangent, full matrix."""
        n, w = self.n, self.frequencies
        self.to_ground, self.dashpot, self.on_tangent = np.zeros(n), np.zeros(n), 0.0
        self.full = None
        kind = damping["kind"]
        if kind == "rayleigh":
            i, j = (m - 1 for m in damping["modes"])
            a0, a1 = np.linalg.solve([[1 / w[i], w[i]], [1 / w[j], w[j]]], 2 * np.array(damping["ratios"]))
            if self.isolator.any():
                # Above an isolator the floors are damped against the floor on it.
                apart = np.eye(n)[1:] - np.eye(n)[0]
                self.full = apart.T @ np.diag(a0 * self.mass[1:]) @ apart
            else:
                self.to_ground = a0 * self.mass
            if damping.get("stiffness") == "tangent":
                self.on_tangent = a1
            else:
                self.dashpot = np.where(self.isolator, 0.0, a1 * net)
        elif kind == "stiffness-proportional":
            self.dashpot = np.where(self.isolator, 0.0, 2 * damping["ratio"] / w[damping["mode"] - 1] * net)
        elif kind == "modal":
            ratios = damping["ratios"]
            ratios = np.array([ratios[min(r, len(ratios) - 1)] for r in range(n)])
            # Shapes from eigh have unit modal mass.
            weighted = self.mass[:, None] * self.shapes
            self.full = weighted @ np.diag(2 * ratios * w) @ weighted.T
        else:
            assert kind == "none"


class March:
    """State: u, v of each floor; z of each Bouc-Wen storey; over the total mass the work of each restoring force, of each
    damper, of C and of the ground; the integral of each drift."""

    def __init__(self, frame, motion, analysis, rtol=RTOL, slow=SLOW):
        self.f = f = Frame(frame, slow)
        self.rtol = rtol
        n, b = f.n, len(f.smooth)
        self.parts = np.cumsum([0, n, n, b, n, n, 1, 1, n])
        self.size = self.parts[-1]
        self.total_mass = f.mass.sum()
        self.interval = motion["interval"]
        self.ag = np.append(np.array(motion["acceleration"]) * motion["scale"], 0.0)
        self.end = (len(motion["acceleration"]) - 1) * self.interval + analysis["tail"]
        self.settling = self.end - f.period
        scale = [1e-13] * n + [1e-12] * n + [1e-11] * b + [1e-12] * (2 * n + 2) + [1e-12] * n
        self.atol = np.array(scale)
        self.sign = np.ones(n)
        self.peaks = {}
        self.pieces = 0
        self.changes = [0] * n

    def split(self, y):
        return [y[a:b] for a, b in zip(self.parts[:-1], self.parts[1:])]

    def straight(self):
        """Lines of the branches as arrays, made anew for each piece."""
        f = self.f
        lines = [(0.0, 0.0) if law.smooth else (law.intercept, law.slope) for law in f.laws]
        self.intercept, self.slope = (np.array(c) for c in zip(*lines))

    def forces(self, u, v, z):
        """Drift, its rate, restoring force, damper force, all of C v, net force on the floors; arrays may be n x places."""
        f = self.f
        wide = (lambda a: a[:, None]) if u.ndim > 1 else (lambda a: a)
        zero = np.zeros_like(u[:1])
        drift, rate = np.diff(u, axis=0, prepend=zero), np.diff(v, axis=0, prepend=zero)
        restoring = wide(self.intercept) + wide(self.slope) * drift
        for i, j in f.at_z.items():
            restoring[i] = f.laws[i].force(drift[i], z[j])
        size = np.maximum(np.abs(rate), f.slow)
        damper = np.where(
            np.abs(rate) > f.slow, wide(f.damper) * size ** (wide(f.exponent) - 1) * rate, wide(f.slow_slope) * rate
        )
        if f.on_tangent:
            tangent = wide(self.slope) + zero
            for i, j in f.at_z.items():
                tangent[i] = f.laws[i].tangent(z[j], self.sign[i])
            dash = f.on_tangent * (tangent - wide(f.p_over_h)) * rate
        else:
            dash = wide(f.dashpot) * rate
        dash_work = (dash * rate).sum(axis=0) + (wide(f.to_ground) * v * v).sum(axis=0)
        storey = restoring - wide(f.p_over_h) * drift + damper + dash
        net = np.diff(storey, axis=0, append=zero) - wide(f.to_ground) * v
        if f.full is not None:
            cv = f.full @ v
            net = net - cv
            dash_work = dash_work + (v * cv).sum(axis=0)
        return drift, rate, restoring, damper, dash_work, net

    def slopes(self, t, y):
        f = self.f
        u, v, z, *_ = self.split(y)
        drift, rate, restoring, damper, dash_work, net = self.forces(u, v, z)
        ag = self.ag0 + self.ag1 * (t - self.t0)
        out = np.empty(self.size)
        n = f.n
        out[:n] = v
        out[n : 2 * n] = net / f.mass - ag
        at = 2 * n
        for i, j in f.at_z.items():
            out[at + j] = f.laws[i].per_drift(z[j], self.sign[i]) * rate[i]
        at += len(f.smooth)
        out[at : at + n] = restoring * rate / self.total_mass
        out[at + n : at + 2 * n] = damper * rate / self.total_mass
        out[at + 2 * n] = dash_work / self.total_mass
        out[at + 2 * n + 1] = -ag * (f.mass @ v) / self.total_mass
        out[at + 2 * n + 2 :] = drift
        return out

    def enders(self):
        """(storey, why, function of y and the place): above zero where the piece is over."""
        n, out = self.f.n, []
        before = lambda i: (0 if i == 0 else i - 1)
        drift = lambda y, i: y[i] - (y[before(i)] if i else 0.0)
        rate = lambda y, i: y[n + i] - (y[n + before(i)] if i else 0.0)
        for i, law in enumerate(self.f.laws):
            if law.smooth:
                j = self.parts[2] + self.f.at_z[i]
                out.append((i, "zero", lambda y, j=j, s=self.z_sign[i]: -s * y[j]))
            else:
                if law.up < math.inf:
                    out.append((i, "up", lambda y, i=i, at=law.up: drift(y, i) - at))
                if law.down > -math.inf:
                    out.append((i, "down", lambda y, i=i, at=law.down: at - drift(y, i)))
                if law.heading:
                    out.append((i, "turn", lambda y, i=i, s=law.heading: -s * rate(y, i)))
        for i in self.f.turning:
            out.append((i, "sign", lambda y, i=i, s=self.sign[i]: -s * rate(y, i)))
        self.rate = rate
        return out

    def run(self):
        y = np.zeros(self.size)
        self.z_sign = np.ones(self.f.n)
        t, sample = 0.0, 0
        limits = [self.interval * j for j in range(1, int(self.end / self.interval) + 2)]
        stops = sorted({min(s, self.end) for s in limits} | {self.settling})
        for stop in stops:
            if stop <= t:
                continue
            sample = int(t / self.interval + 1e-6)
            ag = [self.ag[k] if k < len(self.ag) else 0.0 for k in (sample, sample + 1)]
            self.ag0, self.ag1, self.t0 = ag[0], (ag[1] - ag[0]) / self.interval, sample * self.interval
            while t < stop:
                t, y = self.piece(t, y, stop)
            if stop == self.settling:
                y[self.parts[7] :] = 0.0
        self.y = y
        return self.answer()

    def piece(self, t, y, stop):
        """From t to `stop` or to the first change."""
        self.pieces += 1
        self.straight()
        enders = self.enders()
        solver = DOP853(self.slopes, t, y, stop, max_step=self.interval / 8, rtol=self.rtol, atol=self.atol)
        while solver.status == "running":
            message = solver.step()
            assert solver.status != "failed", message
            dense = solver.dense_output()
            places = np.linspace(solver.t_old, solver.t, PLACES + 1)
            ys = dense(places)
            # Turns of drifts between the places: a limit could be passed and left again there.
            extra = []
            for i in range(self.f.n):
                r = self.rate(ys, i)
                for k in np.flatnonzero(r[:-1] * r[1:] < 0):
                    extra.append(brentq(lambda s: self.rate(dense(s), i), places[k], places[k + 1], xtol=1e-15))
            if extra:
                places = np.unique(np.concatenate([places, extra]))
                ys = dense(places)
            first = None
            for i, why, g in enders:
                values = g(ys)
                over = np.flatnonzero(values > TOUCH)
                if len(over) == 0:
                    continue
                k = over[0]
                if k == 0 or values[k - 1] >= 0:
                    root = places[max(k - 1, 0)]
                else:
                    root = brentq(lambda s: g(dense(s)), places[k - 1], places[k], xtol=1e-15, rtol=1e-15)
                if first is None or root < first[0]:
                    first = (root, i, why)
            if first is None:
                self.watch(places, ys, dense)
                continue
            root, i, why = first
            keep = places < root
            now = dense(root) if root > t else y
            self.watch(np.append(places[keep], root), np.column_stack([ys[:, keep], now]), dense)
            self.change(now, i, why)
            return root, now
        return solver.t, solver.y

    def change(self, y, i, why):
        if why == "sign":
            self.sign[i] = -self.sign[i]
        elif why == "zero":
            self.z_sign[i] = -self.z_sign[i]
        else:
            self.changes[i] += 1
            before = self.f.laws[i]
            x = y[i] - (y[i - 1] if i else 0.0)
            force = before.force(x)
            before.leave(x, why)
            assert abs(before.force(x) - force) < 1e-6 * before.k * 0.01, "the force jumps"

    def watched(self, t, y):
        """Quantities whose largest magnitude is asked for, n x places each."""
        u, v, z, *_ = self.split(y)
        drift, _, restoring, damper, _, net = self.forces(u, v, z)
        return {"drift": drift, "shear": restoring + damper, "acceleration": net / self.mass_like(u)}

    def mass_like(self, u):
        return self.f.mass[:, None] if u.ndim > 1 else self.f.mass

    def watch(self, places, ys, dense):
        """Largest magnitudes, between the places too."""
        for name, values in self.watched(places, ys).items():
            size = np.abs(values)
            for i, k in enumerate(size.argmax(axis=1)):
                best, _ = self.peaks.get((name, i), (0.0, 0.0))
                if size[i, k] < 0.995 * best or len(places) < 2:
                    continue
                found, when = size[i, k], places[k]
                low, high = places[max(k - 1, 0)], places[min(k + 1, len(places) - 1)]
                if high > low:
                    way = math.copysign(1.0, values[i, k])
                    top = minimize_scalar(
                        lambda s: -way * self.watched(s, dense(s))[name][i],
                        bounds=(low, high),
                        method="bounded",
                        options={"xatol": 1e-9},
                    )
                    if -top.fun > found:
                        found, when = -top.fun, top.x
                if found > best:
                    self.peaks[name, i] = (found, when)

    def answer(self):
        f, M = self.f, self.total_mass
        u, v, z, work, damper_work, damping, input_, over = self.split(self.y)
        drift = np.diff(u, prepend=0.0)
        self.straight()
        recoverable = np.array(
            [
                law.recoverable(x, z[f.at_z[i]] if law.smooth else law.force(x))
                for i, (law, x) in enumerate(zip(f.laws, drift))
            ]
        )
        kinetic = (f.mass * v * v).sum() / 2
        hysteretic = work * M - recoverable
        strain = recoverable.sum() - (f.p_over_h * drift**2).sum() / 2
        energy = {
            "input": input_[0] * M,
            "kinetic": kinetic,
            "strain": strain,
            "damping": damping[0] * M,
            "dampers": damper_work.sum() * M,
            "hysteretic": hysteretic.sum(),
        }
        gap = energy["input"] - sum(value for key, value in energy.items() if key != "input")
        self.imbalance = abs(gap) / energy["input"]
        column = lambda name, part: [self.peaks[name, i][part] for i in range(f.n)]
        yields = np.array([getattr(law, "fy", math.inf) / law.k for law in f.laws])
        return {
            "period": f.period,
            "peakDrift": column("drift", 0),
            "peakTime": column("drift", 1),
            "peakShear": column("shear", 0),
            "peakAcceleration": column("acceleration", 0),
            "residualDrift": (over / f.period).tolist(),
            "ductility": [p / x if math.isfinite(x) else None for p, x in zip(column("drift", 0), yields)],
            "dissipated": hysteretic.tolist(),
            "damperWork": (damper_work * M).tolist(),
            "energy": energy,
        }
