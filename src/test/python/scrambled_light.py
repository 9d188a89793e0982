#!/usr/bin/python3
"""Root mean square errors of one replicate of scrambled Sobol points for the light of sample-projects/quay-lighting.

Nested scrambling as Owen (1995) defines it, with a random bit for every node of the tree of digits; Sobol's points
and the densities from scipy. Prints points, replicates, the error, and its standard error. SampleProjectsTest holds
the program to these figures.
"""
import numpy as np
from scipy.stats import beta, norm, qmc

EXACT = 20.088532


def light(u):
    x, y = 120 * u[:, 0], 30 * u[:, 1]
    lamps = [mean + 0.03 * norm.ppf(u[:, 2 + i]) for i, mean in enumerate((0.97, 0.97, 0.95, 0.93))]
    height = 20 + 0.12 * norm.ppf(u[:, 6])
    dirt = 0.8 + 0.2 * beta.ppf(u[:, 7], 6, 3)
    age, temp = 4 * u[:, 8], 9 + 7 * norm.ppf(u[:, 9])
    spread = (18 * (y + 4) + height**2) ** 4 / (18**2 + height**2) ** 2 * height * 28800
    masts = sum(
        lamp * ((x - at) ** 2 + (y + 4) ** 2 + height**2) ** -3.5 for lamp, at in zip(lamps, (15, 45, 75, 105))
    )
    return spread * masts * dirt * np.exp(-0.03 * age) * np.exp(-0.0016 * (temp - 15))


def scrambled(points, digits, random):
    n, inputs = points.shape
    moved = np.empty((n, inputs))
    for j in range(inputs):
        number = (points[:, j] * n).astype(np.int64)
        result = np.zeros(n, dtype=np.int64)
        for level in range(digits):
            flips = random.integers(0, 2, 1 << level)
            digit = (number >> (digits - level - 1)) & 1
            result = (result << 1) | (digit ^ flips[number >> (digits - level)])
        moved[:, j] = (result + random.random(n)) / n
    return moved


random = np.random.default_rng(1)
for digits, replicates in ((8, 400), (10, 300), (12, 150), (14, 100)):
    points = qmc.Sobol(10, scramble=False).random(1 << digits)
    errors = [light(scrambled(points, digits, random)).mean() - EXACT for _ in range(replicates)]
    rmse = np.sqrt(np.mean(np.square(errors)))
    print(1 << digits, replicates, f"{rmse:.3g}", f"{rmse / np.sqrt(2 * replicates):.1g}", flush=True)
