package dev.leadline.density;

import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// The exponential density, `exp(-x/mean) / mean` from 0 on.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Exponential(double mean) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Exponential(v[0]),
            positive("mean", "mean time or distance between events", "The exponential density divides by its mean."));

    static final Family FAMILY =
            new Described("exponential", "waiting times between events that do not wait for one another", ENTRY);

    public Exponential {
        ENTRY.check(mean);
    }

    @Override
    public double scale() {
        return mean;
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
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
