"""The step response of a run of cables by a damped FFT, vectorised with numpy: what the engine is measured against.

Reads {cables: [{r0, corner, l, c, tan, length}], source, load, rise, window, points, rounds} from standard input and
writes {"ms": median, "load": load voltages} to standard output. One thread, complex128, the same grid as the engine's.
"""
import json
import os
import sys
import time

os.environ["OMP_NUM_THREADS"] = "1"
import numpy as np


def step(asked):
    """Source and load voltage over the shown window."""
    half = asked["points"] - 1
    n = 2 * half
    period = 2 * asked["window"]
    damping = np.log(1e7) / period
    s = damping + 2j * np.pi / period * np.arange(half + 1)
    v = np.full(half + 1, complex(asked["load"]))
    i = np.ones(half + 1, complex)
    theta = np.zeros(half + 1, complex)
    for cable in reversed(asked["cables"]):
        p = s / cable["corner"]
        z = cable["r0"] * (1 + (p / 2) / (1 + 2 * p / (5 + np.sqrt(49 + 16 * p)))) + s * cable["l"]
        delta = np.arctan(cable["tan"])
        y = s * cable["c"] / np.cos(delta) * (s / (2e6 * np.pi)) ** (-2 * delta / np.pi)
        gamma = np.sqrt(z * y)
        zc = z / gamma
        g = gamma * cable["length"]
        e = np.exp(-2 * g)
        away, back = v + zc * i, (v - zc * i) * e
        v, i = (away + back) / 2, (away - back) / (2 * zc)
        theta += g
    rise = asked["rise"]
    corner = 2 * np.pi / rise
    emf = corner**2 * (1 - np.exp(-s * rise)) / (s**2 * (s**2 + corner**2) * rise)
    perDrive = emf / (v + asked["source"] * i)
    growth = np.exp(damping * period / n * np.arange(half + 1)) * n / period
    shown = []
    for node in (v * perDrive, asked["load"] * np.exp(-theta) * perDrive):
        shown.append(np.fft.irfft(node, n)[: half + 1] * growth)
    return shown


def main():
    asked = json.load(sys.stdin)
    taken = []
    for _ in range(asked["rounds"]):
        start = time.perf_counter()
        shown = step(asked)
        taken.append(time.perf_counter() - start)
    json.dump({"ms": 1e3 * sorted(taken)[len(taken) // 2], "load": list(shown[1])}, sys.stdout)


main()
