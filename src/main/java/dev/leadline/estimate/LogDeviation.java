package dev.leadline.estimate;

/// The logarithm of the standard deviation of outcomes h, from observations that hold the means of `h - c`
/// and of `(h - c)²` over their draws, for any fixed number c near the mean of h: single draws, folded
/// ones, replicates, with weights or without. Its variance is that of the linear part (delta method), which
/// is the limit of the jackknife, and that of the square of the mean's error, which is all there is where
/// outcomes lie equally far on either side of their mean. Of single draws without weights the two are the
/// variance of the sample variance exactly.
///
/// Of single draws without weights `Jackknife.ofVariance(sums, k).times(.5)` says the same from one
/// component: the value to rounding, the variance to terms of the order of one over n (`LogDeviationTest`).
///
/// Error: digits are lost in proportion to `(mean - c)²` over the variance.
///
/// Sources: Shao and Tu (1995), The Jackknife and Bootstrap, section 2.1; Cramér (1946), Mathematical Methods
/// of Statistics, (27.4.2), the exact variance.
public final class LogDeviation {
    private LogDeviation() {}

    /// @param first component of `h - c`
    /// @param second component of `(h - c)²`
    public static Logarithm of(Accumulator sums, int first, int second) {
        double d = sums.mean(first);
        double squares = sums.mean(second);
        return logarithm(
                squares - d * d,
                sums.covariance(first, first),
                sums.covariance(second, second)
                        - 4 * d * sums.covariance(first, second)
                        + 4 * d * d * sums.covariance(first, first),
                sums.count());
    }

    /// Of weighted draws, their means over the mean of the weights.
    ///
    /// @param first component of `w (h - c)`
    /// @param second component of `w (h - c)²`
    /// @param w component of the weights
    public static Logarithm of(Accumulator sums, int first, int second, int w) {
        double weight = sums.mean(w);
        double d = sums.mean(first) / weight;
        double squares = sums.mean(second) / weight;
        double[] slopes = {-2 * d, 1, 2 * d * d - squares};
        int[] components = {first, second, w};
        double spread = 0;
        for (int i = 0; i < slopes.length; i++) {
            for (int j = 0; j < slopes.length; j++) {
                spread += slopes[i] * slopes[j] * sums.covariance(components[i], components[j]);
            }
        }
        double ofMean =
                sums.covariance(first, first) - 2 * d * sums.covariance(first, w) + d * d * sums.covariance(w, w);
        return logarithm(squares - d * d, ofMean / (weight * weight), spread / (weight * weight), sums.count());
    }

    /// @param variance about the mean that was estimated, which takes away the variance of that mean
    /// @param ofMean variance of the observations behind the mean
    /// @param spread of the linear parts of the variance
    private static Logarithm logarithm(double variance, double ofMean, double spread, double n) {
        double unbiased = variance + ofMean / n;
        double ofSquare = 2 * (ofMean / unbiased) * (ofMean / unbiased) / (n * (n - 1));
        double linear = Math.max(0, spread) / (unbiased * unbiased * n);
        return new Logarithm(StrictMath.log(unbiased) / 2, (linear + ofSquare) / 4, n - 1);
    }
}
