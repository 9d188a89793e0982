"""Means and standard deviations of integrands within cells of equal probability; prints src/test/resources/scheme/cells.csv.

By quadrature to 40 digits, cut at kinks and jumps. Cells are numbered from 0, the first input running fastest.
Run with /usr/bin/python3.
"""

from mpmath import exp, inf, mp, mpf, npdf, quad, sqrt, erfinv

mp.dps = 40


def cell(h, low, high, cuts=()):
    points = [low] + [mpf(c) for c in cuts if low < c < high] + [high]
    p = high - low
    mean = quad(h, points) / p
    return mean, sqrt(quad(lambda x: (h(x) - mean) ** 2, points) / p)


def exponential(n):
    return [cell(lambda u: exp(6 * u), mpf(c) / n, mpf(c + 1) / n) for c in range(n)]


def step(n):
    return [cell(lambda u: mpf(u > mpf("0.53")), mpf(c) / n, mpf(c + 1) / n, [mpf("0.53")]) for c in range(n)]


def product(n, m):
    """exp(3 u + v): the moments of a product of independent factors."""
    cells = []
    for d in range(m):
        for c in range(n):
            a, b, s, t = mpf(c) / n, mpf(c + 1) / n, mpf(d) / m, mpf(d + 1) / m
            one = quad(lambda u: exp(3 * u), [a, b]) * n * quad(exp, [s, t]) * m
            two = quad(lambda u: exp(6 * u), [a, b]) * n * quad(lambda v: exp(2 * v), [s, t]) * m
            cells.append((one, sqrt(two - one**2)))
    return cells


def excess(n):
    """max(z - 1, 0) of a standard normal z."""
    ends = [-inf] + [sqrt(2) * erfinv(2 * mpf(c) / n - 1) for c in range(1, n)] + [inf]
    cells = []
    for a, b in zip(ends, ends[1:]):
        if b <= 1:
            cells.append((mpf(0), mpf(0)))
            continue
        points = [max(a, mpf(1))] + ([b] if b < inf else [mpf(3), mpf(6), mpf(12), mpf(40)])
        one = quad(lambda z: (z - 1) * npdf(z), points) * n
        two = quad(lambda z: (z - 1) ** 2 * npdf(z), points) * n
        cells.append((one, sqrt(two - one**2)))
    return cells


def weighted(n):
    """exp(6 u) times its weight, of ten passes one drawn from the uniform density, the others from 2 u; the root of
    the mean variance over the ten."""
    h = lambda u: exp(6 * u) / (mpf("0.1") + mpf("0.9") * 2 * u)
    cells = []
    for c in range(n):
        own = cell(h, mpf(c) / n, mpf(c + 1) / n)
        other = cell(lambda p: h(sqrt(p)), mpf(c) / n, mpf(c + 1) / n)
        cells.append(((own[0] + 9 * other[0]) / 10, sqrt((own[1] ** 2 + 9 * other[1] ** 2) / 10)))
    return cells


def controlled(n):
    """exp(6 u) - b u, where b explains most within the cells together."""
    around = lambda c: (mpf(c) / n, mpf(c + 1) / n)
    products = 0
    for c in range(n):
        a, b = around(c)
        mean = quad(lambda u: exp(6 * u), [a, b]) * n
        products += quad(lambda u: (exp(6 * u) - mean) * (u - (a + b) / 2), [a, b]) * n
    slope = products / (n * (mpf(1) / (12 * n**2)))
    return [cell(lambda u: exp(6 * u) - slope * u, *around(c)) for c in range(n)]


if __name__ == "__main__":
    print("# Moments within cells of equal probability; cells.py")
    print("integrand,cell,mean,sd")
    for name, cells in (
        ("exponential", exponential(10)),
        ("step", step(10)),
        ("product", product(6, 4)),
        ("excess", excess(16)),
        ("weighted", weighted(10)),
        ("controlled", controlled(10)),
    ):
        for c, (mean, sd) in enumerate(cells):
            print(f"{name},{c},{mp.nstr(mean, 20)},{mp.nstr(sd, 20)}")
