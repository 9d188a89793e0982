package dev.leadline.scheme;

import java.util.SortedSet;

/// The wish to draw from a density that is found before the run.
///
/// @param inputs indices of those that may be drawn from others than their own
/// @param nominal share of the draws that come from the inputs' own densities all the same
public record Adaptation(Way way, SortedSet<Integer> inputs, Share nominal) implements Adapted {
    /// A part of a mixture is a twentieth at least.
    private static final int FINEST = 20;

    /// How it is found.
    public enum Way {
        /// Normal densities, of normal scores of the inputs, that follow the draws which matter (Rubinstein and Kroese
        /// 2004, The cross-entropy method).
        CROSS_ENTROPY("cross-entropy"),
        /// Steps in each input for itself, finer where the outcomes are large (Lepage 1978, Journal of Computational
        /// Physics 27, 192-203).
        GRID("grid");

        private final String word;

        Way(String word) {
            this.word = word;
        }

        /// Word of the project file.
        public String word() {
            return word;
        }
    }

    /// Observations of which so many have exactly their shares: enough for small parts of a mixture.
    public int units() {
        return switch (way) {
            case GRID -> nominal.of();
            case CROSS_ENTROPY -> nominal.of() * Math.ceilDiv(FINEST, nominal.of());
        };
    }

    @Override
    public String inWords() {
        return "adapted by " + way.word();
    }
}
