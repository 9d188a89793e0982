package dev.leadline.estimate;

/// A value with its standard error.
///
/// @param standardError `NaN` where none can be said; exactly 0 where every observation is equal
/// @param degrees of freedom of the standard error
public record Estimate(double value, double standardError, long degrees) {
    /// The mean of a component.
    public static Estimate mean(Accumulator sums, int k) {
        return new Estimate(sums.mean(k), sums.standardError(k), sums.count() - 1);
    }
}
