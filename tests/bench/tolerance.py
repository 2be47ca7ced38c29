"""Draws of five cables between 50 ohm and 75 - 10j ohm, vectorised over draws and frequencies; prints medians as JSON."""

import json
import time

import numpy as np

DRAWS, FREQUENCIES, ROUNDS = 2000, 101, 9
LENGTHS = [1.5, 20.0, 48.0, 3.0, 1.5]
LIGHT = 299792458.0
frequency = np.linspace(440e6, 464e6, FREQUENCIES)
s = 2j * np.pi * frequency
rng = np.random.default_rng(1)


def around(value, by):
    return value + by * rng.uniform(-1.0, 1.0, (DRAWS, 1))


def job(moving):
    v = np.full((DRAWS, FREQUENCIES), 75 - 10j)
    i = np.ones((DRAWS, FREQUENCIES), complex)
    neper = np.zeros((DRAWS, FREQUENCIES))
    for k in range(len(LENGTHS) - 1, -1, -1):
        length = around(LENGTHS[k], 0.01)
        z0 = (50 + k) * around(1.0, 0.02) if "model" in moving else np.array([[50.0 + k]])
        factor = 0.85 * around(1.0, 0.01) if "model" in moving else np.array([[0.85]])
        loss = around(1.0, 0.05) if "loss" in moving else np.array([[1.0]])
        delta = np.arctan(1.5e-4 * loss)
        z = 0.0086 * np.sqrt(1 + s / (1.11e5 / loss**2)) + s * z0 / (LIGHT * factor)
        y = s / (z0 * LIGHT * factor) / np.cos(delta) * (s / (2e6 * np.pi)) ** (-2 * delta / np.pi)
        gamma = np.sqrt(z * y)
        zc = z / gamma
        electrical = gamma * length
        ahead = v + zc * i
        back = (v - zc * i) * np.exp(-2 * electrical)
        v, i = (ahead + back) / 2, (ahead - back) / (2 * zc)
        neper = neper + electrical.real
    driven = np.abs(v + 50 * i) ** 2
    return_loss = -10 * np.log10(np.abs(v - 50 * i) ** 2 / driven)
    transducer_loss = 10 * np.log10(driven / (4 * 50 * 75)) + neper * 20 / np.log(10)
    shares = [0, 5, 50, 95, 100]
    return np.percentile(return_loss, shares, axis=0), np.percentile(transducer_loss, shares, axis=0)


def median_ms(moving):
    job(moving)
    times = []
    for _ in range(ROUNDS):
        start = time.perf_counter()
        found = job(moving)
        times.append(time.perf_counter() - start)
    return {"ms": sorted(times)[ROUNDS // 2] * 1e3, "returnLossDb": found[0][2, 50], "lossDb": found[1][2, 50]}


print(json.dumps([median_ms(moving) for moving in ([], ["model"], ["model", "loss"])]))
