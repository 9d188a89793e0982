package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.problem.Problem;
import java.util.List;

/// The Gumbel density for largest values: `cdf(x) = exp(-exp(-(x - location) / scale))`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). In the lower tail the rounding of `x` counts
/// `exp(-(x - location) / scale)` times, up to 700.
public record Gumbel(double location, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Gumbel(v[0], v[1]),
            finite("location", "most likely largest value"),
            positive(
                            "scale",
                            "spread; the standard deviation is 1.2825 times it",
                            "The Gumbel density divides by its scale.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_MEAN = Entry.of(
            v -> ofMeanAndSd(v[0], v[1]),
            finite("mean", "mean of the largest values"),
            positive("sd", "standard deviation of the largest values", "The Gumbel density divides by it.")
                    .tryThis("For a fixed value use a constant."));

    private static final Entry BY_CV = Entry.of(
                    v -> ofMeanAndSd(v[0], Math.abs(v[0]) * v[1]),
                    Rule.meanOfCv("mean of the largest values"),
                    Rule.cv())
            .and(v -> problems(v[0], v[1]));

    static final Family FAMILY = new Described(
                    "gumbel", "largest value of a period: gusts, waves, floods, loads", ENTRY, BY_MEAN, BY_CV)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Gumbel(v[0], v[1])));

    public Gumbel {
        ENTRY.check(location, scale);
    }

    /// The member of this mean and standard deviation.
    public static Gumbel ofMeanAndSd(double mean, double sd) {
        BY_MEAN.check(mean, sd);
        double scale = sd / Math.sqrt(Standard.VARIANCE);
        return new Gumbel(Math.fma(-Standard.EULER, scale, mean), scale);
    }

    private static List<Problem> problems(double mean, double cv) {
        double scale = Math.abs(mean) * cv / Math.sqrt(Standard.VARIANCE);
        return ENTRY.tooExtreme(Rule.meanWithCv(mean, cv), Math.fma(-Standard.EULER, scale, mean), scale);
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The Gumbel density of location 0 and scale 1.
    record Standard() implements Shape {
        private static final double EULER = 0.5772156649015329;
        private static final double VARIANCE = 1.6449340668482264;

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            return z == Double.NEGATIVE_INFINITY ? z : -z - Exp.exp(-z);
        }

        @Override
        public double cdf(double z) {
            return Exp.exp(-Exp.exp(-z));
        }

        @Override
        public double survival(double z) {
            return -StrictMath.expm1(-Exp.exp(-z));
        }

        @Override
        public double inner(double p) {
            return -Log.log(-Log.log(p));
        }

        @Override
        public double upperInner(double q) {
            return -Log.log(-StrictMath.log1p(-q));
        }

        /// Euler's constant.
        @Override
        public double mean() {
            return EULER;
        }

        /// `pi^2 / 6`.
        @Override
        public double variance() {
            return VARIANCE;
        }

        /// `12 sqrt(6) zeta(3) / pi^3`.
        @Override
        public double skewness() {
            return 1.1395470994046486;
        }

        @Override
        public double excessKurtosis() {
            return 2.4;
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
