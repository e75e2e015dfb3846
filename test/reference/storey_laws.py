"""Restoring forces of a storey as branches, written from their definitions for the reference integration.

A branch is a straight line force = intercept + slope x drift. It ends where the drift rises to `up` or falls to `down`, or, where
`heading` is not zero, where the drift turns against that heading. `leave` then says which branch follows. Bouc-Wen has one
branch and a state z of its own.

Symbols: k initial stiffness [N/m], h hardening ratio, fy strength [N], xy = fy / k yield drift [m].
"""
import math

INF = math.inf


class Branches:
    """What all piecewise-linear laws share. Force and line are continuous at every change of branch."""

    smooth = False

    def __init__(self, k, law):
        self.k = k
        self.h = law.get("hardening", 0.0)
        self.fy = law.get("strength", INF)
        self.xy = self.fy / k
        self.to(0.0, 0.0, k, -self.xy, self.xy)

    def to(self, x, f, slope, down, up, heading=0):
        """The branch through (x, f)."""
        self.intercept, self.slope = f - slope * x, slope
        self.down, self.up, self.heading = down, up, heading

    def force(self, x):
        return self.intercept + self.slope * x

    def envelope(self, x, way):
        """Post-yield line on the side `way` (+1 or -1), from x on."""
        self.to(x, self.h * self.k * x + way * (1 - self.h) * self.fy, self.h * self.k, -INF, INF, way)

    def recoverable(self, x, f):
        return f * f / (2 * self.k)


class Elastic(Branches):
    def leave(self, x, why):
        raise AssertionError("an elastic storey has one branch")


class Bilinear(Branches):
    """Kinematic hardening: the elastic range keeps its width 2 fy / k and moves along the post-yield lines."""

    def leave(self, x, why):
        if why == "turn":
            f, way = self.force(x), self.heading
            other = x - way * 2 * self.xy
            self.to(x, f, self.k, min(x, other), max(x, other))
        else:
            self.envelope(x, 1 if why == "up" else -1)


class Flag(Branches):
    """Upper line h k x + (1 - h) fy, lower line `ratio` fy below it as far as the elastic line through the origin; mirrored."""

    def __init__(self, k, law):
        super().__init__(k, law)
        self.drop = law["ratio"] * self.fy
        self.meet = self.fy * (1 - law["ratio"] / (1 - self.h)) / k
        self.width = self.drop / (k * (1 - self.h))
        self.place = "origin"

    def leave(self, x, why):
        f, way = self.force(x), (1 if why == "up" else -1)
        if self.place == "origin":
            self.place, self.side = "outer", way
            self.envelope(x, way)
        elif self.place == "inner" and way == self.side:
            self.place = "outer"
            self.envelope(x, way)
        elif self.place == "inner":
            self.place = "lower"
            end = self.side * self.meet
            self.to(x, f, self.h * self.k, end if self.side > 0 else -INF, end if self.side < 0 else INF, -self.side)
        elif self.place == "lower" and why != "turn":
            self.place = "origin"
            self.to(0.0, 0.0, self.k, -self.xy, self.xy)
        else:
            # A turn on the outer or on the lower line: between the two at the initial stiffness.
            inward = self.width if self.place == "outer" else -self.width
            other = x - self.side * inward
            self.place = "inner"
            self.to(x, f, self.k, min(x, other), max(x, other))

    def recoverable(self, x, f):
        """Area under the unloading path from (x, f): initial stiffness, lower line, elastic line."""
        if self.place == "origin":
            return f * f / (2 * self.k)
        x, f = abs(x), abs(f)
        low = self.h * self.k * x + (1 - self.h) * self.fy - self.drop
        steep = (f - low) / (self.k * (1 - self.h))
        x1, f1 = x - steep, f - self.k * steep
        f2 = self.k * self.meet
        return (f + f1) / 2 * steep + (f1 + f2) / 2 * (x1 - self.meet) + f2 * self.meet / 2


class PeakOriented(Branches):
    """Unloads at the initial stiffness to zero force, then aims at the largest excursion of the other side."""

    def __init__(self, k, law):
        super().__init__(k, law)
        self.most = {1: (self.xy, self.fy), -1: (-self.xy, -self.fy)}
        self.place = "virgin"

    def leave(self, x, why):
        f = self.force(x)
        if self.place == "virgin":
            self.place = "envelope"
            self.envelope(x, 1 if why == "up" else -1)
        elif self.place in ("envelope", "reload"):
            if why == "turn":
                way = self.heading
                if self.place == "envelope":
                    self.most[way] = (x, f)
                zero = x - f / self.k
                self.left = (self.place, x, way)
                self.place = "unload"
                self.to(x, f, self.k, min(x, zero), max(x, zero))
            else:
                self.place = "envelope"
                self.envelope(x, self.heading)
        else:
            place, turned, way = self.left
            if abs(x - turned) <= abs(f) / self.k:
                self.place = place
                if place == "envelope":
                    self.envelope(x, way)
                else:
                    self.aim(x, f, way)
            else:
                self.place = "reload"
                self.aim(x, 0.0, -way)

    def aim(self, x, f, way):
        """From (x, f) straight at the largest excursion on the side `way`, then the envelope there."""
        xm, fm = self.most[way]
        slope = (fm - f) / (xm - x)
        self.to(x, f, slope, xm if way < 0 else -INF, xm if way > 0 else INF, way)


class BoucWen:
    """force = h k x + (1 - h) fy z, z' = (k / fy) [v - beta |v| |z|^(n-1) z - gamma v |z|^n] (Wen 1976, from memory)."""

    smooth = True

    def __init__(self, k, law):
        self.k, self.h, self.fy = k, law["hardening"], law["strength"]
        self.n, self.beta, self.gamma = law["exponent"], law["beta"], law["gamma"]

    def force(self, x, z):
        return self.h * self.k * x + (1 - self.h) * self.fy * z

    def per_drift(self, z, direction):
        """dz/dx while the drift goes in `direction`."""
        size = abs(z)
        return self.k / self.fy * (1 - self.beta * direction * size ** (self.n - 1) * z - self.gamma * size**self.n)

    def tangent(self, z, direction):
        return self.h * self.k + (1 - self.h) * self.fy * self.per_drift(z, direction)

    def recoverable(self, x, z):
        """As if it unloaded at the initial stiffness, which it does where beta = gamma."""
        return self.force(x, z) ** 2 / (2 * self.k)


KINDS = {"elastic": Elastic, "bilinear": Bilinear, "flag": Flag, "peak-oriented": PeakOriented, "bouc-wen": BoucWen}


def law_of(storey):
    return KINDS[storey["law"]["kind"]](storey["stiffness"], storey["law"])
