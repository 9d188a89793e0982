package dev.leadline.estimate;

import dev.leadline.numeric.Normal;

/// A probability as trades say it. `NaN` where there is no such number: for 0, for 1, and for none at all.
public final class Chance {

    private Chance() {}

    /// The reliability index `-Φ⁻¹(p)`.
    public static double beta(double p) {
        return p > 0 && p < 1 ? Normal.upperQuantile(p) : Double.NaN;
    }

    /// N, where the chance is 1 in N.
    public static double oneIn(double p) {
        return p > 0 && p <= 1 ? 1 / p : Double.NaN;
    }
}
