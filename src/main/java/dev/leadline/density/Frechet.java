package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The Fréchet density for largest values with a heavy tail: `cdf(x) = exp(-((x - from) / scale)^-shape)` from `from`
/// on.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). In the lower tail the rounding of `x` counts up to
/// `700 shape` times.
///
/// Source: Fréchet (1927); Gumbel (1958), Statistics of Extremes, as the second type of extreme values.
public record Frechet(double shape, double scale, double from) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Frechet(v[0], v[1], v[2]),
            between(
                    0.1,
                    1e6,
                    "shape",
                    "the smaller, the heavier the upper tail; the mean exists above 1, the variance above 2",
                    "Below, draws differ by hundreds of orders of magnitude; above, they are too close for numbers of "
                            + "16 digits."),
            positive(
                    "scale",
                    "36.8 % of the values are below from + scale",
                    "The Fréchet density divides by its scale."),
            finite("from", "least value").or(0));

    static final Family FAMILY = new Described(
                    "frechet", "largest value of a period with a heavy tail: rain, floods, claims", ENTRY)
            .enteredBy(ByQuantiles.ofShapeAndScale(0.1, 1e6, v -> new Frechet(v[0], v[1], v[2])));

    public Frechet {
        ENTRY.check(shape, scale, from);
    }

    @Override
    public double location() {
        return from;
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// The Fréchet density of scale 1 from 0 on; its logarithm is a Gumbel value over the shape.
    record Standard(double shape) implements Shape {
        private static final Gumbel.Standard GUMBEL = new Gumbel.Standard();

        private double gumbel(double z) {
            return z <= 0 ? Double.NEGATIVE_INFINITY : shape * Log.log(z);
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? Double.NEGATIVE_INFINITY
                    : GUMBEL.logPdf(gumbel(z)) + Log.log(shape) - Log.log(z);
        }

        @Override
        public double cdf(double z) {
            return GUMBEL.cdf(gumbel(z));
        }

        @Override
        public double survival(double z) {
            return GUMBEL.survival(gumbel(z));
        }

        @Override
        public double inner(double p) {
            return StrictMath.pow(-Log.log(p), -1 / shape);
        }

        @Override
        public double upperInner(double q) {
            return StrictMath.pow(-StrictMath.log1p(-q), -1 / shape);
        }

        private ExponentialPower power() {
            return new ExponentialPower(-1 / shape);
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
        public TailOrders tailOrders() {
            return new TailOrders(Double.POSITIVE_INFINITY, shape);
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
