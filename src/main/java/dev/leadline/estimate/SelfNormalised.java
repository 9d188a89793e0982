package dev.leadline.estimate;

/// The mean of weighted outcomes over the mean of the weights. Its bias, of the order of one over the number of
/// observations, is not corrected; its variance is that of the linear part (delta method).
///
/// Source: Hesterberg (1995), Technometrics 37, 185-194.
public final class SelfNormalised {
    private SelfNormalised() {}

    /// @param k component of the weighted outcomes
    /// @param w component of the weights
    public static Estimate of(Accumulator sums, int k, int w) {
        return RatioOfMeans.of(sums, k, w).estimate();
    }
}
