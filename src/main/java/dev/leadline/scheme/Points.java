package dev.leadline.scheme;

/// How the points of a lane are laid out in the unit cube. Immutable, safe for all threads.
public sealed interface Points permits LaidOut, Repetitions {
    /// Word of the project file.
    String word();

    /// In words, with what was chosen, as `scrambled-sobol, 16 replicates`.
    default String inWords() {
        return word();
    }

    /// These points as a lane of so many draws has them, where their layout depends on that.
    default Points within(long draws) {
        return this;
    }
}
