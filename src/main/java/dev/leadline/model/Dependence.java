package dev.leadline.model;

import dev.leadline.density.Copula;
import dev.leadline.density.Measure;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

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

    /// Excess kurtosis above which few draws decide a product; a lognormal density of sigma 1.3 has more.
    private static final double WILD = 1000;

    /// Names of those inputs of a tie whose rare, large values decide Pearson's correlation.
    public static List<String> wild(Tie tie, List<Input> inputs) {
        return Stream.of(tie.one(), tie.other())
                .map(inputs::get)
                .filter(input -> !(input.drawn().excessKurtosis() <= WILD))
                .map(Input::name)
                .toList();
    }

    /// The value that is drawn with: the one stated, where no nearest takes its place.
    public double taken(Tie tie) {
        return repairs.stream()
                .filter(repair -> Set.of(repair.one(), repair.other()).equals(Set.of(tie.one(), tie.other())))
                .mapToDouble(Repair::to)
                .findFirst()
                .orElse(tie.target());
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
