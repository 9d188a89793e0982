package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The beta density, between `from` and `to`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Beta(double alpha, double beta, double from, double to) implements Scaled {
    private static final String LIMITS =
            "Beyond these limits its values are too far apart or too close for numbers of 16 digits.";

    private static final Entry ENTRY = Entry.of(
                    v -> new Beta(v[0], v[1], v[2], v[3]),
                    between(0.01, 1e6, "alpha", "the larger, the less near from", LIMITS),
                    between(0.01, 1e6, "beta", "the larger, the less near to", LIMITS),
                    finite("from", "least value").or(0),
                    finite("to", "largest value").or(1))
            .and(v -> Uniform.rising("from", v[2], "to", v[3]));

    private static final Entry BY_MEAN = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1], v[2], v[3]),
                    finite("mean", "mean value"),
                    positive("sd", "standard deviation", "For a fixed value use a constant."),
                    finite("from", "least value").or(0),
                    finite("to", "largest value").or(1))
            .and(v -> problems(v[0], v[1], v[2], v[3]));

    static final Family FAMILY = new Described(
            "beta", "fractions and proportions; a probability seen in counts; a value between limits", ENTRY, BY_MEAN);

    public Beta {
        ENTRY.check(alpha, beta, from, to);
    }

    /// The beta density between 0 and 1.
    public static Beta of(double alpha, double beta) {
        return new Beta(alpha, beta, 0, 1);
    }

    /// The member of this mean and standard deviation.
    public static Beta ofMeanAndSd(double mean, double sd, double from, double to) {
        BY_MEAN.check(mean, sd, from, to);
        double sum = sum(mean, sd, from, to);
        return new Beta((mean - from) / (to - from) * sum, (to - mean) / (to - from) * sum, from, to);
    }

    /// Alpha and beta together: `(mean - from) (to - mean) / sd^2 - 1`.
    private static double sum(double mean, double sd, double from, double to) {
        double most = most(mean, from, to);
        return (most - sd) / sd * ((most + sd) / sd);
    }

    /// The standard deviation if all values were at the limits.
    private static double most(double mean, double from, double to) {
        double width = to - from;
        return width * Math.sqrt((mean - from) / width * ((to - mean) / width));
    }

    private static List<Problem> problems(double mean, double sd, double from, double to) {
        var problems = Uniform.rising("from", from, "to", to);
        if (!problems.isEmpty()) {
            return problems;
        }
        if (!(mean > from && mean < to)) {
            String words = "between from, " + Shortest.text(from) + ", and to, " + Shortest.text(to);
            return List.of(Rule.problem("mean", mean, words, "The mean lies within the range.", ""));
        }
        double most = most(mean, from, to);
        if (!(sd < most)) {
            String words = "less than " + Shortest.text(most);
            return List.of(
                    Rule.problem("sd", sd, words, "So much is only possible with all values at the limits.", ""));
        }
        double sum = sum(mean, sd, from, to);
        return ENTRY.tooExtreme(
                Rule.meanWithSd(mean, sd), (mean - from) / (to - from) * sum, (to - mean) / (to - from) * sum);
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
    public Standard standard() {
        return new Standard(IncompleteBeta.of(alpha, beta));
    }

    @Override
    public double pdf(double x) {
        return Exp.exp(logPdf(x));
    }

    @Override
    public double logPdf(double x) {
        return standard().logPdf(fromLow(x), fromHigh(x)) - Log.log(scale());
    }

    @Override
    public void logPdf(double[] x, double[] out, int n) {
        var standard = standard();
        double log = Log.log(scale());
        for (int i = 0; i < n; i++) {
            out[i] = standard.logPdf(fromLow(x[i]), fromHigh(x[i])) - log;
        }
    }

    @Override
    public double cdf(double x) {
        return standard().tails.lower(fromLow(x), fromHigh(x));
    }

    @Override
    public double survival(double x) {
        return standard().tails.mirrored().lower(fromHigh(x), fromLow(x));
    }

    @Override
    public double quantile(double p) {
        return p > 0 && p < 1 ? at(standard().linked(p)) : p == 1 ? to : Scaled.super.quantile(p);
    }

    @Override
    public double upperQuantile(double q) {
        return q > 0 && q < 1 ? at(standard().upperLinked(q)) : q == 0 ? to : Scaled.super.upperQuantile(q);
    }

    /// The point with this `log((x - from) / (to - x))`, measured from the nearer end.
    private double at(double logit) {
        return logit < 0
                ? Math.fma(scale(), IncompleteBeta.logistic(logit), from)
                : Math.fma(-scale(), IncompleteBeta.logistic(-logit), to);
    }

    @Override
    public Support support() {
        return new Support(from, to);
    }

    private double fromLow(double x) {
        return (x - from) / scale();
    }

    private double fromHigh(double x) {
        return (to - x) / scale();
    }

    /// The beta density between 0 and 1.
    record Standard(IncompleteBeta tails) implements Shape, Linked {
        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            return logPdf(z, 1 - z);
        }

        private double logPdf(double x, double y) {
            if (x > 0 && y > 0) {
                return tails.logPrefix(x, y) - Log.log(x) - Log.log(y);
            }
            if (x == 0 || y == 0) {
                double exponent = x == 0 ? tails.a() : tails.b();
                double other = x == 0 ? tails.b() : tails.a();
                return exponent == 1
                        ? Log.log(other)
                        : exponent < 1 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
            }
            return Double.isNaN(x) ? x : Double.NEGATIVE_INFINITY;
        }

        @Override
        public double cdf(double z) {
            return tails.lower(z, 1 - z);
        }

        @Override
        public double survival(double z) {
            return tails.mirrored().lower(1 - z, z);
        }

        @Override
        public double inner(double p) {
            return IncompleteBeta.logistic(linked(p));
        }

        @Override
        public double upperInner(double q) {
            return IncompleteBeta.logistic(upperLinked(q));
        }

        @Override
        public Link link() {
            return Link.ROOT_OF_ENDS;
        }

        @Override
        public double linked(double p) {
            return p <= 0.5 ? tails.logitInverse(p) : -tails.mirrored().logitInverse(1 - p);
        }

        @Override
        public double upperLinked(double q) {
            return q <= 0.5 ? -tails.mirrored().logitInverse(q) : tails.logitInverse(1 - q);
        }

        @Override
        public double mean() {
            return tails.a() / (tails.a() + tails.b());
        }

        @Override
        public double variance() {
            double n = tails.a() + tails.b();
            return tails.a() / n * (tails.b() / n) / (n + 1);
        }

        @Override
        public double skewness() {
            double a = tails.a();
            double b = tails.b();
            return 2 * (b - a) / (a + b + 2) * Math.sqrt((a + b + 1) / a / b);
        }

        @Override
        public double excessKurtosis() {
            double a = tails.a();
            double b = tails.b();
            double n = a + b;
            return 6 / (n + 3) * ((a - b) / a * ((a - b) / b) * ((n + 1) / (n + 2)) - 1);
        }

        @Override
        public Support support() {
            return new Support(0, 1);
        }
    }
}
