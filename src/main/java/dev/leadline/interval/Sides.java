package dev.leadline.interval;

import java.util.Optional;
import java.util.function.DoubleFunction;

/// Which limits of an interval are asked for.
///
/// Every two-sided kind here leaves out as much below as above, so that a limit with confidence L alone is
/// the end of the two-sided interval at `2 L - 1`. What is left out beyond it is `1 - L` to the bit:
/// neither subtraction rounds.
public enum Sides {
    BOTH("two-sided"),
    /// Not above it.
    UPPER("upper"),
    /// Not below it.
    LOWER("lower");

    private final String word;

    Sides(String word) {
        this.word = word;
    }

    /// Word of the project file and of the commands.
    public String word() {
        return word;
    }

    /// The level of the two-sided interval whose ends are wanted.
    ///
    /// @param level of confidence, between 0 and 1; above 1/2 for one side
    public double twoSided(double level) {
        Level.check(level);
        if (this == BOTH) {
            return level;
        }
        if (!(level > 0.5)) {
            throw new IllegalArgumentException("one-sided level " + level + " is not above 1/2");
        }
        return 2 * level - 1;
    }

    /// The limits wanted; in place of one that is not, `-∞` or `∞`. Kinds whose notes speak of a side take
    /// the sides themselves.
    ///
    /// @param kind the two-sided interval at a level
    public Interval of(double level, DoubleFunction<Interval> kind) {
        var both = kind.apply(twoSided(level));
        if (this == BOTH) {
            return both;
        }
        double low = this == LOWER ? both.low() : Double.NEGATIVE_INFINITY;
        double high = this == UPPER ? both.high() : Double.POSITIVE_INFINITY;
        boolean tellsTheOther = !Double.isNaN(low) && !Double.isNaN(high) && both.isLacking();
        return new Interval(
                low, high, level, both.kind(), both.assumption(), tellsTheOther ? Optional.empty() : both.note());
    }
}
