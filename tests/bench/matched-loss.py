"""Attenuation of 10,000 cables at three frequencies, vectorised; prints the median time and a sum as JSON."""

import json
import time

import numpy as np

COUNT, ROUNDS = 10_000, 25
LIGHT = 299792458.0
n = np.arange(COUNT)[:, None]
z0 = 50.0 + n % 50
factor = 0.66 + (n % 7) * 0.03
tangent = 1e-4 * (1 + n % 9)
resistance = 0.01 + (n % 100) * 1e-3
corner = 1e5 + n
s = 2j * np.pi * np.array([1e7, 1e8, 1e9])


def job():
    delta = np.arctan(tangent)
    z = resistance * np.sqrt(1 + s / corner) + s * z0 / (LIGHT * factor)
    y = s / (z0 * LIGHT * factor) / np.cos(delta) * (s / (2e6 * np.pi)) ** (-2 * delta / np.pi)
    return np.sqrt(z * y).real


total = job().sum()
times = []
for _ in range(ROUNDS):
    start = time.perf_counter()
    job()
    times.append(time.perf_counter() - start)
print(json.dumps({"ms": sorted(times)[ROUNDS // 2] * 1e3, "sum": total}))
