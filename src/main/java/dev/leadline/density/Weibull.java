package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The Weibull density for lifetimes: `survival(x) = exp(-((x - from) / scale)^shape)` from `from` on.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Weibull(double shape, double scale, double from) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Weibull(v[0], v[1], v[2]),
            between(0.01, 1e6, "shape", "below 1 early failures, above 1 wear", Standard.LIMITS),
            positive(
                    "scale",
                    "63.2 % of the values are below from + scale",
                    "The Weibull density divides by its scale."),
            finite("from", "least value").or(0));

    private static final Entry BY_MEAN = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1], v[2]),
                    finite("mean", "mean value"),
                    positive("sd", "standard deviation", "The Weibull density divides by it.")
                            .tryThis("For a fixed value use a constant."),
                    finite("from", "least value").or(0))
            .and(v -> problems(v[0], v[1], v[2]));

    private static final Entry BY_CV = Entry.of(
                    v -> ofMeanAndSd(v[0], Math.abs(v[0]) * v[1], v[2]),
                    Rule.meanOfCv("mean value"),
                    Rule.cv(),
                    finite("from", "least value").or(0))
            .and(v -> problems(v[0], Math.abs(v[0]) * v[1], v[2]));

    static final Family FAMILY = new Described("weibull", "lifetimes, strengths, wind speeds", ENTRY, BY_MEAN, BY_CV)
            .enteredBy(ByQuantiles.ofShapeAndScale(0.01, 1e6, v -> new Weibull(v[0], v[1], v[2])));

    public Weibull {
        ENTRY.check(shape, scale, from);
    }

    /// The member of this mean and standard deviation.
    public static Weibull ofMeanAndSd(double mean, double sd, double from) {
        BY_MEAN.check(mean, sd, from);
        double shape = shape(sd / (mean - from));
        return new Weibull(shape, scale(shape, mean - from), from);
    }

    private static List<Problem> problems(double mean, double sd, double from) {
        if (!(mean > from)) {
            String words = "greater than from, " + Shortest.text(from);
            return List.of(Rule.problem("mean", mean, words, "The mean lies above the least value.", ""));
        }
        double shape = shape(sd / (mean - from));
        return ENTRY.tooExtreme(Rule.meanWithSd(mean, sd), shape, scale(shape, mean - from), from);
    }

    private static double scale(double shape, double mean) {
        return mean / new ExponentialPower(1 / shape).mean();
    }

    /// The shape with this standard deviation over the mean, which falls as the shape rises: by halving the interval of
    /// the logarithm.
    private static double shape(double cv) {
        double low = -6;
        double high = 16;
        for (double middle = 0; middle != low && middle != high; middle = 0.5 * (low + high)) {
            if (Math.sqrt(new ExponentialPower(Exp.exp(-middle)).relativeVariance()) > cv) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return Exp.exp(0.5 * (low + high));
    }

    @Override
    public double location() {
        return from;
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// The Weibull density of scale 1 from 0 on.
    record Standard(double shape) implements Shape, Linked {
        private static final String LIMITS =
                "Beyond these limits its values are too far apart or too close for numbers of 16 digits.";

        /// `z^shape`.
        private double power(double z) {
            return StrictMath.pow(z, shape);
        }

        @Override
        public double pdf(double z) {
            if (z == 0) {
                return shape < 1 ? Double.POSITIVE_INFINITY : shape == 1 ? 1 : 0;
            }
            double power = power(z);
            return z < 0 || power > 1e4 ? 0 : shape * (power / z) * Exp.exp(-power);
        }

        @Override
        public double logPdf(double z) {
            double power = power(z);
            return z <= 0 || power == Double.POSITIVE_INFINITY
                    ? Log.log(pdf(z))
                    : Log.log(shape) + (shape - 1) * Log.log(z) - power;
        }

        @Override
        public double cdf(double z) {
            return z < 0 ? 0 : -StrictMath.expm1(-power(z));
        }

        @Override
        public double survival(double z) {
            return z < 0 ? 1 : Exp.exp(-power(z));
        }

        @Override
        public double inner(double p) {
            return StrictMath.pow(-StrictMath.log1p(-p), 1 / shape);
        }

        @Override
        public double upperInner(double q) {
            return StrictMath.pow(-Log.log(q), 1 / shape);
        }

        @Override
        public Link link() {
            return Link.ROOT;
        }

        @Override
        public double linked(double p) {
            return Log.log(-StrictMath.log1p(-p)) / shape;
        }

        @Override
        public double upperLinked(double q) {
            return Log.log(-Log.log(q)) / shape;
        }

        /// A power of an exponential value.
        private ExponentialPower power() {
            return new ExponentialPower(1 / shape);
        }

        @Override
        public double mean() {
            return power().mean();
        }

        @Override
        public double variance() {
            return power().variance();
        }

        @Override
        public double skewness() {
            return power().skewness();
        }

        @Override
        public double excessKurtosis() {
            return power().excessKurtosis();
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
