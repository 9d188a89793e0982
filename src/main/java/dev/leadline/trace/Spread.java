package dev.leadline.trace;

import dev.leadline.estimate.Histogram;
import dev.leadline.estimate.Landmark;
import dev.leadline.estimate.Outcomes.Jump;
import java.util.Optional;

/// How the outcomes of one thing asked lie. Immutable: nobody changes the histogram in it.
///
/// @param landmark what pilot draws found of them before the run
/// @param histogram of the outcomes, by their weights
/// @param jump of the distribution function at the level of a quantile, where there is one
public record Spread(Landmark landmark, Histogram histogram, Optional<Jump> jump) {
    public Spread(Landmark landmark, Histogram histogram) {
        this(landmark, histogram, Optional.empty());
    }
}
