package dev.leadline.formula;

import java.util.Map;
import java.util.SequencedMap;

/// The names that a formula may use, and what each stands for.
///
/// @param meanings by name, in the order in which they were declared
public record Names(SequencedMap<String, Meaning> meanings) {

    /// What a name stands for.
    public sealed interface Meaning {
        /// A column of draws.
        record Input() implements Meaning {}

        /// A fixed number.
        record Constant(double value) implements Meaning {}

        /// An intermediate formula.
        record Step() implements Meaning {}
    }

    public Names {
        meanings = java.util.Collections.unmodifiableSequencedMap(new java.util.LinkedHashMap<>(meanings));
    }

    public static Names of(Map<String, Meaning> meanings) {
        return new Names(new java.util.LinkedHashMap<>(meanings));
    }
}
