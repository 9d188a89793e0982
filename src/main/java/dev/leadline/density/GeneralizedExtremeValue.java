package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;

/// The generalized extreme value density for largest values: `cdf(x) = exp(-(1 + shape z)^(-1 / shape))` with
/// `z = (x - location) / scale`. A positive shape has a heavy upper tail and a lower end (Fréchet), shape 0 is the
/// Gumbel density, a negative shape has an upper end (Weibull, mirrored).
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`), for any shape down to 0. Towards a finite end and in the
/// lower tail the rounding of `x` counts as often as the distribution is steep.
///
/// Source: Jenkinson (1955), Quarterly Journal of the Royal Meteorological Society 81, 158-171, with the sign of the
/// shape as in Coles (2001), An Introduction to Statistical Modeling of Extreme Values.
public record GeneralizedExtremeValue(double location, double scale, double shape) implements Ended {
    private static final Entry ENTRY = Entry.of(
            v -> new GeneralizedExtremeValue(v[0], v[1], v[2]),
            finite("location", "36.8 % of the largest values are below"),
            positive("scale", "spread; not the standard deviation", "The extreme value density divides by its scale.")
                    .tryThis("For a fixed value use a constant."),
            between(
                            -1,
                            5,
                            "shape",
                            "above 0 a heavy upper tail, 0 Gumbel, below 0 an upper end",
                            "Below, the density would be infinite at its end; above, draws differ by a hundred orders of magnitude.")
                    .tryThis("Some fields write it with the other sign: here a positive shape is a heavy tail."));

    static final Family FAMILY = new Described(
            "generalized-extreme-value", "largest value of a year or a block: floods, gusts, waves, losses", ENTRY);

    public GeneralizedExtremeValue {
        ENTRY.check(location, scale, shape);
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// The extreme value density of location 0 and scale 1: a Gumbel value y, bent to `expm1(shape y) / shape`.
    record Standard(double shape) implements Shape {
        private static final Gumbel.Standard GUMBEL = new Gumbel.Standard();

        private double gumbel(double z) {
            return Bend.straight(shape, z);
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            double y = gumbel(z);
            if (Math.abs(y) == Double.POSITIVE_INFINITY) {
                return y < 0 || z > support().high() || shape > -1 ? Double.NEGATIVE_INFINITY : 0;
            }
            return -Math.fma(shape, y, y) - Exp.exp(-y);
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
            return Bend.bent(shape, GUMBEL.inner(p));
        }

        @Override
        public double upperInner(double q) {
            return Bend.bent(shape, GUMBEL.upperInner(q));
        }

        private ExponentialPower power() {
            return new ExponentialPower(-shape);
        }

        private boolean isGumbel() {
            return Math.abs(shape) < Bend.LEAST;
        }

        @Override
        public double mean() {
            if (isGumbel()) {
                return GUMBEL.mean();
            }
            return Math.abs(shape) <= 0.5
                    ? StrictMath.expm1(GammaFunction.logOnePlus(-shape)) / shape
                    : (power().mean() - 1) / shape;
        }

        @Override
        public double variance() {
            double perShape = power().mean() / shape;
            return isGumbel() ? GUMBEL.variance() : perShape * perShape * power().relativeVariance();
        }

        @Override
        public double skewness() {
            return isGumbel() ? GUMBEL.skewness() : Math.signum(shape) * power().skewness();
        }

        @Override
        public double excessKurtosis() {
            return isGumbel() ? GUMBEL.excessKurtosis() : power().excessKurtosis();
        }

        @Override
        public TailOrders tailOrders() {
            return Bend.tailOrders(shape);
        }

        @Override
        public Support support() {
            double end = -1 / shape;
            return new Support(shape > 0 ? end : Double.NEGATIVE_INFINITY, shape < 0 ? end : Double.POSITIVE_INFINITY);
        }
    }
}
