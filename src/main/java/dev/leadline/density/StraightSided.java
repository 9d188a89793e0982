package dev.leadline.density;

import dev.leadline.numeric.Log;

/// A density of straight sides between two ends. A point is measured from the nearer end, so that nothing cancels near
/// either.
interface StraightSided extends Scaled {
    double from();

    double to();

    @Override
    Standard standard();

    /// The density between 0 and 1. A point lies `z` from 0 and `y` from 1.
    interface Standard extends Shape {
        Standard mirrored();

        double height(double z, double y);

        /// The mass below the point.
        double below(double z, double y);

        @Override
        default double pdf(double z) {
            return height(z, 1 - z);
        }

        @Override
        default double logPdf(double z) {
            return Log.log(pdf(z));
        }

        @Override
        default double cdf(double z) {
            return below(z, 1 - z);
        }

        @Override
        default double survival(double z) {
            return mirrored().below(1 - z, z);
        }

        @Override
        default Support support() {
            return new Support(0, 1);
        }
    }

    @Override
    default double location() {
        return from();
    }

    @Override
    default double scale() {
        return to() - from();
    }

    @Override
    default double pdf(double x) {
        return standard().height(fromLow(x), fromHigh(x)) / scale();
    }

    @Override
    default double logPdf(double x) {
        return Log.log(pdf(x));
    }

    @Override
    default void logPdf(double[] x, double[] out, int n) {
        for (int i = 0; i < n; i++) {
            out[i] = logPdf(x[i]);
        }
    }

    @Override
    default double cdf(double x) {
        return standard().below(fromLow(x), fromHigh(x));
    }

    @Override
    default double survival(double x) {
        return standard().mirrored().below(fromHigh(x), fromLow(x));
    }

    @Override
    default double quantile(double p) {
        return at(standard().quantile(p), standard().mirrored().upperQuantile(p));
    }

    @Override
    default double upperQuantile(double q) {
        return at(standard().upperQuantile(q), standard().mirrored().quantile(q));
    }

    /// The point at these distances from the ends, measured from the nearer one.
    private double at(double fromLow, double fromHigh) {
        return fromHigh < fromLow ? Math.fma(-scale(), fromHigh, to()) : Math.fma(scale(), fromLow, from());
    }

    @Override
    default Support support() {
        return new Support(from(), to());
    }

    private double fromLow(double x) {
        return (x - from()) / scale();
    }

    private double fromHigh(double x) {
        return (to() - x) / scale();
    }
}
