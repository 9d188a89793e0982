package dev.leadline.scheme;

/// The points of one item of work, read from first to last. Confined to one worker.
public interface Cursor {
    /// The next points.
    ///
    /// @param u one array for each input, at least `rows` long, filled with probabilities in the open
    ///     interval (0, 1); `null` for an input that nobody reads
    void next(double[][] u, int rows);
}
