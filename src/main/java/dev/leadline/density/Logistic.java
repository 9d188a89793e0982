package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The logistic density: `cdf(x) = 1 / (1 + exp(-(x - location) / scale))`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 23. From memory.
public record Logistic(double location, double scale) implements Scaled {
    /// `pi / sqrt(3)`, the standard deviation for scale 1.
    private static final double SD = 1.8137993642342178;

    private static final Entry ENTRY = Entry.of(
            v -> new Logistic(v[0], v[1]),
            finite("location", "middle value; the mean"),
            positive(
                            "scale",
                            "spread; the standard deviation is 1.8138 times it",
                            "The logistic density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_MEAN = Entry.of(
            v -> new Logistic(v[0], v[1] / SD),
            finite("mean", "middle value"),
            positive("sd", "standard deviation", "The logistic density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    static final Family FAMILY = new Described(
                    "logistic", "doses, growth, thresholds; like the normal, with heavier tails", ENTRY, BY_MEAN)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Logistic(v[0], v[1])));

    public Logistic {
        ENTRY.check(location, scale);
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The logistic density of location 0 and scale 1.
    record Standard() implements Shape {
        /// `pi^2 / 3`.
        private static final double VARIANCE = 3.289868133696453;

        @Override
        public double pdf(double z) {
            double e = Exp.exp(-Math.abs(z));
            return e / ((1 + e) * (1 + e));
        }

        @Override
        public double logPdf(double z) {
            return -Math.abs(z) - 2 * StrictMath.log1p(Exp.exp(-Math.abs(z)));
        }

        @Override
        public double cdf(double z) {
            double e = Exp.exp(-Math.abs(z));
            return (z < 0 ? e : 1) / (1 + e);
        }

        @Override
        public double survival(double z) {
            return cdf(-z);
        }

        /// The logarithm of `p / (1 - p)`; near the middle from the distance to it.
        @Override
        public double inner(double p) {
            return p > 0.25 && p < 0.75 ? StrictMath.log1p((2 * p - 1) / (1 - p)) : Log.log(p / (1 - p));
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
            return VARIANCE;
        }

        @Override
        public double skewness() {
            return 0;
        }

        @Override
        public double excessKurtosis() {
            return 1.2;
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
