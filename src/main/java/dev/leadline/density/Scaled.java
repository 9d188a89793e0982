package dev.leadline.density;

import dev.leadline.numeric.Log;

/// A density that is a shape, shifted and scaled: `location + scale * shape`.
interface Scaled extends Density {
    /// The member at location 0 and scale 1.
    Density standard();

    default double location() {
        return 0;
    }

    double scale();

    @Override
    default double pdf(double x) {
        return standard().pdf(fromLocation(x)) / scale();
    }

    @Override
    default double logPdf(double x) {
        return standard().logPdf(fromLocation(x)) - Log.log(scale());
    }

    @Override
    default void logPdf(double[] x, double[] out, int n) {
        for (int i = 0; i < n; i++) {
            out[i] = fromLocation(x[i]);
        }
        standard().logPdf(out, out, n);
        double log = Log.log(scale());
        for (int i = 0; i < n; i++) {
            out[i] -= log;
        }
    }

    @Override
    default double cdf(double x) {
        return standard().cdf(fromLocation(x));
    }

    @Override
    default double survival(double x) {
        return standard().survival(fromLocation(x));
    }

    @Override
    default double quantile(double p) {
        return Math.fma(scale(), standard().quantile(p), location());
    }

    @Override
    default double upperQuantile(double q) {
        return Math.fma(scale(), standard().upperQuantile(q), location());
    }

    @Override
    default double mean() {
        return Math.fma(scale(), standard().mean(), location());
    }

    @Override
    default double variance() {
        return scale() * scale() * standard().variance();
    }

    @Override
    default double skewness() {
        return standard().skewness();
    }

    @Override
    default double excessKurtosis() {
        return standard().excessKurtosis();
    }

    @Override
    default TailOrders tailOrders() {
        return standard().tailOrders();
    }

    @Override
    default boolean isDiscrete() {
        return standard().isDiscrete();
    }

    @Override
    default Support support() {
        var s = standard().support();
        return new Support(Math.fma(scale(), s.low(), location()), Math.fma(scale(), s.high(), location()));
    }

    @Override
    default Standardised standardised() {
        return new Standardised(standard(), location(), scale());
    }

    private double fromLocation(double x) {
        return (x - location()) / scale();
    }
}
