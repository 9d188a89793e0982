package dev.leadline.interval;

import dev.leadline.estimate.Logarithm;

/// A positive number with the limits between which it lies, Student's interval for its logarithm.
public record Ratio(double low, double value, double high) {
    public static final Ratio ONE = new Ratio(1, 1, 1);

    public static Ratio of(Logarithm logarithm, double level) {
        double half = Student.quantile(logarithm.degrees(), level) * logarithm.standardError();
        return new Ratio(
                StrictMath.exp(logarithm.value() - half),
                StrictMath.exp(logarithm.value()),
                StrictMath.exp(logarithm.value() + half));
    }

    public Ratio inverse() {
        return new Ratio(1 / high, 1 / value, 1 / low);
    }

    /// The product with a number that was found independently: on the logarithmic scale the distances of limits add up
    /// by their squares.
    public Ratio times(Ratio other) {
        double product = value * other.value;
        double less = StrictMath.hypot(StrictMath.log(low / value), StrictMath.log(other.low / other.value));
        double more = StrictMath.hypot(StrictMath.log(high / value), StrictMath.log(other.high / other.value));
        return new Ratio(product * StrictMath.exp(-less), product, product * StrictMath.exp(more));
    }

    /// Whether the number is 1, as far as the limits say.
    public boolean holdsOne() {
        return low <= 1 && high >= 1;
    }

    /// How far the limits are apart, as a factor; 1 where they are equal.
    public double width() {
        return high / low;
    }
}
