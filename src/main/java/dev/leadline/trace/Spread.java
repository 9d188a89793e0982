package dev.leadline.trace;

import dev.leadline.estimate.Histogram;
import dev.leadline.estimate.Landmark;

/// How the outcomes of one thing asked lie. Immutable: nobody changes the histogram in it.
///
/// @param landmark what pilot draws found of them before the run
/// @param histogram of the outcomes, by their weights
public record Spread(Landmark landmark, Histogram histogram) {}
