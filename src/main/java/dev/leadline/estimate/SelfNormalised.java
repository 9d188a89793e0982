package dev.leadline.estimate;

/// The mean of weighted outcomes over the mean of the weights. Its bias, of the order of one over the number of
/// observations, is not corrected; its variance is that of the linear part (delta method).
///
/// Source: Hesterberg (1995), Technometrics 37, 185-194.
public final class SelfNormalised {
    /// What is left of the variance of equal outcomes, which is none.
    private static final double ROUNDING = 0x1p-43;

    private SelfNormalised() {}

    /// @param k component of the weighted outcomes
    /// @param w component of the weights
    public static Estimate of(Accumulator sums, int k, int w) {
        double ratio = sums.mean(k) / sums.mean(w);
        double outcomes = sums.covariance(k, k);
        double both = ratio * sums.covariance(k, w);
        double weights = ratio * ratio * sums.covariance(w, w);
        double left = outcomes - 2 * both + weights;
        double variance = left <= ROUNDING * (outcomes + weights) ? 0 : left / (sums.mean(w) * sums.mean(w));
        return new Estimate(ratio, Math.sqrt(variance / sums.count()), sums.count() - 1);
    }
}
