"""Writes src/test/resources/density/smoothed.csv: samples smoothed with a Gaussian kernel, by mpmath at 60 digits.

Run from the root of the project: /usr/bin/python3 src/test/python/smoothed.py
"""

import mpmath as mp
import numpy as np

mp.mp.dps = 60

SAMPLES = {
    # invented: waits in hours, one long
    "twelve": ([0.4, 0.7, 0.7, 1.1, 1.3, 1.9, 2.2, 2.6, 3.4, 4.1, 6.8, 23.1], None),
    # two clusters with nothing between
    "apart": ([0.0, 0.5, 1.0, 1000.0], 1.0),
    # one value more than half of the time: the quartiles are equal
    "tied": ([2.0] * 7 + [1.0, 5.0, 9.0], None),
    "two": ([-1.0, 1.0], 0.3),
}


def silverman(values):
    n = len(values)
    sd = np.std(values, ddof=1)
    q1, q3 = np.percentile(values, [25, 75])  # linear interpolation
    iqr = (q3 - q1) / 1.34
    return float(0.9 * (min(sd, iqr) if iqr > 0 else sd) * n ** -0.2)


def points(values, h):
    low, high = min(values), max(values)
    near = [x + d * h for x in sorted(set(values)) for d in (-1.7, 0, 0.3)]
    tails = [low - k * h for k in (4, 8.5, 9.5, 20, 37)] + [high + k * h for k in (4, 8.5, 9.5, 20, 37)]
    middles = [0.5 * (a + b) for a, b in zip(sorted(set(values)), sorted(set(values))[1:])]
    return sorted(set(near + tails + middles))


def text(x):
    return mp.nstr(x, 20, strip_zeros=False, min_fixed=0, max_fixed=0)


with open("src/test/resources/density/smoothed.csv", "w") as out:
    out.write(f"# by smoothed.py, mpmath {mp.__version__} at 60 digits, numpy {np.__version__} for the bandwidths\n")
    for name, (values, given) in SAMPLES.items():
        h = given if given is not None else silverman(values)
        out.write(f"values,{name},{'' if given is None else given},{' '.join(map(repr, values))}\n")
        v = [mp.mpf(x) for x in values]
        n = len(v)
        H = mp.mpf(h)
        mean = sum(v) / n
        m2, m3, m4 = (sum((x - mean) ** k for x in v) / n for k in (2, 3, 4))
        var = m2 + H**2
        # moments of a sum of independent sample value and kernel
        kurt = (m4 + 6 * m2 * H**2 + 3 * H**4) / var**2 - 3
        out.write(f"moments,{name},{h!r},{text(mean)},{text(var)},{text(m3 / var ** mp.mpf(1.5))},{text(kurt)}\n")
        for x in points(values, h):
            z = [(mp.mpf(x) - c) / H for c in v]
            pdf = sum(mp.npdf(t) for t in z) / n / H
            cdf = sum(mp.erfc(-t / mp.sqrt(2)) / 2 for t in z) / n
            survival = sum(mp.erfc(t / mp.sqrt(2)) / 2 for t in z) / n
            out.write(f"at,{name},{x!r},{text(pdf)},{text(mp.log(pdf))},{text(cdf)},{text(survival)}\n")
