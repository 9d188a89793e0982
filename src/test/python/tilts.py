"""Logarithms of E exp(t X) and cdfs of tilted densities; prints src/test/resources/density/tilts.csv.

By quadrature or summation of the density times exp(t x) in mpmath, 40 digits; densities written here from their
definitions, no closed form of a tilted one is used. Run with /usr/bin/python3.
"""

from mpmath import mp, mpf, exp, log, sqrt, pi, gamma, quad, inf, nsum, loggamma, binomial, ncdf

mp.dps = 40


def continuous(name, parameters, pdf, low, high, t, points, cuts):
    f = lambda x: pdf(x) * exp(t * x)
    line = [low] + cuts + [high]
    total = quad(f, line)
    for x in points:
        below = quad(f, [c for c in line if c < x] + [x]) / total
        above = quad(f, [x] + [c for c in line if c > x]) / total
        row(name, parameters, t, log(total), x, below, above)


def discrete(name, parameters, mass, values, t, points):
    f = [(k, mass(k) * exp(t * k)) for k in values]
    total = sum(m for _, m in f)
    for x in points:
        row(name, parameters, t, log(total), x, sum(m for k, m in f if k <= x) / total, sum(m for k, m in f if k > x) / total)


def row(name, parameters, t, factor, x, below, above):
    print(",".join([name, parameters] + [mp.nstr(mpf(v), 20) for v in (t, factor, x, below, above)]))


def main():
    print("family,parameters,tilt,logFactor,x,cdf,survival")
    n = lambda x: exp(-((x - 3) / 2) ** 2 / 2) / (2 * sqrt(2 * pi))
    for t in (mpf("1.5"), mpf(-4)):
        m = 3 + 4 * t
        continuous("normal", "mean=3;sd=2", n, -inf, inf, t, [m - 8, m + 3], [m - 40, m - 8, m, m + 8, m + 40])
    e = lambda x: exp(-x / 2) / 2
    for t in (mpf("0.25"), mpf("0.49"), mpf(-3)):
        s = 1 / (mpf("0.5") - t)
        continuous("exponential", "mean=2", e, 0, inf, t, [s / 4, 3 * s], [s, 5 * s, 20 * s, 100 * s])
    g = lambda x: x ** mpf("1.5") * exp(-x / 3) / (gamma(mpf("2.5")) * mpf(3) ** mpf("2.5"))
    for t in (mpf("0.25"), mpf(-2)):
        s = 1 / (mpf(1) / 3 - t)
        continuous("gamma", "shape=2.5;scale=3", g, 0, inf, t, [s, 6 * s], [s / 10, s, 3 * s, 10 * s, 40 * s, 150 * s])
    c = lambda x: x ** mpf("1.5") * exp(-x / 2) / (gamma(mpf("2.5")) * mpf(2) ** mpf("2.5"))
    continuous("chi-square", "dof=5", c, 0, inf, mpf("0.25"), [mpf(4), mpf(30)], [mpf(1), mpf(5), mpf(15), mpf(60), mpf(400)])
    i = lambda x: sqrt(3 / (2 * pi * x ** 3)) * exp(-3 * (x - 2) ** 2 / (8 * x)) if x > 0 else mpf(0)
    for t in (mpf("0.25"), mpf(-1)):
        continuous("inverse-gaussian", "mean=2;shape=3", i, 0, inf, t, [mpf("0.5"), mpf(5)],
                   [mpf("0.1"), mpf("0.3"), mpf(1), mpf(3), mpf(10), mpf(40), mpf(200)])
    l = lambda x: exp(-abs(x - 1) / 2) / 4
    for t in (mpf("0.25"), mpf("-0.375")):
        continuous("laplace", "location=1;scale=2", l, -inf, inf, t, [mpf(-2), mpf(6)], [mpf(-200), mpf(-20), mpf(1), mpf(20), mpf(200)])
    u = lambda x: mpf(1) / 3
    for t in (mpf(2), mpf(-40)):
        continuous("uniform", "from=-1;to=2", u, mpf(-1), mpf(2), t, [mpf("-0.95"), mpf("1.5")], [mpf("-0.9"), mpf(0), mpf("1.9")])
    b = lambda x: exp(-(x - 1) / 2 - exp(-(x - 1) / 2)) / 2
    for t in (mpf("0.25"), mpf(-2)):
        continuous("gumbel", "location=1;scale=2", b, mpf(-14), mpf(1000), t, [mpf(0), mpf(8)],
                   [mpf(-10), mpf(-6), mpf(-3), mpf(0), mpf(3), mpf(10), mpf(40), mpf(200)])
    w = lambda x: 2 * x * exp(-x ** 2)
    continuous("weibull", "shape=2;scale=1;from=0", w, 0, inf, mpf(6), [mpf(1), mpf(4)], [mpf(1), mpf(3), mpf(5), mpf(10)])
    discrete("poisson", "mean=4", lambda k: exp(-4 + k * log(mpf(4)) - loggamma(k + 1)), range(400), mpf(1), [8, 16])
    discrete("binomial", "trials=12;probability=0.25", lambda k: binomial(12, k) * mpf("0.25") ** k * mpf("0.75") ** (12 - k),
             range(13), mpf("1.5"), [4, 11])
    discrete("bernoulli", "probability=0.0625", lambda k: mpf("0.0625") if k else mpf("0.9375"), range(2), mpf(3), [0])
    discrete("geometric", "probability=0.25", lambda k: mpf("0.25") * mpf("0.75") ** k, range(4000), mpf("0.25"), [3, 60])
    p = mpf("2.5") / (mpf("2.5") + 4)
    discrete("negative-binomial", "size=2.5;mean=4",
             lambda k: exp(loggamma(k + mpf("2.5")) - loggamma(mpf("2.5")) - loggamma(k + 1)) * p ** mpf("2.5") * (1 - p) ** k,
             range(4000), mpf("0.25"), [5, 60])
    discrete("hypergeometric", "population=50;marked=20;drawn=10",
             lambda k: binomial(20, k) * binomial(30, 10 - k) / binomial(50, 10), range(11), mpf(1), [4, 8])


main()
