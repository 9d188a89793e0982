package dev.leadline.ground;

/// What repetitions of a set-up with other seeds came to.
///
/// @param repetitions of the whole run
/// @param draws of each
/// @param held how many of their intervals held the value
/// @param level of the intervals
public record Rehearsed(long repetitions, long draws, long held, double level) {
    double rate() {
        return (double) held / repetitions;
    }

    /// Standard error of the rate, where intervals hold as they say.
    double error() {
        return Math.sqrt(level * (1 - level) / repetitions);
    }
}
