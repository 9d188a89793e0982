package dev.leadline.chart;

/// A stretch of an axis, finite, with `low < high`.
public record Range(double low, double high) {
    public Range {
        if (!(low < high && Double.isFinite(low) && Double.isFinite(high))) {
            throw new IllegalArgumentException("no stretch of an axis: " + low + " to " + high);
        }
    }

    public double length() {
        return high - low;
    }

    public boolean contains(double value) {
        return low <= value && value <= high;
    }

    /// The smallest range that holds both.
    public Range with(Range other) {
        return new Range(Math.min(low, other.low), Math.max(high, other.high));
    }
}
