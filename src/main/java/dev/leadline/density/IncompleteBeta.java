package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;

/// The regularised incomplete beta function: the mass of the beta density of parameters `a` and `b` below `x`. Points
/// are given by their distances `x` from 0 and `y` from 1, so that neither loses digits near the other's end.
///
/// The continued fraction of Didonato and Morris for `x < (a + 1) / (a + b + 2)`, which loses no
/// digits when `y` is small; beyond it the mass above, mirrored.
///
/// Error: relative 1e-12 for results above 1e-290 (`DensityTablesTest`: parameters from .02 to 10000; beyond, to 1e6,
/// there are the round trips of `CatalogueTest` and a library). Of the fraction alone: whole parameters to 1e9, by the
/// binomial's table.
///
/// Cost: .1 to 1 microsecond; more, like the square root, where both parameters exceed 1000.
///
/// Sources: Didonato and Morris (1992), ACM TOMS 18, 360-373, equation 9; the prefix after Loader (2000), Fast and
/// accurate computation of binomial probabilities. From memory.
///
/// @param logConstant `log(sqrt(a b / (2 pi (a + b))))` and Stirling's errors: what the deviances leave of the prefix
record IncompleteBeta(double a, double b, double logConstant) {
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    /// Below this `log x` the mass below is its prefix.
    private static final double FRACTION_IS_ONE = -80;

    /// Below this the other end is not felt.
    private static final double END = 1e-200;

    private static final int TRIALS = 200;
    private static final Normal.Standard NORMAL = new Normal.Standard();

    static IncompleteBeta of(double a, double b) {
        double constant = 0.5 * (Log.log(a) - Log.log(a + b) + Log.log(b))
                - HALF_LOG_2PI
                + (GammaFunction.stirlingError(a + b)
                        - GammaFunction.stirlingError(a)
                        - GammaFunction.stirlingError(b));
        return new IncompleteBeta(a, b, constant);
    }

    IncompleteBeta mirrored() {
        return new IncompleteBeta(b, a, logConstant);
    }

    /// `log(x^a y^b / B(a, b))`.
    double logPrefix(double x, double y) {
        if (x < END) {
            return a * Log.log(x) + Log.log(a) - logScale();
        }
        if (y < END) {
            return mirrored().logPrefix(y, x);
        }
        double n = a + b;
        double difference = b * x - a * y;
        return logConstant - (Deviance.of(a, n * x, difference) + Deviance.of(b, n * y, -difference));
    }

    /// `log(a B(a, b))`.
    double logScale() {
        return Log.log(a) - logConstant - a * StrictMath.log1p(b / a) - b * StrictMath.log1p(a / b);
    }

    /// The mass below.
    double lower(double x, double y) {
        if (!(x > 0 && y > 0)) {
            return x <= 0 ? 0 : y <= 0 ? 1 : x + y;
        }
        return isBelow(x)
                ? Exp.exp(logPrefix(x, y)) * fraction(a, b, x, y, b * x - a * y)
                : 1 - mirrored().lower(y, x);
    }

    /// The logarithm of the mass below.
    double logLower(double x, double y) {
        if (isBelow(x)) {
            return logPrefix(x, y) + Log.log(fraction(a, b, x, y, b * x - a * y));
        }
        return StrictMath.log1p(-mirrored().lower(y, x));
    }

    private boolean isBelow(double x) {
        return isBelow(a, b, x);
    }

    /// Whether the fraction serves for the mass below x, and not for that above.
    static boolean isBelow(double a, double b, double x) {
        return x <= (a + 1) / (a + b + 2);
    }

    /// The mass below by its prefix, by Lentz's method.
    ///
    /// @param difference `b x - a y`, which a caller may know better than the subtraction would
    static double fraction(double a, double b, double x, double y, double difference) {
        double f = a * (1 - difference) / (a + 1);
        double c = f;
        double d = 0;
        for (int m = 1; m < 10_000_000; m++) {
            double even = a + 2.0 * m;
            double ratio = m * x / (even - 1);
            double numerator = (a + m - 1) / (even - 1) * (a + b + m - 1) * (b - m) * (ratio * x);
            double term = m + (b - m) * ratio + (a + m) / (even + 1) * (1 - difference + m * (1 + y));
            d = 1 / Math.fma(numerator, d, term);
            c = term + numerator / c;
            double change = c * d;
            f *= change;
            if (Math.abs(change - 1) < 3e-16) {
                break;
            }
        }
        return 1 / f;
    }

    /// The mass above, for `a < 1` and `b x` not much above 1, where it is the small difference of
    /// numbers near 1: 1 less `x^a Γ(a + b) / (Γ(a + 1) Γ(b))` times 1 plus the sum over n of
    /// `(1 - b) (2 - b) to (n - b)` times `x^n / n!` times `a / (a + n)`.
    static double upperOfSmall(double a, double b, double x) {
        double power = 1;
        double sum = 0;
        for (int n = 1; n < 60; n++) {
            power *= (n - b) * x / n;
            sum += power / (a + n);
        }
        double ofA = a <= 0.5 ? GammaFunction.logOnePlus(a) : GammaFunction.log(a + 1);
        double log = a * Log.log(x) + logRise(a, b) - ofA;
        return -StrictMath.expm1(log) - Exp.exp(log) * a * sum;
    }

    /// `log Γ(a + b) - log Γ(b)` without their rounding.
    private static double logRise(double a, double b) {
        double sum = 0;
        double c = b;
        while (c < 10) {
            sum -= StrictMath.log1p(a / c);
            c++;
        }
        double stirling = GammaFunction.stirlingError(a + c) - GammaFunction.stirlingError(c);
        return sum + (c - 0.5) * StrictMath.log1p(a / c) + a * (Log.log(a + c) - 1) + stirling;
    }

    /// The `log(x / y)` that has the mass p below, by Newton's method: the logarithm of the mass is concave in
    /// `log(x / y)`, so that the second step and all later ones approach from the left.
    double logitInverse(double p) {
        double logP = Log.log(p);
        double least = (logP + logScale()) / a;
        if (least < FRACTION_IS_ONE) {
            return least;
        }
        double w = Log.log(a / b) + NORMAL.quantile(p) * Math.sqrt(1 / a + 1 / b);
        for (int trial = 0; trial < TRIALS; trial++) {
            double x = logistic(w);
            double y = logistic(-w);
            double log = logLower(x, y);
            double step = (log - logP) / Exp.exp(logPrefix(x, y) - log);
            w -= step;
            if (Math.abs(step) < 1e-6 * Math.min(1, Math.sqrt(1 / a + 1 / b))) {
                break;
            }
        }
        double x = logistic(w);
        double y = logistic(-w);
        return w - (lower(x, y) - p) / Exp.exp(logPrefix(x, y));
    }

    /// `e^w / (1 + e^w)`.
    static double logistic(double w) {
        return 1 / (1 + Exp.exp(-w));
    }
}
