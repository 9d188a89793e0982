package dev.leadline.estimate;

/// The mean of one component over the mean of another, of the same observations.
///
/// @param numerator its mean
/// @param denominator its mean
/// @param varianceOfNumerator of the mean, as are the next two
/// @param degrees of freedom of the variances
public record RatioOfMeans(
        double numerator,
        double denominator,
        double varianceOfNumerator,
        double covariance,
        double varianceOfDenominator,
        long degrees) {
    /// What is left of the variance of proportional components, which is none.
    private static final double ROUNDING = 0x1p-43;

    /// @param k component of the numerator
    /// @param w component of the denominator
    public static RatioOfMeans of(Accumulator sums, int k, int w) {
        double n = sums.count();
        return new RatioOfMeans(
                sums.mean(k),
                sums.mean(w),
                sums.covariance(k, k) / n,
                sums.covariance(k, w) / n,
                sums.covariance(w, w) / n,
                sums.count() - 1);
    }

    public double value() {
        return numerator / denominator;
    }

    /// Of the linear part (delta method); exactly 0 where the components are proportional.
    public double standardError() {
        double ratio = value();
        double both = ratio * covariance;
        double below = ratio * ratio * varianceOfDenominator;
        double left = varianceOfNumerator - 2 * both + below;
        return left <= ROUNDING * (varianceOfNumerator + below) ? 0 : Math.sqrt(left) / Math.abs(denominator);
    }

    /// How far the value lies off in expectation, to first order in one over the number of observations; it
    /// is not corrected for.
    public double bias() {
        return (value() * varianceOfDenominator - covariance) / (denominator * denominator);
    }

    /// The standard error of the denominator's mean in parts of it.
    public double errorOfDenominator() {
        return Math.sqrt(varianceOfDenominator) / Math.abs(denominator);
    }

    public Estimate estimate() {
        return new Estimate(value(), standardError(), degrees);
    }
}
