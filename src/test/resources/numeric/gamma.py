"""Makes gamma.csv: the gamma function and the logarithm of its size, rounded from 60 digits.

    python3 gamma.py > gamma.csv
"""
import random
import mpmath
from mpmath import mp, mpf

mp.dps = 60
random.seed(7)
xs = [5e-324, 1e-300, 1e-20, 1e-8, 0.1, 0.25, 0.49999, 0.5, 0.75, 0.999, 0.9999999, 1 + 2**-52, 1.0000001, 1.25,
      1.4616321449683622, 1.5, 1.75, 1.999999, 2 - 2**-52, 2 + 2**-51, 2.000001, 2.25, 2.5, 2.50001, 3.3, 4.75, 7.1,
      9.999, 10.001, 12.5, 25.25, 60.6, 100.5, 150.3, 170.9, 171.6, 172.5, 1000.5, 1e5, 1e10, 1e100, 1e305]
xs += [random.uniform(0, 10) for _ in range(60)] + [random.uniform(10, 171) for _ in range(40)]
xs += [-x for x in (1e-300, 1e-8, 0.1, 0.5, 0.9, 1.5, 2.2, 2.9, 3.5, 4.7, 7.3, 9.5, 15.6, 19.9)]

print("# gamma.py, mpmath %s, 60 digits" % mpmath.__version__)
print("x,gamma,log")
for x in xs:
    value = mpmath.gamma(mpf(x)) if x < 1e6 else mpf("inf")
    log = mpmath.log(abs(value)) if x < 1e6 else mpmath.loggamma(mpf(x))
    shown = float(value) if abs(value) < mpf("1.797693134862315807e308") else float("inf")
    print("%r,%s,%r" % (x, repr(shown).replace("inf", "Infinity"), float(log)))
