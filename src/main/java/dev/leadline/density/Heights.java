package dev.leadline.density;

/// A density, or its logarithm, up to a factor: all that is known of it. Safe for all threads.
@FunctionalInterface
public interface Heights {
    /// The heights at the first `n` points, at most `Program.BLOCK`, with the same bits as one by one.
    ///
    /// @param x points; not changed
    /// @param heights filled; not `x`
    void fill(double[] x, double[] heights, int n);
}
