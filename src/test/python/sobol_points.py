"""Writes src/test/resources/scheme/sobol-points.csv, sobol-pairs.csv and nested.csv.

Points: scipy's direction numbers, summed by numpy; point 2^32 - 1 has all of them, point 0x55555555 every second.
Pairs: quality parameters t of the first 2^m points in two dimensions, by ranks of scipy's generating matrices.
Nested: scrambled points in whole numbers of Python, of which none comes from the program.
Run from the root of the project: /usr/bin/python3 src/test/python/sobol_points.py
"""

import numpy as np
from scipy.stats import qmc

DIMENSIONS = 1111
HEAD = "# Written by src/test/python/sobol_points.py.\n"
numbers = qmc.Sobol(d=DIMENSIONS, scramble=False, bits=32)._sv.astype(np.uint64)  # by dimension, point 2^k, times 2^32

with open("src/test/resources/scheme/sobol-points.csv", "w") as out:
    out.write(HEAD + "dimension,point 4294967295,point 1431655765\n")
    for dimension, v in enumerate(numbers, 1):
        out.write("%d,%d,%d\n" % (dimension, np.bitwise_xor.reduce(v), np.bitwise_xor.reduce(v[::2])))


def rank(rows):
    """Over two elements, of rows that are the bits of whole numbers."""
    pivots = {}
    for row in rows:
        while row and row.bit_length() in pivots:
            row ^= pivots[row.bit_length()]
        if row:
            pivots[row.bit_length()] = row
    return len(pivots)


def digit_rows(dimension, m):
    """Row r says which digits of the point's number make digit r of the point."""
    return [sum((int(numbers[dimension - 1][k]) >> (31 - r) & 1) << k for k in range(m)) for r in range(m)]


def quality(first, second, m):
    """The least t for which any q = m - t leading digits of the two, r and q - r, are independent."""
    a, b = digit_rows(first, m), digit_rows(second, m)
    q = m
    while any(rank(a[:r] + b[: q - r]) < q for r in range(q + 1)):
        q -= 1
    return m - q


PAIRS = [(1, 2), (1, 3), (2, 3), (3, 4), (4, 5), (5, 6), (7, 8), (9, 10), (3, 20), (10, 11), (19, 20), (30, 31), (1, 50),
         (49, 50), (99, 100), (1, 500), (250, 251), (400, 1000), (999, 1000), (1, 1000), (1009, 1010), (1110, 1111)]
with open("src/test/resources/scheme/sobol-pairs.csv", "w") as out:
    out.write(HEAD + "first,second,m,t\n")
    for first, second in PAIRS:
        for m in (4, 7, 10, 13):
            out.write("%d,%d,%d,%d\n" % (first, second, m, quality(first, second, m)))

MASK = 0xFFFFFFFF


def reverse(x):
    return int(format(x, "032b")[::-1], 2)


def scrambled(digits, seed, shift, following):
    """Times 2^53."""
    x = reverse(digits)
    h = x ^ (x * 0x3D20ADEA & MASK)
    h = (h + seed) & MASK
    h = h * ((seed >> 16) | 1) & MASK
    h ^= h * 0x05526C56 & MASK
    h ^= h * 0x53A22864 & MASK
    low = x ^ following
    low ^= low >> 16
    low = low * 0x7FEB352D & MASK
    low ^= low >> 15
    low = low * 0x846CA68B & MASK
    low ^= low >> 16
    return ((reverse(h) ^ shift) << 20 | low >> 12) * 2 + 1


rng = np.random.default_rng(20261201)
with open("src/test/resources/scheme/nested.csv", "w") as out:
    out.write(HEAD + "dimension,point,seed,shift,next,u times 2^53\n")
    for _ in range(200):
        dimension, point = int(rng.integers(1, DIMENSIONS + 1)), int(rng.integers(0, 1 << 32))
        seed, shift, following = (int(v) for v in rng.integers(0, 1 << 32, 3))
        digits = 0
        for k in range(32):
            digits ^= int(numbers[dimension - 1][k]) if point >> k & 1 else 0
        out.write("%d,%d,%d,%d,%d,%d\n" % (dimension, point, seed, shift, following,
                                           scrambled(digits, seed, shift, following)))
