package dev.leadline.interval;

import dev.leadline.stream.StreamKey;
import java.util.Arrays;

/// Samples of n from n observations, with replacement: how far their means lie from the mean of the
/// observations, and the standard errors of those means. Each sample has a stream of its own, so that it
/// does not depend on the others.
///
/// Cost: 2 ns for an observation of a sample, 3 ns where there are 100,000.
final class Resampling {
    /// Deviations from the mean, in parts of the largest, so that no square overflows.
    private final double[] deviations;

    private final double largest;
    private final StreamKey key;

    Resampling(double[] observations, double mean, StreamKey key) {
        largest = Arrays.stream(observations).map(x -> Math.abs(x - mean)).max().orElse(0);
        deviations = Arrays.stream(observations).map(x -> (x - mean) / largest).toArray();
        this.key = key;
    }

    /// One sample.
    ///
    /// @param off of its mean from that of the observations
    /// @param standardError of its mean; 0 where it holds one observation n times
    record Sample(double off, double standardError) {
        /// Student's ratio; `±∞` or 0 where there is no spread.
        double ratio() {
            return off == 0 ? 0 : off / standardError;
        }
    }

    Sample sample(int index) {
        int n = deviations.length;
        var stream = key.stream(index);
        double first = deviations[place(stream.next(), n)];
        boolean constant = true;
        double sum = first;
        double squares = first * first;
        for (int i = 1; i < n; i++) {
            double x = deviations[place(stream.next(), n)];
            constant &= x == first;
            sum += x;
            squares = Math.fma(x, x, squares);
        }
        double off = sum / n;
        double variance = constant ? 0 : Math.max(0, squares - sum * off) / (n - 1.0);
        return new Sample(largest * off, largest * Math.sqrt(variance / n));
    }

    /// From 0 to n - 1; unequally likely by less than a relative `n 2^-64`.
    private static int place(long bits, int n) {
        return (int) Math.unsignedMultiplyHigh(bits, n);
    }
}
