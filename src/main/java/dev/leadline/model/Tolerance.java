package dev.leadline.model;

import java.util.OptionalDouble;

/// The numerical tolerance: how far the half-width of the first answer may reach.
///
/// @param absolute in the unit of the answer
/// @param relative part of the true value
/// @param both true where absolute and relative must both be met, false where either will do
public record Tolerance(OptionalDouble absolute, OptionalDouble relative, boolean both) {

    /// The largest half-width that meets it; 0 where there is no estimate.
    ///
    /// Relative to the true value, not to the estimate: where `h <= r |m| / (1 + r)` and the interval `m ± h` holds
    /// the true value, that value is at least `|m| / (1 + r)` in size, and h at most r of it.
    public double allowed(double estimate) {
        double relatively = relative.isPresent()
                ? relative.getAsDouble() * Math.abs(estimate) / (1 + relative.getAsDouble())
                : Double.NaN;
        double allowed;
        if (absolute.isEmpty()) {
            allowed = relatively;
        } else if (relative.isEmpty()) {
            allowed = absolute.getAsDouble();
        } else {
            allowed =
                    both ? Math.min(absolute.getAsDouble(), relatively) : Math.max(absolute.getAsDouble(), relatively);
        }
        return Double.isNaN(allowed) ? 0 : allowed;
    }

    /// @param reach half-width of the interval, or where it is lopsided the distance of the farther limit
    public boolean met(double estimate, double reach) {
        return reach <= allowed(estimate);
    }

    /// Whether an estimate is as near to the true value as the tolerance asks.
    public boolean isNear(double estimate, double value) {
        double off = Math.abs(estimate - value);
        boolean absolutely = absolute.isPresent() && off <= absolute.getAsDouble();
        boolean relatively = relative.isPresent() && off <= relative.getAsDouble() * Math.abs(value);
        return both ? absolutely && relatively : absolutely || relatively;
    }
}
