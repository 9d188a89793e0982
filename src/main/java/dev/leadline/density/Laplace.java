package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The Laplace density: exponential to both sides, `exp(-|x - location| / scale) / (2 scale)`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 24. From memory.
public record Laplace(double location, double scale) implements Scaled {
    private static final double SQRT_2 = 1.4142135623730951;

    private static final Entry ENTRY = Entry.of(
            v -> new Laplace(v[0], v[1]),
            finite("location", "middle value; the mean"),
            positive("scale", "mean distance from the middle value", "The Laplace density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_MEAN = Entry.of(
            v -> new Laplace(v[0], v[1] / SQRT_2),
            finite("mean", "middle value"),
            positive("sd", "standard deviation", "The Laplace density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    static final Family FAMILY = new Described(
                    "laplace",
                    "errors that are mostly small and sometimes large; the difference of two waiting times",
                    ENTRY,
                    BY_MEAN)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Laplace(v[0], v[1])));

    public Laplace {
        ENTRY.check(location, scale);
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The Laplace density of location 0 and scale 1.
    record Standard() implements Shape {
        private static final double LOG_2 = 0.6931471805599453;

        @Override
        public double pdf(double z) {
            return 0.5 * Exp.exp(-Math.abs(z));
        }

        @Override
        public double logPdf(double z) {
            return -Math.abs(z) - LOG_2;
        }

        @Override
        public double cdf(double z) {
            double tail = 0.5 * Exp.exp(-Math.abs(z));
            return z > 0 ? 1 - tail : tail;
        }

        @Override
        public double survival(double z) {
            return cdf(-z);
        }

        @Override
        public double inner(double p) {
            return p <= 0.5 ? Log.log(2 * p) : -Log.log(2 * (1 - p));
        }

        @Override
        public double upperInner(double q) {
            return -inner(q);
        }

        @Override
        public double mean() {
            return 0;
        }

        @Override
        public double variance() {
            return 2;
        }

        @Override
        public double skewness() {
            return 0;
        }

        @Override
        public double excessKurtosis() {
            return 3;
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
