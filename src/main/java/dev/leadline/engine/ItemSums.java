package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.trace.Failure;
import java.util.List;

/// What an item of work came to.
///
/// @param failures the first [#KEPT] draws whose evaluation was not finite
public record ItemSums(Item item, Accumulator sums, List<Failure> failures) {
    /// Failures kept in all; the others are counted.
    public static final int KEPT = 20;
}
