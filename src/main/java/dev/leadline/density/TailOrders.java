package dev.leadline.density;

/// How heavy the tails of a density are: which of its moments exist.
///
/// @param lower the moments of the lower tail exist below this order, and not above it; `∞` where all exist
/// @param upper the same for the upper tail
public record TailOrders(double lower, double upper) {
    /// Every moment exists.
    public static final TailOrders LIGHT = new TailOrders(Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY);

    /// The heavier of the two.
    public double least() {
        return Math.min(lower, upper);
    }
}
