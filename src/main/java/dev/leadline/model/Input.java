package dev.leadline.model;

import dev.leadline.density.Density;

/// A named variable of a question, and how its values are drawn.
///
/// @param drawn the density its values are drawn from
/// @param role what a draw of it stands for
public record Input(String name, String unit, String label, String provenance, Density drawn, Role role) {

    public sealed interface Role {
        /// A random variable; `drawn` is its density.
        record Random() implements Role {}

        /// An integration variable over a bounded range, drawn uniformly; a draw counts `high - low`.
        record Range(double low, double high) implements Role {}

        /// An integration variable over an unbounded range; a draw counts `1 / drawn.pdf(x)` within it and
        /// nothing beyond.
        record UnboundedRange(double low, double high) implements Role {}
    }
}
