package dev.leadline.trace;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import java.util.OptionalLong;

/// One estimate with everything it must travel with.
///
/// @param estimate `NaN` where there is none yet
/// @param standardError `NaN` where none can be said (no spread or no hit seen yet)
/// @param hits of an event, for probabilities where independent draws count 1 each
/// @param observations that entered the estimate
/// @param nonFinite evaluations left out because they were not finite
public record Answer(
        Estimand estimand,
        String unit,
        String label,
        double estimate,
        double standardError,
        Interval interval,
        OptionalLong hits,
        long observations,
        long nonFinite) {}
