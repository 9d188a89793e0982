"""Independent tables of the densities: src/test/resources/density/NAME.csv, computed with mpmath at 60 digits.

Run from the top of the repository: python3 src/test/python/density_tables.py

Rows "at":      parameters, x        -> pdf, log pdf, cdf, survival at the double x
Rows "inverse": parameters, p and q  -> the x with cdf(x) = p, the x with survival(x) = q

density/moments/NAME.csv: mean, variance, skewness and excess kurtosis of the members of a family with a method for
them; "+inf" where infinite, "nan" where undefined.

Other scripts (density_tables_*.py) import this one for families of their own: a class, and `main(families, script)`.

Gamma and beta masses are a power series or a continued fraction of the smaller tail, written for this file.
"""
import os
from mpmath import mp, mpf, erfc, euler, exp, expm1, gamma, inf, log, log1p, loggamma, nan, pi, sqrt, zeta
import mpmath

mp.dps = 60
OUT = os.path.join("src", "test", "resources", "density")
TAILS = ["1e-300", "1e-100", "1e-30", "1e-16", "1e-8", "0.001", "0.1", "0.3", "0.5"]


def gamma_tails(a, x):
    """P and Q of shape a; the smaller one from its own series or, far above the mode, continued fraction."""
    prefix = exp(a * log(x) - x - loggamma(a + 1))
    if x > 1.1 * a + 20:
        b = x + 1 - a
        f, c, d, n = b, b, mpf(0), 0
        while True:
            n += 1
            b += 2
            d = 1 / (b - n * (n - a) * d)
            c = b - n * (n - a) / c
            f *= c * d
            if abs(c * d - 1) < mpf(10) ** -mp.dps:
                return 1 - a * prefix / f, a * prefix / f
    term, total, n = mpf(1), mpf(1), a
    while term > mpf(10) ** -(mp.dps + 5) * total:
        n += 1
        term *= x / n
        total += term
    lower = prefix * total
    return lower, 1 - lower


def beta_lower(a, b, x):
    """The continued fraction of DLMF 8.17.22, with 20 digits more than asked for."""
    digits = mp.dps
    mp.dps += 20
    prefix = exp(a * log(x) + b * log(1 - x) + loggamma(a + b) - loggamma(a + 1) - loggamma(b))
    f, c, d, m = mpf(1), mpf(1), mpf(0), 0
    while True:
        change = mpf(1)
        for term in (m * (b - m) * x / ((a + 2 * m - 1) * (a + 2 * m)) if m else None,
                     -(a + m) * (a + b + m) * x / ((a + 2 * m) * (a + 2 * m + 1))):
            if term is not None:
                d = 1 / (1 + term * d)
                c = 1 + term / c
                change *= c * d
        f *= change
        m += 1
        if abs(change - 1) < mpf(10) ** -(digits + 3):
            break
    mp.dps = digits
    return prefix / f


def beta_tails(a, b, x):
    if x <= a / (a + b):
        lower = beta_lower(a, b, x)
        return lower, 1 - lower
    upper = beta_lower(b, a, 1 - x)
    return 1 - upper, upper


def standardised(raw, order):
    """Mean, variance, skewness, excess kurtosis from a function of the order; those from `order` on do not exist."""
    with mp.workdps(150):
        m = [mpf(1)] + [raw(k) if k < order else None for k in range(1, 5)]
        mean = m[1] if order > 1 else inf
        if order <= 2:
            return mean, inf, nan, nan
        variance = m[2] - mean ** 2
        skewness, excess = inf, inf
        if order > 3:
            skewness = (m[3] - 3 * mean * m[2] + 2 * mean ** 3) / variance ** mpf(1.5)
        if order > 4:
            excess = (m[4] - 4 * mean * m[3] + 6 * mean ** 2 * m[2] - 3 * mean ** 4) / variance ** 2 - 3
        return mean, variance, skewness, excess


def moved(moments, location, scale):
    mean, variance, skewness, excess = moments
    return location + scale * mean, scale * scale * variance, skewness, excess


class Uniform:
    name, columns = "uniform", ["from", "to"]
    members = [("-2", "3"), ("1000000", "1000000.5"), ("0", "1e20"), ("-1e20", "0")]

    def __init__(self, a, b):
        self.a, self.b = a, b

    def log_pdf(self, x):
        return -log(self.b - self.a)

    def tails(self, x):
        return (x - self.a) / (self.b - self.a), (self.b - x) / (self.b - self.a)

    def moments(self):
        return (self.a + self.b) / 2, (self.b - self.a) ** 2 / 12, 0, mpf(-6) / 5

    def support(self):
        return self.a, self.b


class Normal:
    name, columns = "normal", ["mean", "sd"]
    members = [("0", "1"), ("1.5", "2.5"), ("50000623", "25")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        z = (x - self.m) / self.s
        return -z * z / 2 - log(2 * pi) / 2 - log(self.s)

    def tails(self, x):
        z = (x - self.m) / self.s / sqrt(mpf(2))
        return erfc(-z) / 2, erfc(z) / 2

    def moments(self):
        return self.m, self.s ** 2, 0, 0

    def support(self):
        return -inf, inf


class Lognormal:
    name, columns = "lognormal", ["mu", "sigma"]
    members = [("0.3", "0.8"), ("0", "5"), ("-100", "0.001"), ("1", "16")]

    def __init__(self, m, s):
        self.n = Normal(m, s)

    def log_pdf(self, x):
        return self.n.log_pdf(log(x)) - log(x)

    def tails(self, x):
        return self.n.tails(log(x))

    def moments(self):
        return standardised(lambda k: exp(k * self.n.m + k * k * self.n.s ** 2 / 2), inf)

    def support(self):
        return mpf(0), inf


class Triangular:
    name, columns = "triangular", ["from", "mode", "to"]
    members = [("0", "2", "7"), ("0", "0", "1"), ("-1", "4", "4"), ("10", "10.001", "11"), ("-7", "-2", "0")]

    def __init__(self, a, m, b):
        self.a, self.m, self.b = a, m, b

    def log_pdf(self, x):
        a, m, b = self.a, self.m, self.b
        return log(2 * (x - a) / (b - a) / (m - a)) if x < m else log(2 * (b - x) / (b - a) / (b - m))

    def tails(self, x):
        a, m, b = self.a, self.m, self.b
        if x < m:
            return (x - a) ** 2 / (b - a) / (m - a), (b - m + (m - x) * (m + x - 2 * a) / (m - a)) / (b - a)
        return (m - a + (x - m) * (2 * b - m - x) / (b - m)) / (b - a), (b - x) ** 2 / (b - a) / (b - m)

    def moments(self):
        return moved(standardised(self.raw, inf), self.a, self.b - self.a)

    def raw(self, k):
        """Of the density between 0 and 1: the integral of the two straight lines."""
        m = (self.m - self.a) / (self.b - self.a)
        rising = m ** (k + 1) / (k + 2)
        falling = ((1 - m ** (k + 1)) / (k + 1) - (1 - m ** (k + 2)) / (k + 2)) / (1 - m) if m < 1 else 0
        return 2 * (rising + falling)

    def support(self):
        return self.a, self.b


class Exponential:
    name, columns = "exponential", ["mean", "from"]
    members = [("2", "0"), ("1e-100", "0"), ("5", "3"), ("-7", "-7.5"), ("1e20", "0")]

    def __init__(self, m, low):
        self.s, self.low = m - low, low

    def log_pdf(self, x):
        return -(x - self.low) / self.s - log(self.s)

    def tails(self, x):
        z = (x - self.low) / self.s
        return -expm1(-z), exp(-z)

    def moments(self):
        return self.low + self.s, self.s ** 2, 2, 6

    def support(self):
        return self.low, inf


class Gamma:
    name, columns = "gamma", ["shape", "scale"]
    members = [("2.5", "1.4"), ("0.05", "1"), ("0.001", "1"), ("0.5", "2"), ("1", "3"), ("24", "1"), ("25", "1"),
               ("30.5", "0.1"), ("150", "1"), ("3000", "1")]

    def __init__(self, a, s):
        self.a, self.s = a, s

    def log_pdf(self, x):
        return (self.a - 1) * log(x / self.s) - x / self.s - loggamma(self.a) - log(self.s)

    def tails(self, x):
        return gamma_tails(self.a, x / self.s)

    def moments(self):
        return moved(standardised(lambda k: gamma(self.a + k) / gamma(self.a), inf), 0, self.s)

    def support(self):
        return mpf(0), inf


class Beta:
    name, columns = "beta", ["alpha", "beta", "from", "to"]
    members = [("2.3", "4.1", "0", "1"), ("0.5", "0.5", "0", "1"), ("0.02", "0.05", "0", "1"), ("1", "1", "0", "1"),
               ("0.3", "20", "2", "5"), ("200", "0.7", "-1", "1"), ("1000", "3000", "0", "1"), ("5", "10000", "0", "1"),
               ("1.5", "2000", "0", "1")]

    def __init__(self, a, b, low, high):
        self.a, self.b, self.low, self.high = a, b, low, high

    def log_pdf(self, x):
        a, b, w = self.a, self.b, self.high - self.low
        z, y = (x - self.low) / w, (self.high - x) / w
        return (a - 1) * log(z) + (b - 1) * log(y) + loggamma(a + b) - loggamma(a) - loggamma(b) - log(w)

    def tails(self, x):
        return beta_tails(self.a, self.b, (x - self.low) / (self.high - self.low))

    def moments(self):
        return moved(standardised(self.raw, inf), self.low, self.high - self.low)

    def raw(self, k):
        return exp(loggamma(self.a + k) - loggamma(self.a) + loggamma(self.a + self.b) - loggamma(self.a + self.b + k))

    def support(self):
        return self.low, self.high


class Weibull:
    name, columns = "weibull", ["shape", "scale", "from"]
    members = [("1.7", "3", "0"), ("0.3", "2", "0"), ("0.02", "1", "0"), ("1", "2", "-3"), ("50", "10", "0")]

    def __init__(self, k, s, low):
        self.k, self.s, self.low = k, s, low

    def log_pdf(self, x):
        z = (x - self.low) / self.s
        return log(self.k) + (self.k - 1) * log(z) - z ** self.k - log(self.s)

    def tails(self, x):
        z = ((x - self.low) / self.s) ** self.k
        return -expm1(-z), exp(-z)

    def moments(self):
        return moved(standardised(lambda k: gamma(1 + k / self.k), inf), self.low, self.s)

    def support(self):
        return self.low, inf


class Gumbel:
    name, columns = "gumbel", ["location", "scale"]
    members = [("2", "1.5"), ("24.5", "2.6")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        z = (x - self.m) / self.s
        return -z - exp(-z) - log(self.s)

    def tails(self, x):
        z = exp(min(-(x - self.m) / self.s, mpf(1000)))
        return exp(-z), -expm1(-z)

    def moments(self):
        return self.m + euler * self.s, (pi * self.s) ** 2 / 6, 12 * sqrt(mpf(6)) * zeta(3) / pi ** 3, mpf(12) / 5

    def support(self):
        return -inf, inf


class Student:
    name, columns = "student", ["dof", "location", "scale"]
    members = [("3", "0", "1"), ("5.5", "10", "2"), ("1", "0", "1"), ("0.1", "0", "1"), ("0.5", "0", "1"),
               ("18", "50000623", "25"), ("300", "0", "1"), ("5000", "0", "1")]

    def __init__(self, n, m, s):
        self.n, self.m, self.s = n, m, s

    def log_pdf(self, x):
        n, z = self.n, (x - self.m) / self.s
        return loggamma((n + 1) / 2) - loggamma(n / 2) - log(n * pi) / 2 - (n + 1) / 2 * log1p(z * z / n) - log(self.s)

    def tails(self, x):
        n, z = self.n, (x - self.m) / self.s
        square = z * z / n
        w = 1 / (1 + square)
        if w <= n / (n + 1):
            far = beta_lower(n / 2, mpf(1) / 2, w) / 2
        else:
            far = (1 - beta_lower(mpf(1) / 2, n / 2, square * w)) / 2
        return (1 - far, far) if z > 0 else (far, 1 - far)

    def moments(self):
        return self.from_dof()

    def from_dof(self):
        n = self.n
        if n <= 1:
            return nan, nan, nan, nan
        variance = self.s ** 2 * n / (n - 2) if n > 2 else inf
        return self.m, variance, 0 if n > 3 else nan, 6 / (n - 4) if n > 4 else inf if n > 2 else nan

    def support(self):
        return -inf, inf


def solve(d, mass, side):
    """The x whose tail (0 lower, 1 upper) has this mass: bisection on the bits of a double, then secants at 60 digits."""
    import struct

    def order(v):
        bits = struct.unpack("<q", struct.pack("<d", v))[0]
        return bits if bits >= 0 else -(bits & 0x7FFFFFFFFFFFFFFF)

    def double(o):
        return struct.unpack("<d", struct.pack("<q", o))[0] if o >= 0 else -double(-o)

    low, high = d.support()
    top = 1.7e308
    lo = order(-top if low == -inf else float(low))
    hi = order(top if high == inf else float(high))
    sign = 1 if side == 0 else -1
    mp.dps = 25
    while hi - lo > 1:
        middle = (lo + hi) // 2
        x = mpf(double(middle))
        if x <= low or x >= high:
            return None
        if sign * (d.tails(x)[side] - mass) < 0:
            lo = middle
        else:
            hi = middle
    mp.dps = 60
    a, b = mpf(double(lo)), mpf(double(hi))
    if a <= low or b >= high or abs(a) < mpf("1e-290") and a != 0 or abs(b) > mpf("1e300"):
        return None
    f = lambda x: sign * (d.tails(x)[side] - mass)
    fa, fb = f(a), f(b)
    for _ in range(4):
        if fb == fa:
            break
        c = b - fb * (b - a) / (fb - fa)
        a, fa, b, fb = b, fb, c, f(c)
        if abs(b - a) < mpf(10) ** -40 * abs(b):
            break
    return b


def text(v):
    return "" if v is None else mpmath.nstr(v, 20, min_fixed=1, max_fixed=0) if v != 0 else "0"


def write(family, script):
    os.makedirs(OUT, exist_ok=True)
    with open(os.path.join(OUT, family.name + ".csv"), "w") as out:
        out.write("# mpmath %s, 60 digits; made by src/test/python/%s\n" % (mpmath.__version__, script))
        out.write(",".join(["kind"] + family.columns + ["x", "y", "pdf", "logPdf", "cdf", "survival"]) + "\n")
        for member in family.members:
            d = family(*[mpf(float(v)) for v in member])
            xs = set()
            for tail in TAILS:
                mp.dps = 60
                mass = mpf(float(tail))
                below, above = solve(d, mass, 0), solve(d, mass, 1)
                out.write(",".join(["inverse"] + list(member) + [text(below), text(above), "", "", tail, tail]) + "\n")
                xs |= {float(v) for v in (below, above) if v is not None}
            for x in sorted(xs):
                low, high = d.support()
                if not low < x < high:
                    continue
                v = mpf(x)
                lower, upper = d.tails(v)
                log_pdf = d.log_pdf(v)
                row = [repr(x), "", text(exp(log_pdf)), text(log_pdf), text(lower), text(upper)]
                out.write(",".join(["at"] + list(member) + row) + "\n")
    print(family.name)


def write_moments(family, script):
    folder = os.path.join(OUT, "moments")
    os.makedirs(folder, exist_ok=True)
    with open(os.path.join(folder, family.name + ".csv"), "w") as out:
        out.write("# mpmath %s, 60 digits; made by src/test/python/%s\n" % (mpmath.__version__, script))
        out.write(",".join(family.columns + ["mean", "variance", "skewness", "excessKurtosis"]) + "\n")
        for member in family.members:
            moments = family(*[mpf(float(v)) for v in member]).moments()
            out.write(",".join(list(member) + [text(mpf(v)) for v in moments]) + "\n")


def main(families, script):
    import sys
    for family in families:
        if len(sys.argv) < 2 or family.name in sys.argv[1:]:
            write(family, script)
            if hasattr(family, "moments"):
                write_moments(family, script)


if __name__ == "__main__":
    main((Uniform, Normal, Lognormal, Triangular, Exponential, Gamma, Beta, Weibull, Gumbel, Student),
         "density_tables.py")
