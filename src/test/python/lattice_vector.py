"""Writes src/main/resources/dev/leadline/scheme/lattice.txt, the generating vector of the shifted lattices, and
src/test/resources/scheme/lattice-errors.csv, its worst-case errors.

Embedded lattices of 2^7 .. 2^20 points, component by component: Cools, Kuo and Nuyens (2006), Constructing embedded
lattice rules for multivariate integration, SIAM J. Sci. Comput. 28, 2162-2188. Shift-averaged worst-case error of the
unanchored Sobolev space with product weights gamma_j = 5/(99 + j),

    e^2(m) = -1 + 2^-m sum_k prod_j (1 + gamma_j B2(frac(k z_j / 2^m))),   B2(x) = x^2 - x + 1/6.

Weights that fall slowly from .05 serve inputs in any order: pairs count most, and late inputs nearly as much as early
ones; with gamma_j = 1/j^2 late components repeat. A component minimises, over the odd z below 2^20, the largest over m of
e^2(m) / r^2(m), where r(m) is what the same construction reaches for 2^m points alone.

Odd numerators of a level are +-5^i and B2 is symmetric, so the sums over a level are a circular correlation of
length 2^(m-2), done by fast Fourier transform (Nuyens and Cools 2006).

Run from the root of the project: /usr/bin/python3 src/test/python/lattice_vector.py   (about two minutes)
"""

import csv
import sys

import numpy as np
from scipy import fft

LOWEST, HIGHEST, DIMENSIONS = 7, 20, 1010
GAMMA = 5 / (99 + np.arange(1, DIMENSIONS + 1))
REPORTED = [1, 2, 3, 5, 10, 30, 100, 300, 1010]


def b2(x):
    return x * (x - 1) + 1 / 6


def powers_of_five(level):
    """5^i modulo 2^level for i below 2^(level-2)."""
    a = np.ones(1, dtype=np.int64)
    step = 5
    while a.size < 1 << (level - 2):
        a = np.concatenate([a, a * step % (1 << level)])
        step = step * step % (1 << level)
    return a


OMEGA = {level: b2(powers_of_five(level) / (1 << level)) for level in range(2, HIGHEST + 1)}
SPECTRUM = {level: fft.rfft(omega) for level, omega in OMEGA.items()}


class Products:
    """The products over the components taken so far, at the numerators 5^i of every level; at 0 and 1/2."""

    def __init__(self, top):
        self.top = top
        self.zero = self.half = 1.0
        self.odd = {level: np.ones(1 << (level - 2)) for level in range(2, top + 1)}

    def gains(self):
        """For each level, by i: 2^m e^2 gains gamma times this from the component 5^i."""
        total = np.array([self.zero / 6 - self.half / 12])
        for level, p in self.odd.items():
            if p.size == 1:
                sums = p * OMEGA[level]
            else:
                sums = fft.irfft(np.conj(fft.rfft(p)) * SPECTRUM[level], n=p.size)
            total = (2 * sums.reshape(-1, total.size) + total).reshape(-1)
            yield level, total

    def take(self, gamma, index):
        self.zero *= 1 + gamma / 6
        self.half *= 1 - gamma / 12
        for level, p in self.odd.items():
            p *= 1 + gamma * np.roll(OMEGA[level], -(index % p.size))

    def squared_errors(self):
        """e^2 by m, from 2 to the top."""
        sums = np.cumsum([self.zero - 1 + self.half - 1] + [2 * np.sum(p - 1) for p in self.odd.values()])
        return {m: sums[m - 1] / 2**m for m in range(2, self.top + 1)}


def alone(m):
    """e^2 after each component of the vector for 2^m points alone."""
    products = Products(m)
    errors = []
    for j, gamma in enumerate(GAMMA):
        index = 0
        if j > 0:
            for _, gain in products.gains():
                pass
            index = int(np.argmin(gain))
        products.take(gamma, index)
        errors.append(products.squared_errors()[m])
    return errors


def embedded(references):
    products = Products(HIGHEST)
    error = products.squared_errors()
    for j, gamma in enumerate(GAMMA):
        index = 0
        if j > 0:
            worst = None
            for level, gain in products.gains():
                if level >= LOWEST:
                    ratio = (error[level] + gamma * gain / 2**level) / references[level][j]
                    worst = ratio if worst is None else np.maximum(ratio.reshape(-1, worst.size), worst).reshape(-1)
            index = int(np.argmin(worst))
        products.take(gamma, index)
        error = products.squared_errors()
        yield pow(5, index, 1 << HIGHEST), error


references = {}
for m in range(LOWEST, HIGHEST + 1):
    references[m] = alone(m)
    print("2^%d points alone: done" % m, file=sys.stderr, flush=True)
rows = []
vector = []
for dimension, (z, error) in enumerate(embedded(references), 1):
    vector.append(z)
    if dimension in REPORTED:
        for m in references:
            rows.append((dimension, m, "%.10e" % error[m] ** 0.5, "%.4f" % (error[m] / references[m][dimension - 1]) ** 0.5))

with open("src/main/resources/dev/leadline/scheme/lattice.txt", "w") as out:
    out.write("# Generating vector of embedded lattices of 2^%d .. 2^%d points, %d dimensions, one component a line.\n"
              % (LOWEST, HIGHEST, DIMENSIONS))
    out.write("# Made by src/test/python/lattice_vector.py, which names the method and the weights, 5/(99 + j).\n")
    out.writelines("%d\n" % z for z in vector)
with open("src/test/resources/scheme/lattice-errors.csv", "w") as out:
    out.write("# Worst-case errors of the vector by number of components; times: over what 2^m points alone reach.\n")
    out.write("# Written by src/test/python/lattice_vector.py.\n")
    table = csv.writer(out, lineterminator="\n")
    table.writerow(("dimensions", "m", "error", "times"))
    table.writerows(rows)
