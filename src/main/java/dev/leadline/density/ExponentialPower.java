package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;

/// Moments of `E^e`, a power of an exponential value E of mean 1: what Weibull, Fréchet and generalized extreme values
/// are.
///
/// The k-th moment over the k-th power of the mean is `exp(L(k))`, `L(k) = log Γ(1 + k e) - k log Γ(1 + e)`. For small
/// e the central moments are small differences of these: so they are written with the differences `D(k)` of `log Γ`,
/// as `L(2) = D(2)`, `L(3) = D(3) + 3 D(2)`, `L(4) = D(4) + 4 D(3) + 6 D(2)`, and everything that cancels is left out.
///
/// @param e above -1 where the mean exists, above -1/k where the k-th moment does
record ExponentialPower(double e) {

    double mean() {
        return e > -1 ? GammaFunction.gamma(1 + e) : Double.POSITIVE_INFINITY;
    }

    double variance() {
        double mean = mean();
        return mean * mean * relativeVariance();
    }

    /// The variance over the square of the mean.
    double relativeVariance() {
        return e > -0.5 ? StrictMath.expm1(difference(2)) : Double.POSITIVE_INFINITY;
    }

    /// `exp(L(3)) - 3 exp(L(2)) + 2` over `(exp(L(2)) - 1)^(3/2)`.
    double skewness() {
        double variance = relativeVariance();
        if (!(variance < Double.POSITIVE_INFINITY)) {
            return Double.NaN;
        }
        if (!(e > -1 / 3.0)) {
            return Double.POSITIVE_INFINITY;
        }
        double two = difference(2);
        double three = difference(3);
        double central = three + expLess(1, three + 3 * two) - 3 * expLess(1, two);
        return central / (variance * Math.sqrt(variance));
    }

    /// `exp(L(4)) - 4 exp(L(3)) - 3 exp(2 L(2)) + 12 exp(L(2)) - 6` over `(exp(L(2)) - 1)^2`.
    double excessKurtosis() {
        double variance = relativeVariance();
        if (!(variance < Double.POSITIVE_INFINITY)) {
            return Double.NaN;
        }
        if (!(e > -0.25)) {
            return Double.POSITIVE_INFINITY;
        }
        double two = difference(2);
        double three = difference(3);
        double four = difference(4);
        double squares = 0.5 * (four + 2 * three) * (four + 6 * three + 12 * two);
        double cumulant = four
                + squares
                + expLess(2, four + 4 * three + 6 * two)
                - 4 * expLess(2, three + 3 * two)
                - 3 * expLess(2, 2 * two)
                + 12 * expLess(2, two);
        return cumulant / (variance * variance);
    }

    private double difference(int order) {
        return GammaFunction.logDifference(order, e);
    }

    /// `exp(x)` less the terms of its series up to `x^order`, order 1 or 2, for `x >= 0`.
    private static double expLess(int order, double x) {
        if (x > 1) {
            return Exp.exp(x) - 1 - x - (order == 2 ? 0.5 * x * x : 0);
        }
        double sum = 1;
        for (int n = 22; n > order + 1; n--) {
            sum = Math.fma(sum, x / n, 1);
        }
        double first = x * x / 2;
        return sum * (order == 2 ? first * x / 3 : first);
    }
}
