package dev.leadline.density;

import static dev.leadline.density.Rule.finite;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The exponential density from `from` on, falling by the factor e over every `mean - from`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Exponential(double mean, double from) implements Scaled {
    private static final Entry ENTRY = Entry.of(
                    v -> new Exponential(v[0], v[1]),
                    finite("mean", "mean time or distance between events; with a least value, the mean all the same"),
                    finite("from", "least value").or(0))
            .and(v -> problems(v[0], v[1]));

    static final Family FAMILY =
            new Described("exponential", "waiting times between events that do not wait for one another", ENTRY);

    public Exponential {
        ENTRY.check(mean, from);
    }

    /// From 0 on.
    public Exponential(double mean) {
        this(mean, 0);
    }

    private static List<Problem> problems(double mean, double from) {
        if (!(mean > from)) {
            String words = from == 0 ? "greater than 0" : "greater than from, " + Shortest.text(from);
            return List.of(Rule.problem("mean", mean, words, "The mean lies above the least value.", ""));
        }
        return Uniform.rising("from", from, "mean", mean);
    }

    @Override
    public double location() {
        return from;
    }

    @Override
    public double scale() {
        return mean - from;
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    /// The exponential density of mean 1.
    record Standard() implements Shape {
        @Override
        public double pdf(double z) {
            return z < 0 ? 0 : Exp.exp(-z);
        }

        @Override
        public double logPdf(double z) {
            return z < 0 ? Double.NEGATIVE_INFINITY : -z;
        }

        @Override
        public double cdf(double z) {
            return z < 0 ? 0 : -StrictMath.expm1(-z);
        }

        @Override
        public double survival(double z) {
            return z < 0 ? 1 : Exp.exp(-z);
        }

        @Override
        public double inner(double p) {
            return -StrictMath.log1p(-p);
        }

        @Override
        public double upperInner(double q) {
            return -Log.log(q);
        }

        @Override
        public double mean() {
            return 1;
        }

        @Override
        public double variance() {
            return 1;
        }

        @Override
        public double skewness() {
            return 2;
        }

        @Override
        public double excessKurtosis() {
            return 6;
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
