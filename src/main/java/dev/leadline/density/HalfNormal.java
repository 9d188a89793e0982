package dev.leadline.density;

import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.ErrorFunction;

/// The half-normal density: the size of a normal value of mean 0 and standard deviation `sigma`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 13. From memory.
public record HalfNormal(double sigma) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new HalfNormal(v[0]),
            positive("sigma", "standard deviation of the value with its sign", "The half-normal density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_MEAN =
            Entry.of(v -> ofMean(v[0]), positive("mean", "mean size", "A half-normal value is positive."));

    static final Family FAMILY = new Described(
            "half-normal", "size of a deviation without its sign: eccentricity, flatness, run-out", ENTRY, BY_MEAN);

    public HalfNormal {
        ENTRY.check(sigma);
    }

    /// The member of this mean.
    public static HalfNormal ofMean(double mean) {
        BY_MEAN.check(mean);
        return new HalfNormal(mean / Standard.MEAN);
    }

    @Override
    public double scale() {
        return sigma;
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The half-normal density of sigma 1.
    record Standard() implements Shape {
        private static final double LOG_2 = 0.6931471805599453;
        private static final double SQRT_2 = 1.4142135623730951;

        /// `sqrt(2 / pi)`.
        private static final double MEAN = 0.7978845608028654;

        /// `1 - 2 / pi`.
        private static final double VARIANCE = 0.3633802276324186;

        /// `sqrt(2) (4 - pi) / (pi - 2)^(3/2)`.
        private static final double SKEWNESS = 0.9952717464311566;

        /// `8 (pi - 3) / (pi - 2)^2`.
        private static final double EXCESS_KURTOSIS = 0.8691773036059736;

        private static final Normal.Standard NORMAL = new Normal.Standard();

        @Override
        public double pdf(double z) {
            return z < 0 ? 0 : 2 * NORMAL.pdf(z);
        }

        @Override
        public double logPdf(double z) {
            return z < 0 ? Double.NEGATIVE_INFINITY : NORMAL.logPdf(z) + LOG_2;
        }

        @Override
        public double cdf(double z) {
            return z < 0 ? 0 : ErrorFunction.erf(z / SQRT_2);
        }

        @Override
        public double survival(double z) {
            return z < 0 ? 1 : 2 * NORMAL.survival(z);
        }

        /// Below the median by Newton's method, from the series of the inverse; the distribution is concave there, so
        /// that every step approaches from the left.
        @Override
        public double inner(double p) {
            if (p > 0.5) {
                return upperInner(1 - p);
            }
            double start = p / MEAN;
            double z = start * (1 + start * start / 6);
            for (int trial = 0; trial < 4; trial++) {
                z += (p - cdf(z)) / pdf(z);
            }
            return z;
        }

        @Override
        public double upperInner(double q) {
            return q > 0.5 ? inner(1 - q) : NORMAL.upperQuantile(0.5 * q);
        }

        @Override
        public double mean() {
            return MEAN;
        }

        @Override
        public double variance() {
            return VARIANCE;
        }

        @Override
        public double skewness() {
            return SKEWNESS;
        }

        @Override
        public double excessKurtosis() {
            return EXCESS_KURTOSIS;
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
