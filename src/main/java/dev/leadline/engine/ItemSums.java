package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Catch;
import dev.leadline.estimate.Extremes;
import dev.leadline.trace.Failure;
import java.util.List;
import java.util.Optional;

/// What an item of work came to.
///
/// @param extremes of the draws one by one; none of splitting, nor where all that is asked is 0 or 1
/// @param outcomes of each thing asked; none of splitting
/// @param failures the first [#KEPT] draws whose evaluation was not finite
public record ItemSums(
        Item item, Accumulator sums, Optional<Extremes> extremes, List<Catch> outcomes, List<Failure> failures) {
    /// Failures kept in all; the others are counted.
    public static final int KEPT = 20;
}
