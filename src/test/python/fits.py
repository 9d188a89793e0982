"""Writes src/test/resources/density/fits.csv: maximum likelihood fits and their distances, by scipy.

The likelihoods are scipy's; each is maximised by Nelder and Mead's method from several starts until nothing is gained.
Run from the root of the project: /usr/bin/python3 src/test/python/fits.py
"""

import numpy as np
import scipy
from scipy import optimize, stats

SAMPLES = {
    # endurance of 23 ball bearings, millions of revolutions: Lieblein and Zelen (1956), Journal of Research of the
    # National Bureau of Standards 57, 273-316
    "bearings": [17.88, 28.92, 33.00, 41.52, 42.12, 45.60, 48.48, 51.84, 51.96, 54.12, 55.56, 67.80, 68.64, 68.64,
                 68.88, 84.12, 93.12, 98.64, 105.12, 105.84, 127.92, 128.04, 173.40],
    # invented: deviations in mm, both signs, one far
    "deviations": [-2.31, -1.4, -1.02, -0.77, -0.61, -0.5, -0.33, -0.21, -0.08, 0.02, 0.11, 0.17, 0.29, 0.41, 0.44,
                   0.63, 0.82, 0.97, 1.31, 1.66, 2.05, 4.9],
    # invented: shares
    "shares": [0.08, 0.12, 0.17, 0.21, 0.24, 0.25, 0.31, 0.33, 0.38, 0.4, 0.47, 0.52, 0.6, 0.71],
    # invented: yearly highest water, m
    "floods": [2.11, 2.3, 2.34, 2.51, 2.6, 2.62, 2.75, 2.8, 2.96, 3.02, 3.1, 3.33, 3.41, 3.6, 3.77, 4.1, 4.42, 5.3,
               6.9],
    # invented: faults a week
    "counts": [0, 0, 0, 0, 1, 1, 1, 2, 2, 3, 3, 4, 5, 7, 11],
}

exp = np.exp

# family: parameters from free numbers, distribution from parameters, starts in free numbers
FAMILIES = {
    "uniform": None,
    "normal": (lambda t: dict(mean=t[0], sd=exp(t[1])), lambda p: stats.norm(p["mean"], p["sd"])),
    "lognormal": (lambda t: dict(mu=t[0], sigma=exp(t[1])), lambda p: stats.lognorm(p["sigma"], scale=exp(p["mu"]))),
    "exponential": (lambda t: {"mean": exp(t[0]), "from": 0.0}, lambda p: stats.expon(scale=p["mean"])),
    "laplace": (lambda t: dict(location=t[0], scale=exp(t[1])), lambda p: stats.laplace(p["location"], p["scale"])),
    "half-normal": (lambda t: dict(sigma=exp(t[0])), lambda p: stats.halfnorm(scale=p["sigma"])),
    "rayleigh": (lambda t: dict(sigma=exp(t[0])), lambda p: stats.rayleigh(scale=p["sigma"])),
    "inverse-gaussian": (lambda t: dict(mean=exp(t[0]), shape=exp(t[1])),
                         lambda p: stats.invgauss(p["mean"] / p["shape"], scale=p["shape"])),
    "gamma": (lambda t: dict(shape=exp(t[0]), scale=exp(t[1])), lambda p: stats.gamma(p["shape"], scale=p["scale"])),
    "inverse-gamma": (lambda t: dict(shape=exp(t[0]), scale=exp(t[1])),
                      lambda p: stats.invgamma(p["shape"], scale=p["scale"])),
    "chi-square": (lambda t: dict(dof=exp(t[0])), lambda p: stats.chi2(p["dof"])),
    "weibull": (lambda t: {"shape": exp(t[0]), "scale": exp(t[1]), "from": 0.0},
                lambda p: stats.weibull_min(p["shape"], scale=p["scale"])),
    "frechet": (lambda t: {"shape": exp(t[0]), "scale": exp(t[1]), "from": 0.0},
                lambda p: stats.invweibull(p["shape"], scale=p["scale"])),
    "log-logistic": (lambda t: dict(shape=exp(t[0]), scale=exp(t[1])),
                     lambda p: stats.fisk(p["shape"], scale=p["scale"])),
    "gumbel": (lambda t: dict(location=t[0], scale=exp(t[1])), lambda p: stats.gumbel_r(p["location"], p["scale"])),
    "gumbel-min": (lambda t: dict(location=t[0], scale=exp(t[1])), lambda p: stats.gumbel_l(p["location"], p["scale"])),
    "logistic": (lambda t: dict(location=t[0], scale=exp(t[1])), lambda p: stats.logistic(p["location"], p["scale"])),
    "cauchy": (lambda t: dict(location=t[0], scale=exp(t[1])), lambda p: stats.cauchy(p["location"], p["scale"])),
    "student": (lambda t: dict(dof=exp(t[2]), location=t[0], scale=exp(t[1])),
                lambda p: stats.t(p["dof"], p["location"], p["scale"])),
    "generalized-extreme-value": (lambda t: dict(location=t[0], scale=exp(t[1]), shape=t[2]),
                                  lambda p: stats.genextreme(-p["shape"], p["location"], p["scale"])),
    "beta": (lambda t: {"alpha": exp(t[0]), "beta": exp(t[1]), "from": 0.0, "to": 1.0},
             lambda p: stats.beta(p["alpha"], p["beta"])),
    "poisson": (lambda t: dict(mean=exp(t[0])), lambda p: stats.poisson(p["mean"])),
    "geometric": (lambda t: dict(probability=1 / (1 + exp(t[0]))), lambda p: stats.geom(p["probability"], loc=-1)),
    "negative-binomial": (lambda t: dict(size=exp(t[1]), mean=exp(t[0])),
                          lambda p: stats.nbinom(p["size"], p["size"] / (p["size"] + p["mean"]))),
}

DISCRETE = {"poisson", "geometric", "negative-binomial"}
POSITIVE = ["normal", "lognormal", "exponential", "laplace", "half-normal", "rayleigh", "inverse-gaussian", "gamma",
            "inverse-gamma", "chi-square", "weibull", "frechet", "log-logistic", "gumbel", "gumbel-min", "logistic",
            "cauchy"]
WANTED = {
    "bearings": POSITIVE,
    # not Laplace: of an even number of values its location is not unique
    "deviations": ["normal", "gumbel", "gumbel-min", "logistic", "cauchy", "student"],
    "shares": ["beta", "gamma", "normal"],
    "floods": ["generalized-extreme-value", "gumbel", "lognormal"],
    "counts": ["poisson", "geometric", "negative-binomial"],
}
# how many numbers are free
FREE = {"exponential": 1, "half-normal": 1, "rayleigh": 1, "chi-square": 1, "poisson": 1, "geometric": 1, "student": 3,
        "generalized-extreme-value": 3}


def log_density(family, distribution, x):
    return distribution.logpmf(x) if family in DISCRETE else distribution.logpdf(x)


def fitted(family, x):
    parameters, distribution = FAMILIES[family]

    def loss(t):
        with np.errstate(all="ignore"):
            value = -np.sum(log_density(family, distribution(parameters(t)), x))
        return value if np.isfinite(value) else 1e300

    n = FREE.get(family, 2)
    best = None
    real = family in {"normal", "laplace", "gumbel", "gumbel-min", "logistic", "cauchy", "student",
                      "generalized-extreme-value"}
    for first in ([np.median(x), np.mean(x)] if real else [0.0, 1.0, np.log(np.mean(x))]):
        for second in (np.log(np.std(x)), 0.0, 1.0):
            t = np.array([first, second, 0.1][:n])
            for _ in range(40):
                found = optimize.minimize(loss, t, method="Nelder-Mead",
                                          options=dict(xatol=1e-12, fatol=1e-13, maxiter=20000, maxfev=20000))
                if best is not None and found.fun > best.fun - 1e-13 and np.allclose(found.x, t, rtol=0, atol=1e-9):
                    break
                t = found.x
                if best is None or found.fun < best.fun:
                    best = found
    return parameters(best.x), -best.fun


def distances(family, distribution, x):
    x = np.sort(x)
    n = len(x)
    if family in DISCRETE:
        values = np.unique(x)
        share = np.array([np.mean(x <= v) for v in values])
        before = np.array([np.mean(x < v) for v in values])
        ks = max(np.max(np.abs(distribution.cdf(values) - share)),
                 np.max(np.abs(distribution.cdf(values - 1) - before)))
        return ks, float("nan")
    ks = stats.kstest(x, distribution.cdf).statistic
    i = np.arange(1, n + 1)
    ad = -n - np.sum((2 * i - 1) / n * (distribution.logcdf(x) + distribution.logsf(x[::-1])))
    return ks, ad


with open("src/test/resources/density/fits.csv", "w") as out:
    out.write(f"# by fits.py, scipy {scipy.__version__}\n")
    for name, values in SAMPLES.items():
        out.write(f"values,{name},{' '.join(map(repr, values))}\n")
        x = np.array(values, dtype=float)
        for family in WANTED[name]:
            parameters, log_likelihood = fitted(family, x)
            ks, ad = distances(family, FAMILIES[family][1](parameters), x)
            shown = " ".join(f"{k}={v!r}" for k, v in ((k, float(v)) for k, v in parameters.items()))
            out.write(f"fit,{name},{family},{shown},{float(log_likelihood)!r},{float(ks)!r},{float(ad)!r}\n".replace("nan", "NaN"))
