package dev.leadline.density;

/// A density at location 0 and scale 1: what tables are built of, and shared by.
///
/// A record whose components are what distinguishes one shape from another.
interface Shape extends Density {
    /// The quantile for `p` between 0 and 1, both excluded.
    double inner(double p);

    /// The upper quantile for `q` between 0 and 1, both excluded.
    double upperInner(double q);

    @Override
    default double quantile(double p) {
        return p > 0 && p < 1 ? inner(p) : end(p, support().low(), support().high());
    }

    @Override
    default double upperQuantile(double q) {
        return q > 0 && q < 1
                ? upperInner(q)
                : end(q, support().high(), support().low());
    }

    @Override
    default Standardised standardised() {
        return new Standardised(this, 0, 1);
    }

    private static double end(double p, double atZero, double atOne) {
        return p == 0 ? atZero : p == 1 ? atOne : Double.NaN;
    }
}
