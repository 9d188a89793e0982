package dev.leadline.interval;

import java.util.function.DoubleUnaryOperator;

/// How many draws a rule is likely to take in all, with the limits between which that lies.
///
/// @param low at least so many
/// @param high at most so many; `∞` where nothing is known of it
public record DrawsNeeded(double low, double value, double high) {
    /// More than can be made.
    private static final double MOST = 1e30;

    /// Of a rule that stops once its half-width is small enough.
    ///
    /// @param unit half-width at n observations, in standard deviations of one of them: falling in n
    /// @param sd of one observation, as far as is known
    /// @param tolerance half-width to reach, in the unit of the observations
    public static DrawsNeeded of(DoubleUnaryOperator unit, Ratio sd, double tolerance) {
        return new DrawsNeeded(
                least(unit, tolerance / sd.low()),
                least(unit, tolerance / sd.value()),
                least(unit, tolerance / sd.high()));
    }

    /// Of a rule that waits for hits, from those of n independent draws: of a flow of hits, the wait for the
    /// others over the wait for these is a ratio of two gamma variables, whatever the rate.
    ///
    /// @param hits so far
    /// @param level with which the limits hold
    public static DrawsNeeded of(HitsRule rule, long hits, long n, double level) {
        long left = rule.hits() - hits;
        if (left <= 0) {
            return new DrawsNeeded(n, n, n);
        }
        double tail = (1 - level) / 2;
        var others = wait(left, hits, level);
        return new DrawsNeeded(n * (1 + others.low()), n * (1 + others.value()), n * (1 + others.high()));
    }

    /// Of the same rule where it begins anew: none of the n draws is one of its own.
    public static DrawsNeeded afresh(HitsRule rule, long hits, long n, double level) {
        var all = wait(rule.hits(), hits, level);
        return new DrawsNeeded(n * all.low(), n * all.value(), n * all.high());
    }

    /// The wait for so many hits over that for those seen.
    private static DrawsNeeded wait(long wanted, long hits, double level) {
        double tail = (1 - level) / 2;
        double low = odds(wanted, hits + 1, -LogOdds.upper(hits + 1, wanted, tail));
        return hits == 0
                ? new DrawsNeeded(low, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY)
                : new DrawsNeeded(low, (double) wanted / hits, odds(wanted, hits, LogOdds.upper(wanted, hits, tail)));
    }

    /// Those that are left after n draws.
    public DrawsNeeded after(double n) {
        return new DrawsNeeded(Math.max(0, low - n), Math.max(0, value - n), Math.max(0, high - n));
    }

    /// At least so many, as a guard asks.
    public DrawsNeeded atLeast(double n) {
        return new DrawsNeeded(Math.max(n, low), Math.max(n, value), Math.max(n, high));
    }

    private static double odds(double a, double b, double s) {
        return a / b * StrictMath.exp(s);
    }

    /// The least n from which on `unit` is at most this.
    private static double least(DoubleUnaryOperator unit, double most) {
        double high = 1;
        while (!(unit.applyAsDouble(high) <= most)) {
            high *= 2;
            if (high > MOST) {
                return Double.POSITIVE_INFINITY;
            }
        }
        double low = high / 2;
        return high == 1
                ? 1
                : Math.ceil(Crossing.between(n -> unit.applyAsDouble(n) - most, low, high, 1e-12 * high) * (1 - 1e-12));
    }
}
