package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;

/// The lognormal density: the logarithm is normal, with mean `mu` and standard deviation `sigma`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`); `log x - mu` is taken as `log(x / exp(mu))`.
public record Lognormal(double mu, double sigma) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Lognormal(v[0], v[1]),
            between(
                    -700,
                    700,
                    "mu",
                    "mean of the logarithm; exp(mu) is the median",
                    "The median, exp(mu), must be a number."),
            between(
                            1e-9,
                            80,
                            "sigma",
                            "standard deviation of the logarithm",
                            "It is a ratio, not an amount: sigma 0.1 is about 10 %.")
                    .tryThis("To enter mean and standard deviation of the value itself, use mean and sd."));

    private static final Entry BY_MEAN = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1]),
                    positive("mean", "mean of the value itself", "A lognormal value is positive."),
                    positive("sd", "standard deviation of the value itself", "The lognormal density divides by it.")
                            .tryThis("For a fixed value use a constant."))
            .and(v -> problems(v[0], v[1]));

    private static final Entry BY_CV = Entry.of(
                    v -> ofMeanAndSd(v[0], v[0] * v[1]),
                    positive("mean", "mean of the value itself", "A lognormal value is positive."),
                    Rule.cv())
            .and(v -> problems(v[0], v[0] * v[1]));

    static final Family FAMILY = new Described(
                    "lognormal",
                    "positive values that vary by factors: costs, permeabilities, concentrations, incomes",
                    ENTRY,
                    BY_MEAN,
                    BY_CV)
            .enteredBy(new ByQuantiles(List.of(), Lognormal::ofQuantiles));

    public Lognormal {
        ENTRY.check(mu, sigma);
    }

    /// The member of this mean and standard deviation.
    public static Lognormal ofMeanAndSd(double mean, double sd) {
        BY_MEAN.check(mean, sd);
        double sigma = sigma(sd / mean);
        return new Lognormal(Log.log(mean) - 0.5 * sigma * sigma, sigma);
    }

    private static Lognormal ofQuantiles(double[] given, ByQuantiles.Quantile low, ByQuantiles.Quantile high) {
        if (!(low.x() > 0)) {
            throw new Refusal(
                    Rule.problem(low.name(), low.x(), "greater than 0", "A lognormal value is positive.", ""));
        }
        var normal = new Normal.Standard();
        double sigma = (Log.log(high.x()) - Log.log(low.x())) / (normal.quantile(high.p()) - normal.quantile(low.p()));
        return new Lognormal(Log.log(low.x()) - sigma * normal.quantile(low.p()), sigma);
    }

    /// `sqrt(log(1 + cv^2))`, without overflow of the square.
    private static double sigma(double cv) {
        return cv < 1e-8 ? cv : Math.sqrt(cv > 1e100 ? 2 * Log.log(cv) : StrictMath.log1p(cv * cv));
    }

    private static List<Problem> problems(double mean, double sd) {
        double sigma = sigma(sd / mean);
        return ENTRY.tooExtreme(Rule.meanWithSd(mean, sd), Log.log(mean) - 0.5 * sigma * sigma, sigma);
    }

    @Override
    public double scale() {
        return Exp.exp(mu);
    }

    @Override
    public Density standard() {
        return new Standard(sigma);
    }

    /// The lognormal density of median 1.
    record Standard(double sigma) implements Shape, Linked {
        private static final Normal.Standard NORMAL = new Normal.Standard();

        private double normal(double z) {
            return z <= 0 ? Double.NEGATIVE_INFINITY : Log.log(z) / sigma;
        }

        @Override
        public double pdf(double z) {
            return z <= 0 ? 0 : NORMAL.pdf(normal(z)) / sigma / z;
        }

        @Override
        public double logPdf(double z) {
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? Double.NEGATIVE_INFINITY
                    : NORMAL.logPdf(normal(z)) - Log.log(sigma) - Log.log(z);
        }

        @Override
        public double cdf(double z) {
            return NORMAL.cdf(normal(z));
        }

        @Override
        public double survival(double z) {
            return NORMAL.survival(normal(z));
        }

        @Override
        public double inner(double p) {
            return Exp.exp(linked(p));
        }

        @Override
        public double upperInner(double q) {
            return Exp.exp(upperLinked(q));
        }

        @Override
        public Link link() {
            return Link.ROOT;
        }

        @Override
        public double linked(double p) {
            return sigma * NORMAL.quantile(p);
        }

        @Override
        public double upperLinked(double q) {
            return sigma * NORMAL.upperQuantile(q);
        }

        @Override
        public double mean() {
            return Exp.exp(0.5 * sigma * sigma);
        }

        @Override
        public double variance() {
            return Exp.exp(sigma * sigma) * StrictMath.expm1(sigma * sigma);
        }

        @Override
        public double skewness() {
            double v = StrictMath.expm1(sigma * sigma);
            return (3 + v) * Math.sqrt(v);
        }

        @Override
        public double excessKurtosis() {
            double v = StrictMath.expm1(sigma * sigma);
            return v * (16 + v * (15 + v * (6 + v)));
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
