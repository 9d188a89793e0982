package dev.leadline.interval;

import dev.leadline.numeric.Normal;
import dev.leadline.numeric.Shortest;
import java.util.ArrayList;
import java.util.Locale;
import java.util.Optional;
import java.util.function.LongPredicate;

/// Which values of n independent draws, in increasing order, are limits of a quantile: with exact binomial
/// coverage, whatever the density; more than that where values repeat.
///
/// The lower limit is the largest rank l with `P(B < l)` at most the tail left out, the upper one the
/// smallest u with `P(B >= u)` at most that, with B binomial (n, q). A tail that is larger by less than a
/// relative 1e-12 counts as equal.
///
/// Error: none in the ranks, to 1e13 draws; 1e-12 in the coverage (`RanksTest`). Cost: .1 ms, and for
/// many draws that of a normal quantile.
///
/// Source: David and Nagaraja (2003), Order Statistics, section 7.1.
///
/// @param level of confidence
/// @param low rank of the lower limit, from 1 on; 0 where there is none, or none is wanted
/// @param high rank of the upper limit, to n; n + 1 where there is none, or none is wanted
public record Ranks(long n, double q, double level, Sides sides, long low, long high) {
    /// Word of the project file and of the commands.
    public static final String KIND = "order-statistics";

    private static final String ASSUMPTION = "The draws are independent; nothing else is taken for granted.";

    private static final double ROUNDING = 1 + 1e-12;

    /// From this variance on a guess is as good as the tails themselves, unless it is so near to a whole number.
    private static final double MANY = 1e5;

    private static final double MARGIN = 0.02;

    /// Draws beyond these are not counted.
    private static final long MOST = 1L << 53;

    /// @param n draws
    /// @param q between 0 and 1
    public static Ranks of(long n, double q, double level, Sides sides) {
        double tail = tail(q, level, sides);
        long low = sides == Sides.UPPER ? 0 : lower(n, q, tail);
        long high = sides == Sides.LOWER ? n + 1 : upper(n, q, tail);
        return new Ranks(n, q, level, sides, low, high);
    }

    private static double tail(double q, double level, Sides sides) {
        if (!(q > 0 && q < 1)) {
            throw new IllegalArgumentException("quantile " + q);
        }
        return (1 - sides.twoSided(level)) / 2;
    }

    private static long lower(long n, double q, double tail) {
        return last(n, q, tail, k -> BinomialTail.atMost(k, n, q) <= tail * ROUNDING) + 1;
    }

    private static long upper(long n, double q, double tail) {
        return n - last(n, 1 - q, tail, k -> BinomialTail.atLeast(n - k, n, q) <= tail * ROUNDING);
    }

    /// The last k at which `P(B <= k)` is at most `tail`.
    ///
    /// @param holds whether it is, exactly
    private static long last(long n, double q, double tail, LongPredicate holds) {
        double guess = guess(n, q, tail);
        double part = guess - Math.floor(guess);
        boolean certain = n * q * (1 - q) >= MANY && part > MARGIN && part < 1 - MARGIN;
        return certain ? (long) guess : last(n, (long) guess, holds);
    }

    /// Where `P(B <= k)` would be `tail` if k were no whole number: the expansion of Cornish and Fisher to the
    /// second order, with the correction for whole numbers. From a variance of [#MANY] on it is off by less
    /// than .001 for tails from 5e-10 to .05 (against SciPy, at seven n and q); `RanksTest` holds the ranks.
    private static double guess(long n, double q, double tail) {
        double z = -Normal.upperQuantile(tail);
        double spread = Math.sqrt(n * q * (1 - q));
        double square = z * z;
        double skewness = 1 - 2 * q;
        return n * q
                - 0.5
                + spread * z
                + skewness * (square - 1) / 6
                + ((1 - 6 * q * (1 - q)) * z * (square - 3) / 24 - skewness * skewness * z * (2 * square - 5) / 36)
                        / spread;
    }

    /// The last k from 0 to n - 1 at which `holds` is true, which it stays no longer; -1 where it nowhere
    /// is.
    private static long last(long n, long guess, LongPredicate holds) {
        long low = -1;
        long high = n;
        long at = Math.clamp(guess, -1, n);
        long step = 1;
        while (high - low > 1 && step > 0) {
            long k = Math.clamp(at, low + 1, high - 1);
            if (holds.test(k)) {
                low = k;
                at = k + step;
            } else {
                high = k;
                at = k - step;
            }
            step = low > -1 && high < n ? 0 : 2 * step;
        }
        while (high - low > 1) {
            long middle = low + (high - low) / 2;
            if (holds.test(middle)) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return low;
    }

    /// Probability that the quantile of a continuous density lies between the limits; of any other at least
    /// that.
    public double coverage() {
        return 1 - BinomialTail.atMost(low - 1, n, q) - BinomialTail.atLeast(high, n, q);
    }

    /// The least number of draws of which the `fromTop`-th largest is an upper limit.
    ///
    /// @param level of confidence of this limit alone
    /// @param fromTop 1 for the largest
    public static long drawsForUpper(double q, double level, int fromTop) {
        double tail = tail(q, level, Sides.UPPER);
        return draws(fromTop, n -> BinomialTail.atLeast(n - fromTop + 1, n, q) <= tail * ROUNDING);
    }

    /// The least number of draws of which the `fromBottom`-th smallest is a lower limit.
    public static long drawsForLower(double q, double level, int fromBottom) {
        double tail = tail(q, level, Sides.LOWER);
        return draws(fromBottom, n -> BinomialTail.atMost(fromBottom - 1, n, q) <= tail * ROUNDING);
    }

    private static long draws(int least, LongPredicate enough) {
        long few = least - 1;
        long many = least;
        while (many < MOST && !enough.test(many)) {
            few = many;
            many = Math.min(MOST, 2 * many);
        }
        while (many - few > 1) {
            long middle = few + (many - few) / 2;
            if (enough.test(middle)) {
                many = middle;
            } else {
                few = middle;
            }
        }
        return many;
    }

    /// Whether there is a lower limit.
    public boolean hasLow() {
        return low > 0;
    }

    public boolean hasHigh() {
        return high <= n;
    }

    /// @param lowValue the value of rank `low`; of no matter where there is none
    /// @param highValue the value of rank `high`, likewise
    public Interval interval(double lowValue, double highValue) {
        return new Interval(
                sides == Sides.UPPER ? Double.NEGATIVE_INFINITY : hasLow() ? lowValue : Double.NaN,
                sides == Sides.LOWER ? Double.POSITIVE_INFINITY : hasHigh() ? highValue : Double.NaN,
                level,
                KIND,
                ASSUMPTION,
                note());
    }

    /// @param sorted the n values, increasing
    public Interval interval(double[] sorted) {
        return interval(
                hasLow() ? sorted[Math.toIntExact(low - 1)] : Double.NaN,
                hasHigh() ? sorted[Math.toIntExact(high - 1)] : Double.NaN);
    }

    /// Which limits are missing, and how many draws have them.
    private Optional<String> note() {
        double alone = (1 + sides.twoSided(level)) / 2;
        var missing = new ArrayList<String>();
        if (sides != Sides.UPPER && !hasLow()) {
            missing.add(missing("lower", drawsForLower(q, alone, 1)));
        }
        if (sides != Sides.LOWER && !hasHigh()) {
            missing.add(missing("upper", drawsForUpper(q, alone, 1)));
        }
        return missing.isEmpty() ? Optional.empty() : Optional.of(String.join("; ", missing));
    }

    private String missing(String side, long needed) {
        return String.format(
                Locale.ROOT,
                "no %s limit of the %s quantile at this n (%,d); needs n = %,d",
                side,
                Shortest.text(q),
                n,
                needed);
    }
}
