package dev.leadline.estimate;

/// The logarithm of a positive number that was estimated: ratios of such numbers are differences here, and their errors
/// more nearly normal.
///
/// @param variance of the estimate
/// @param degrees of freedom of that variance
public record Logarithm(double value, double variance, double degrees) {
    /// Of the product with a number that was estimated independently.
    public Logarithm plus(Logarithm other) {
        return combined(value + other.value, other);
    }

    /// Of the quotient by a number that was estimated independently.
    public Logarithm minus(Logarithm other) {
        return combined(value - other.value, other);
    }

    /// Of a power of the number.
    public Logarithm times(double power) {
        return new Logarithm(power * value, power * power * variance, degrees);
    }

    /// Of the product with a number that is known.
    public Logarithm moved(double by) {
        return new Logarithm(value + by, variance, degrees);
    }

    public double standardError() {
        return Math.sqrt(variance);
    }

    /// Degrees of freedom: Welch (1947), Biometrika 34, 28-35.
    private Logarithm combined(double newValue, Logarithm other) {
        double sum = variance + other.variance;
        double spread = variance * variance / degrees + other.variance * other.variance / other.degrees;
        return new Logarithm(newValue, sum, spread > 0 ? sum * sum / spread : degrees + other.degrees);
    }
}
