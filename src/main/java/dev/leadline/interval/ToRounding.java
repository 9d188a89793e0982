package dev.leadline.interval;

import dev.leadline.numeric.Rounding;
import java.util.Optional;

/// The interval of a value that every weighted draw gives alike: the density drawn from is perfect for it, and what
/// is left is the rounding of weights.
///
/// Error: `2^-40`, relative, is taken for it; densities are accurate to 1e-12 (`PerfectDensityTest`).
public final class ToRounding {
    /// Word of the commands.
    public static final String KIND = "rounding";

    /// Relative, of a weighted draw.
    private static final double ROUNDING = 0x1p-40;

    private static final String ASSUMPTION =
            "Every draw gives the same value up to rounding, as do those that were not made.";

    private ToRounding() {}

    /// Whether values differ by rounding alone.
    public static boolean isMet(double least, double most) {
        return least != 0 && most - least <= ROUNDING * Math.min(Math.abs(least), Math.abs(most));
    }

    public static double standardError(double value) {
        return ROUNDING * Math.abs(value);
    }

    public static Interval of(double value, long n, double level) {
        double half = 2 * standardError(value);
        return new Interval(
                value - half,
                value + half,
                level,
                KIND,
                ASSUMPTION,
                Optional.of("every draw gives the same value up to rounding, so that the density drawn from is perfect"
                        + " for it; a part of probability below 3/n = "
                        + Rounding.atMost(Math.min(1, 3.0 / n)) + " may be unseen"));
    }
}
