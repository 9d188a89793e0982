"""Independent tables of truncated, mixed, shifted and mirrored densities, with the machinery of density_tables.py.

Run from the top of the repository: python3 src/test/python/density_tables_composites.py

One file for each density, which CompositesTest makes by the same name. Moments are integrals of the density.
"""
from density_tables import Gamma, Normal, Uniform, main
from mpmath import exp, inf, log, mpf, quad, sqrt


class Base:
    """A density without parameters: name, columns and members of a family that has one member."""
    columns, members = [], [()]

    def moments(self):
        pdf = lambda x: exp(self.log_pdf(x))
        points = self.points()
        mean = quad(lambda x: x * pdf(x), points)
        second, third, fourth = [quad(lambda x: (x - mean) ** k * pdf(x), points) for k in (2, 3, 4)]
        return mean, second, third / second ** mpf("1.5"), fourth / second ** 2 - 3


def truncated(name, density, low, high, points):
    class Truncated(Base):
        def __init__(self):
            self.low, self.high = mpf(low), mpf(high)
            self.below = density.tails(self.low)[0] if self.low > -inf else mpf(0)
            self.above = density.tails(self.high)[1] if self.high < inf else mpf(0)
            self.mass = (1 - self.above) - self.below if self.below > 1e-30 and self.below < 0.9 else None
            if self.mass is None:
                self.mass = (density.tails(self.low)[1] if self.low > -inf else 1) - self.above
            if self.above > 0.9:
                self.mass = density.tails(self.high)[0] - self.below

        def log_pdf(self, x):
            return density.log_pdf(x) - log(self.mass)

        def tails(self, x):
            lower, upper = density.tails(x)
            if lower < upper:
                cdf = (lower - self.below) / self.mass
                return cdf, 1 - cdf
            survival = (upper - self.above) / self.mass
            return 1 - survival, survival

        def support(self):
            return self.low, self.high

        def points(self):
            return [mpf(p) for p in points]

    Truncated.name = name
    return Truncated


def mixture(name, parts, points):
    class Mixture(Base):
        def log_pdf(self, x):
            return log(sum(mpf(w) * (exp(d.log_pdf(x)) if d.support()[0] < x < d.support()[1] else 0)
                           for w, d in parts))

        def tails(self, x):
            lower = upper = mpf(0)
            for w, d in parts:
                low, high = d.support()
                a, b = (0, 1) if x <= low else (1, 0) if x >= high else d.tails(x)
                lower += mpf(w) * a
                upper += mpf(w) * b
            return lower, upper

        def support(self):
            return min(d.support()[0] for _, d in parts), max(d.support()[1] for _, d in parts)

        def points(self):
            return [mpf(p) for p in points]

    Mixture.name = name
    return Mixture


class MirroredGamma(Base):
    """3 - 2 X, X gamma of shape 2.5 and scale 1.4."""
    name = "composite-mirrored"

    def __init__(self):
        self.of = Gamma(mpf(2.5), mpf(1.4))

    def log_pdf(self, x):
        return self.of.log_pdf((3 - x) / 2) - log(mpf(2))

    def tails(self, x):
        lower, upper = self.of.tails((3 - x) / 2)
        return upper, lower

    def support(self):
        return -inf, mpf(3)

    def moments(self):
        a = mpf(2.5)
        return 3 - 2 * a * mpf(1.4), 4 * a * mpf(1.4) ** 2, -2 / sqrt(a), 6 / a


class Far(Normal):
    """erfc of mpmath overflows far out."""

    def tails(self, x):
        z = (x - self.m) / self.s
        return super().tails(x) if abs(z) < 10000 else (mpf(z > 0), mpf(z < 0))


def normal(m, s):
    return Far(mpf(m), mpf(s))


ALL = (
    truncated("composite-upper-tail", normal(0, 1), 8, inf, [8, 9, 10, 12, 20]),
    truncated("composite-lower-tail", normal(0, 1), -inf, -30, [-40, -32, -31, -30]),
    truncated("composite-moderate", normal(0, 1), 0.5, 2, [0.5, 1, 2]),
    truncated("composite-narrow-middle", normal(10, 2), 10, 10.0009765625, [10, 10.0009765625]),
    truncated("composite-narrow-tail", normal(0, 1), 20, 20.0009765625, [20, 20.0009765625]),
    truncated("composite-gamma", Gamma(mpf(2.5), mpf(1.4)), 0.125, 3, [0.125, 1, 2, 3]),
    mixture("composite-two-humps", [(0.25, normal(-10, 1)), (0.75, normal(10, 1))],
            [-50, -13, -10, -7, 0, 7, 10, 13, 50]),
    mixture("composite-two-scales", [(0.875, normal(0, 1)), (0.125, normal(0, 1000000))],
            [-2e7, -3e6, -1e6, -100, -10, -3, 0, 3, 10, 100, 1e6, 3e6, 2e7]),
    mixture("composite-gap", [(0.375, Uniform(mpf(0), mpf(1))), (0.625, Uniform(mpf(10), mpf(12)))],
            [0, 1, 10, 12]),
    mixture("composite-faint", [(1 - 2.0 ** -20, normal(0, 1)), (2.0 ** -20, normal(40, 0.5))],
            [-20, -3, 0, 3, 20, 38, 40, 42, 50]),
    MirroredGamma,
)

if __name__ == "__main__":
    main(ALL, "density_tables_composites.py")
