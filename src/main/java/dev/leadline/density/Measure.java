package dev.leadline.density;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;

/// What the correlation of two inputs is measured by.
///
/// Spearman's of the Gaussian copula is `6/π asin(ρ/2)`, Kendall's of both `2/π asin(ρ)`, with ρ the correlation of the
/// normals behind: Kruskal (1958), Journal of the American Statistical Association 53, 814-861.
public enum Measure {
    /// Correlation of ranks.
    SPEARMAN,
    /// Chance that two draws are in the same order in both inputs, less the chance that they are not.
    KENDALL,
    /// Correlation of values: covariance over the product of standard deviations.
    PEARSON;

    private static final Density RANKS = new Uniform(0, 1);
    private static final int KEPT = 10_000;

    /// What was solved last: a project is checked again at every edit.
    private static final Map<Sought, Double> SOLVED = new ConcurrentHashMap<>();

    private record Sought(Measure measure, Mixing mixing, Density one, Density other, double target) {}

    /// Word of the project file.
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    public static Optional<Measure> of(String word) {
        for (Measure measure : values()) {
            if (measure.word().equals(word)) {
                return Optional.of(measure);
            }
        }
        return Optional.empty();
    }

    /// The correlation of the normals behind two inputs, for which this measure has the value `target`; `NaN` where it
    /// cannot have it.
    public double latent(Mixing mixing, Density one, Density other, double target) {
        if (this == KENDALL) {
            return StrictMath.sin(Math.PI / 2 * target);
        }
        if (this == SPEARMAN && mixing.equals(Mixing.NONE)) {
            return 2 * StrictMath.sin(Math.PI / 6 * target);
        }
        if (this == PEARSON && (one instanceof Empirical || other instanceof Empirical)) {
            // Columns of data are too large to keep.
            return TiedPair.of(mixing, one, other).latent(target);
        }
        if (SOLVED.size() > KEPT) {
            SOLVED.clear();
        }
        // The densities of ranks are all the same.
        var sought = this == SPEARMAN
                ? new Sought(this, mixing, RANKS, RANKS, target)
                : new Sought(this, mixing, one, other, target);
        return SOLVED.computeIfAbsent(
                sought, s -> TiedPair.of(s.mixing, s.one, s.other).latent(s.target));
    }

    /// The value of this measure, given the correlation of the normals behind two inputs.
    public double value(Mixing mixing, Density one, Density other, double latent) {
        double alpha = StrictMath.asin(latent);
        if (this == KENDALL) {
            return 2 / Math.PI * alpha;
        }
        if (this == SPEARMAN && mixing.equals(Mixing.NONE)) {
            return 6 / Math.PI * StrictMath.asin(latent / 2);
        }
        var pair = this == SPEARMAN ? TiedPair.of(mixing, RANKS, RANKS) : TiedPair.of(mixing, one, other);
        return pair.correlation(alpha);
    }
}
