package dev.leadline.density;

/// A probability density on the real line. Immutable, safe for all threads.
///
/// Every function is a pure function of its argument, takes `NaN` to `NaN`, and is bit-stable (see `numeric`).
/// Both tails have their own functions: `1 - cdf(x)` is 0 exactly where a sign-off looks.
public interface Density {
    double pdf(double x);

    /// Natural logarithm of the density; `-∞` outside the support.
    double logPdf(double x);

    /// [#logPdf(double)] of the first `n` values, with the same bits as one by one.
    ///
    /// @param out filled with the logarithms; may be `x`
    default void logPdf(double[] x, double[] out, int n) {
        for (int i = 0; i < n; i++) {
            out[i] = logPdf(x[i]);
        }
    }

    double cdf(double x);

    /// `P(X > x)`.
    double survival(double x);

    /// The x with `cdf(x) = p`; ends of the support at 0 and 1, `NaN` outside `[0, 1]`.
    double quantile(double p);

    /// The x with `survival(x) = q`; accurate for tiny q, where `quantile(1 - q)` is not.
    double upperQuantile(double q);

    /// `∞` where infinite, `NaN` where undefined.
    double mean();

    /// `∞` where infinite, `NaN` where undefined.
    double variance();

    /// Third central moment over the cube of the standard deviation; `∞` or `-∞` where only the third moment of
    /// one tail is infinite, `NaN` where those of both are, or the variance.
    default double skewness() {
        return Moments.skewness(this);
    }

    /// Fourth central moment over the square of the variance, less 3; `NaN` where the variance is not finite, `∞`
    /// where only the fourth moment is infinite.
    default double excessKurtosis() {
        return Moments.excessKurtosis(this);
    }

    /// How heavy the tails are.
    default TailOrders tailOrders() {
        return TailOrders.LIGHT;
    }

    /// Whether its values are separate ones, each with a probability of its own, which [#pdf(double)] then gives. The
    /// quantile is then the smallest value whose cdf reaches p, the upper quantile the smallest whose survival does
    /// not exceed q.
    default boolean isDiscrete() {
        return false;
    }

    Support support();

    /// The density as a standardised shape, shifted and scaled: `location + scale * shape`. Tables are built, and
    /// shared, per shape.
    Standardised standardised();
}
