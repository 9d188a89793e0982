package dev.leadline.density;

import static dev.leadline.density.Rule.finite;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.List;

/// The uniform density: the same everywhere between `from` and `to`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Uniform(double from, double to) implements Scaled {
    private static final Entry ENTRY = Entry.of(
                    v -> new Uniform(v[0], v[1]), finite("from", "least value"), finite("to", "largest value"))
            .and(v -> rising("from", v[0], "to", v[1]));

    static final Family FAMILY = new Described(
                    "uniform", "only the limits are known; rounding; a direction or phase", ENTRY)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Uniform(v[0], v[0] + v[1])));

    public Uniform {
        ENTRY.check(from, to);
    }

    /// What is wrong with the ends of a range: the second must be greater, and their distance a finite number.
    static List<Problem> rising(String low, double from, String high, double to) {
        if (!(to > from)) {
            return List.of(Rule.problem(
                    high,
                    to,
                    "greater than " + low + ", " + Shortest.text(from),
                    to == from ? "The range would be a single point." : "The range would be empty.",
                    to == from ? "For a fixed value use a constant." : ""));
        }
        if (Double.isInfinite(to - from)) {
            return List.of(Problem.of("the distance between " + low + " and " + high + " is too large")
                    .because("It exceeds the largest number there is, 1.8e308.")
                    .at(Place.of(high)));
        }
        return List.of();
    }

    @Override
    public double location() {
        return from;
    }

    @Override
    public double scale() {
        return to - from;
    }

    @Override
    public Density standard() {
        return new Standard();
    }

    @Override
    public double survival(double x) {
        return standard().cdf((to - x) / scale());
    }

    @Override
    public double upperQuantile(double q) {
        return q > 0.5 && q <= 1
                ? quantile(1 - q)
                : Math.fma(-scale(), standard().quantile(q), to);
    }

    @Override
    public double quantile(double p) {
        return p > 0.5 && p <= 1 ? upperQuantile(1 - p) : Scaled.super.quantile(p);
    }

    @Override
    public double mean() {
        return 0.5 * from + 0.5 * to;
    }

    @Override
    public Support support() {
        return new Support(from, to);
    }

    /// The uniform density between 0 and 1.
    record Standard() implements Shape, ClosedForm {
        @Override
        public double pdf(double z) {
            return z >= 0 && z <= 1 ? 1 : Double.isNaN(z) ? z : 0;
        }

        @Override
        public double logPdf(double z) {
            return Log.log(pdf(z));
        }

        @Override
        public double cdf(double z) {
            return Math.min(Math.max(z, 0), 1);
        }

        @Override
        public double survival(double z) {
            return 1 - cdf(z);
        }

        @Override
        public double inner(double p) {
            return p;
        }

        @Override
        public double upperInner(double q) {
            return 1 - q;
        }

        @Override
        public void fill(double[] u, double[] x, int n) {
            System.arraycopy(u, 0, x, 0, n);
        }

        @Override
        public double mean() {
            return 0.5;
        }

        @Override
        public double variance() {
            return 1 / 12.0;
        }

        @Override
        public double skewness() {
            return 0;
        }

        @Override
        public double excessKurtosis() {
            return -1.2;
        }

        @Override
        public Support support() {
            return new Support(0, 1);
        }
    }
}
