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
               ("0", "1", "-3"), ("0", "1", "-10"), ("0", "1", "1.5"), ("0", "1", "10")]

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
               ("3", "0.5", "-0.6"), ("0", "1", "-1"), ("0", "1", "-3"), ("0", "1", "-10"), ("0", "1", "1.5"),
               ("0", "1", "10")]

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


if __name__ == "__main__":
    main((GumbelMin, Frechet, GeneralizedExtremeValue, GeneralizedPareto, Pareto, InverseGamma), "density_tables_b.py")
