package dev.leadline.scheme;

import java.util.OptionalInt;

/// Repetitions of [splitting][Splitting], each an observation: the probability of an event is the product of shares
/// that its particles leave on their way to it.
///
/// @param most repetitions; empty for as many as the draws allow
public record Repetitions(Splitting splitting, OptionalInt most) implements Points {
    public static final String WORD = "splitting";

    /// Components of an observation: replacements; particles that were tied; points that failed at the start, as a
    /// share
    /// of those drawn; the number of the [end][SplittingOutcome.End].
    public static final int COMPONENTS = 4;

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String inWords() {
        return "%s with %d particles".formatted(word(), splitting.particles());
    }
}
