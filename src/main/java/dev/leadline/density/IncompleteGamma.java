package dev.leadline.density;

import dev.leadline.numeric.ErrorFunction;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;

/// The regularised incomplete gamma functions of shape `a > 0` at `x >= 0`: the mass of the standard gamma density
/// below and above `x`, each accurate where it is small, and their logarithms where they underflow.
///
/// Below the mode the power series, above it the continued fraction (DLMF 8.11.4, 8.9.2); for large shapes near the
/// mode Temme's uniform expansion, summed backwards; for shapes below 1 at small `x` the upper tail from `expm1`,
/// since there it is the small difference of numbers near 1.
///
/// Error: relative 1e-12 for results above 1e-290 (`DensityTablesTest`: shapes from .001 to 3000 and, by
/// Poisson's, whole ones to 1e12; other shapes to 1e6 have the round trips of `CatalogueTest` and a library).
///
/// Cost: .1 to 1 microsecond.
///
/// Sources: DLMF chapter 8; Temme (1987), in the form of the recursion in Gil, Segura and Temme (2012), SIAM J. Sci.
/// Comput. 34, A2965. From memory; the recursion was derived again and its coefficients computed with 60 digits.
record IncompleteGamma(double a, double stirlingError, double logGammaOnePlus) {
    private static final double SQRT_2PI = 2.5066282746310007;
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    /// From this shape on, within `|eta| < 1`, the uniform expansion is used.
    private static final double LARGE = 25;

    /// Below this a result may have lost digits to underflow.
    private static final double TINY = 1e-290;

    /// Below this `log x`, `P(a, x)` is its prefix.
    private static final double SERIES_IS_ONE = -40;

    private static final int TRIALS = 100;
    private static final Normal.Standard NORMAL = new Normal.Standard();

    /// Taylor coefficients of `eta / (lambda - 1)`, where `eta^2 / 2 = lambda - 1 - log lambda`.
    private static final double[] TEMME = {
        1.0,
        -0.3333333333333333,
        0.08333333333333333,
        -0.014814814814814815,
        0.0011574074074074073,
        0.0003527336860670194,
        -0.0001787551440329218,
        3.919263178522438e-05,
        -2.185448510679992e-06,
        -1.85406221071516e-06,
        8.296711340953087e-07,
        -1.7665952736826078e-07,
        6.707853543401498e-09,
        1.0261809784240309e-08,
        -4.382036018453353e-09,
        9.14769958223679e-10,
        -2.5514193994946248e-11,
        -5.830772132550426e-11,
        2.4361948020667415e-11,
        -5.0276692801141755e-12,
        1.1004392031956135e-13,
        3.371763262400985e-13,
        -1.392388722418162e-13,
        2.8534893807047445e-14,
        -5.139111834242572e-16,
        -1.9752288294349442e-15,
        8.099521156704561e-16,
        -1.6522531216398162e-16,
        2.5305430097478883e-18,
        1.1686939738559576e-17,
        -4.770037049820485e-18,
    };

    static IncompleteGamma of(double a) {
        return new IncompleteGamma(
                a, GammaFunction.stirlingError(a), a <= 0.5 ? GammaFunction.logOnePlus(a) : GammaFunction.log(a + 1));
    }

    /// `log(x^a e^-x / Γ(a + 1))`.
    double logPrefix(double x) {
        return a < 1
                ? a * Log.log(x) - x - logGammaOnePlus
                : -Deviance.of(a, x, x - a) - stirlingError - 0.5 * Log.log(a) - HALF_LOG_2PI;
    }

    /// `P(a, x)`.
    double lower(double x) {
        if (!(x > 0 && x < Double.POSITIVE_INFINITY)) {
            return x <= 0 ? 0 : x > 0 ? 1 : x;
        }
        if (isUniform(x)) {
            return uniform(x, -1);
        }
        return isBelow(x) ? Exp.exp(logPrefix(x)) * series(x) : 1 - upper(x);
    }

    /// `Q(a, x)`.
    double upper(double x) {
        if (!(x > 0 && x < Double.POSITIVE_INFINITY)) {
            return x <= 0 ? 1 : x > 0 ? 0 : x;
        }
        if (isUniform(x)) {
            return uniform(x, 1);
        }
        if (!isBelow(x)) {
            return Exp.exp(logPrefix(x)) * fraction(x);
        }
        return a < 1 ? smallShape(x) : 1 - lower(x);
    }

    /// `log P(a, x)`.
    double logLower(double x) {
        double lower = lower(x);
        return lower > TINY || !isBelow(x) ? Log.log(lower) : logPrefix(x) + Log.log(series(x));
    }

    /// `log Q(a, x)`.
    double logUpper(double x) {
        double upper = upper(x);
        return upper > TINY || isBelow(x) ? Log.log(upper) : logPrefix(x) + Log.log(fraction(x));
    }

    private boolean isBelow(double x) {
        return x < Math.max(a, 1.5);
    }

    /// `1 + x / (a + 1) + x^2 / ((a + 1) (a + 2)) + …`.
    private double series(double x) {
        double term = 1;
        double sum = 1;
        for (double n = a + 1; term > 1e-17 * sum; n++) {
            term *= x / n;
            sum += term;
        }
        return sum;
    }

    /// `Q(a, x)` by its prefix: `a / (x + 1 - a - 1 (1 - a) / (x + 3 - a - …))`, by Lentz's method.
    private double fraction(double x) {
        double b = x + 1 - a;
        double c = 1e300;
        double d = 1 / b;
        double h = d;
        for (int n = 1; n < 100_000; n++) {
            double numerator = -n * (n - a);
            b += 2;
            d = 1 / Math.fma(numerator, d, b);
            c = b + numerator / c;
            double change = c * d;
            h *= change;
            if (Math.abs(change - 1) < 3e-16) {
                break;
            }
        }
        return a * h;
    }

    /// `Q(a, x)` for `a < 1` and `x < 1.5`: 1 less `x^a / Γ(a + 1)` times `1 + a (-x / (a + 1) + x^2 / (2 (a + 2)) -
    /// …)`.
    private double smallShape(double x) {
        double power = 1;
        double sum = 0;
        for (int n = 1; n < 40; n++) {
            power *= -x / n;
            sum += power / (a + n);
        }
        double log = a * Log.log(x) - logGammaOnePlus;
        return -StrictMath.expm1(log) - Exp.exp(log) * a * sum;
    }

    private boolean isUniform(double x) {
        double u = (x - a) / a;
        return a >= LARGE && u > -0.6 && u < 1.2;
    }

    /// `P` (side -1) or `Q` (side 1) as `erfc(± eta sqrt(a / 2)) / 2 ± e^(-a eta^2 / 2) / sqrt(2 pi a) T / Γ*`, with
    /// `T = Σ β_n eta^n`, `β_(n-1) = d_n + (n + 1) / a β_(n+1)` and `Γ* = 1 + β_1 / a`.
    private double uniform(double x, int side) {
        double half = Deviance.of(a, x, x - a);
        double eta = Math.copySign(Math.sqrt(2 * half / a), x - a);
        double later = 0;
        double beta = 0;
        double sum = 0;
        for (int n = TEMME.length - 1; n >= 1; n--) {
            double next = TEMME[n] + (n + 1) / a * later;
            later = beta;
            beta = next;
            sum = Math.fma(sum, eta, beta);
        }
        double gammaStar = 1 + later / a;
        double rest = Exp.exp(-half) / (SQRT_2PI * Math.sqrt(a)) * sum / gammaStar;
        return 0.5 * ErrorFunction.erfc(side * Math.copySign(Math.sqrt(half), eta)) + side * rest;
    }

    /// The logarithm of the x with `P(a, x) = p`, by Newton's method: `log P` is concave in `log x`, so that the second
    /// step and all later ones approach from the left.
    double logInverse(double p) {
        double w = nearlyLogInverse(p);
        return w - lowerCorrection(w, p);
    }

    /// The x itself, not through its logarithm, whose rounding counts more the larger x is.
    double inverse(double p) {
        double w = nearlyLogInverse(p);
        return Exp.exp(w) * (1 - lowerCorrection(w, p));
    }

    private double lowerCorrection(double w, double p) {
        double x = Exp.exp(w);
        return w < SERIES_IS_ONE ? 0 : (lower(x) - p) / (a * Exp.exp(logPrefix(x)));
    }

    private double nearlyLogInverse(double p) {
        double logP = Log.log(p);
        double least = (logP + logGammaOnePlus) / a;
        if (least < SERIES_IS_ONE) {
            return least;
        }
        double w = Math.max(least, Log.log(start(NORMAL.quantile(p))));
        for (int trial = 0; trial < TRIALS; trial++) {
            double x = Exp.exp(w);
            double log = logLower(x);
            double step = (log - logP) / (a * Exp.exp(logPrefix(x) - log));
            w = Math.max(least, w - step);
            if (Math.abs(step) < near()) {
                break;
            }
        }
        return w;
    }

    /// The logarithm of the x with `Q(a, x) = q`; the same from the right.
    double logUpperInverse(double q) {
        double w = nearlyLogUpperInverse(q);
        return w - upperCorrection(w, q);
    }

    /// The x itself.
    double upperInverse(double q) {
        double w = nearlyLogUpperInverse(q);
        return Exp.exp(w) * (1 - upperCorrection(w, q));
    }

    private double upperCorrection(double w, double q) {
        double x = Exp.exp(w);
        return w < SERIES_IS_ONE ? 0 : (q - upper(x)) / (a * Exp.exp(logPrefix(x)));
    }

    private double nearlyLogUpperInverse(double q) {
        double least = (StrictMath.log1p(-q) + logGammaOnePlus) / a;
        if (least < SERIES_IS_ONE) {
            return least;
        }
        double logQ = Log.log(q);
        double most = Log.log(a - logQ + Math.sqrt(-2 * a * logQ));
        double w = Math.min(most, Math.max(least, Log.log(start(NORMAL.upperQuantile(q)))));
        for (int trial = 0; trial < TRIALS; trial++) {
            double x = Exp.exp(w);
            double log = logUpper(x);
            double step = (logQ - log) / (a * Exp.exp(logPrefix(x) - log));
            w = Math.min(most, w - step);
            if (Math.abs(step) < near()) {
                break;
            }
        }
        return w;
    }

    /// Where one more step of Newton's method is exact.
    private double near() {
        return 1e-6 / (1 + Math.sqrt(a));
    }

    /// Wilson and Hilferty's approximation to the quantile, from the normal one; 0 where it fails.
    private double start(double z) {
        double root = 1 - 1 / (9 * a) + z / (3 * Math.sqrt(a));
        return root > 0.1 ? a * root * root * root : 0;
    }
}
