package dev.leadline.estimate;

/// A value with its standard error.
///
/// @param standardError `NaN` where none can be said; exactly 0 where every observation is equal
/// @param degrees of freedom of the standard error
/// @param bias bound of what it may be off beside chance
public record Estimate(double value, double standardError, long degrees, double bias) {
    public Estimate(double value, double standardError, long degrees) {
        this(value, standardError, degrees, 0);
    }

    /// The mean of a component.
    public static Estimate mean(Accumulator sums, int k) {
        return new Estimate(sums.mean(k), sums.standardError(k), sums.count() - 1);
    }

    /// Chance and bias together.
    public double error() {
        return bias == 0 ? standardError : StrictMath.hypot(standardError, bias);
    }
}
