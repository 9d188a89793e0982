package dev.leadline.density;

/// A density with a name and parameters of its own that is a member of another family.
interface Renamed extends Density {
    /// The same density by its other name.
    Density member();

    @Override
    default double pdf(double x) {
        return member().pdf(x);
    }

    @Override
    default double logPdf(double x) {
        return member().logPdf(x);
    }

    @Override
    default void logPdf(double[] x, double[] out, int n) {
        member().logPdf(x, out, n);
    }

    @Override
    default double cdf(double x) {
        return member().cdf(x);
    }

    @Override
    default double survival(double x) {
        return member().survival(x);
    }

    @Override
    default double quantile(double p) {
        return member().quantile(p);
    }

    @Override
    default double upperQuantile(double q) {
        return member().upperQuantile(q);
    }

    @Override
    default double mean() {
        return member().mean();
    }

    @Override
    default double variance() {
        return member().variance();
    }

    @Override
    default double skewness() {
        return member().skewness();
    }

    @Override
    default double excessKurtosis() {
        return member().excessKurtosis();
    }

    @Override
    default TailOrders tailOrders() {
        return member().tailOrders();
    }

    @Override
    default boolean isDiscrete() {
        return member().isDiscrete();
    }

    @Override
    default Support support() {
        return member().support();
    }

    @Override
    default Standardised standardised() {
        return member().standardised();
    }
}
