"""Independent tables of more densities, with the machinery of density_tables.py.

Run from the top of the repository: python3 src/test/python/density_tables_a.py
"""
from density_tables import beta_lower, beta_tails, gamma_tails, main, moved, standardised
from mpmath import asin, atan, erf, erfc, exp, expm1, gamma, inf, log, log1p, loggamma, mpf, nan, pi, sin, sqrt


class Trapezoidal:
    name, columns = "trapezoidal", ["from", "flatFrom", "flatTo", "to"]
    members = [("0", "1", "3", "6"), ("0", "0", "0", "1"), ("-1", "-1", "2", "4"), ("-1", "2", "4", "4"),
               ("0", "0", "5", "5"), ("10", "10.001", "10.999", "11"), ("0", "1", "1", "6"), ("0", "0.5", "9.999", "10"),
               ("-6", "-5", "-3", "0")]

    def __init__(self, a, b, c, d):
        self.a, self.b, self.c, self.d = a, b, c, d
        self.h = 2 / (d + c - a - b)

    def log_pdf(self, x):
        rise = (x - self.a) / (self.b - self.a) if x < self.b else 1
        fall = (self.d - x) / (self.d - self.c) if x > self.c else 1
        return log(self.h * min(rise, fall))

    def tails(self, x):
        a, b, c, d = self.a, self.b, self.c, self.d
        return self.below(x, a, b, c, d), self.below(-x, -d, -c, -b, -a)

    def below(self, x, a, b, c, d):
        if a < b and x < b:
            return self.h * (x - a) ** 2 / (b - a) / 2
        flat = self.h * ((b - a) / 2 + min(x, c) - b)
        return flat + (self.h * (x - c) * (2 * d - c - x) / (d - c) / 2 if c < x and c < d else 0)

    def moments(self):
        return standardised(self.raw, inf)

    def raw(self, k):
        """The second difference of the power two orders higher."""
        def rise(low, high):
            return (k + 2) * low ** (k + 1) if low == high else (high ** (k + 2) - low ** (k + 2)) / (high - low)

        return self.h * (rise(self.c, self.d) - rise(self.a, self.b)) / ((k + 1) * (k + 2))

    def support(self):
        return self.a, self.d


class CurvilinearTrapezoid:
    """JCGM 101:2008, 6.4.3: the tails are the integral of its density log((w + d) / |x - middle|) / (4 d)."""
    name, columns = "curvilinear-trapezoid", ["from", "to", "inexact"]
    members = [("-1", "1", "0.1"), ("-0.05", "0.05", "0.025"), ("1", "5", "1"), ("1", "5", "1.999"),
               ("-1", "1", "9.5367431640625e-07"), ("9.5", "10.5", "4.656612873077393e-10"), ("-5", "-1", "1")]

    def __init__(self, a, b, d):
        self.m, self.w, self.d = (a + b) / 2, (b - a) / 2, d

    def log_pdf(self, x):
        w, d = self.w, self.d
        low, high = self.support()
        return log(-log1p(-min(x - low, high - x, 2 * d) / (w + d)) / (4 * d))

    def tails(self, x):
        w, d = self.w, self.d
        low, high = self.support()
        y = min(x - low, high - x) / (w + d)
        e = 2 * d / (w + d)

        def corner(v):
            if v > mpf("0.01"):
                return (v + (1 - v) * log(1 - v)) / (2 * e)
            return sum(v ** k / (k * (k - 1)) for k in range(2, 40)) / (2 * e)

        far = corner(y) if y < e else corner(e) - (y - e) * log(1 - e) / (2 * e)
        return (far, 1 - far) if x < self.m else (1 - far, far)

    def moments(self):
        return self.m, self.mean_power(2) / 3, 0, self.mean_power(4) / 5 / (self.mean_power(2) / 3) ** 2 - 3

    def mean_power(self, k):
        """Of half the width, which is uniform."""
        return ((self.w + self.d) ** (k + 1) - (self.w - self.d) ** (k + 1)) / (2 * self.d * (k + 1))

    def support(self):
        return self.m - self.w - self.d, self.m + self.w + self.d


class Arcsine:
    name, columns = "arcsine", ["from", "to"]
    members = [("0", "1"), ("-0.5", "0.5"), ("0", "1e-50"), ("19.5", "20.5"), ("-1", "0")]

    def __init__(self, a, b):
        self.a, self.b = a, b

    def log_pdf(self, x):
        return -log(pi * sqrt((x - self.a) * (self.b - x)))

    def tails(self, x):
        w = self.b - self.a
        z, y = max((x - self.a) / w, mpf(0)), max((self.b - x) / w, mpf(0))
        return 2 / pi * asin(sqrt(z)), 2 / pi * asin(sqrt(y))

    def moments(self):
        return (self.a + self.b) / 2, (self.b - self.a) ** 2 / 8, 0, mpf(-3) / 2

    def support(self):
        return self.a, self.b


class Pert:
    name, columns = "pert", ["from", "mode", "to", "emphasis"]
    members = [("1", "4", "10", "4"), ("0", "0", "1", "4"), ("0", "3", "3", "2.5"), ("0", "2", "7", "500"),
               ("0", "0.001", "1", "0.01")]

    def __init__(self, low, mode, high, emphasis):
        self.low, self.w = low, high - low
        self.high = high
        self.a, self.b = 1 + emphasis * (mode - low) / self.w, 1 + emphasis * (high - mode) / self.w

    def log_pdf(self, x):
        a, b = self.a, self.b
        z, y = (x - self.low) / self.w, (self.high - x) / self.w
        return (a - 1) * log(z) + (b - 1) * log(y) + loggamma(a + b) - loggamma(a) - loggamma(b) - log(self.w)

    def tails(self, x):
        return beta_tails(self.a, self.b, (x - self.low) / self.w)

    def moments(self):
        return moved(standardised(self.raw, inf), self.low, self.w)

    def raw(self, k):
        return exp(loggamma(self.a + k) - loggamma(self.a) + loggamma(self.a + self.b) - loggamma(self.a + self.b + k))

    def support(self):
        return self.low, self.high


class HalfNormal:
    name, columns = "half-normal", ["sigma"]
    members = [("1",), ("2.5",), ("1e-100",), ("1e100",)]

    def __init__(self, s):
        self.s = s

    def log_pdf(self, x):
        return log(2 / pi) / 2 - log(self.s) - (x / self.s) ** 2 / 2

    def tails(self, x):
        z = x / self.s / sqrt(mpf(2))
        return erf(z), erfc(z)

    def moments(self):
        return moved(standardised(lambda k: 2 ** (mpf(k) / 2) * gamma((k + mpf(1)) / 2) / sqrt(pi), inf), 0, self.s)

    def support(self):
        return mpf(0), inf


class Rayleigh:
    name, columns = "rayleigh", ["sigma"]
    members = [("1",), ("1.3",), ("1e100",)]

    def __init__(self, s):
        self.s = s

    def log_pdf(self, x):
        return log(x) - 2 * log(self.s) - (x / self.s) ** 2 / 2

    def tails(self, x):
        z = (x / self.s) ** 2 / 2
        return -expm1(-z), exp(-z)

    def moments(self):
        return moved(standardised(lambda k: 2 ** (mpf(k) / 2) * gamma(1 + mpf(k) / 2), inf), 0, self.s)

    def support(self):
        return mpf(0), inf


class ChiSquare:
    name, columns = "chi-square", ["dof"]
    members = [("7",), ("1",), ("2",), ("3",), ("0.2",), ("50",), ("1000",), ("6000",)]

    def __init__(self, n):
        self.a = n / 2

    def log_pdf(self, x):
        return (self.a - 1) * log(x / 2) - x / 2 - loggamma(self.a) - log(mpf(2))

    def tails(self, x):
        return gamma_tails(self.a, x / 2)

    def moments(self):
        return moved(standardised(lambda k: gamma(self.a + k) / gamma(self.a), inf), 0, 2)

    def support(self):
        return mpf(0), inf


class Fisher:
    name, columns = "f", ["dof1", "dof2"]
    members = [("5", "12"), ("1", "3"), ("2", "2"), ("1", "1"), ("0.2", "3"), ("7", "0.3"), ("3", "4000"),
               ("900", "5"), ("1000", "2000")]

    def __init__(self, m, n):
        self.m, self.n = m, n

    def log_pdf(self, x):
        a, b, s = self.m / 2, self.n / 2, self.m / self.n
        return (loggamma(a + b) - loggamma(a) - loggamma(b) + a * log(s) + (a - 1) * log(x)
                - (a + b) * log1p(s * x))

    def tails(self, x):
        a, b, z = self.m / 2, self.n / 2, x * self.m / self.n
        if z <= a / b:
            lower = beta_lower(a, b, z / (1 + z))
            return lower, 1 - lower
        upper = beta_lower(b, a, 1 / (1 + z))
        return 1 - upper, upper

    def moments(self):
        return moved(standardised(self.raw, self.n / 2), 0, self.n / self.m)

    def raw(self, k):
        a, b = self.m / 2, self.n / 2
        return exp(loggamma(a + k) - loggamma(a) + loggamma(b - k) - loggamma(b))

    def support(self):
        return mpf(0), inf


class Laplace:
    name, columns = "laplace", ["location", "scale"]
    members = [("0", "1"), ("0.5", "1.2"), ("50000623", "25")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        return -abs(x - self.m) / self.s - log(2 * self.s)

    def tails(self, x):
        far = exp(-abs(x - self.m) / self.s) / 2
        return (far, 1 - far) if x < self.m else (1 - far, far)

    def moments(self):
        return self.m, 2 * self.s ** 2, 0, 3

    def support(self):
        return -inf, inf


class Logistic:
    name, columns = "logistic", ["location", "scale"]
    members = [("0", "1"), ("1", "2"), ("50000623", "25")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        z = abs(x - self.m) / self.s
        return -z - 2 * log1p(exp(-z)) - log(self.s)

    def tails(self, x):
        e = exp(-abs(x - self.m) / self.s)
        far, near = e / (1 + e), 1 / (1 + e)
        return (far, near) if x < self.m else (near, far)

    def moments(self):
        return self.m, (pi * self.s) ** 2 / 3, 0, mpf(6) / 5

    def support(self):
        return -inf, inf


class LogLogistic:
    name, columns = "log-logistic", ["shape", "scale"]
    members = [("3.5", "2"), ("1", "1"), ("0.06", "1e-5"), ("0.5", "3"), ("40", "10"), ("100000", "1")]

    def __init__(self, k, s):
        self.k, self.s = k, s

    def log_pdf(self, x):
        w = self.k * log(x / self.s)
        return log(self.k / x) - abs(w) - 2 * log1p(exp(-abs(w)))

    def tails(self, x):
        w = self.k * log(x / self.s)
        e = exp(-abs(w))
        far, near = e / (1 + e), 1 / (1 + e)
        return (far, near) if w < 0 else (near, far)

    def moments(self):
        return moved(standardised(lambda k: k * pi / self.k / sin(k * pi / self.k), self.k), 0, self.s)

    def support(self):
        return mpf(0), inf


class Cauchy:
    name, columns = "cauchy", ["location", "scale"]
    members = [("0", "1"), ("1", "2"), ("50000623", "25"), ("0", "1e-100")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        return -log(pi * self.s) - log1p(((x - self.m) / self.s) ** 2)

    def tails(self, x):
        z = abs(x - self.m) / self.s
        far = atan(1 / z) / pi if z else mpf(1) / 2
        return (far, 1 - far) if x < self.m else (1 - far, far)

    def moments(self):
        return nan, nan, nan, nan

    def support(self):
        return -inf, inf


if __name__ == "__main__":
    main((Trapezoidal, CurvilinearTrapezoid, Arcsine, Pert, HalfNormal, Rayleigh, ChiSquare, Fisher, Laplace,
               Logistic, LogLogistic, Cauchy), "density_tables_a.py")
