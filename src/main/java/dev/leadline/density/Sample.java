package dev.leadline.density;

import dev.leadline.numeric.Log;
import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;

/// Ordered values, and what a fit begins from.
///
/// @param mean and standard deviation, which divides by n
record Sample(double[] sorted, double mean, double sd) {

    static Sample of(double... sorted) {
        var moments = Empirical.of(sorted);
        return new Sample(sorted, moments.mean(), Math.sqrt(moments.variance()));
    }

    int size() {
        return sorted.length;
    }

    double least() {
        return sorted[0];
    }

    double most() {
        return sorted[sorted.length - 1];
    }

    double median() {
        int n = sorted.length;
        return 0.5 * sorted[(n - 1) / 2] + 0.5 * sorted[n / 2];
    }

    /// Half the distance between the quartiles.
    double halfWidth() {
        int n = sorted.length;
        return 0.5 * (sorted[3 * (n - 1) / 4] - sorted[(n - 1) / 4]);
    }

    boolean isWhole() {
        return Arrays.stream(sorted).allMatch(x -> x == Math.rint(x));
    }

    /// The mean of a function of the values.
    double mean(DoubleUnaryOperator f) {
        return Arrays.stream(sorted).map(f).sum() / sorted.length;
    }

    Sample mapped(DoubleUnaryOperator f) {
        double[] values = Arrays.stream(sorted).map(f).toArray();
        Arrays.sort(values);
        return of(values);
    }

    Sample logs() {
        return mapped(Log::log);
    }
}
