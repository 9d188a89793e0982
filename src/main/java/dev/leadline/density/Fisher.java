package dev.leadline.density;

import static dev.leadline.density.Rule.between;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// Fisher's F density: the ratio of two independent chi-square values, each divided by its degrees of freedom.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 27. From memory.
public record Fisher(double dof1, double dof2) implements Scaled {
    private static final String LIMITS =
            "Beyond these limits its values are too far apart or too close for numbers of 16 digits.";

    private static final Entry ENTRY = Entry.of(
            v -> new Fisher(v[0], v[1]),
            between(0.2, 1e6, "dof1", "degrees of freedom of the numerator", LIMITS),
            between(
                    0.2,
                    1e6,
                    "dof2",
                    "degrees of freedom of the denominator; the fewer, the heavier the tail",
                    LIMITS));

    static final Family FAMILY = new Described("f", "the ratio of two variances, each seen in few readings", ENTRY);

    public Fisher {
        ENTRY.check(dof1, dof2);
    }

    @Override
    public double scale() {
        return dof2 / dof1;
    }

    @Override
    public Standard standard() {
        return new Standard(IncompleteBeta.of(0.5 * dof1, 0.5 * dof2));
    }

    /// The ratio of two gamma values of scale 1: the odds `x / (1 - x)` of a beta value.
    ///
    /// @param tails of the beta density
    record Standard(IncompleteBeta tails) implements Shape, Linked {
        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            if (z > 0 && z < Double.POSITIVE_INFINITY) {
                return tails.logPrefix(share(z), 1 / (1 + z)) - Log.log(z);
            }
            double a = tails.a();
            return Double.isNaN(z)
                    ? z
                    : z == 0 && a == 1
                            ? Log.log(tails.b())
                            : z == 0 && a < 1 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
        }

        /// The beta value of these odds.
        private static double share(double z) {
            return z < 1 ? z / (1 + z) : 1 / (1 + 1 / z);
        }

        @Override
        public double cdf(double z) {
            return z <= 0 ? 0 : tails.lower(share(z), 1 / (1 + z));
        }

        @Override
        public double survival(double z) {
            return z <= 0 ? 1 : tails.mirrored().lower(1 / (1 + z), share(z));
        }

        @Override
        public double inner(double p) {
            double z = Exp.exp(linked(p));
            return p <= 0.5 ? mended(z, cdf(z) - p) : mended(z, 1 - p - survival(z));
        }

        @Override
        public double upperInner(double q) {
            double z = Exp.exp(upperLinked(q));
            return q <= 0.5 ? mended(z, q - survival(z)) : mended(z, cdf(z) - (1 - q));
        }

        /// One step of Newton's method mends what the rounding of the logarithm spoils.
        ///
        /// @param excess mass below z that is too much
        private double mended(double z, double excess) {
            double slope = Exp.exp(tails.logPrefix(share(z), 1 / (1 + z)));
            return slope > 0 ? z * (1 - excess / slope) : z;
        }

        @Override
        public Link link() {
            return Link.ROOT;
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
            return tails.b() > 1 ? tails.a() / (tails.b() - 1) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double variance() {
            double b = tails.b();
            return b > 2 ? mean() * ((tails.a() + b - 1) / (b - 1) / (b - 2)) : Double.POSITIVE_INFINITY;
        }

        @Override
        public double skewness() {
            double a = tails.a();
            double b = tails.b();
            double n = a + b - 1;
            return b > 3 ? 2 * (n + a) / (b - 3) * Math.sqrt((b - 2) / (a * n)) : Shape.super.skewness();
        }

        @Override
        public double excessKurtosis() {
            double a = tails.a();
            double b = tails.b();
            double part = (b - 1) * (b - 1) * (b - 2) / (a * (a + b - 1));
            return b > 4 ? 6 * (5 * b - 11 + part) / ((b - 3) * (b - 4)) : Shape.super.excessKurtosis();
        }

        @Override
        public TailOrders tailOrders() {
            return new TailOrders(Double.POSITIVE_INFINITY, tails.b());
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
