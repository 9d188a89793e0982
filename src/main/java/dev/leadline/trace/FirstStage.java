package dev.leadline.trace;

import java.util.OptionalDouble;
import java.util.OptionalLong;

/// What the first stage of a run found, frozen before the draws that follow from it.
///
/// @param draws evaluations of the stage
/// @param observations they made
/// @param inAnswer whether they enter the answer
/// @param standardDeviation of an observation
/// @param kurtosis of the observations, 3 for normal ones; `NaN` where none can be said
/// @param largestKurtosis under which the promise holds; empty where the rule does not speak of it
/// @param wanted observations behind the answer that follow; empty where the stage cannot tell
public record FirstStage(
        long draws,
        long observations,
        boolean inAnswer,
        double standardDeviation,
        double kurtosis,
        OptionalDouble largestKurtosis,
        OptionalLong wanted) {}
