"""Independent tables of the discrete densities: src/test/resources/density/NAME.csv, as density_tables.py has them.

Run from the top of the repository: python3 src/test/python/density_tables_discrete.py

Rows "at":      parameters, x        -> probability of x, its logarithm, cdf, survival
Rows "inverse": parameters, p and q  -> the smallest x with cdf(x) >= p, the smallest x with survival(x) <= q

density/moments/NAME.csv: mean, variance, skewness, excess kurtosis: the textbook's formulas, but sums for the
hypergeometric density; "nan" where there is but one value.

Probabilities are gamma functions and powers at 60 digits; tails are sums of them, each beginning at the far end. Where
there are too many values for that, tails are integrals of the gamma or the beta density, by mpmath's quadrature.
"""
import os
from mpmath import mp, mpf, exp, floor, inf, log, log1p, loggamma, sqrt
import mpmath
from density_tables import OUT, TAILS, text

mp.dps = 60
NOTHING = mpf(10) ** -345

# The contract of quantiles: a tail that misses a probability by no more than this, relative, reaches it. It decides
# only where a double is nearest to a tail that it is not: .1 and a tenth.
ROUNDING = mpf(10) ** -13


class Summed:
    """Tails by sums over all values whose probability counts."""

    def __init__(self):
        self.low, self.high, self.lower, self.upper = None, None, [], []

    def window(self):
        least, most = self.support()
        k = min(max(mpf(floor(self.mean())), least), most)
        lo, hi = int(k), int(k)
        while lo > least and self.mass(lo - 1) > NOTHING:
            lo -= 1
        while hi < most and self.mass(hi + 1) > NOTHING:
            hi += 1
        masses = [self.mass(j) for j in range(lo, hi + 1)]
        self.low, self.high = lo, hi
        total = mpf(0)
        for m in masses:
            total += m
            self.lower.append(total)
        total = mpf(0)
        for m in reversed(masses):
            self.upper.append(total)
            total += m
        self.upper.reverse()

    def tails(self, k):
        if self.low is None:
            self.window()
        if k < self.low:
            return mpf(0), mpf(1)
        if k > self.high:
            return mpf(1), mpf(0)
        return self.lower[int(k) - self.low], self.upper[int(k) - self.low]

    def mass(self, k):
        return exp(self.log_mass(k))

    def stride(self):
        return 1


class Bernoulli(Summed):
    name, columns = "bernoulli", ["probability"]
    members = [("0.3",), ("0.5",), ("1e-9",), ("0.999999",), ("0",), ("1",)]

    def __init__(self, p):
        super().__init__()
        self.p = p

    def mean(self):
        return self.p

    def support(self):
        return (1 if self.p == 1 else 0), (0 if self.p == 0 else 1)

    def moments(self):
        p, q = self.p, 1 - self.p
        v = p * q
        return p, v, (q - p) / sqrt(v) if v else mp.nan, (1 - 6 * v) / v if v else mp.nan

    def log_mass(self, k):
        return log(self.p if k == 1 else 1 - self.p)


class Binomial(Summed):
    name, columns = "binomial", ["trials", "probability"]
    members = [("20", "0.3"), ("5", "0.5"), ("1", "0.2"), ("40", "0.5"), ("1000", "0.01"), ("10000", "0.37"),
               ("1000000", "1e-6"), ("1000000", "0.9999"), ("1000000000", "3e-9"), ("0", "0.4"), ("7", "0"), ("7", "1")]

    def __init__(self, n, p):
        super().__init__()
        self.n, self.p = int(n), p

    def mean(self):
        return self.n * self.p

    def support(self):
        return (self.n if self.p == 1 else 0), (0 if self.p == 0 else self.n)

    def moments(self):
        n, p, q = self.n, self.p, 1 - self.p
        v = n * p * q
        return n * p, v, (q - p) / sqrt(v) if v else mp.nan, (1 - 6 * p * q) / v if v else mp.nan

    def log_mass(self, k):
        n = self.n
        return (loggamma(n + 1) - loggamma(mpf(k) + 1) - loggamma(mpf(n - k) + 1)
                + (k * log(self.p) if k else 0) + ((n - k) * log1p(-self.p) if k < n else 0))


class LargeBinomial(Binomial):
    members = [("1000000", "0.5"), ("1000000000", "0.3"), ("1000000000", "0.001")]

    def tails(self, k):
        # the beta density of parameters k + 1 and n - k at t = p + s: survival is its mass below p
        n, p = self.n, self.p
        a, b = mpf(k) + 1, mpf(n - k)
        constant = loggamma(a + b) - loggamma(a) - loggamma(b)
        f = lambda t: exp((a - 1) * log(t) + (b - 1) * log1p(-t) + constant) if 0 < t < 1 else mpf(0)
        return integral(f, (a - 1) / (a + b - 2), sqrt(a * b / (a + b) ** 3), p, mpf(0), mpf(1))

    def stride(self):
        return sqrt(self.n * self.p * (1 - self.p))


class Poisson(Summed):
    name, columns = "poisson", ["mean"]
    members = [("4.2",), ("0.001",), ("1",), ("30",), ("1234.5",), ("1e-100",), ("0",)]

    def __init__(self, m):
        super().__init__()
        self.m = m

    def mean(self):
        return self.m

    def support(self):
        return 0, (0 if self.m == 0 else inf)

    def moments(self):
        m = self.m
        return m, m, 1 / sqrt(m) if m else mp.nan, 1 / m if m else mp.nan

    def log_mass(self, k):
        return (k * log(self.m) if k else 0) - self.m - loggamma(mpf(k) + 1)


class LargePoisson(Poisson):
    members = [("1000000",), ("1e9",), ("1e12",)]

    def tails(self, k):
        a = mpf(k) + 1
        constant = loggamma(a)
        f = lambda t: exp((a - 1) * log(t) - t - constant) if t > 0 else mpf(0)
        return integral(f, a - 1, sqrt(a), self.m, mpf(0), inf)

    def stride(self):
        return sqrt(self.m)


def integral(f, mode, sd, at, low, high):
    """Mass of f above and below a point: the smaller side by quadrature over strips, until one counts nothing.

    A strip is an sd wide, or what f takes to fall by exp(10). The quadrature's error is absolute: f is scaled to 1.
    """
    side = 1 if at > mode else -1
    end = high if at > mode else low
    total, a = mpf(0), at
    near = at + side * sd / 10 ** 6
    scale = f(at)
    width = min(sd, 10 * abs(near - at) / abs(log(f(near) / scale)))
    while a != end:
        b = a + side * width
        b = end if (b - end) * side > 0 else b
        strip = mpmath.quad(lambda t: f(t) / scale, [min(a, b), max(a, b)], method="gauss-legendre")
        total += strip
        if strip < total * mpf(10) ** -(mp.dps - 8):
            break
        a = b
    total *= scale
    return (total, 1 - total) if at > mode else (1 - total, total)


class Geometric(Summed):
    name, columns = "geometric", ["probability"]
    members = [("0.15",), ("0.5",), ("0.75",), ("0.998",), ("1e-4",), ("1e-9",), ("1",)]

    def __init__(self, p):
        super().__init__()
        self.p = p

    def mean(self):
        return (1 - self.p) / self.p

    def support(self):
        return 0, (0 if self.p == 1 else inf)

    def moments(self):
        p, q = self.p, 1 - self.p
        return q / p, q / p ** 2, (2 - p) / sqrt(q) if q else mp.nan, 6 + p ** 2 / q if q else mp.nan

    def log_mass(self, k):
        return (k * log1p(-self.p) if k else 0) + log(self.p)

    def tails(self, k):
        q = 1 - self.p
        upper = q ** (mpf(k) + 1) if q > 0 else mpf(0)
        return 1 - upper, upper


class NegativeBinomial(Summed):
    name, columns = "negative-binomial", ["size", "mean"]
    members = [("3", "5"), ("0.5", "2"), ("0.05", "1"), ("2", "6"), ("2.5", "1e-3"), ("1000", "20"), ("1e6", "30"),
               ("200", "600"), ("3", "0")]

    def __init__(self, r, m):
        super().__init__()
        self.r, self.m = r, m

    def mean(self):
        return self.m

    def support(self):
        return 0, (0 if self.m == 0 else inf)

    def moments(self):
        r, m = self.r, self.m
        p, q = r / (r + m), m / (r + m)
        return (m, m + m ** 2 / r, (2 - p) / sqrt(r * q) if q else mp.nan,
                6 / r + p ** 2 / (r * q) if q else mp.nan)

    def log_mass(self, k):
        r, m, k = self.r, self.m, mpf(k)
        return (loggamma(k + r) - loggamma(k + 1) - loggamma(r) - r * log1p(m / r)
                + (k * (log(m) - log(r + m)) if k else 0))


class WideNegativeBinomial(NegativeBinomial):
    members = [("0.001", "1"), ("0.4", "1e6"), ("50", "1e8"), ("1e6", "1e6")]

    def tails(self, k):
        # the mean of a Poisson number follows a gamma density: the cdf is a mass of the beta density
        r, q = self.r, self.m / (self.r + self.m)
        a, b = mpf(k) + 1, r
        constant = loggamma(a + b) - loggamma(a) - loggamma(b)
        # by w = log(t / (1 - t)), smooth at both ends
        f = lambda w: exp(-a * log1p(exp(-w)) - b * log1p(exp(w)) + constant)
        at = log(q) - log1p(-q)
        mode = log(a / b)
        sd = sqrt(1 / a + 1 / b)
        return integral(f, mode, sd, at, -inf, inf)

    def stride(self):
        return sqrt(self.m + self.m ** 2 / self.r)


class Hypergeometric(Summed):
    name, columns = "hypergeometric", ["population", "marked", "drawn"]
    members = [("50", "12", "10"), ("2", "1", "1"), ("3", "2", "2"), ("8", "4", "4"), ("1000", "30", "900"),
               ("100000", "40000", "3000"), ("1000000000", "500", "1000000"), ("10", "0", "4"), ("10", "10", "4")]

    def __init__(self, n, marked, drawn):
        super().__init__()
        self.n, self.k, self.d = int(n), int(marked), int(drawn)

    def mean(self):
        return mpf(self.k) * self.d / self.n

    def support(self):
        return max(0, self.d + self.k - self.n), min(self.d, self.k)

    def moments(self):
        # by their definition: sums over all values
        self.window()
        values = range(self.low, self.high + 1)
        masses = [self.mass(k) for k in values]
        about = lambda c, order: sum(m * (k - c) ** order for k, m in zip(values, masses))
        mean = about(0, 1)
        if len(masses) == 1:
            return mean, mpf(0), mp.nan, mp.nan
        v = about(mean, 2)
        return mean, v, about(mean, 3) / sqrt(v) ** 3, about(mean, 4) / v ** 2 - 3

    def log_mass(self, k):
        def choose(a, b):
            return loggamma(mpf(a) + 1) - loggamma(mpf(b) + 1) - loggamma(mpf(a - b) + 1)
        return choose(self.k, k) + choose(self.n - self.k, self.d - k) - choose(self.n, self.d)


class DiscreteUniform(Summed):
    name, columns = "discrete-uniform", ["from", "to"]
    members = [("1", "6"), ("-3", "4"), ("0", "9"), ("-5", "1000000000"), ("4", "4")]

    def __init__(self, a, b):
        super().__init__()
        self.a, self.b = int(a), int(b)

    def mean(self):
        return mpf(self.a + self.b) / 2

    def support(self):
        return self.a, self.b

    def moments(self):
        n = mpf(self.b - self.a + 1)
        many = n > 1
        return (self.mean(), (n * n - 1) / 12, mpf(0) if many else mp.nan,
                -mpf(6) / 5 * (n * n + 1) / (n * n - 1) if many else mp.nan)

    def log_mass(self, k):
        return -log(mpf(self.b - self.a + 1))

    def tails(self, k):
        n = mpf(self.b - self.a + 1)
        return (k - self.a + 1) / n, (self.b - k) / n


def tails_at(d, k):
    least, most = d.support()
    if k < least:
        return mpf(0), mpf(1)
    if k >= most:
        return mpf(1), mpf(0)
    return d.tails(k)


def smallest(d, holds):
    """The smallest value for which it holds: by doubled strides from the mean, then by halving."""
    least, most = d.support()
    k = int(min(max(mpf(floor(d.mean())), least), most))
    step = first = max(1, int(d.stride()))
    if holds(k):
        yes, no = k, max(k - first, least - 1)
        while no >= least and holds(no):
            yes, step = no, 2 * step
            no = max(yes - step, least - 1)
    else:
        no, yes = k, (k + first if most == inf else min(k + first, int(most)))
        while not holds(yes):
            no, step = yes, 2 * step
            yes = no + step if most == inf else min(no + step, int(most))
    while yes - no > 1:
        middle = (yes + no) // 2
        if holds(middle):
            yes = middle
        else:
            no = middle
    return yes


def rows(out, kind, members, digits):
    for member in members:
        mp.dps = digits
        d = kind(*[mpf(float(v)) for v in member])
        ks = set()
        for tail in TAILS:
            mass = mpf(float(tail))
            slack = mass * ROUNDING
            below = smallest(d, lambda k: tails_at(d, k)[0] >= mass - slack)
            above = smallest(d, lambda k: tails_at(d, k)[1] <= mass + slack)
            out.write(",".join(["inverse"] + list(member) + [str(below), str(above), "", "", tail, tail]) + "\n")
            ks |= {below, below - 1, above, above - 1}
        least, most = d.support()
        for k in sorted(ks):
            if least <= k <= most:
                lower, upper = tails_at(d, k)
                log_mass = d.log_mass(k)
                row = [str(k), "", text(exp(log_mass)), text(log_mass), text(lower), text(upper)]
                out.write(",".join(["at"] + list(member) + row) + "\n")


def write(kinds):
    os.makedirs(OUT, exist_ok=True)
    family = kinds[0]
    with open(os.path.join(OUT, family.name + ".csv"), "w") as out:
        out.write("# mpmath %s, 60 digits, integrals 24; made by src/test/python/density_tables_discrete.py\n"
                  % mpmath.__version__)
        out.write(",".join(["kind"] + family.columns + ["x", "y", "pdf", "logPdf", "cdf", "survival"]) + "\n")
        rows(out, kinds[0], kinds[0].members, 60)
        for kind in kinds[1:]:
            rows(out, kind, kind.members, 32)
    write_moments(kinds)
    print(family.name, flush=True)


def write_moments(kinds):
    folder = os.path.join(OUT, "moments")
    os.makedirs(folder, exist_ok=True)
    with open(os.path.join(folder, kinds[0].name + ".csv"), "w") as out:
        out.write("# mpmath %s, 60 digits; made by src/test/python/density_tables_discrete.py\n" % mpmath.__version__)
        out.write(",".join(kinds[0].columns + ["mean", "variance", "skewness", "excessKurtosis"]) + "\n")
        for kind in kinds:
            for member in kind.members:
                mp.dps = 60
                moments = kind(*[mpf(float(v)) for v in member]).moments()
                out.write(",".join(list(member) + [text(mpf(v)) for v in moments]) + "\n")


if __name__ == "__main__":
    import sys
    for kinds in ([Bernoulli], [Binomial, LargeBinomial], [Poisson, LargePoisson], [Geometric],
                  [NegativeBinomial, WideNegativeBinomial], [Hypergeometric], [DiscreteUniform]):
        if len(sys.argv) < 2 or kinds[0].name in sys.argv[1:]:
            write(kinds)
