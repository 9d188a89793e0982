package dev.leadline.estimate;

/// The mean of the upper tail that holds a share `1 - q` of the probability (expected shortfall), by `v +
/// mean((y - v)+)/(1 - q)` with v the quantile: of values equal to v just so many count as fill the share.
///
/// The standard error is that of the influence function, whose other part, the error of v, has no slope at
/// the quantile. The error of the mean of the values beyond v would be too small by a factor 1.5 for a
/// normal outcome at .95 (`TailMeanTest`).
///
/// Source: Rockafellar and Uryasev (2002), Journal of Banking and Finance 26, 1443-1471; Manistre and
/// Hancock (2005), North American Actuarial Journal 9, 129-156. From memory.
public final class TailMean {
    private TailMean() {}

    /// @param quantile v, of the same observations
    /// @param q between 0 and 1
    /// @param k component of `(y - v)+`, weighted where draws are
    public static Estimate of(double quantile, double q, Accumulator sums, int k) {
        double above = Quantile.above(q);
        return new Estimate(quantile + sums.mean(k) / above, sums.standardError(k) / above, sums.count() - 1);
    }

    /// Of single draws, each kept.
    ///
    /// @param sorted increasing; not changed
    public static Estimate of(double[] sorted, double q) {
        int n = sorted.length;
        int rank = Math.toIntExact(Quantile.rank(n, q));
        double quantile = sorted[rank - 1];
        var excess = new double[n];
        for (int i = rank; i < n; i++) {
            excess[i] = sorted[i] - quantile;
        }
        var sums = new Accumulator(1);
        sums.add(new double[][] {excess}, 0, n);
        return of(quantile, q, sums, 0);
    }
}
