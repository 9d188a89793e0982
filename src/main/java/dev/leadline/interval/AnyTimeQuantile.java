package dev.leadline.interval;

import java.util.Locale;
import java.util.Optional;
import java.util.function.LongPredicate;

/// The any-time band of a quantile, as ranks of the values sorted upwards: the q-quantile of the distribution
/// lies between the values of these two ranks, at all n at once. How many draws lie at or below it is a count
/// of hits of chance q, and [AnyTimeChance] says which counts are seldom reached at any n. Exact for
/// continuous values, and with more than its level where values repeat.
///
/// Source: Howard and Ramdas (2022), Bernoulli 28, 1704-1728.
///
/// @param q level of the quantile, between 0 and 1
public record AnyTimeQuantile(double q, AnyTimeChance chance) {
    /// Word of the project file and of the commands.
    public static final String KIND = "any-time-quantile";

    static final String ASSUMPTION =
            "The draws are independent; nothing else is taken for granted, and the band holds at all n at once.";

    public AnyTimeQuantile {
        if (!(q > 0 && q < 1)) {
            throw new IllegalArgumentException("quantile " + q + " is not between 0 and 1");
        }
    }

    /// Nearly the tightest at n draws.
    public static AnyTimeQuantile tunedTo(double n, double q, double level) {
        return new AnyTimeQuantile(q, AnyTimeChance.tunedTo(n, level));
    }

    /// The rank, from 1 up, of the value that is the lower limit; 0 where n draws are too few for one.
    public long lowerRank(long n) {
        return first(0, middle(n), k -> isPlausible(k, n));
    }

    /// The rank of the value that is the upper limit; `n + 1` where n draws are too few for one.
    public long upperRank(long n) {
        return first(middle(n), n + 1, k -> !isPlausible(k, n));
    }

    /// The fewest draws from which both limits exist.
    public long leastDraws() {
        long enough = 1;
        while (!hasLimits(enough)) {
            enough *= 2;
        }
        return first(enough / 2 + 1, enough, this::hasLimits);
    }

    private boolean hasLimits(long n) {
        return !isPlausible(0, n) && !isPlausible(n, n);
    }

    /// The band after n draws.
    ///
    /// @param low value of rank [#lowerRank]; anything where that is 0
    /// @param high value of rank [#upperRank]; anything where that is above n
    public Interval of(double low, double high, long n) {
        boolean hasLow = lowerRank(n) > 0;
        boolean hasHigh = upperRank(n) <= n;
        return new Interval(
                hasLow ? low : Double.NaN,
                hasHigh ? high : Double.NaN,
                level(),
                KIND,
                ASSUMPTION,
                hasLow && hasHigh
                        ? Optional.empty()
                        : Optional.of(String.format(
                                Locale.ROOT,
                                "%,d draws are too few for %s limit of this band: it takes %,d",
                                n,
                                hasLow ? "the upper" : hasHigh ? "the lower" : "either",
                                leastDraws())));
    }

    private long middle(long n) {
        return Math.round(q * n);
    }

    private boolean isPlausible(long hits, long n) {
        return hits <= n && chance.log(hits, n, q, 1 - q) < -StrictMath.log(1 - level());
    }

    public double level() {
        return chance.level();
    }

    /// The first k from `from` on that is so, where `to` is.
    private static long first(long from, long to, LongPredicate isSo) {
        long low = from - 1;
        long high = to;
        while (high - low > 1) {
            long k = low + (high - low) / 2;
            if (isSo.test(k)) {
                high = k;
            } else {
                low = k;
            }
        }
        return high;
    }
}
