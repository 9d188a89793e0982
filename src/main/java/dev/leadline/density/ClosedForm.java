package dev.leadline.density;

/// A shape whose quantile is so simple that no table can be faster.
interface ClosedForm {
    /// The quantiles, monotone in u, without a branch on it.
    ///
    /// @param u probabilities in the open interval (0, 1), `n` of them from index 0
    /// @param x filled with the quantiles; may be the same array
    void fill(double[] u, double[] x, int n);
}
