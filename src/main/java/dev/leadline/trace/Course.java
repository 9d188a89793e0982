package dev.leadline.trace;

import dev.leadline.interval.Interval;
import dev.leadline.model.StopRule;
import dev.leadline.model.Tolerance;
import java.util.Optional;
import java.util.OptionalLong;

/// How a lane comes to its end.
///
/// @param rule word of the stop rule in force
/// @param judged what the tolerance is held against
/// @param hits to stop at, of the hits rule
/// @param firstStage what a first stage found, of rules that have one
public record Course(String rule, Judged judged, OptionalLong hits, Optional<FirstStage> firstStage) {
    /// Of a number of draws fixed beforehand.
    public static final Course FIXED = new Course(new StopRule.Fixed().word(), Judged.INTERVAL);

    public Course(String rule, Judged judged) {
        this(rule, judged, OptionalLong.empty(), Optional.empty());
    }

    /// What a numerical tolerance is held against.
    public enum Judged {
        /// The interval for a fixed number of draws.
        INTERVAL,
        /// The any-time band, since the lane was stopped for what it showed.
        BAND,
        /// The rule itself, which promises the tolerance and was satisfied.
        PROMISE
    }

    /// How far the value sought may lie from the estimate, as far as the tolerance asks; `NaN` where nothing
    /// says it.
    public double reach(Answer answer) {
        return switch (judged) {
            case INTERVAL, PROMISE -> answer.interval().reach(answer.estimate());
            case BAND ->
                answer.band().map(band -> reach(band, answer.estimate())).orElse(Double.NaN);
        };
    }

    /// The farther limit of a band: it may lie anywhere around the estimate.
    private static double reach(Interval band, double estimate) {
        return Math.max(band.high() - estimate, estimate - band.low());
    }

    public boolean isMet(Tolerance tolerance, Answer answer) {
        return judged == Judged.PROMISE || tolerance.met(answer.estimate(), reach(answer));
    }
}
