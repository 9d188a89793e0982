package dev.leadline.density;

import dev.leadline.numeric.Log;
import java.util.function.DoubleUnaryOperator;

/// The place where a mass reaches a probability: Newton's method on the logarithm of the mass, within a bracket that is
/// halved, in numbers of doubles, wherever Newton does not gain. Immutable.
///
/// @param start tried first, where it is within the bracket
/// @param step after one of at most this length the place is near enough
record Root(double low, double high, double start, double step) {
    /// More than halving alone takes.
    private static final int TRIALS = 200;

    /// After a step of this size the next one is exact.
    private static final double LAST_BUT_ONE = 1e-7;

    static Root between(double low, double high) {
        return new Root(low, high, Double.NaN, 0);
    }

    Root from(double newStart) {
        return new Root(low, high, newStart, step);
    }

    /// To the square of `1e-7`, in far fewer trials where the mass has no more digits than that, or is costly.
    Root roughly() {
        return new Root(low, high, start, LAST_BUT_ONE);
    }

    /// The least double in the bracket at which the mass reaches p, or a neighbour of it.
    ///
    /// @param mass rising; at `low` at most p, at `high` at least p
    /// @param slope of the mass; it may be wrong, infinite, 0 or `NaN`
    /// @throws ArithmeticException where the mass is no number, since no side of it is right
    double rising(DoubleUnaryOperator mass, DoubleUnaryOperator slope, double p) {
        double lo = Math.max(low, -Double.MAX_VALUE);
        double hi = Math.min(high, Double.MAX_VALUE);
        double x = start > lo && start < hi ? start : middle(lo, hi);
        long width = Long.MAX_VALUE;
        for (int trial = 0; trial < TRIALS && Math.nextUp(lo) < hi; trial++) {
            double there = mass.applyAsDouble(x);
            if (Double.isNaN(there)) {
                throw new ArithmeticException("The mass at " + x + " is not a number.");
            }
            if (there < p) {
                lo = x;
            } else {
                hi = x;
            }
            double excess = Math.abs(there - p) < 0.1 * p ? (there - p) / p : Log.log(there / p);
            double steep = slope.applyAsDouble(x);
            double next = Double.isInfinite(steep) ? Double.NaN : x - excess * there / steep;
            if (Math.abs(next - x) <= Math.max(Math.ulp(x), step)) {
                return Math.clamp(next, lo, hi);
            }
            long left = order(hi) - order(lo);
            boolean gains = trial % 3 != 2 || Long.compareUnsigned(left, width >>> 1) <= 0;
            if (trial % 3 == 2) {
                width = left;
            }
            x = gains && next > lo && next < hi ? next : middle(lo, hi);
        }
        return hi;
    }

    /// As [#rising], of a mass that falls.
    double falling(DoubleUnaryOperator mass, DoubleUnaryOperator slope, double p) {
        return -new Root(-high, -low, -start, step)
                .rising(x -> mass.applyAsDouble(-x), x -> -slope.applyAsDouble(-x), p);
    }

    /// The double half-way between two, counted in doubles.
    private static double middle(double low, double high) {
        long a = order(low);
        long b = order(high);
        return fromOrder((a & b) + ((a ^ b) >> 1));
    }

    /// Whole numbers in the order of the doubles.
    private static long order(double x) {
        long bits = Double.doubleToRawLongBits(x);
        return bits >= 0 ? bits : Long.MIN_VALUE - bits;
    }

    private static double fromOrder(long order) {
        return Double.longBitsToDouble(order >= 0 ? order : Long.MIN_VALUE - order);
    }
}
