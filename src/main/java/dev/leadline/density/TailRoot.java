package dev.leadline.density;

import dev.leadline.numeric.Log;
import java.util.function.DoubleUnaryOperator;

/// Where the mass of a tail has a given size: Newton's method on its logarithm, kept within a bracket, which is halved
/// where a step would leave it.
final class TailRoot {
    /// After a step of this size the next one is exact.
    private static final double NEAR = 1e-7;

    private static final int TRIALS = 200;

    private TailRoot() {}

    /// The w with `mass(w) = p`, to about the square of [#NEAR].
    ///
    /// @param mass rises, or falls, from `low` to `high`
    /// @param slope of the mass, by w
    static double of(
            DoubleUnaryOperator mass, DoubleUnaryOperator slope, double p, double low, double high, double start) {
        double least = low;
        double most = high;
        double w = start > low && start < high ? start : 0.5 * (low + high);
        for (int trial = 0; trial < TRIALS; trial++) {
            double m = mass.applyAsDouble(w);
            double rise = slope.applyAsDouble(w);
            if (m < p == rise >= 0) {
                least = w;
            } else {
                most = w;
            }
            double next = w - m * Log.log(m / p) / rise;
            if (!(next > least && next < most)) {
                next = 0.5 * (least + most);
            }
            double step = Math.abs(next - w);
            w = next;
            if (step <= NEAR || most - least <= NEAR * NEAR) {
                break;
            }
        }
        return w;
    }
}
