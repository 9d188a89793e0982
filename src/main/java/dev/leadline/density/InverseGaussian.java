package dev.leadline.density;

import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.ErrorFunction;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The inverse Gaussian density: the time a drifting random walk takes to a level; its variance is `mean^3 / shape`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Tweedie (1957), Annals of Mathematical Statistics 28, 362-377; Wald's distribution where the mean is 1.
public record InverseGaussian(double mean, double shape) implements Scaled {
    private static final double LEAST_RATIO = 1e-6;
    private static final double MOST_RATIO = 1e8;

    private static final Entry ENTRY = Entry.of(
                    v -> new InverseGaussian(v[0], v[1]),
                    positive("mean", "mean", "An inverse Gaussian value is positive."),
                    positive(
                            "shape",
                            "cube of the mean over the variance; the larger, the nearer to normal",
                            "The spread is divided by it."))
            .and(v -> problems("shape", v[1], v[1] / v[0], "at least 1e-6 and at most 1e8", v[0]));

    private static final Entry BY_MEAN = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1]),
                    positive("mean", "mean", "An inverse Gaussian value is positive."),
                    positive("sd", "standard deviation", "The inverse Gaussian density divides by it.")
                            .tryThis("For a fixed value use a constant."))
            .and(v -> problems("sd", v[1], (v[0] / v[1]) * (v[0] / v[1]), "at least 1e-4 and at most 1000", v[0]));

    static final Family FAMILY = new Described(
            "inverse-gaussian",
            "times until a drift reaches a level: wear, failure, passage of a tracer",
            ENTRY,
            BY_MEAN);

    public InverseGaussian {
        ENTRY.check(mean, shape);
    }

    /// The member of this mean and standard deviation.
    public static InverseGaussian ofMeanAndSd(double mean, double sd) {
        BY_MEAN.check(mean, sd);
        return new InverseGaussian(mean, mean * ((mean / sd) * (mean / sd)));
    }

    /// @param ratio of shape and mean
    /// @param times the limits of the value, in units of the mean
    private static List<Problem> problems(String name, double value, double ratio, String times, double mean) {
        return ratio >= LEAST_RATIO && ratio <= MOST_RATIO
                ? List.of()
                : List.of(Rule.problem(
                        name,
                        value,
                        times + " times the mean, " + Shortest.text(mean),
                        "Beyond, its values are too close or too far apart for numbers of 16 digits.",
                        "Check the units of both."));
    }

    @Override
    public double scale() {
        return mean;
    }

    @Override
    public Density standard() {
        return new Standard(shape / mean);
    }

    /// The inverse Gaussian density of mean 1.
    ///
    /// With `s = sqrt(shape / (2 z)) (z - 1)` and `h = sqrt(2 shape / z)` the masses are `exp(-s^2) / 2` times
    /// `erfcx(-s) + erfcx(s + h)` and `erfcx(s) - erfcx(s + h)`. Where that difference cancels, it is
    /// the integral of `2 / sqrt(pi) exp(-t^2 - 2 s t) (1 - exp(-2 h t))`.
    record Standard(double shape) implements Shape {
        private static final double HALF_LOG_2PI = 0.9189385332046728;
        private static final double TWO_PER_ROOT_PI = 1.1283791670955126;
        private static final Normal.Standard NORMAL = new Normal.Standard();

        /// The exponent of the density, `s^2`.
        private double square(double z) {
            return 0.5 * shape * (z - 1) * ((z - 1) / z);
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? Double.NEGATIVE_INFINITY
                    : 0.5 * Log.log(shape) - HALF_LOG_2PI - 1.5 * Log.log(z) - square(z);
        }

        private double s(double z) {
            return Math.sqrt(0.5 * shape / z) * (z - 1);
        }

        private double h(double z) {
            return Math.sqrt(2 * shape / z);
        }

        @Override
        public double cdf(double z) {
            if (z <= 0 || z == Double.POSITIVE_INFINITY) {
                return z <= 0 ? 0 : 1;
            }
            double s = s(z);
            double fall = 0.5 * Exp.exp(-square(z));
            if (fall == 0) {
                return z < 1 ? 0 : 1;
            }
            double other = fall * ErrorFunction.erfcx(s + h(z));
            return s < 0 ? fall * ErrorFunction.erfcx(-s) + other : 0.5 * ErrorFunction.erfc(-s) + other;
        }

        @Override
        public double survival(double z) {
            if (z <= 0 || z == Double.POSITIVE_INFINITY) {
                return z <= 0 ? 1 : 0;
            }
            double cdf = z < 1 ? cdf(z) : 1;
            if (cdf < 0.9) {
                return 1 - cdf;
            }
            double s = s(z);
            double h = h(z);
            double near = ErrorFunction.erfcx(s);
            double far = ErrorFunction.erfcx(s + h);
            return 0.5 * Exp.exp(-square(z)) * (far < 0.5 * near ? near - far : difference(s, h));
        }

        private static double difference(double s, double h) {
            double end = Quadrature.END / (s + Math.sqrt(s * s + Quadrature.END));
            return TWO_PER_ROOT_PI
                    * Quadrature.of(t -> Exp.exp(-t * (t + 2 * s)) * -StrictMath.expm1(-2 * h * t), 0, end, 3);
        }

        @Override
        public double inner(double p) {
            double w = logarithm(NORMAL.quantile(p)).rising(w1 -> cdf(Exp.exp(w1)), this::slope, p);
            double z = Exp.exp(w);
            return z - (cdf(z) - p) / pdf(z);
        }

        @Override
        public double upperInner(double q) {
            double w = logarithm(NORMAL.upperQuantile(q)).falling(w1 -> survival(Exp.exp(w1)), w1 -> -slope(w1), q);
            double z = Exp.exp(w);
            return z + (survival(z) - q) / pdf(z);
        }

        private Root logarithm(double normal) {
            return Root.between(least(), 8 - least()).from(like(normal)).roughly();
        }

        /// Below `exp` of this there is less mass than any double.
        private double least() {
            return Math.min(Log.log(shape), 0) - 8;
        }

        /// Of the mass below `exp(w)`.
        private double slope(double w) {
            double z = Exp.exp(w);
            return pdf(z) * z;
        }

        /// The logarithm of the z with `sqrt(2) s = normal`.
        private double like(double normal) {
            double root = Math.sqrt(normal * normal + 4 * shape);
            double twice = Math.sqrt(4 * shape);
            return 2 * Log.log(normal < 0 ? twice / (root - normal) : (root + normal) / twice);
        }

        @Override
        public double mean() {
            return 1;
        }

        @Override
        public double variance() {
            return 1 / shape;
        }

        @Override
        public double skewness() {
            return 3 / Math.sqrt(shape);
        }

        @Override
        public double excessKurtosis() {
            return 15 / shape;
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
