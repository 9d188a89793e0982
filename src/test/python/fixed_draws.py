# Makes wilson.csv, hall.csv and ranks.csv of src/test/resources/interval, the references of WilsonTest,
# SkewnessCorrectedTest and RanksTest:
#   /usr/bin/python3 fixed_draws.py
# Wilson's limits are the roots of (k/n - p)^2 = z^2 p (1-p)/n, at 50 digits. Ranks come from binomial tails by
# quadrature of the beta density with mpmath's gamma function, at 40 digits; up to n = 1e6 SciPy has to agree.
import os

import mpmath
from mpmath import mp, mpf, exp, log, loggamma, quad, sqrt
from scipy.stats import binom

OUT = os.path.join(os.path.dirname(os.path.abspath(__file__)), "..", "resources", "interval")
HEAD = "# mpmath %s, %d digits, fixed_draws.py"


def wilson(k, n, level):
    z2 = 2 * mp.erfinv(level) ** 2
    p = mpf(k) / n
    middle = p + z2 / (2 * n)
    root = sqrt(z2 * (p * (1 - p) / n + z2 / (4 * mpf(n) ** 2)))
    return (middle - root) / (1 + z2 / n), (middle + root) / (1 + z2 / n)


def at_most(k, n, q):
    """P(B <= k), B binomial (n, q): what a Beta(k+1, n-k) variable has above q."""
    if k >= n:
        return mpf(1)
    a, b = mpf(k + 1), mpf(n - k)
    constant = loggamma(a + b) - loggamma(a) - loggamma(b)
    sd = sqrt(a * b / (a + b + 1)) / (a + b)

    def density(x):
        return exp(constant + (a - 1) * log(x) + (b - 1) * log(1 - x)) if 0 < x < 1 else mpf(0)

    mean = a / (a + b)
    if q < mean - sd:
        return 1 - at_least_by_density(density, q, sd)
    ends = [q] + [q + sd * i for i in (1, 2, 4, 7, 11, 16, 22, 29, 37, 46, 60, 80) if q + sd * i < 1]
    return quad(density, ends + [1] if ends[-1] < 1 and len(ends) < 13 else ends)


def at_least_by_density(density, q, sd):
    ends = [q] + [q - sd * i for i in (1, 2, 4, 7, 11, 16, 22, 29, 37, 46, 60, 80) if q - sd * i > 0]
    return quad(density, list(reversed(ends + [mpf(0)] if len(ends) < 13 else ends)))


def most(n, q, tail):
    """The largest k with P(B <= k) <= tail; -1 where there is none."""
    sd = sqrt(n * q * (1 - q))
    z = sqrt(2) * mp.erfinv(1 - 2 * tail)
    k = int(mp.floor(n * q - z * sd + (z * z - 1) * (1 - 2 * q) / 6))
    k = min(max(k, 0), n - 1)
    low, high, step = None, None, max(1, int(sd * mpf("1e-9")))
    while low is None or high is None:
        if at_most(k, n, q) <= tail:
            low = k
            if high is None:
                k += step
        else:
            high = k
            if k == 0:
                return -1
            if low is None:
                k = max(0, k - step)
        step *= 4
    while high - low > 1:
        middle = (low + high) // 2
        if at_most(middle, n, q) <= tail:
            low = middle
        else:
            high = middle
    return low


def row(n, q, level):
    tail = (1 - mpf(level)) / 2
    q_exact = mpf(q)
    low = most(n, q_exact, tail) + 1
    # P(B >= u) = P(n - B <= n - u)
    high = n - most(n, 1 - q_exact, tail)
    if n <= 10**6:
        assert low == 0 or binom.cdf(low - 1, n, q) <= (1 - level) / 2 < binom.cdf(low, n, q)
        assert high == n + 1 or binom.sf(high - 1, n, q) <= (1 - level) / 2 < binom.sf(high - 2, n, q)
    below = at_most(low - 1, n, q_exact) if low > 0 else mpf(0)
    above = at_most(n - high, n, 1 - q_exact) if high <= n else mpf(0)
    return "%d,%r,%r,%d,%d,%s" % (n, q, level, low, high, mp.nstr(1 - below - above, 17))


mp.dps = 50
with open(os.path.join(OUT, "wilson.csv"), "w") as out:
    print(HEAD % (mpmath.__version__, mp.dps), file=out)
    print("hits,n,level,low,high", file=out)
    cases = [(1, 1), (1, 2), (1, 3), (2, 3), (1, 1000), (999, 1000), (3, 10**6), (10**6 - 3, 10**6), (25, 10**7)]
    cases += [(1, 10**13), (7, 10**13), (10**6, 10**13), (10**13 - 2, 10**13), (500, 1000), (123456, 10**6)]
    for k, n in cases:
        for level in (0.5, 0.95, 0.99, 1 - 1e-9):
            low, high = wilson(k, n, mpf(level))
            print("%d,%d,%r,%s,%s" % (k, n, level, mp.nstr(low, 20), mp.nstr(high, 20)), file=out)

with open(os.path.join(OUT, "hall.csv"), "w") as out:
    print(HEAD % (mpmath.__version__, mp.dps), file=out)
    print("level,low,high", file=out)
    # the data of record diag-johnson-t; limits are the roots of Hall's cubic at t and -t
    data = [mpf(x) for x in "0.12 0.35 0.08 1.9 0.44 0.02 3.7 0.61 0.27 0.95 0.15 1.1".split()]
    n = len(data)
    mean = sum(data) / n
    s = sqrt(sum((x - mean) ** 2 for x in data) / (n - 1))
    g = sum((x - mean) ** 3 for x in data) / n / s**3
    for level in (0.5, 0.95, 0.99):
        within = lambda t: 1 - mp.betainc(mpf(n - 1) / 2, 0.5, 0, (n - 1) / (n - 1 + t * t), regularized=True)
        t = mp.findroot(lambda t: within(t) - mpf(level), (mpf("0.1"), mpf(20)), solver="illinois", tol=1e-60)
        limits = []
        for at in (t, -t):
            cubic = [g * g / (27 * n), g / (3 * sqrt(n)), mpf(1), g / (6 * sqrt(n)) - at]
            (root,) = [r.real for r in mp.polyroots(cubic, maxsteps=200, extraprec=200) if abs(r.imag) < mpf(10) ** -20]
            limits.append(mean - s / sqrt(n) * root)
        print("%r,%s,%s" % (level, mp.nstr(limits[0], 20), mp.nstr(limits[1], 20)), file=out)

mp.dps = 40
with open(os.path.join(OUT, "ranks.csv"), "w") as out:
    print(HEAD % (mpmath.__version__, mp.dps), file=out)
    print("n,q,level,low,high,coverage", file=out)
    for n in (10, 100, 1000, 12345, 10**6, 10**9, 10**11, 10**13):
        for q in (0.5, 0.05, 0.95, 0.999, 1e-6):
            for level in (0.9, 0.95, 1 - 1e-6):
                print(row(n, q, level), file=out, flush=True)
