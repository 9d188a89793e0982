package dev.leadline.interval;

import java.util.Optional;

/// A mean to a fixed tolerance, exact for normal values: a first stage tells how many draws in all are
/// needed. Its draws enter the mean, and its standard deviation alone the interval, since for normal values
/// the two are independent.
///
/// Source: Stein (1945), Annals of Mathematical Statistics 16, 243-258.
///
/// @param level of confidence, between 0 and 1
/// @param first draws of the first stage, at least 2
public record Stein(double level, long first) {
    /// Word of the project file and of the commands.
    public static final String KIND = "stein";

    private static final String ASSUMPTION = "The values are independent and normal.";

    public Stein {
        Level.check(level);
        if (first < 2) {
            throw new IllegalArgumentException(first + " draws first");
        }
    }

    /// Draws of both stages.
    ///
    /// @param sd of the first stage
    /// @param tolerance that the mean may be off, above 0
    public double all(double sd, double tolerance) {
        double ratio = Student.quantile(first - 1, level) * sd / tolerance;
        return Math.max(first, Math.ceil(ratio * ratio));
    }

    /// The interval.
    ///
    /// @param mean of both stages
    /// @param sd of the first stage
    /// @param n draws of both stages
    public Interval of(double mean, double sd, long n) {
        if (!(sd > 0)) {
            return Interval.none(
                    level, KIND, ASSUMPTION, "every value of the first stage is equal, which normal ones are not");
        }
        double half = Student.quantile(first - 1, level) * sd / Math.sqrt(n);
        return new Interval(mean - half, mean + half, level, KIND, ASSUMPTION, Optional.empty());
    }
}
