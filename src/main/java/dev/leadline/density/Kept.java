package dev.leadline.density;

/// The mass of a density from the lower end of an interval on.
///
/// @param below the mass of the whole density below the interval
/// @param above the mass of the whole density that is not below it
record Kept(Density of, double low, double high, double below, double above) {
    /// Where the difference of two masses is a smaller part of them than this, it is integrated instead.
    private static final double NARROW = 0.1;

    private static final double LEAST = 1e-300;

    Kept(Density of, double low, double high) {
        this(of, low, high, of.cdf(before(of, low)), of.survival(before(of, low)));
    }

    private static double before(Density of, double x) {
        return of.isDiscrete() ? Math.nextDown(x) : x;
    }

    /// The mass from the lower end to `x`, both included.
    double mass(double x) {
        double p = of.cdf(x);
        double q = of.survival(x);
        double difference = p <= 0.5 ? p - below : above <= 0.5 ? above - q : 0.5 - below + (0.5 - q);
        double of = p <= 0.5 ? p : above <= 0.5 ? above : 0.5;
        return difference < NARROW * of && x > low ? integral(x, difference) : Math.max(difference, 0);
    }

    private double integral(double x, double difference) {
        return of.isDiscrete() || Double.isInfinite(low) || Double.isInfinite(x)
                ? Math.max(difference, 0)
                : Quadrature.halving(of::pdf, low, x).orElse(Math.max(difference, 0));
    }

    /// Where a density that is not discrete has this mass from the lower end on, or the least mass that it has with all
    /// its digits.
    double at(double wanted) {
        double mass = Math.max(wanted, LEAST);
        double p = below + mass;
        double q = above - mass;
        double x = Math.clamp(p <= 0.5 ? of.quantile(p) : of.upperQuantile(q), low, high);
        double rest = below <= 0.5 ? below : above;
        if (mass >= NARROW * rest || Double.isInfinite(low)) {
            return x;
        }
        double beyond =
                below <= 0.5 ? of.quantile(below * (1 + 2 * NARROW)) : of.upperQuantile(above * (1 - 2 * NARROW));
        return Root.between(low, Math.clamp(beyond, low, high))
                .from(low + mass / of.pdf(low))
                .rising(this::mass, of::pdf, mass);
    }
}
