package dev.leadline.interval;

import dev.leadline.estimate.Estimate;
import java.util.Optional;

/// An interval of so many standard errors around an estimate, widened on either side by what the estimate may
/// be off beside chance.
final class Around {
    private Around() {}

    /// No interval where [Student] has none, and for the same reason.
    ///
    /// @param n observations the estimate is made of
    /// @param errors half the width, in standard errors
    static Interval of(Estimate estimate, long n, double errors, double level, String kind, String assumption) {
        double half = errors * estimate.standardError() + estimate.bias();
        if (n < 2 || !(estimate.standardError() > 0 && Double.isFinite(estimate.value() + half))) {
            var reason = Student.of(estimate.value(), estimate.standardError(), n, level);
            return reason.isNone()
                    ? reason.as(kind, assumption)
                    : Interval.none(
                            level,
                            kind,
                            assumption,
                            "the values are too large for an interval: their squares overflow");
        }
        return new Interval(
                estimate.value() - half, estimate.value() + half, level, kind, assumption, Optional.empty());
    }
}
