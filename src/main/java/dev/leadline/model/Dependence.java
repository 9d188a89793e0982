package dev.leadline.model;

import dev.leadline.density.Copula;
import dev.leadline.density.Measure;
import java.util.List;

/// How inputs are tied to each other.
///
/// @param copula its inputs are `inputs`
/// @param inputs indices of those tied, in the order of the question
/// @param ties every pair that a correlation was stated for, in the order stated
/// @param repairs what the nearest possible correlations changed, largest change first; empty where those stated are
///     possible
public record Dependence(Copula copula, List<Integer> inputs, List<Tie> ties, List<Repair> repairs) {
    public Dependence {
        inputs = List.copyOf(inputs);
        ties = List.copyOf(ties);
        repairs = List.copyOf(repairs);
    }

    /// The correlation of two inputs.
    ///
    /// @param one index of an input of the question
    /// @param other index of another
    /// @param target its value as stated
    /// @param latent correlation of the normals behind the two that is drawn with
    public record Tie(int one, int other, Measure measure, double target, double latent) {}

    /// A correlation that was changed.
    ///
    /// @param from as stated; 0 of a pair for which nothing was stated
    public record Repair(int one, int other, Measure measure, double from, double to) {}
}
