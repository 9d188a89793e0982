package dev.leadline.numeric;

import java.math.BigInteger;

/// The gamma function and its logarithm on the whole real line, with the same bits on every machine.
///
/// Between 1.5 and 2.5 from the series of `log Γ(2 + t)`, whose terms shrink like `t^k / 4^k`; elsewhere below 10 by
/// the recurrence, above by Stirling's series, and for negative arguments by reflection. The logarithm keeps its
/// relative accuracy at its zeros 1 and 2, but not at those between the negative integers.
///
/// Special values: at 0 `gamma` is infinite with the sign of the zero, at the negative integers `NaN`; there the
/// logarithm is ∞. `gamma(n + 1)` is `n!` to the last bit.
///
/// Error: `gamma` 6 ulp, `log` 4 ulp for positive arguments and 5e-16 of the larger of itself and 1 for negative ones
/// (`GammaFunctionTest`; seen: 3 ulp, 2 ulp, 2e-16). The forms for small results: relative 2e-15 for `logOnePlus` and
/// `logDifference` of order 2, 1e-13 for the other orders, absolute 4e-15 for `stirlingError` below 10 and relative
/// 2e-15 beyond.
///
/// Source: Abramowitz and Stegun (1964), 6.1.15, 6.1.17, 6.1.33 and 6.1.40; constants computed with 40 digits.
public final class GammaFunction {
    private static final double ONE_LESS_EULER = 0.42278433509846713;
    private static final double SQRT_2PI = 2.5066282746310007;
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    /// From here Stirling's series is used.
    private static final double LARGE = 10;

    private static final double OVERFLOW = 171.63;

    /// `(zeta(k) - 1) / k` for k = 2, 3 ….
    private static final double[] SERIES = {
        0.3224670334241132,
        0.0673523010531981,
        0.020580808427784546,
        0.007385551028673986,
        0.0028905103307415234,
        0.001192753911703261,
        0.0005096695247430425,
        0.00022315475845357939,
        9.945751278180853e-05,
        4.492623673813314e-05,
        2.050721277567069e-05,
        9.439488275268397e-06,
        4.374866789907488e-06,
        2.039215753801366e-06,
        9.55141213040742e-07,
        4.492469198764566e-07,
        2.1207184805554665e-07,
        1.0043224823968099e-07,
        4.7698101693639804e-08,
        2.2711094608943164e-08,
        1.0838659214896955e-08,
        5.183475041970047e-09,
        2.4836745438024785e-09,
        1.1921401405860912e-09,
        5.731367241678862e-10,
        2.7595228851242334e-10,
        1.330476437424449e-10,
        6.4229645638381e-11,
    };

    /// `B(2k) / (2k (2k - 1))` for k = 1, 2 ….
    private static final double[] STIRLING = {
        0.08333333333333333,
        -0.002777777777777778,
        0.0007936507936507937,
        -0.0005952380952380953,
        0.0008417508417508417,
        -0.0019175269175269176,
        0.00641025641025641,
        -0.029550653594771242,
        0.17964437236883057,
        -1.3924322169059011,
    };

    private static final double[] FACTORIALS = factorials();

    private GammaFunction() {}

    /// `Γ(x)`.
    public static double gamma(double x) {
        if (!(x > 0)) return x == 0 ? 1 / x : reflected(x);
        if (x > OVERFLOW) return Double.POSITIVE_INFINITY;
        if (x == Math.rint(x)) return FACTORIALS[(int) x - 1];
        if (x >= LARGE) {
            double root = Power.pow(x, 0.5 * x - 0.25);
            return root * (Exp.exp(-x) * root) * (SQRT_2PI * Exp.exp(stirlingSeries(x)));
        }
        double f = x;
        double above = 1;
        double below = 1;
        while (f > 2.5) {
            f -= 1;
            above *= f;
        }
        while (f < 1.5) {
            below *= f;
            f += 1;
        }
        return above / below * Exp.exp(logAboutTwo(f - 2));
    }

    /// `log |Γ(x)|`.
    public static double log(double x) {
        if (!(x > 0)) return logOfNegative(x);
        if (x >= LARGE) return (x - 0.5) * (Log.log(x) - 1) + (HALF_LOG_2PI - 0.5) + stirlingSeries(x);
        if (x < 0.5) return logOnePlus(x) - Log.log(x);
        if (x < 1.5) return logOnePlus(x - 1);
        double f = x;
        double product = 1;
        while (f > 2.5) {
            f -= 1;
            product *= f;
        }
        return Log.log(product) + logAboutTwo(f - 2);
    }

    /// `log Γ(1 + x)` for `|x| <= 1/2`, accurate near 0.
    public static double logOnePlus(double x) {
        return logAboutTwo(x) - StrictMath.log1p(x);
    }

    /// The difference of order 2, 3 or 4 of `log Γ` from 1 on, at steps of `x`: `log Γ(1 + 2x) - 2 log Γ(1 + x)`,
    /// `log Γ(1 + 3x) - 3 log Γ(1 + 2x) + 3 log Γ(1 + x)`, …; for `x > -1 / order`. Accurate near 0, where it is of
    /// the size of `x^order`.
    public static double logDifference(int order, double x) {
        if (Math.abs(order * x) > 0.5) {
            double two = log(1 + 2 * x) - 2 * log(1 + x);
            double three = order > 2 ? log(1 + 3 * x) - 3 * log(1 + x) - 3 * two : 0;
            return switch (order) {
                case 2 -> two;
                case 3 -> three;
                default -> log(1 + 4 * x) - 4 * log(1 + x) - 4 * three - 6 * two;
            };
        }
        double sum = 0;
        for (int k = SERIES.length - 1; k >= order - 2; k--) sum = Math.fma(sum, -x, SERIES[k] * differ(order, k + 2));
        double one = 1 + x;
        double two = 1 + 2 * x;
        double square = x * x;
        return switch (order) {
            case 2 -> square * sum + StrictMath.log1p(square / two);
            case 3 -> {
                double cube = square * x;
                yield -cube * sum + StrictMath.log1p(-cube * (2 + 3 * x) / ((1 + 3 * x) * one * one * one));
            }
            default -> {
                double fourth = square * square;
                double polynomial = Math.fma(Math.fma(Math.fma(Math.fma(81, x, 176), x, 140), x, 48), x, 6);
                yield fourth * sum
                        + StrictMath.log1p(fourth * polynomial / ((1 + 4 * x) * two * two * two * two * two * two));
            }
        };
    }

    /// The same difference of the powers `0^k, 1^k, 2^k …`.
    private static double differ(int order, int k) {
        double two = StrictMath.pow(2, k);
        return switch (order) {
            case 2 -> two - 2;
            case 3 -> StrictMath.pow(3, k) - 3 * two + 3;
            default -> two * two - 4 * StrictMath.pow(3, k) + 6 * two - 4;
        };
    }

    /// `log Γ(2 + t)` for `|t| <= 1/2`.
    private static double logAboutTwo(double t) {
        double sum = 0;
        for (int k = SERIES.length - 1; k >= 0; k--) sum = Math.fma(sum, -t, SERIES[k]);
        return t * Math.fma(t, sum, ONE_LESS_EULER);
    }

    /// What Stirling's formula `(x - 1/2) log x - x + log(2 pi) / 2` lacks, for `x > 0`.
    public static double stirlingError(double x) {
        return x < LARGE ? log(x) - (x - 0.5) * Log.log(x) + x - HALF_LOG_2PI : stirlingSeries(x);
    }

    private static double stirlingSeries(double x) {
        double square = 1 / (x * x);
        double sum = 0;
        for (int k = STIRLING.length - 1; k >= 0; k--) sum = Math.fma(sum, square, STIRLING[k]);
        return sum / x;
    }

    private static double reflected(double x) {
        if (!(x > Double.NEGATIVE_INFINITY) || x == Math.rint(x)) return Double.NaN;
        return x > -0.5 ? Math.PI / (sineOfPi(x) * gamma(1 - x)) : -Math.PI / (x * sineOfPi(x) * gamma(-x));
    }

    private static double logOfNegative(double x) {
        if (Double.isNaN(x)) return x;
        if (x == Math.rint(x)) return Double.POSITIVE_INFINITY;
        return x > -0.5
                ? -Log.log(Math.abs(sineOfPi(x)) / Math.PI) - log(1 - x)
                : Log.log(Math.PI / Math.abs(x * sineOfPi(x))) - log(-x);
    }

    /// `sin(pi x)`, where the multiple of pi is taken off before it is rounded.
    private static double sineOfPi(double x) {
        double nearest = Math.rint(x);
        double sine = Trigonometry.sin(Math.PI * (x - nearest));
        return Math.rint(0.5 * nearest) == 0.5 * nearest ? sine : -sine;
    }

    private static double[] factorials() {
        double[] factorials = new double[171];
        BigInteger exact = BigInteger.ONE;
        for (int n = 0; n < factorials.length; n++) {
            if (n > 0) exact = exact.multiply(BigInteger.valueOf(n));
            factorials[n] = exact.doubleValue();
        }
        return factorials;
    }
}
