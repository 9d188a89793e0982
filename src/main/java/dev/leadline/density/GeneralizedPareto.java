package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The generalized Pareto density of what exceeds a threshold: `survival(x) = (1 + shape z)^(-1 / shape)` with
/// `z = (x - location) / scale` from 0 on. A positive shape has a heavy tail, shape 0 is exponential, a negative shape
/// has an upper end.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`), for any shape down to 0. Towards a finite end the
/// rounding of `x` counts as often as the distribution is steep.
///
/// Source: Pickands (1975), Annals of Statistics 3, 119-131, with the sign of the shape as in Coles (2001), An
/// Introduction to Statistical Modeling of Extreme Values.
public record GeneralizedPareto(double location, double scale, double shape) implements Ended {
    private static final Entry ENTRY = Entry.of(
            v -> new GeneralizedPareto(v[0], v[1], v[2]),
            finite("location", "the threshold; least value"),
            positive("scale", "mean excess for shape 0", "The Pareto density divides by its scale.")
                    .tryThis("For a fixed value use a constant."),
            between(
                            -1,
                            5,
                            "shape",
                            "above 0 a heavy tail, 0 exponential, below 0 an upper end",
                            "Below, the density would be infinite at its end; above, draws differ by a hundred orders of magnitude.")
                    .tryThis("Some fields write it with the other sign: here a positive shape is a heavy tail."));

    static final Family FAMILY = new Described(
            "generalized-pareto", "what exceeds a high threshold: losses, river levels, wave heights", ENTRY);

    public GeneralizedPareto {
        ENTRY.check(location, scale, shape);
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// The Pareto density from 0 on with scale 1: an exponential value y, bent to `expm1(shape y) / shape`.
    record Standard(double shape) implements Shape {
        private double exponential(double z) {
            return Bend.straight(shape, z);
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            double y = exponential(z);
            if (z < 0 || y == Double.POSITIVE_INFINITY) {
                return z < 0 || z > support().high() || shape > -1 ? Double.NEGATIVE_INFINITY : 0;
            }
            return -Math.fma(shape, y, y);
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
            return Bend.bent(shape, -StrictMath.log1p(-p));
        }

        @Override
        public double upperInner(double q) {
            return Bend.bent(shape, -Log.log(q));
        }

        @Override
        public double mean() {
            return shape < 1 ? 1 / (1 - shape) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double variance() {
            return shape < 0.5 ? 1 / ((1 - shape) * (1 - shape) * (1 - 2 * shape)) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double skewness() {
            return shape < 1 / 3.0
                    ? 2 * (1 + shape) * Math.sqrt(1 - 2 * shape) / (1 - 3 * shape)
                    : Shape.super.skewness();
        }

        @Override
        public double excessKurtosis() {
            if (!(shape < 0.25)) {
                return Shape.super.excessKurtosis();
            }
            double polynomial = Math.fma(Math.fma(Math.fma(-2, shape, -6), shape, 1), shape, 1);
            return 6 * polynomial / ((1 - 3 * shape) * (1 - 4 * shape));
        }

        @Override
        public TailOrders tailOrders() {
            return Bend.tailOrders(shape);
        }

        @Override
        public Support support() {
            return new Support(0, shape < 0 ? -1 / shape : Double.POSITIVE_INFINITY);
        }
    }
}
