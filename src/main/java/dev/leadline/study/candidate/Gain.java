package dev.leadline.study.candidate;

/// Where the outcome comes from, along one input: the values of its draws, counted by the size of the outcome.
///
/// @param input its name
/// @param discrete whether it has separate values
/// @param away how far their mean is from the input's own
/// @param width root of their mean square distance from the input's own mean
/// @param spread of the input's own density
record Gain(String input, boolean discrete, double away, double width, double spread) {
    /// Whether the outcome comes from one side of most draws.
    boolean isAside() {
        return Math.abs(away) > .5 * spread;
    }

    /// Whether it comes from beyond most draws.
    boolean isBeyond() {
        return width > 1.3 * spread;
    }
}
