package dev.leadline.density;

/// What the tied normals of a draw are all multiplied by: the kind of a copula. Immutable, safe for all threads.
public sealed interface Mixing {
    /// Word of the project file.
    String word();

    /// By nothing: the Gaussian copula. Extremes of several inputs do not come together.
    record None() implements Mixing {
        @Override
        public String word() {
            return "gaussian";
        }
    }
}
