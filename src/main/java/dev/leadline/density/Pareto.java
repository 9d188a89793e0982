package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The Pareto density: `survival(x) = (from / x)^shape` from `from` on.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Pareto (1896), Cours d'économie politique, as the first of his laws; Johnson, Kotz and Balakrishnan (1994),
/// Continuous Univariate Distributions, volume 1, chapter 20.
public record Pareto(double from, double shape) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Pareto(v[0], v[1]),
            positive("from", "least value", "The Pareto density is a power of x over its least value."),
            between(
                    0.1,
                    1e6,
                    "shape",
                    "the smaller, the heavier the tail; the mean exists above 1, the variance above 2",
                    "Below, draws differ by hundreds of orders of magnitude; above, they are too close for numbers of "
                            + "16 digits."));

    static final Family FAMILY = new Described(
            "pareto", "few are large and most are small: losses, incomes, sizes above a least one", ENTRY);

    public Pareto {
        ENTRY.check(from, shape);
    }

    @Override
    public double location() {
        return from;
    }

    @Override
    public double scale() {
        return from;
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// What a Pareto value exceeds its least by, over that least: `survival(z) = (1 + z)^-shape` from 0 on.
    record Standard(double shape) implements Shape {
        private double exponential(double z) {
            return shape * StrictMath.log1p(z);
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            return z < 0 ? Double.NEGATIVE_INFINITY : Log.log(shape) - (shape + 1) * StrictMath.log1p(z);
        }

        @Override
        public double cdf(double z) {
            return z < 0 ? 0 : -StrictMath.expm1(-exponential(z));
        }

        @Override
        public double survival(double z) {
            return z < 0 ? 1 : Exp.exp(-exponential(z));
        }

        @Override
        public double inner(double p) {
            return StrictMath.expm1(-StrictMath.log1p(-p) / shape);
        }

        @Override
        public double upperInner(double q) {
            return StrictMath.expm1(-Log.log(q) / shape);
        }

        @Override
        public double mean() {
            return shape > 1 ? 1 / (shape - 1) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double variance() {
            return shape > 2 ? shape / ((shape - 1) * (shape - 1) * (shape - 2)) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double skewness() {
            return shape > 3 ? 2 * (shape + 1) / (shape - 3) * Math.sqrt((shape - 2) / shape) : Shape.super.skewness();
        }

        @Override
        public double excessKurtosis() {
            if (!(shape > 4)) {
                return Shape.super.excessKurtosis();
            }
            double polynomial = Math.fma(Math.fma(shape + 1, shape, -6), shape, -2);
            return 6 * polynomial / (shape * (shape - 3) * (shape - 4));
        }

        @Override
        public TailOrders tailOrders() {
            return new TailOrders(Double.POSITIVE_INFINITY, shape);
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
