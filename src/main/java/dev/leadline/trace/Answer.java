package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Coverage;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.interval.Interval;
import dev.leadline.model.Ask;
import java.util.Optional;
import java.util.OptionalLong;

/// One estimate with everything it must travel with.
///
/// @param estimate `NaN` where there is none yet; of a distribution its mean
/// @param standardError `NaN` where none can be said (no spread or no hit seen yet, or the interval comes without)
/// @param band the any-time band here: it holds at every mark at once, however often one looks
/// @param hits of an event, for probabilities where independent draws count 1 each
/// @param observations that entered the estimate
/// @param nonFinite evaluations left out because they were not finite
/// @param coverage of a distribution, what it is besides its mean
/// @param provisional whether the value, or a limit, is known to lie between two outcomes only: more would have to be
/// kept
///     than may be, and a second pass over the same draws finds it at the end
public record Answer(
        Estimand estimand,
        String unit,
        String label,
        double estimate,
        double standardError,
        Interval interval,
        Optional<Interval> band,
        OptionalLong hits,
        long observations,
        long nonFinite,
        Optional<Coverage> coverage,
        boolean provisional) {
    static Answer of(Ask ask, Estimate estimate, Interval interval, Accumulator sums) {
        return new Answer(
                ask.estimand(),
                ask.unit(),
                ask.label(),
                estimate.value(),
                estimate.standardError() == 0 ? Double.NaN : estimate.error(),
                interval,
                Optional.empty(),
                OptionalLong.empty(),
                sums.count(),
                sums.excluded(),
                Optional.empty(),
                false);
    }

    Answer with(OptionalLong seen) {
        return new Answer(
                estimand,
                unit,
                label,
                estimate,
                standardError,
                interval,
                band,
                seen,
                observations,
                nonFinite,
                coverage,
                provisional);
    }

    Answer with(Coverage found) {
        return new Answer(
                estimand,
                unit,
                label,
                estimate,
                standardError,
                interval,
                band,
                hits,
                observations,
                nonFinite,
                Optional.of(found),
                provisional);
    }

    /// With the any-time band at its mark.
    public Answer within(Interval anyTime) {
        return new Answer(
                estimand,
                unit,
                label,
                estimate,
                standardError,
                interval,
                Optional.of(anyTime),
                hits,
                observations,
                nonFinite,
                coverage,
                provisional);
    }

    /// What a stop rule of its own makes of it.
    public Answer ended(double value, double error, Interval own) {
        return new Answer(
                estimand, unit, label, value, error, own, band, hits, observations, nonFinite, coverage, provisional);
    }

    Answer untilKnown() {
        return new Answer(
                estimand,
                unit,
                label,
                estimate,
                standardError,
                interval,
                band,
                hits,
                observations,
                nonFinite,
                coverage,
                true);
    }
}
