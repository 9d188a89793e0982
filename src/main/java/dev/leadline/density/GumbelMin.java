package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

/// The Gumbel density for smallest values, the mirror image of that for largest ones:
/// `survival(x) = exp(-exp((x - location) / scale))`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). In the upper tail the rounding of `x` counts
/// `exp((x - location) / scale)` times, up to 700.
///
/// Source: Gumbel (1958), Statistics of Extremes; the limit of the least of many values with a light lower tail.
public record GumbelMin(double location, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new GumbelMin(v[0], v[1]),
            finite("location", "most likely smallest value"),
            positive(
                            "scale",
                            "spread; the standard deviation is 1.2825 times it",
                            "The Gumbel density divides by its scale.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_MEAN = Entry.of(
            v -> ofMeanAndSd(v[0], v[1]),
            finite("mean", "mean of the smallest values"),
            positive("sd", "standard deviation of the smallest values", "The Gumbel density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    static final Family FAMILY = new Described(
                    "gumbel-min",
                    "smallest value of a period or a part: low water, cold, the weakest link",
                    ENTRY,
                    BY_MEAN)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new GumbelMin(v[0], v[1])));

    public GumbelMin {
        ENTRY.check(location, scale);
    }

    /// The member of this mean and standard deviation.
    public static GumbelMin ofMeanAndSd(double mean, double sd) {
        BY_MEAN.check(mean, sd);
        double scale = sd / Math.sqrt(Standard.LARGEST.variance());
        return new GumbelMin(Math.fma(Standard.LARGEST.mean(), scale, mean), scale);
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The density for smallest values of location 0 and scale 1.
    record Standard() implements Shape {
        private static final Gumbel.Standard LARGEST = new Gumbel.Standard();

        @Override
        public double pdf(double z) {
            return LARGEST.pdf(-z);
        }

        @Override
        public double logPdf(double z) {
            return LARGEST.logPdf(-z);
        }

        @Override
        public double cdf(double z) {
            return LARGEST.survival(-z);
        }

        @Override
        public double survival(double z) {
            return LARGEST.cdf(-z);
        }

        @Override
        public double inner(double p) {
            return -LARGEST.upperInner(p);
        }

        @Override
        public double upperInner(double q) {
            return -LARGEST.inner(q);
        }

        @Override
        public double mean() {
            return -LARGEST.mean();
        }

        @Override
        public double variance() {
            return LARGEST.variance();
        }

        @Override
        public double skewness() {
            return -LARGEST.skewness();
        }

        @Override
        public double excessKurtosis() {
            return LARGEST.excessKurtosis();
        }

        @Override
        public Support support() {
            return LARGEST.support();
        }
    }
}
