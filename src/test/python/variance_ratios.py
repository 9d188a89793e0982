"""How often a 95 % interval for the ratio of two variances holds it: the logarithm by a jackknife that leaves out one
observation (or one of 64 groups) after the other. Prints the figures that ComparisonCoverageTest names.

    /usr/bin/python3 variance_ratios.py        (1 minute)
"""

import numpy as np
from scipy import stats

rng = np.random.default_rng(20261201)
REPETITIONS = 20_000


def delete_one(x):
    """ln of the variance of each row without each of its values."""
    n = x.shape[1]
    d2 = (x - x.mean(axis=1, keepdims=True)) ** 2
    ss = d2.sum(axis=1, keepdims=True)
    return np.log((ss - d2 * n / (n - 1)) / (n - 2))


def jackknife(without):
    g = without.shape[1]
    return (g - 1) / g * ((without - without.mean(axis=1, keepdims=True)) ** 2).sum(axis=1)


def independent(name, draw, n, factor):
    held, halves, done = 0, 0.0, 0
    while done < REPETITIONS:
        a, b = factor * draw((500, n)), draw((500, n))
        log = np.log(a.var(axis=1, ddof=1) / b.var(axis=1, ddof=1))
        half = stats.t.ppf(0.975, 2 * n - 2) * np.sqrt(jackknife(delete_one(a)) + jackknife(delete_one(b)))
        held += (abs(log - 2 * np.log(factor)) <= half).sum()
        halves += half.sum()
        done += 500
    print(f"{name}, n = {n}: coverage {held / done:.4f}, half-width {halves / done:.4f}")


def without_groups(x, groups):
    n = x.shape[1]
    edges = np.linspace(0, n, groups + 1).astype(int)
    s1, s2 = x.sum(axis=1), (x**2).sum(axis=1)
    logs = []
    for lo, hi in zip(edges[:-1], edges[1:]):
        m = n - (hi - lo)
        t1, t2 = s1 - x[:, lo:hi].sum(axis=1), s2 - (x[:, lo:hi] ** 2).sum(axis=1)
        logs.append(np.log((t2 - t1**2 / m) / (m - 1)))
    return np.array(logs).T


def shared(n, groups):
    plain = (np.e**2 - 1) / 2 - (np.e - 1) ** 2
    pair = plain / 2 + (np.e - (np.e - 1) ** 2) / 2
    truth = np.log(plain / pair)
    held = {"paired": 0, "as if independent": 0}
    halves = dict.fromkeys(held, 0.0)
    done = 0
    while done < REPETITIONS:
        u = rng.random((500, n))
        a, b = np.exp(u), (np.exp(u) + np.exp(1 - u)) / 2
        log = np.log(a.var(axis=1, ddof=1) / b.var(axis=1, ddof=1))
        la, lb = without_groups(a, groups), without_groups(b, groups)
        for kind, variance, degrees in [
            ("paired", jackknife(la - lb), groups - 1),
            ("as if independent", jackknife(la) + jackknife(lb), 2 * groups - 2),
        ]:
            half = stats.t.ppf(0.975, degrees) * np.sqrt(variance)
            held[kind] += (abs(log - truth) <= half).sum()
            halves[kind] += half.sum()
        done += 500
    for kind in held:
        print(f"shared numbers, {kind}, n = {n}, {groups} groups: coverage {held[kind] / done:.4f}, "
              f"half-width {halves[kind] / done:.4f}")


independent("normal", rng.standard_normal, 1000, 2)
independent("exponential", rng.standard_exponential, 1000, 2)
independent("lognormal .5", lambda size: np.exp(0.5 * rng.standard_normal(size)), 1000, 2)
shared(1000, 64)
shared(1000, 250)
