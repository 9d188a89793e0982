package dev.leadline.density;

/// How the quantiles of a shape are computed for many draws. Immutable.
interface Curve {
    /// The quantiles of `location + scale * shape`, monotone in u; a negative scale mirrors the shape, and is
    /// asked of tables only.
    void fill(double[] u, double[] x, int n, double location, double scale);

    /// Largest error in probability that was measured.
    double uError();

    /// What it keeps in memory, nearly.
    long bytes();

    /// SHA-256 of what decides the bits.
    String hash();
}
