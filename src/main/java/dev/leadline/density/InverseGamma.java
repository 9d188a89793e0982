package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The inverse gamma density: one over a gamma value; its mean is `scale / (shape - 1)`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan (1994), Continuous Univariate Distributions, volume 1, as Pearson's fifth
/// type; in the parameters of Bernardo and Smith (1994), Bayesian Theory.
public record InverseGamma(double shape, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new InverseGamma(v[0], v[1]),
            between(
                    0.1,
                    1e6,
                    "shape",
                    "the smaller, the heavier the upper tail; half the degrees of freedom of a variance",
                    "Below, draws differ by hundreds of orders of magnitude; above, they are too close for numbers of "
                            + "16 digits."),
            positive(
                    "scale",
                    "mean times shape less 1; half the sum of squares behind a variance",
                    "The inverse gamma density divides by its scale."));

    static final Family FAMILY = new Described(
                    "inverse-gamma",
                    "an unknown variance, as readings leave it; waiting times at an unknown rate",
                    ENTRY)
            .enteredBy(ByQuantiles.ofPositiveShapeAndScale(0.1, 1e6, v -> new InverseGamma(v[0], v[1])));

    public InverseGamma {
        ENTRY.check(shape, scale);
    }

    @Override
    public Density standard() {
        return new Standard(new Gamma.Standard(IncompleteGamma.of(shape)));
    }

    /// One over a standard gamma value.
    record Standard(Gamma.Standard inverse) implements Shape, Linked {

        private double a() {
            return inverse.tails().a();
        }

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            double x = 1 / z;
            return z > 0 && x > 0 && x < Double.POSITIVE_INFINITY
                    ? inverse.tails().logPrefix(x) + Log.log(a()) + Log.log(x)
                    : Double.isNaN(z) ? z : Double.NEGATIVE_INFINITY;
        }

        @Override
        public double cdf(double z) {
            return z <= 0 ? 0 : inverse.survival(1 / z);
        }

        @Override
        public double survival(double z) {
            return z <= 0 ? 1 : inverse.cdf(1 / z);
        }

        @Override
        public double inner(double p) {
            return 1 / inverse.upperInner(p);
        }

        @Override
        public double upperInner(double q) {
            return 1 / inverse.inner(q);
        }

        @Override
        public Link link() {
            return Link.ROOT;
        }

        @Override
        public double linked(double p) {
            return -inverse.upperLinked(p);
        }

        @Override
        public double upperLinked(double q) {
            return -inverse.linked(q);
        }

        @Override
        public double mean() {
            return a() > 1 ? 1 / (a() - 1) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double variance() {
            double less = a() - 1;
            return a() > 2 ? 1 / (less * less * (a() - 2)) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double skewness() {
            return a() > 3 ? 4 * Math.sqrt(a() - 2) / (a() - 3) : Shape.super.skewness();
        }

        @Override
        public double excessKurtosis() {
            if (!(a() > 4)) {
                return Shape.super.excessKurtosis();
            }
            return 6 * (5 * a() - 11) / ((a() - 3) * (a() - 4));
        }

        @Override
        public TailOrders tailOrders() {
            return new TailOrders(Double.POSITIVE_INFINITY, a());
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
