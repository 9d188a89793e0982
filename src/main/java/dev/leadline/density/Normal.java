package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

/// The normal density.
///
/// Error: relative 1e-13 in both tails (`DensityTablesTest`).
public record Normal(double mean, double sd) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Normal(v[0], v[1]),
            finite("mean", "middle value"),
            positive("sd", "standard deviation", "The normal density divides by its standard deviation.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_CV = Entry.of(
                    v -> new Normal(v[0], Math.abs(v[0]) * v[1]), Rule.meanOfCv("middle value"), Rule.cv())
            .and(v -> ENTRY.tooExtreme(Rule.meanWithCv(v[0], v[1]), v[0], Math.abs(v[0]) * v[1]));

    static final Family FAMILY = new Described(
                    "normal",
                    "sums of many small effects; measurement errors; a value with its uncertainty",
                    ENTRY,
                    BY_CV)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Normal(v[0], v[1])));

    public Normal {
        ENTRY.check(mean, sd);
    }

    @Override
    public double location() {
        return mean;
    }

    @Override
    public double scale() {
        return sd;
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The normal density of mean 0 and standard deviation 1.
    record Standard() implements Shape {
        private static final double HALF_LOG_2PI = 0.9189385332046728;

        @Override
        public double pdf(double z) {
            return dev.leadline.numeric.Normal.pdf(z);
        }

        @Override
        public double logPdf(double z) {
            return -0.5 * z * z - HALF_LOG_2PI;
        }

        @Override
        public double cdf(double z) {
            return dev.leadline.numeric.Normal.cdf(z);
        }

        @Override
        public double survival(double z) {
            return dev.leadline.numeric.Normal.cdf(-z);
        }

        @Override
        public double inner(double p) {
            return dev.leadline.numeric.Normal.quantile(p);
        }

        @Override
        public double upperInner(double q) {
            return -dev.leadline.numeric.Normal.quantile(q);
        }

        @Override
        public double mean() {
            return 0;
        }

        @Override
        public double variance() {
            return 1;
        }

        @Override
        public double skewness() {
            return 0;
        }

        @Override
        public double excessKurtosis() {
            return 0;
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
