package dev.leadline.density;

/// Draws of a density by inversion: a table of the quantile function with a checked error. Immutable, safe for all
/// threads.
public final class Inversion {
    private Inversion() {}

    /// The table of a density, from the cache of shapes where it was built before; takes 1 to 100 ms otherwise.
    public static Inversion of(Density density) {
        throw new UnsupportedOperationException();
    }

    /// Monotone in u.
    ///
    /// @param u probabilities in the open interval (0, 1), `n` of them from index 0
    /// @param x filled with the quantiles; may be the same array
    public void fill(double[] u, double[] x, int n) {
        throw new UnsupportedOperationException();
    }

    /// Largest `|cdf(x(u)) - u|` found when the table was built.
    public double uError() {
        throw new UnsupportedOperationException();
    }

    /// SHA-256 of the table, in hexadecimal: machines that build another table say so instead of differing silently.
    public String hash() {
        throw new UnsupportedOperationException();
    }
}
