package dev.leadline.density;

import java.util.List;

/// Draws of a density by inversion: a table of the quantile function with a checked error. Immutable, safe for all
/// threads.
public final class Inversion {
    private final Curve curve;
    private final double location;
    private final double scale;

    private Inversion(Curve curve, double location, double scale) {
        this.curve = curve;
        this.location = location;
        this.scale = scale;
    }

    /// The table of a density, from the cache of shapes where it was built before; takes 1 to 400 ms otherwise,
    /// for mixtures that are truncated up to a second.
    public static Inversion of(Density density) {
        var standardised = density.standardised();
        return new Inversion(Curves.of(standardised.shape()), standardised.location(), standardised.scale());
    }

    /// Those of many densities, built side by side.
    public static List<Inversion> of(List<Density> densities) {
        return densities.parallelStream().map(Inversion::of).toList();
    }

    /// Monotone in u.
    ///
    /// @param u probabilities from `2^-53` to `1 - 2^-53`, `n` of them from index 0; one nearer to 0 or 1 counts as
    ///     that
    /// @param x filled with the quantiles; may be the same array
    public void fill(double[] u, double[] x, int n) {
        curve.fill(u, x, n, location, scale);
    }

    /// Largest `|cdf(x(u)) - u|` found when the table was built, beyond what the rounding of x explains.
    public double uError() {
        return curve.uError();
    }

    /// SHA-256 of the table, in hexadecimal: machines that build another table say so instead of differing silently.
    public String hash() {
        return curve.hash();
    }
}
