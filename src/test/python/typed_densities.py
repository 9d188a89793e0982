"""Independent values of typed densities: src/test/resources/density/typed.csv, computed with mpmath at 60 digits.

Run from the top of the repository: python3 src/test/python/typed_densities.py

Rows "density": name, formula, range, breaks, log -> integral, mean, variance, skewness, excess kurtosis
Rows "at":      name, x -> cdf, survival at the double x

Integrals, masses and moments are closed forms, written here by hand; those of sums are sums of those of their parts.
The density of each formula is written a second time, and its integral by quadrature is asserted to be the closed one.
"""
import os
from mpmath import mp, mpf, mpc, erfc, exp, inf, log, pi, sqrt, cos, quad, betainc, beta, atan, gamma, gammainc, loggamma
import mpmath

mp.dps = 60
OUT = os.path.join("src", "test", "resources", "density", "typed.csv")
nan = mpmath.nan


class Part:
    """A distribution with weight 1: mass below, mass above, raw moments 1 to 4."""

    def __init__(self, cdf, survival, moments):
        self.cdf, self.survival, self.moments = cdf, survival, moments


def normal(mean, sd):
    mean, sd = mpf(mean), mpf(sd)
    return Part(lambda x: erfc((mean - x) / sd / sqrt(2)) / 2, lambda x: erfc((x - mean) / sd / sqrt(2)) / 2,
                [mean, mean**2 + sd**2, mean**3 + 3 * mean * sd**2, mean**4 + 6 * mean**2 * sd**2 + 3 * sd**4])


def uniform(a, b):
    a, b = mpf(a), mpf(b)
    return Part(lambda x: min(max((x - a) / (b - a), mpf(0)), mpf(1)),
                lambda x: min(max((b - x) / (b - a), mpf(0)), mpf(1)),
                [(b**(n + 1) - a**(n + 1)) / ((n + 1) * (b - a)) for n in range(1, 5)])


def rising(a, b):
    """A straight line that is 0 at a and stands between a and b, whichever is greater."""
    a, b = mpf(a), mpf(b)

    def towards(x):
        t = min(max((x - a) / (b - a), mpf(0)), mpf(1))
        return t * t
    moments = [quad(lambda t: 2 * t * (a + (b - a) * t)**n, [0, 1]) for n in range(1, 5)]
    if b > a:
        return Part(towards, lambda x: 1 - towards(x), moments)
    return Part(lambda x: 1 - towards(x), towards, moments)


def mixture(*parts):
    total = sum(mpf(w) for w, _ in parts)
    return Part(lambda x: sum(mpf(w) * p.cdf(x) for w, p in parts) / total,
                lambda x: sum(mpf(w) * p.survival(x) for w, p in parts) / total,
                [sum(mpf(w) * p.moments[n] for w, p in parts) / total for n in range(4)])


def symmetric(upper, moments):
    return Part(lambda x: upper(-x), upper, moments)


def waves():
    """(1 + cos 20 x) exp(-x^2 / 2): the wave's mass beyond x is Re exp(-200) erfc((x - 20 i) / sqrt 2) / 2."""
    one = 1 + exp(mpf(-200))

    def upper(x):
        wave = exp(mpf(-200)) * mpmath.erfc(mpc(x, -20) / sqrt(2)) / 2
        return (erfc(x / sqrt(2)) / 2 + wave.real) / one
    second = (1 + exp(mpf(-200)) * (1 - 400)) / one
    fourth = (3 + exp(mpf(-200)) * (20**4 - 6 * 400 + 3)) / one
    return symmetric(upper, [mpf(0), second, mpf(0), fourth])


def laplace(m, k):
    m, k = mpf(m), mpf(k)

    def upper(x):
        return exp(-k * (x - m)) / 2 if x >= m else 1 - exp(k * (x - m)) / 2
    c = [mpf(1), mpf(0), 2 / k**2, mpf(0), 24 / k**4]
    raw = [sum(mpmath.binomial(n, i) * c[i] * m**(n - i) for i in range(n + 1)) for n in range(1, 5)]
    return Part(lambda x: upper(2 * m - x), upper, raw)


def power(a):
    """x^(a - 1) between 0 and 1."""
    a = mpf(a)
    return Part(lambda x: x**a, lambda x: 1 - x**a, [a / (a + n) for n in range(1, 5)])


def pole():
    """|x - 0.3|^(-1/3) between -1 and 1; both sides of the double 0.3, which is the break."""
    c = mpf(0.3)
    low, high = (1 + c)**(mpf(2) / 3), (1 - c)**(mpf(2) / 3)

    def side(x):
        return abs(x - c)**(mpf(2) / 3)

    def cdf(x):
        return ((low - side(x)) if x < c else (low + side(x))) / (low + high)

    def survival(x):
        return ((high + side(x)) if x < c else (high - side(x))) / (low + high)
    k = mpf(2) / 3
    d = [(k / (k + n) * ((-1)**n * low * (1 + c)**n + high * (1 - c)**n)) / (low + high) for n in range(5)]
    raw = [sum(mpmath.binomial(n, i) * d[i] * c**(n - i) for i in range(n + 1)) for n in range(1, 5)]
    return Part(cdf, survival, raw)


def pole_integral():
    c = mpf(0.3)
    return mpf(3) / 2 * ((1 + c)**(mpf(2) / 3) + (1 - c)**(mpf(2) / 3))


ROOT = sqrt(2 * pi)
S6 = mpf(1e-6)

# name, formula, from, to, breaks, log, integral, distribution, density again, where to split its quadrature, points
DENSITIES = [
    ("two humps", "exp(-(s-2)^2/2)+0.5*exp(-(s+3)^2/0.5)", "-inf", "inf", "", False,
     ROOT * (1 + mpf("0.25")), mixture((1, normal(2, 1)), ("0.25", normal(-3, "0.5"))),
     lambda x: exp(-(x - 2)**2 / 2) + exp(-(x + 3)**2 * 2) / 2, [-inf, -3, 0, 2, inf],
     [-20, -7, -5, -4, -3, -2.5, -1, 0, 1, 2, 3.5, 6, 9, 11, 25]),
    ("gap", "[s>2 & s<3]+2*[s>5 & s<6]", "0", "10", "", False,
     mpf(3), mixture((1, uniform(2, 3)), (2, uniform(5, 6))),
     lambda x: (2 < x < 3) + 2 * (5 < x < 6), [0, 2, 3, 5, 6, 10],
     [1, 2.000001, 2.25, 2.999, 3.5, 4.5, 5.001, 5.5, 5.999999, 8]),
    ("jump", "[s<1]+3*[s>=1]", "0", "2", "", False,
     mpf(4), mixture((1, uniform(0, 1)), (3, uniform(1, 2))),
     lambda x: 1 if x < 1 else 3, [0, 1, 2], [1e-300, 1e-100, 1e-16, 0.001, 0.5, 0.999, 1, 1.001, 1.5, 1.999999]),
    ("kink", "1-abs(s-0.25)", "-0.75", "1.25", "", False,
     mpf(1), mixture((1, rising(-0.75, 0.25)), (1, rising(1.25, 0.25))),
     lambda x: 1 - abs(x - mpf(0.25)), [-0.75, 0.25, 1.25],
     [-0.75 + 1e-6, -0.7, -0.2, 0.2, 0.25, 0.3, 0.9, 1.2, 1.25 - 1e-6]),
    ("heavy tail", "1/(1+((s-1000)/3)^2)", "-inf", "inf", "", False,
     3 * pi, Part(lambda x: atan(3 / (1000 - x)) / pi if x < 1000 else mpf(1) / 2 + atan((x - 1000) / 3) / pi,
                  lambda x: atan(3 / (x - 1000)) / pi if x > 1000 else mpf(1) / 2 + atan((1000 - x) / 3) / pi,
                  [nan] * 4),
     lambda x: 1 / (1 + ((x - 1000) / 3)**2), [-inf, 0, 1000, 2000, inf],
     [-1e250, -1e100, -1e16, -1e6, 0, 900, 990, 999, 1000, 1001, 1010, 1e4, 1e8, 1e16, 1e100, 1e250]),
    ("spike", "exp(-((s-0.3)/1e-6)^2/2)", "-10", "10", "", False,
     ROOT * S6, normal(mpf(0.3), S6),
     lambda x: exp(-((x - mpf(0.3)) / S6)**2 / 2), [0.29999, 0.3, 0.30001],
     [-1, 0.29998, 0.299992, 0.299995, 0.299999, 0.3, 0.3000002, 0.300001, 0.300006, 0.300008, 0.30002, 1]),
    ("spike on a hump", "exp(-s^2/2)+1e5*exp(-((s-0.3)/1e-6)^2/2)", "-inf", "inf", "", False,
     ROOT * (1 + mpf("1e5") * S6), mixture((1, normal(0, 1)), (mpf("1e5") * S6, normal(mpf(0.3), S6))),
     lambda x: exp(-x**2 / 2) + mpf("1e5") * exp(-((x - mpf(0.3)) / S6)**2 / 2),
     [-inf, 0, 0.29999, 0.3, 0.30001, 1, inf],
     [-30, -8, -3, -1, 0, 0.2, 0.299999, 0.3, 0.300001, 0.30001, 0.4, 1, 3, 8, 30]),
    ("far below underflow", "-1e5-(s-4)^2/2", "-inf", "inf", "", True,
     ROOT * exp(mpf(-100000)), normal(4, 1),
     lambda x: exp(-(x - 4)**2 / 2), [-20, -8, 0, 4, 8, 16, 28], [-30, -4, 0, 2, 3.5, 4, 4.5, 6, 8, 12, 38]),
    ("pole at an end", "1/sqrt(s)", "0", "1", "", False,
     mpf(2), power("0.5"), lambda x: 1 / sqrt(x), [0, 1],
     [1e-300, 1e-200, 1e-100, 1e-32, 1e-16, 1e-6, 0.01, 0.25, 0.5, 0.75, 0.99, 0.999999]),
    ("pole at a break", "abs(s-0.3)^(-1/3)", "-1", "1", "0.3", False,
     pole_integral(), pole(), lambda x: abs(x - mpf(0.3))**(mpf(-1) / 3), [-1, 0.3, 1],
     [-0.999, -0.5, 0, 0.29, 0.299999, 0.3 - 1e-9, 0.3, 0.3 + 1e-9, 0.300001, 0.31, 0.5, 0.9, 0.999]),
    ("wall", "exp(-s)", "0", "inf", "", False,
     mpf(1), Part(lambda x: -mpmath.expm1(-x), lambda x: exp(-x), [mpf(1), mpf(2), mpf(6), mpf(24)]),
     lambda x: exp(-x), [0, 1, 10, inf], [1e-300, 1e-100, 1e-16, 1e-6, 0.01, 0.5, 0.7, 1, 5, 20, 37, 200, 650]),
    ("polynomial", "s^2*(1-s)^3", "0", "1", "", False,
     mpf(1) / 60, Part(lambda x: betainc(3, 4, 0, x, regularized=True), lambda x: betainc(4, 3, 0, 1 - x, regularized=True),
                       [beta(3 + n, 4) / beta(3, 4) for n in range(1, 5)]),
     lambda x: x**2 * (1 - x)**3, [0, 1], [1e-90, 1e-16, 1e-6, 0.01, 0.2, 0.4, 0.5, 0.8, 0.95, 0.999]),
    ("waves", "(1+cos(20*s))*exp(-s^2/2)", "-inf", "inf", "", False,
     ROOT * (1 + exp(mpf(-200))), waves(),
     lambda x: (1 + cos(20 * x)) * exp(-x**2 / 2), [mpf(i) / 10 for i in range(-170, 171)],
     [-12, -8, -3, -1, -0.2, -0.1, 0, 0.05, 0.15, 0.5, 1.7, 4, 8, 12]),
    ("constants", "k*exp(-k*abs(s-m))", "-inf", "inf", "", False,
     mpf(2), laplace(-3, mpf(2.5)), lambda x: mpf(2.5) * exp(-mpf(2.5) * abs(x + 3)), [-40, -10, -5, -3, -1, 4, 34],
     [-250, -20, -10, -5, -4, -3, -2.5, 0, 5, 12, 200]),
    ("cube", "exp(-abs(s)^3)", "-inf", "inf", "", False,
     2 * gamma(mpf(4) / 3),
     symmetric(lambda x: gammainc(mpf(1) / 3, x**3, inf, regularized=True) / 2 if x >= 0
               else 1 - gammainc(mpf(1) / 3, -x**3, inf, regularized=True) / 2,
               [mpf(0), gamma(mpf(1)) / gamma(mpf(1) / 3), mpf(0), gamma(mpf(5) / 3) / gamma(mpf(1) / 3)]),
     lambda x: exp(-abs(x)**3), [-6, -3, -1, 0, 1, 3, 6], [-8.5, -5, -3, -2, -1, -0.3, 0, 0.1, 0.5, 0.9, 1.5, 2.5, 4, 8.5]),
]


def central(raw):
    m = raw[0]
    c2 = raw[1] - m**2
    c3 = raw[2] - 3 * m * raw[1] + 2 * m**3
    c4 = raw[3] - 4 * m * raw[2] + 6 * m**2 * raw[1] - 3 * m**4
    return m, c2, c3 / c2**mpf("1.5"), c4 / c2**2 - 3


def text(v):
    if v == 0:
        return "0"
    return "NaN" if mpmath.isnan(v) else mpmath.nstr(v, 32, min_fixed=0, max_fixed=0)


with open(OUT, "w") as out:
    out.write("# mpmath %s, 60 digits; made by src/test/python/typed_densities.py\n" % mpmath.__version__)
    out.write("kind,name,formula,from,to,breaks,log,integral,mean,variance,skewness,excessKurtosis,x,cdf,survival\n")
    for name, formula, low, high, breaks, is_log, integral, d, density, splits, points in DENSITIES:
        seen = quad(density, splits)
        # quad stops at an absolute error, so the one far below underflow is looked at without its factor
        factor = exp(mpf(100000)) if is_log else 1
        assert abs(seen / (factor * integral) - 1) < mpf("1e-15"), (name, seen, integral)
        mean, variance, skewness, kurtosis = central(d.moments)
        out.write(",".join(["density", name, formula, low, high, breaks, str(is_log).lower(), text(integral), text(mean),
                            text(variance), text(skewness), text(kurtosis), "", "", ""]) + "\n")
        for x in points:
            c, s = d.cdf(mpf(x)), d.survival(mpf(x))
            assert abs(c + s - 1) < mpf("1e-50"), (name, x, c, s)
            out.write(",".join(["at", name] + [""] * 10 + [repr(float(x)), text(c), text(s)]) + "\n")
