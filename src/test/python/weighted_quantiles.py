"""How often the 95 % interval of a quantile holds it that comes from inverting the distribution function of weighted
draws from the light side, S(x) = (1/n) sum of w [y > x], and how far the estimate is from the self-normalised one.
Prints the figures that InvertedCdfTest names.

    /usr/bin/python3 weighted_quantiles.py        (10 seconds)

Standard normal outcome, draws from a normal density of mean 2.5 and standard deviation 1, n = 1000, q = .999.
"""

import numpy as np
from scipy import stats

rng = np.random.default_rng(20261201)
REPETITIONS, N, Q, SHIFT = 20_000, 1_000, 0.999, 2.5
truth = stats.norm.isf(1 - Q)
t = stats.t.ppf(0.975, N - 1)


def beyond(y, above, probability):
    """The least y of which no more than `probability` lies above; y from high to low, `above` summed up to each."""
    return y[np.searchsorted(above, probability, side="right")]


held, light, own = 0, [], []
for _ in range(REPETITIONS):
    y = np.sort(rng.normal(SHIFT, 1, N))[::-1]
    w = np.exp(SHIFT * SHIFT / 2 - SHIFT * y)
    # what lies at or above each y
    above = np.cumsum(w) / N
    v = beyond(y, above, 1 - Q)
    se = np.std(w * (y > v), ddof=1) / np.sqrt(N)
    low, high = beyond(y, above, 1 - Q + t * se), beyond(y, above, 1 - Q - t * se)
    held += low <= truth <= high
    light.append(v)
    own.append(beyond(y, above / above[-1], 1 - Q))
print("coverage %.4f, standard error %.4f" % (held / REPETITIONS, np.sqrt(0.95 * 0.05 / REPETITIONS)))
print("sd from the light side %.4f, self-normalised %.4f" % (np.std(light), np.std(own)))
