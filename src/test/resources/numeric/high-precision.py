"""Writes high-precision.csv beside this script: python3 high-precision.py"""
import pathlib
import sys

import mpmath
from mpmath import mp, mpf

mp.dps = 1500  # reducing 1e300 by pi and subtracting erf(27) from 1 both need it
SHOWN = 60

TABLE = {
    "exp": (mpmath.exp, ["-745.1", "-700.25", "-20.5", "-1", "-0.3465", "1e-10", "-1e-300", "0.3", "1", "88.7", "709.78"]),
    "log": (mpmath.log, ["4.9e-324", "1e-310", "1e-5", "0.7", "0.9999999999999999", "1.0000000000000002", "1.4142", "10", "1.7e308"]),
    "sin": (mpmath.sin, ["1e-320", "1e-9", "0.5", "-3.141592653589793", "183107.7278144811", "1e22", "-1.7e308"]),
    "cos": (mpmath.cos, ["1e-9", "0.5", "1.5707963267948966", "-22743.560015663308", "1e22", "1.7e308"]),
    "pow1.7": (lambda x: x ** mpf(1.7), ["1e-180", "0.3", "1.0000000000000002", "7.5", "1e180"]),
    "erf": (mpmath.erf, ["1e-300", "1e-5", "0.46", "-1", "2.5", "5.9"]),
    "erfc": (mpmath.erfc, ["-5", "-1e-5", "0.46", "1", "6", "15.25", "27.2"]),
    "upper": (lambda x: mpmath.erfc(x / mpmath.sqrt(2)) / 2, ["-38", "-1", "0.5", "8", "20.5", "38.4"]),
    "density": (mpmath.npdf, ["0", "-1e-7", "1", "8.5", "-38.5"]),
}

with open(pathlib.Path(__file__).with_suffix(".csv"), "w", encoding="utf-8") as csv:
    python = sys.version.split()[0]
    csv.write(f"# mpmath {mpmath.__version__}, Python {python}, {mp.dps} digits, {SHOWN} shown; arguments are doubles\n")
    csv.write("function,x,value\n")
    for name, (function, arguments) in TABLE.items():
        for x in arguments:
            csv.write(f"{name},{x},{mpmath.nstr(function(mpf(float(x))), SHOWN)}\n")
