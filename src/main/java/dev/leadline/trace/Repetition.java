package dev.leadline.trace;

import dev.leadline.interval.Interval;
import dev.leadline.trace.Course.Judged;

/// What one answer came to in one repetition of a set-up.
///
/// @param estimate `NaN` where there is none
/// @param standardError `NaN` where none can be said
public record Repetition(double estimate, double standardError, Interval interval) {
    /// With what the answer is signed by: of a run that was stopped for what its band showed, the band.
    public static Repetition of(Answer answer, Judged judged) {
        var interval = judged == Judged.BAND ? answer.band().orElse(answer.interval()) : answer.interval();
        return new Repetition(answer.estimate(), answer.standardError(), interval);
    }

    /// Whether it has a limit at all.
    public boolean isBounded() {
        return !(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
    }

    /// Whether its interval lies below the value; one without an upper limit does not.
    public boolean isBelow(double value) {
        return interval.high() < value;
    }

    /// Whether its interval lies above the value; one without a lower limit does not.
    public boolean isAbove(double value) {
        return interval.low() > value;
    }

    /// Where its interval stands among others: the middle, or the estimate where a limit is missing.
    public double centre() {
        double middle = interval.low() + (interval.high() - interval.low()) / 2;
        return Double.isFinite(middle) ? middle : estimate;
    }
}
