package dev.leadline.scheme;

/// One coordinate of a replicate of a point set. Immutable, safe for all threads.
interface Coordinate {
    /// Points `firstPoint` to `firstPoint + rows - 1` in the open interval (0, 1), at the first `rows`
    /// indices of `u`.
    ///
    /// @throws IllegalArgumentException for points that the set does not have
    void fill(double[] u, long firstPoint, int rows);

    /// Refuses what is not among `points` points.
    static void check(long firstPoint, int rows, long points) {
        if (firstPoint < 0 || rows < 0 || firstPoint > points - rows) {
            throw new IllegalArgumentException(
                    rows + " points from " + firstPoint + " on: a replicate has " + points + " points");
        }
    }
}
