# Makes the references of AnyTimeMeanTest, AnyTimeChanceTest and AnyTimeBoundedTest under src/test/resources/interval:
#   python3 src/test/python/any_time.py
# From the definitions at 60 digits: Lambert's function, the beta functions and incomplete gamma functions of mpmath, and
# bisection. Nothing of the method under test. Levels are the doubles that the names stand for.
import os
import mpmath
from mpmath import mp, mpf, log, exp, sqrt, loggamma, gammainc, lambertw

mp.dps = 60
FOLDER = os.path.join(os.path.dirname(os.path.abspath(__file__)), "..", "resources", "interval")


def table(name, columns):
    out = open(os.path.join(FOLDER, name), "w")
    print("# mpmath %s, %d digits, src/test/python/any_time.py" % (mpmath.__version__, mp.dps), file=out)
    print(columns, file=out)
    return out


def bisect(f, low, high):
    """Where f, negative at low, changes its sign; to 40 digits."""
    while abs(high - low) > mpf(10) ** -40 * abs(high):
        middle = (low + high) / 2
        if f(middle) < 0:
            low = middle
        else:
            high = middle
    return (low + high) / 2


with table("any-time-mean.csv", "tuned,level,rhoSquared,at,halfWidth") as out:
    for tuned in (1, 500, 1000, 10**4, 10**8):
        for level in (0.5, 0.9, 0.95, 0.99, 1 - 1e-6, 1 - 1e-9):
            alpha = 1 - mpf(level)
            square = (-lambertw(-(alpha**2) / mp.e, -1).real - 1) / tuned
            for t in (10, 1000, 10**6, 10**13):
                half = sqrt(2 * (t * square + 1) / (t**2 * square) * log(sqrt(t * square + 1) / alpha))
                print("%d,%r,%s,%d,%s" % (tuned, level, mp.nstr(square, 20), t, mp.nstr(half, 20)), file=out)


def ratio(k, n, p, tuned, alpha):
    v = p * (1 - p) * tuned
    rho = v / (2 * log(1 / alpha) + log(1 + 2 * log(1 / alpha)))
    r = max(rho - p * (1 - p), mpf("0.001") * p * (1 - p))
    a, b = r / (1 - p), r / p
    beta = lambda x, y: loggamma(x) + loggamma(y) - loggamma(x + y)
    return beta(a + k, b + n - k) - beta(a, b) - k * log(p) - (n - k) * log(1 - p)


def limit(k, n, tuned, alpha):
    """Lower limit, searched for in the logarithm of p."""
    if k < 2:
        return mpf(0)
    f = lambda s: log(1 / alpha) - ratio(k, n, exp(s), tuned, alpha)
    top = log(mpf(k) / n) if k < n else log(1 - mpf(1) / (10 * n))
    return exp(bisect(f, top - 60, top))


with table("any-time-chance.csv", "hits,n,tuned,level,low,high,missingHigh") as out:
    cases = [(0, 10), (1, 10), (2, 10), (5, 10), (10, 10), (25, 2500), (700, 1000), (7, 10**5), (10**5 - 7, 10**5)]
    cases += [(0, 10**7), (10**6, 10**7), (3, 10**13), (10**6, 10**13), (10**13 // 2, 10**13), (10**13, 10**13)]
    for k, n in cases:
        for tuned in (5, 1000, 10**4, 10**7):
            for level in (0.9, 0.95, 1 - 1e-6):
                alpha = 1 - mpf(level)
                low = limit(k, n, tuned, alpha)
                missing = limit(n - k, n, tuned, alpha)
                high = 1 - missing
                print("%d,%d,%d,%r,%s,%s,%s" % (k, n, tuned, level, mp.nstr(low, 20), mp.nstr(high, 20), mp.nstr(missing, 20)), file=out)


def gamma_exponential(s, v, rho, c):
    square = c * c
    below = lambda a, x: log(gammainc(a, 0, x, regularized=True))
    return (
        rho / square * log(rho / square) - loggamma(rho / square) - below(rho / square, rho / square)
        + loggamma((v + rho) / square) + below((v + rho) / square, (c * s + v + rho) / square)
        - (v + rho) / square * log((c * s + v + rho) / square) + (c * s + v) / square
    )


with table("gamma-mixture.csv", "rho,scale,level,variance,bound") as out:
    mp.dps = 40
    for rho, c in ((mpf(30), mpf(1)), (mpf("0.5"), mpf(3)), (mpf(1000), mpf("0.25"))):
        for level in (0.95, 0.975, 1 - 1e-6):
            for v in (mpf(0), mpf("0.01"), mpf(1), mpf(100), mpf(10**4)):
                alpha = 1 - mpf(level)
                f = lambda s: gamma_exponential(s, v, rho, c) - log(1 / alpha)
                high = mpf(1)
                while f(high) < 0:
                    high *= 2
                bound = bisect(f, mpf(0), high)
                print("%s,%s,%r,%s,%s" % (mp.nstr(rho, 17), mp.nstr(c, 17), level, mp.nstr(v, 17), mp.nstr(bound, 20)), file=out)


with table("gamma-mixture-late.csv", "rho,scale,level,variance,least") as out:
    # With 1 in place of the incomplete gamma function at the variance, which is more than it: less than the bound.
    mp.dps = 50
    rho, c = mpf(30), mpf(1)
    for level in (0.95, 0.975, 1 - 1e-6):
        for v in (mpf(10) ** 6, mpf(10) ** 7, mpf(10) ** 9, mpf(10) ** 12):
            alpha = 1 - mpf(level)
            first = rho * log(rho) - loggamma(rho) - log(gammainc(rho, 0, rho, regularized=True))
            f = lambda s: first + loggamma(v + rho) - (v + rho) * log(s + v + rho) + s + v - log(1 / alpha)
            high = mpf(1)
            while f(high) < 0:
                high *= 2
            print("%s,%s,%r,%s,%s" % (mp.nstr(rho, 17), mp.nstr(c, 17), level, mp.nstr(v, 17), mp.nstr(bisect(f, mpf(0), high), 20)), file=out)
