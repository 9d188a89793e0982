package dev.leadline.scheme;

/// How far points are from an event, as splitting asks. Confined to one worker.
@FunctionalInterface
public interface Score {
    /// @param z independent standard normal coordinates of the points: one array for each coordinate, at least `rows`
    ///     long; not changed
    /// @param rows from 1 to [Splitting#BLOCK]
    /// @param score filled: above 0 where the point lies in the event, at most 0 where it does not, the larger
    ///     the nearer it is; `NaN` where the point could not be evaluated
    void at(double[][] z, int rows, double[] score);
}
