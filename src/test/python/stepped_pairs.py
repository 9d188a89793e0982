"""Independent values for the correlation of inputs of which one, or both, are discrete; prints
src/test/resources/density/stepped-pairs.csv.

Of two discrete inputs it is Hoeffding's double sum over the steps: cov = sum_ij dx_i dy_j (C(F_i, G_j) - F_i G_j). The
copula at the steps comes from its derivative in rho (Plackett 1954, Biometrika 41, 351-360; of the t: Genz 2004,
Statistics and Computing 14, 251-260), integrated down from min(F, G) at rho = 1 by scipy's adaptive quad; for the
Gaussian copula it is checked against scipy's multivariate normal distribution function. Of a discrete input and a
lognormal one it is a sum of sigma-shifted normal tails, in closed form.
Run with /usr/bin/python3.
"""

import numpy as np
from scipy import integrate, stats


def steps(dist):
    """Values and the chances up to each, but the last."""
    values = np.arange(dist.ppf(1e-16), dist.isf(1e-16) + 1)
    below = dist.cdf(values)
    keep = (below > 0) & (below < 1 - 1e-15)
    return values, below[keep], np.ones(keep.sum()), dist.std()


def steps_of(values, chances):
    values, chances = np.array(values, float), np.array(chances, float)
    mean = chances @ values
    return values, np.cumsum(chances)[:-1], np.diff(values), np.sqrt(chances @ (values - mean) ** 2)


def copula(f, g, rho, nu):
    if rho >= 1:
        return min(f, g)
    if rho <= -1:
        return max(f + g - 1, 0)
    t = stats.norm if nu is None else stats.t(nu)
    a, b = t.ppf(f), t.ppf(g)

    # by the angle from the nearer end, where the copula is known
    side = 1 if rho > 0 else -1

    def slope(beta):
        q = side * a * b / np.cos(beta / 2) ** 2
        if a != side * b:
            q = q + (a - side * b) ** 2 / np.sin(beta) ** 2 if beta > 0 else np.inf
        return (np.exp(-q / 2) if nu is None else (1 + q / nu) ** (-nu / 2)) / (2 * np.pi)

    reach = np.arccos(abs(rho))
    near = min(abs(a - side * b), reach)
    part = sum(
        integrate.quad(slope, x, y, epsabs=1e-14, epsrel=1e-12, limit=400)[0]
        for x, y in ((0, near / 8), (near / 8, near), (near, reach))
        if y > x
    )
    return min(f, g) - part if rho > 0 else max(f + g - 1, 0) + part


def both(x, y, rho, nu):
    (_, fs, dx, sx), (_, gs, dy, sy) = x, y
    total = sum(dx[i] * dy[j] * (copula(f, g, rho, nu) - f * g) for i, f in enumerate(fs) for j, g in enumerate(gs))
    if nu is None and abs(rho) < 1:
        normal = stats.multivariate_normal([0, 0], [[1, rho], [rho, 1]])
        a, b = stats.norm.ppf(fs[0]), stats.norm.ppf(gs[-1])
        assert abs(normal.cdf([a, b]) - copula(fs[0], gs[-1], rho, nu)) < 1e-7
    return total / (sx * sy)


def lognormal(x, sigma, rho):
    _, fs, dx, sx = x
    a = stats.norm.ppf(fs)
    total = np.exp(sigma**2 / 2) * (dx @ (stats.norm.cdf(rho * sigma - a) - stats.norm.sf(a)))
    return total / (sx * np.exp(sigma**2 / 2) * np.sqrt(np.expm1(sigma**2)))


MARGINS = {
    "poisson(1.3)": steps(stats.poisson(1.3)),
    "binomial(5, 0.3)": steps(stats.binom(5, 0.3)),
    "bernoulli(0.03)": steps_of([0, 1], [0.97, 0.03]),
    "table(0 0.5, 1 0.3, 2.5 0.2)": steps_of([0, 1, 2.5], [0.5, 0.3, 0.2]),
}

if __name__ == "__main__":
    print("# Pearson's correlation of inputs with steps, by the double sum over them; stepped_pairs.py")
    print("one;other;dof;rho;pearson")
    pairs = [
        ("poisson(1.3)", "binomial(5, 0.3)"),
        ("bernoulli(0.03)", "table(0 0.5, 1 0.3, 2.5 0.2)"),
        ("poisson(1.3)", "poisson(1.3)"),
    ]
    for one, other in pairs:
        for nu in (None, 3):
            for rho in (-1, -0.9, -0.4, 0.2, 0.7, 0.99, 0.99999, 1):
                value = both(MARGINS[one], MARGINS[other], rho, nu)
                print(f"{one};{other};{nu or 0};{rho};{value:.12f}")
    for one in MARGINS:
        for sigma in (0.5, 1.2):
            for rho in (-1, -0.6, 0.3, 0.95, 0.9999, 1):
                print(f"{one};lognormal(0, {sigma});0;{rho};{lognormal(MARGINS[one], sigma, rho):.12f}")
