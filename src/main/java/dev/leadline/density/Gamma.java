package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.problem.Problem;
import java.util.List;

/// The gamma density; its mean is `shape * scale`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Gamma(double shape, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Gamma(v[0], v[1]),
            between(
                    1e-3,
                    1e6,
                    "shape",
                    "number of events waited for, or how far from exponential",
                    "Beyond these limits its values are too far apart or too close for numbers of 16 digits."),
            positive("scale", "mean divided by shape", "The gamma density divides by its scale."));

    private static final Entry BY_MEAN = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1]),
                    positive("mean", "mean value", "A gamma value is positive."),
                    positive("sd", "standard deviation", "The gamma density divides by it.")
                            .tryThis("For a fixed value use a constant."))
            .and(v -> problems(v[0], v[1]));

    private static final Entry BY_CV = Entry.of(
                    v -> ofMeanAndSd(v[0], v[0] * v[1]),
                    positive("mean", "mean value", "A gamma value is positive."),
                    Rule.cv())
            .and(v -> problems(v[0], v[0] * v[1]));

    static final Family FAMILY = new Described(
                    "gamma",
                    "times until several events, rain, amounts of loss; a rate seen in counts",
                    ENTRY,
                    BY_MEAN,
                    BY_CV)
            .enteredBy(ByQuantiles.ofPositiveShapeAndScale(1e-3, 1e6, v -> new Gamma(v[0], v[1])));

    public Gamma {
        ENTRY.check(shape, scale);
    }

    /// The member of this mean and standard deviation.
    public static Gamma ofMeanAndSd(double mean, double sd) {
        BY_MEAN.check(mean, sd);
        double ratio = mean / sd;
        return new Gamma(ratio * ratio, sd / ratio);
    }

    private static List<Problem> problems(double mean, double sd) {
        double ratio = mean / sd;
        return ENTRY.tooExtreme(Rule.meanWithSd(mean, sd), ratio * ratio, sd / ratio);
    }

    @Override
    public Density standard() {
        return new Standard(IncompleteGamma.of(shape));
    }

    /// The gamma density of scale 1.
    record Standard(IncompleteGamma tails) implements Shape, Linked {
        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            double a = tails.a();
            if (z > 0 && z < Double.POSITIVE_INFINITY) {
                double ratio = a / z;
                return tails.logPrefix(z)
                        + (ratio < Double.POSITIVE_INFINITY ? Log.log(ratio) : Log.log(a) - Log.log(z));
            }
            return Double.isNaN(z)
                    ? z
                    : z == 0 && a == 1 ? 0 : z == 0 && a < 1 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
        }

        @Override
        public double cdf(double z) {
            return tails.lower(z);
        }

        @Override
        public double survival(double z) {
            return tails.upper(z);
        }

        @Override
        public double inner(double p) {
            return p <= 0.5 ? tails.inverse(p) : tails.upperInverse(1 - p);
        }

        @Override
        public double upperInner(double q) {
            return q <= 0.5 ? tails.upperInverse(q) : tails.inverse(1 - q);
        }

        @Override
        public Link link() {
            return Link.ROOT;
        }

        @Override
        public double linked(double p) {
            return p <= 0.5 ? tails.logInverse(p) : tails.logUpperInverse(1 - p);
        }

        @Override
        public double upperLinked(double q) {
            return q <= 0.5 ? tails.logUpperInverse(q) : tails.logInverse(1 - q);
        }

        @Override
        public double mean() {
            return tails.a();
        }

        @Override
        public double variance() {
            return tails.a();
        }

        @Override
        public double skewness() {
            return 2 / Math.sqrt(tails.a());
        }

        @Override
        public double excessKurtosis() {
            return 6 / tails.a();
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
