package dev.leadline.density;

import static dev.leadline.density.Rule.positive;

/// The Rayleigh density: the distance from the origin of a point whose two coordinates are normal with mean 0 and
/// standard deviation `sigma`. It is the Weibull density of shape 2 and scale `sigma sqrt(2)`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 18. From memory.
public record Rayleigh(double sigma) implements Renamed {
    private static final double SQRT_2 = 1.4142135623730951;

    /// `sqrt(pi / 2)`, the mean for sigma 1.
    private static final double MEAN = 1.2533141373155003;

    private static final Entry ENTRY = Entry.of(
            v -> new Rayleigh(v[0]),
            positive(
                    "sigma",
                    "standard deviation of each of the two coordinates; the most likely value",
                    "The Rayleigh density divides by it."));

    private static final Entry BY_MEAN =
            Entry.of(v -> ofMean(v[0]), positive("mean", "mean value", "A Rayleigh value is positive."));

    static final Family FAMILY = new Described(
            "rayleigh", "wave heights, wind speeds, distance from the target, amplitude of noise", ENTRY, BY_MEAN);

    public Rayleigh {
        ENTRY.check(sigma);
    }

    /// The member of this mean.
    public static Rayleigh ofMean(double mean) {
        BY_MEAN.check(mean);
        return new Rayleigh(mean / MEAN);
    }

    @Override
    public Weibull member() {
        return new Weibull(2, sigma * SQRT_2, 0);
    }
}
