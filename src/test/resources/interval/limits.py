# Makes student.csv and clopper-pearson.csv, the references of StudentTest and ClopperPearsonTest:
#   python3 limits.py
# Tails come from the continued fraction of the incomplete beta function (DLMF 8.17.22) and mpmath's gamma function,
# limits from a secant on their logarithm, all at 50 digits: nothing of the method under test.
from mpmath import mp, mpf, log, exp, sqrt, loggamma, findroot

mp.dps = 50
HEAD = "# mpmath %s, %d digits, limits.py"


def tail(a, b, x, y):
    """I_x(a, b) with y = 1 - x given, by the modified Lentz method; best where x < (a+1)/(a+b+2)."""
    if x * (a + b + 2) > a + 1:
        return 1 - tail(b, a, y, x)
    front = exp(a * log(x) + b * log(y) + loggamma(a + b) - loggamma(a) - loggamma(b)) / a
    tiny = mpf(10) ** -200
    c, d = mpf(1), 1 - (a + b) * x / (a + 1)
    d = 1 / d
    f = d
    m = 1
    while True:
        for numerator in (
            m * (b - m) * x / ((a + 2 * m - 1) * (a + 2 * m)),
            -(a + m) * (a + b + m) * x / ((a + 2 * m) * (a + 2 * m + 1)),
        ):
            d = 1 / ((1 + numerator * d) or tiny)
            c = (1 + numerator / c) or tiny
            f *= c * d
        if abs(c * d - 1) < mpf(10) ** -40:
            return front * f
        m += 1


def student(df, level):
    # P(|T| > t) = I_x(df/2, 1/2) with x = df / (df + t^2); P(|T| < t) = I_y(1/2, df/2)
    def miss(s):
        t2 = exp(2 * s)
        x, y = df / (df + t2), t2 / (df + t2)
        if level > 0.5:
            return log(tail(df / 2, mpf(1) / 2, x, y)) - log(1 - level)
        return log(tail(mpf(1) / 2, df / 2, y, x)) - log(level)

    start = log(sqrt(2) * mp.erfinv(level))
    if df < 30:
        start += log(1 / (1 - level)) / (2 * df)
    return exp(findroot(miss, (start, start + mpf("0.01")), solver="secant", tol=1e-70, verify=False, maxsteps=60))


def beta_quantile(a, b, tail_below=None, tail_above=None):
    mean, sd = a / (a + b), sqrt(a * b / (a + b + 1)) / (a + b)
    sign = -1 if tail_below else 1

    def miss(s):
        odds = exp(s)
        x, y = odds / (1 + odds), 1 / (1 + odds)
        if tail_below:
            return log(tail(a, b, x, y)) - log(tail_below)
        return log(tail(b, a, y, x)) - log(tail_above)

    z = sqrt(2) * mp.erfinv(1 - 2 * (tail_below or tail_above))
    start = log(a / b) + sign * z * sqrt(1 / a + 1 / b)
    odds = exp(findroot(miss, (start, start + sqrt(1 / a + 1 / b) / 100), solver="secant", tol=1e-70, verify=False, maxsteps=60))
    return odds / (1 + odds)


with open("student.csv", "w") as out:
    print(HEAD % (mp.__class__.__module__ and __import__("mpmath").__version__, mp.dps), file=out)
    print("degrees,level,t", file=out)
    for df in (1, 2, 3, 4, 7, 15, 31, 64, 127, 1000, 1999, 10**5, 10**6, 10**8, 10**10, 10**12):
        for level in (0.001, 0.1, 0.5, 0.6827, 0.9, 0.95, 0.99, 0.999, 1 - 1e-6, 1 - 1e-9):
            print("%d,%r,%s" % (df, level, mp.nstr(student(mpf(df), mpf(level)), 20)), file=out)

with open("clopper-pearson.csv", "w") as out:
    print(HEAD % (__import__("mpmath").__version__, mp.dps), file=out)
    print("hits,n,level,low,high", file=out)
    cases = [(1, 2), (1, 3), (2, 3), (1, 1000), (999, 1000), (3, 10**6), (10**6 - 3, 10**6), (25, 10**7)]
    cases += [(1, 10**11), (7, 10**11), (1000, 10**11), (10**6, 10**11), (10**11 - 2, 10**11)]
    cases += [(500, 1000), (5 * 10**4, 10**5), (123456, 10**6), (10**5, 10**9), (10**9 - 10**5, 10**9)]
    for k, n in cases:
        for level in (0.5, 0.95, 0.99, 1 - 1e-6, 1 - 1e-9):
            t = (1 - mpf(level)) / 2
            low = beta_quantile(mpf(k), mpf(n - k + 1), tail_below=t)
            high = beta_quantile(mpf(k + 1), mpf(n - k), tail_above=t)
            print("%d,%d,%r,%s,%s" % (k, n, level, mp.nstr(low, 20), mp.nstr(high, 20)), file=out)
