"""Independent tables of extreme value, Pareto, inverse and other families, as density_tables.py makes them.

Run from the top of the repository: python3 src/test/python/density_tables_b.py [NAME ...]

Moments are taken from raw moments at 150 digits, or by integrating the density.
"""
from mpmath import mp, mpf, exp, expm1, gamma, inf, log, log1p, loggamma, pi, sqrt
import mpmath

from density_tables import gamma_tails, main, moved, standardised


def gumbel_tails(y):
    t = exp(min(-y, mpf(2000)))
    return exp(-t), -expm1(-t)


GUMBEL = mpmath.euler, pi ** 2 / 6, 12 * sqrt(mpf(6)) * mpmath.zeta(3) / pi ** 3, mpf(12) / 5


class GumbelMin:
    name, columns = "gumbel-min", ["location", "scale"]
    members = [("2", "1.5"), ("-24.5", "2.6")]

    def __init__(self, m, s):
        self.m, self.s = m, s

    def log_pdf(self, x):
        z = (x - self.m) / self.s
        return z - exp(z) - log(self.s)

    def tails(self, x):
        return gumbel_tails((self.m - x) / self.s)[::-1]

    def support(self):
        return -inf, inf

    def moments(self):
        mean, variance, skewness, excess = GUMBEL
        return moved((-mean, variance, -skewness, excess), self.m, self.s)


class Frechet:
    name, columns = "frechet", ["shape", "scale", "from"]
    members = [("1.7", "3", "0"), ("0.1", "1", "0"), ("0.9", "2", "5"), ("4.5", "2", "-3"), ("12", "1", "0"),
               ("300", "10", "0"), ("1e6", "1", "0")]

    def __init__(self, k, s, low):
        self.k, self.s, self.low = k, s, low

    def log_pdf(self, x):
        z = (x - self.low) / self.s
        return log(self.k) - (self.k + 1) * log(z) - z ** -self.k - log(self.s)

    def tails(self, x):
        return gumbel_tails(self.k * log((x - self.low) / self.s)) if x > self.low else (mpf(0), mpf(1))

    def support(self):
        return self.low, inf

    def moments(self):
        return moved(standardised(lambda n: gamma(1 - n / self.k), self.k), self.low, self.s)


class Bent:
    """z = (exp(shape y) - 1) / shape."""

    def __init__(self, m, s, k):
        self.m, self.s, self.k = m, s, k

    def y(self, x):
        z = (x - self.m) / self.s
        if 1 + self.k * z <= 0:
            return -inf if self.k > 0 else inf
        return z if self.k == 0 else log1p(self.k * z) / self.k

    def order(self):
        return 1 / self.k if self.k > 0 else inf


class GeneralizedExtremeValue(Bent):
    name, columns = "generalized-extreme-value", ["location", "scale", "shape"]
    members = [("1", "2", "0.2"), ("0", "1", "0.6"), ("0", "1", "0"), ("0", "3", "1e-18"), ("0", "1", "1e-9"),
               ("0", "1", "-1e-9"), ("2", "1", "1e-4"), ("0", "1", "-0.003"), ("0", "1", "0.06"), ("0", "1", "0.13"),
               ("0", "1", "0.24"), ("0", "1", "-0.11"), ("0", "1", "-0.277"), ("3", "0.5", "-0.6"), ("0", "1", "-1"),
               ("0", "1", "-0.9"), ("0", "1", "1.5"), ("0", "1", "5")]

    def log_pdf(self, x):
        y = self.y(x)
        return -(1 + self.k) * y - exp(-y) - log(self.s)

    def tails(self, x):
        return gumbel_tails(self.y(x))

    def support(self):
        end = self.m - self.s / self.k if self.k != 0 else None
        return (end if self.k > 0 else -inf), (end if self.k < 0 else inf)

    def moments(self):
        if self.k == 0:
            return moved(GUMBEL, self.m, self.s)
        mean, variance, skewness, excess = standardised(lambda n: gamma(1 - n * self.k), self.order())
        sign = 1 if self.k > 0 else -1
        with mp.workdps(150):
            return moved(((mean - 1) / self.k, variance / self.k ** 2, sign * skewness, excess), self.m, self.s)


class GeneralizedPareto(Bent):
    name, columns = "generalized-pareto", ["location", "scale", "shape"]
    members = [("1", "2", "0.25"), ("0", "1", "0.7"), ("0", "1", "0"), ("0", "3", "1e-18"), ("0", "1", "1e-9"),
               ("0", "1", "-1e-9"), ("2", "1", "1e-4"), ("0", "1", "-0.003"), ("0", "1", "0.24"), ("0", "1", "0.3"),
               ("3", "0.5", "-0.6"), ("0", "1", "-1"), ("0", "1", "-0.9"), ("0", "1", "1.5"),
               ("0", "1", "5"), ("0", "1e20", "0.25")]

    def log_pdf(self, x):
        return -(1 + self.k) * self.y(x) - log(self.s)

    def tails(self, x):
        y = self.y(x)
        return -expm1(-y), exp(-y)

    def support(self):
        return self.m, self.m - self.s / self.k if self.k < 0 else inf

    def moments(self):
        k = self.k

        def raw(n):
            product = mpf(1)
            for j in range(1, n + 1):
                product *= j / (1 - j * k)
            return product

        return moved(standardised(raw, self.order()), self.m, self.s)


class Pareto:
    name, columns = "pareto", ["from", "shape"]
    members = [("2", "2.5"), ("1", "0.9"), ("1e-5", "0.1"), ("3", "3.5"), ("1000", "4.2"), ("1", "60"), ("7", "1e6")]

    def __init__(self, low, k):
        self.low, self.k = low, k

    def log_pdf(self, x):
        return log(self.k) - (self.k + 1) * log(x / self.low) - log(self.low)

    def tails(self, x):
        y = self.k * log(max(x, self.low) / self.low)
        return -expm1(-y), exp(-y)

    def support(self):
        return self.low, inf

    def moments(self):
        return moved(standardised(lambda n: self.k / (self.k - n), self.k), mpf(0), self.low)


class InverseGamma:
    name, columns = "inverse-gamma", ["shape", "scale"]
    members = [("3.2", "2"), ("0.1", "1"), ("0.5", "2"), ("1", "3"), ("2.5", "1e-6"), ("24", "1"), ("30.5", "0.1"),
               ("3000", "1")]

    def __init__(self, a, s):
        self.a, self.s = a, s

    def log_pdf(self, x):
        z = x / self.s
        return -(self.a + 1) * log(z) - 1 / z - loggamma(self.a) - log(self.s)

    def tails(self, x):
        return gamma_tails(self.a, self.s / x)[::-1]

    def support(self):
        return mpf(0), inf

    def moments(self):
        def raw(n):
            product = mpf(1)
            for j in range(1, n + 1):
                product /= self.a - j
            return product

        return moved(standardised(raw, self.a), mpf(0), self.s)


class JohnsonSu:
    name, columns = "johnson-su", ["gamma", "delta", "xi", "lambda"]
    members = [("0", "1", "0", "1"), ("-2", "1.5", "0", "3"), ("3", "0.5", "-4", "0.1"), ("1", "0.1", "0", "1"),
               ("-40", "20", "0", "1"), ("0.5", "3000", "0", "1")]

    def __init__(self, g, d, m, s):
        self.g, self.d, self.m, self.s = g, d, m, s

    def normal(self, x):
        return self.g + self.d * mpmath.asinh((x - self.m) / self.s)

    def log_pdf(self, x):
        n, z = self.normal(x), (x - self.m) / self.s
        return -n * n / 2 - log(2 * pi) / 2 + log(self.d) - log1p(z * z) / 2 - log(self.s)

    def tails(self, x):
        n = self.normal(x) / sqrt(mpf(2))
        return mpmath.erfc(-n) / 2, mpmath.erfc(n) / 2

    def support(self):
        return -inf, inf

    def moments(self):
        def raw(n):
            terms = [(-1) ** j * mpmath.binomial(n, j) *
                     exp(-(n - 2 * j) * self.g / self.d + (n - 2 * j) ** 2 / (2 * self.d ** 2)) for j in range(n + 1)]
            return sum(terms) / 2 ** n

        return moved(standardised(raw, inf), self.m, self.s)


class InverseGaussian:
    name, columns = "inverse-gaussian", ["mean", "shape"]
    members = [("1.2", "2.7"), ("1", "1"), ("3", "0.01"), ("1", "1e-6"), ("100", "5000"), ("1e-5", "10"), ("2", "2e8")]

    def __init__(self, m, k):
        self.m, self.k = m, k

    def log_pdf(self, x):
        return log(self.k / (2 * pi * x ** 3)) / 2 - self.k * (x - self.m) ** 2 / (2 * self.m ** 2 * x)

    def tails(self, x):
        if x <= 0:
            return mpf(0), mpf(1)
        with mp.workdps(mp.dps + 40):
            root = sqrt(self.k / (2 * x))
            less, more = root * (x / self.m - 1), root * (x / self.m + 1)
            other = exp(2 * self.k / self.m) * mpmath.erfc(more)
            return (mpmath.erfc(-less) + other) / 2, (mpmath.erfc(less) - other) / 2

    def support(self):
        return mpf(0), inf

    def moments(self):
        m, k = self.m, self.k
        return m, m ** 3 / k, 3 * sqrt(m / k), 15 * m / k


class Rice:
    """Masses are sums over pairs of Poisson probabilities, all positive."""
    name, columns = "rice", ["distance", "scale"]
    members = [("0", "1"), ("1e-3", "2"), ("0.7", "1"), ("3", "1"), ("2.4", "0.2"), ("38", "1")]

    def __init__(self, b, s):
        self.b, self.s = b / s, s

    def log_pdf(self, x):
        z = x / self.s
        return log(z) - (z * z + self.b ** 2) / 2 + log(mpmath.besseli(0, self.b * z)) - log(self.s)

    def tails(self, x):
        if x <= 0:
            return mpf(0), mpf(1)
        m, y = self.b ** 2 / 2, (x / self.s) ** 2 / 2
        if y > 10000:
            return mpf(1), mpf(0)
        p, t = exp(-m), exp(-y)
        lower, upper, sum_p, sum_t, k = mpf(0), mpf(0), mpf(0), mpf(0), 0
        small = mpf(10) ** -(mp.dps + 5)
        while True:
            lower += t * sum_p
            sum_p += p
            sum_t += t
            upper += p * sum_t
            k += 1
            if k > 2 and k > 2 * max(m, y) and p * sum_t <= small * upper and t * sum_p <= small * lower:
                return lower, upper
            p *= m / k
            t *= y / k

    def support(self):
        return mpf(0), inf

    def moments(self):
        def raw(n):
            half = mpf(n) / 2
            return 2 ** half * gamma(1 + half) * mpmath.hyp1f1(-half, 1, -self.b ** 2 / 2)

        return moved(standardised(raw, inf), mpf(0), self.s)


class VonMises:
    name, columns = "von-mises", ["mean", "concentration"]
    members = [("0", "0"), ("1", "0.8"), ("0", "700"), ("-2", "1e5")]

    def __init__(self, m, k):
        self.m, self.k = m, k
        self.whole = 2 * pi * mpmath.besseli(0, k) * exp(-k)

    def log_pdf(self, x):
        return self.k * (mpmath.cos(x - self.m) - 1) - log(self.whole)

    def below(self, z, weight=lambda t: 1, end=-pi):
        """The integral from -pi, or from where nothing is left; of the density over that at z, for the quadrature judges
        its error absolutely."""
        far = mpmath.sin(z / 2) ** 2 + (mp.dps + 10) * mpf("1.2") / self.k if self.k else inf
        start = max(end, -2 * mpmath.asin(sqrt(far)) if far < 1 else end)
        parts = [start + (z - start) * j / 8 for j in range(9)]
        top = mpmath.sin(z / 2) ** 2
        f = lambda t: weight(t) * exp(-2 * self.k * (mpmath.sin(t / 2) ** 2 - top))
        return exp(-2 * self.k * top) * mpmath.quad(f, parts, method="gauss-legendre", maxdegree=5) / self.whole

    def tails(self, x):
        z = x - self.m
        if z <= -pi or z >= pi:
            return (mpf(0), mpf(1)) if z < 0 else (mpf(1), mpf(0))
        less = self.below(-abs(z))
        return (less, 1 - less) if z < 0 else (1 - less, less)

    def support(self):
        return self.m - pi, self.m + pi

    def moments(self):
        two, four = [2 * self.below(mpf(0), lambda t: t ** n) for n in (2, 4)]
        return self.m, two, mpf(0), four / two ** 2 - 3


if __name__ == "__main__":
    main((GumbelMin, Frechet, GeneralizedExtremeValue, GeneralizedPareto, Pareto, InverseGamma, JohnsonSu,
          InverseGaussian, Rice, VonMises), "density_tables_b.py")
