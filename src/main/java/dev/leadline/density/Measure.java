package dev.leadline.density;

import java.util.Locale;
import java.util.Optional;

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

    /// The correlation of the normals behind two inputs, for which this measure has the value `target`.
    public double latent(double target) {
        return switch (this) {
            case SPEARMAN -> 2 * StrictMath.sin(Math.PI / 6 * target);
            case KENDALL -> StrictMath.sin(Math.PI / 2 * target);
            case PEARSON -> throw new UnsupportedOperationException();
        };
    }
}
