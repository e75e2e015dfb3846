#!/usr/bin/env python3
"""Writes yielding-frames.json: yielding shear frames and their response by an integration independent of the program.

    python3 test/reference/yielding_frames.py [FOLDER]       numpy and scipy; a few minutes
    npx biome format --write test/reference/yielding-frames.json
    python3 test/reference/yielding_frames.py --check [NAME] writes nothing: how far the answers of the frames with that in their name
                                                             move at a tenth of the accuracy, and with dampers taken as linear
                                                             below a tenth of the speed

The program and its tests need neither; they read the values. The motions are seeded numbers, rounded before use, so that the file holds
the very samples. The energy balance of each reference run closes to 1e-8 of the input, or nothing is written.
"""
import json
import sys
import time
from pathlib import Path

import numpy as np

sys.dont_write_bytecode = True
from exact_march import RTOL, SLOW, March

TAIL = 2.0


def motion(seed, count, peak, slow, fast, first=0.0, last=0.0):
    """Twelve sines between two frequencies [Hz] under a rise and a fall, m/s2, three decimals."""
    rng = np.random.default_rng(seed)
    t = np.arange(count) * 0.02
    f, phase, size = rng.uniform(slow, fast, 12), rng.uniform(0, 2 * np.pi, 12), rng.uniform(0.3, 1, 12)
    shape = np.minimum(1, t / (0.15 * t[-1])) * np.minimum(1, (t[-1] - t) / (0.4 * t[-1]))
    a = (size[:, None] * np.sin(2 * np.pi * f[:, None] * t + phase[:, None])).sum(axis=0) * shape
    a *= peak / np.abs(a).max()
    a[0], a[-1] = first, last
    return {"interval": 0.02, "acceleration": [round(float(x), 3) + 0.0 for x in a]}


MOTIONS = {
    "rolling": motion(11, 300, 4.0, 0.4, 4.0),
    "sharp": motion(12, 200, 6.0, 0.8, 9.0, first=0.35),
    "long": motion(13, 400, 3.5, 0.25, 2.5, last=-0.4),
}


def frame(laws, mass, stiffness, damping, height=3.4, p_delta=False, dampers=None, roles=None, gravity=None):
    storeys = []
    for i, law in enumerate(laws):
        row = {"name": "Storey %d" % (i + 1), "height": height, "mass": mass[i], "stiffness": stiffness[i], "law": law}
        if gravity:
            row["gravity"] = gravity[i]
        if dampers and dampers[i]:
            row["damper"] = {"coefficient": dampers[i][0], "exponent": dampers[i][1]}
        if roles and roles[i]:
            row["role"] = roles[i]
        storeys.append(row)
    return {"storeys": storeys, "damping": damping, "pDelta": p_delta}


def bilinear(strength, hardening):
    return {"kind": "bilinear", "strength": strength, "hardening": hardening}


def peak_oriented(strength, hardening):
    return {"kind": "peak-oriented", "strength": strength, "hardening": hardening}


def flag(strength, hardening, ratio):
    return {"kind": "flag", "strength": strength, "hardening": hardening, "ratio": ratio}


def bouc_wen(strength, hardening, exponent, beta):
    return {"kind": "bouc-wen", "strength": strength, "hardening": hardening, "exponent": exponent, "beta": beta,
            "gamma": round(1 - beta, 6)}


ELASTIC = {"kind": "elastic"}
NONE = {"kind": "none"}


def modal(*ratios):
    return {"kind": "modal", "ratios": list(ratios)}


def rayleigh(modes, ratios, **more):
    return {"kind": "rayleigh", "modes": modes, "ratios": ratios, **more}


M1, M2, M3, M5, M8 = [2e5], [2.4e5, 2e5], [2.2e5, 2.2e5, 1.8e5], [3e5] * 4 + [2.4e5], [2.5e5] * 7 + [2e5]
K2, K3 = [9e7, 6e7], [1.2e8, 1e8, 7e7]
K5 = [2.6e8, 2.4e8, 2.1e8, 1.7e8, 1.2e8]
K8 = [3.4e8, 3.3e8, 3.1e8, 2.8e8, 2.5e8, 2.1e8, 1.7e8, 1.2e8]
S5 = [2.6e6, 2.4e6, 2.05e6, 1.6e6, 1.0e6]
S8 = [2.9e6, 2.7e6, 2.5e6, 2.2e6, 1.9e6, 1.55e6, 1.15e6, 7e5]

FRAMES = [
    ("elastic-perfectly plastic, one storey", "rolling", 1.0,
     frame([bilinear(5.5e5, 0)], M1, [3.2e7], modal(0.05))),
    ("bilinear with a linear damper and nothing else", "sharp", -1.0,
     frame([bilinear(3.5e5, 0.1)], M1, [4e7], NONE, dampers=[(2.5e5, 1)])),
    ("peak-oriented, one storey, no damping at all", "long", 1.0,
     frame([peak_oriented(4e5, 0.05)], M1, [1.6e7], NONE)),
    ("bilinear, two storeys", "rolling", 1.0,
     frame([bilinear(7e5, 0.1), bilinear(4.2e5, 0.03)], M2, K2, rayleigh([1, 2], [0.05, 0.05]))),
    ("Bouc-Wen, exponents 1 and 2, two storeys", "sharp", 1.2,
     frame([bouc_wen(8e5, 0.05, 1, 0.5), bouc_wen(5e5, 0.1, 2, 0.8)], M2, K2, rayleigh([1, 2], [0.03, 0.04]))),
    ("Bouc-Wen with a damper of power 0.3", "long", 0.8,
     frame([bouc_wen(2.5e5, 0.03, 2, 0.5)], M1, [2e7], modal(0.02), dampers=[(7e4, 0.3)])),
    ("peak-oriented under gravity, three storeys", "rolling", -1.0,
     frame([peak_oriented(1.2e6, 0.05), peak_oriented(8e5, 0.05), peak_oriented(4.5e5, 0.03)], M3, K3,
           rayleigh([1, 3], [0.04, 0.04]), p_delta=True)),
    ("flag-shaped, three storeys", "sharp", 1.0,
     frame([flag(1.1e6, 0.1, 0.8), flag(9e5, 0.05, 0.6), flag(5.5e5, 0.1, 0.9)], M3, K3, modal(0.03, 0.02))),
    ("Bouc-Wen, exponent 5, under gravity, three storeys", "rolling", 0.9,
     frame([bouc_wen(1e6, 0.05, 5, 0.8), bouc_wen(8e5, 0.05, 5, 0.5), bouc_wen(5e5, 0.1, 2, 0.8)], M3, K3,
           modal(0.05, 0.03), p_delta=True)),
    ("Rayleigh on the tangent, under gravity, three storeys", "long", 1.0,
     frame([bilinear(1.4e6, 0.03), bilinear(9e5, 0.03), bilinear(5e5, 0.1)], M3, K3,
           rayleigh([1, 2], [0.05, 0.05], stiffness="tangent"), p_delta=True)),
    ("isolator under three storeys", "long", 0.6,
     frame([bilinear(2.5e5, 0.1), bilinear(1.3e6, 0.05), bilinear(1.1e6, 0.05), bilinear(7e5, 0.05)], [2e5] + M3,
           [3.5e7] + K3, rayleigh([2, 4], [0.03, 0.03]), dampers=[(2e5, 1)] + [None] * 3,
           roles=["isolator", None, None, None])),
    ("mixed laws with dampers of power 0.5, under gravity, five storeys", "rolling", 1.0,
     frame([bilinear(S5[0], 0.03), peak_oriented(S5[1], 0.05), flag(S5[2], 0.05, 0.7), bouc_wen(S5[3], 0.05, 2, 0.5),
            ELASTIC], M5, K5, rayleigh([1, 3], [0.03, 0.03]), p_delta=True,
           dampers=[(4e5, 0.5), (3e5, 0.5), None, None, (1.5e5, 0.5)])),
    ("bilinear with dampers of power 1.5 and nothing else, five storeys", "sharp", 1.5,
     frame([bilinear(s, 0.03) for s in S5], M5, K5, NONE, dampers=[(9e6, 1.5)] * 5)),
    ("bilinear under heavy gravity, eight storeys", "rolling", 0.8,
     frame([bilinear(s, 0.03) for s in S8], M8, K8, rayleigh([1, 4], [0.03, 0.03]), p_delta=True,
           gravity=[4e6] * 7 + [3e6])),
    ("mixed laws, modal damping, eight storeys", "sharp", 1.5,
     frame([bilinear(S8[0], 0), bilinear(S8[1], 0.03), peak_oriented(S8[2], 0.03), peak_oriented(S8[3], 0.05),
            flag(S8[4], 0.03, 0.9), bouc_wen(S8[5], 0.05, 1, 0.8), bouc_wen(S8[6], 0.05, 5, 0.5), ELASTIC], M8, K8,
           modal(0.04, 0.04, 0.02), dampers=[None, (2e5, 0.3)] + [None] * 5 + [(2e6, 1)])),
]


def short(x):
    """Ten figures: more than the integration is good for."""
    if isinstance(x, dict):
        return {key: short(value) for key, value in x.items()}
    if isinstance(x, (list, tuple)):
        return [short(value) for value in x]
    return float("%.10g" % x) if isinstance(x, float) else x


def marches(wanted=""):
    for name, under, scale, description in FRAMES:
        if wanted not in name:
            continue
        analysis = {"tail": TAIL, "stopDrift": 0.1}
        yield name, under, scale, description, analysis, ({**MOTIONS[under], "scale": scale}, analysis)


def write(folder):
    out = []
    for name, under, scale, description, analysis, rest in marches():
        began = time.time()
        run = March(description, *rest)
        expected = run.run()
        assert run.imbalance < 1e-8, "%s: the energy balance is off by %.2g" % (name, run.imbalance)
        ratios = ["%.4f" % (d / s["height"]) for d, s in zip(expected["peakDrift"], description["storeys"])]
        ductility = ["-" if m is None else "%.2f" % m for m in expected["ductility"]]
        print("%s: %.1f s, %d pieces, imbalance %.1e" % (name, time.time() - began, run.pieces, run.imbalance))
        print("   drift ratios", *ratios, "ductility", *ductility, "changes of branch", *run.changes, flush=True)
        row = {"name": name, "motion": under, "scale": scale, "frame": description, "analysis": analysis}
        out.append({**row, "expected": short(expected)})
    with open(folder / "yielding-frames.json", "w") as file:
        json.dump({"motions": MOTIONS, "frames": out}, file, indent=1)
        file.write("\n")


def check(wanted):
    for name, _, _, description, _, rest in marches(wanted):
        a, b = March(description, *rest).run(), March(description, *rest, rtol=10 * RTOL, slow=SLOW / 10).run()
        moved = {
            key: max(abs(p - q) / max(map(abs, a[key])) for p, q in zip(a[key], b[key]))
            for key in ("peakDrift", "peakShear", "peakAcceleration", "residualDrift", "dissipated")
        }
        print(name, " ".join("%s %.1e" % item for item in moved.items()), flush=True)


if __name__ == "__main__":
    if sys.argv[1:2] == ["--check"]:
        check(" ".join(sys.argv[2:]))
    else:
        write(Path(sys.argv[1]) if len(sys.argv) > 1 else Path(__file__).parent)
