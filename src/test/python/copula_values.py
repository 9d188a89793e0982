"""Independent values for the copula tests; prints src/test/resources/density/copula.csv.

Spearman's correlation of the Student copula: 6/pi E[asin(rho W / sqrt((W + W')(W + W'')))] with 1/W, 1/W', 1/W''
independent chi-square with nu degrees of freedom (three independent copies of the pair share no draw; the sign of a
product of two normals is asin). By the trapezoidal rule in the logarithms, which converges exponentially.
Run with /usr/bin/python3.
"""

import numpy as np
from scipy.special import gammaln


def nodes(nu, step):
    x = np.arange(-80 / nu, np.log(2 * nu + 160), step)
    log = 0.5 * nu * x - 0.5 * np.exp(x) - 0.5 * nu * np.log(2) - gammaln(0.5 * nu)
    w = np.exp(log) * step
    keep = w > 1e-19
    return x[keep], w[keep]


def spearman(nu, rho, step):
    x, w = nodes(nu, step)
    s = np.exp(x)
    total = 0.0
    for si, wi in zip(s, w):
        c = 1 / np.sqrt(1 + si / s)  # with W = 1/S: W/(W + W') = 1/(1 + S/S')
        total += wi * (w @ np.arcsin(rho * np.outer(c, c)) @ w)
    return 6 / np.pi * total


if __name__ == "__main__":
    print("# Spearman's correlation of the Student copula; copula_values.py")
    print("dof,rho,spearman")
    for nu in (1, 2, 3, 5, 30):
        for rho in (-0.5, 0.3, 0.7, 0.95):
            h = min(0.25, 0.5 / np.sqrt(nu))
            a = spearman(nu, rho, h)
            b = spearman(nu, rho, 0.8 * h)
            assert abs(a - b) < 1e-9, (nu, rho, a, b)
            print(f"{nu},{rho},{b:.10f}")
