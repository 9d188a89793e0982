package dev.leadline.interval;

import dev.leadline.density.Poisson;
import java.util.Locale;
import java.util.Optional;

/// Stopping a probability at the r-th hit, which gives it a relative error that does not depend on how rare
/// the event is. The number of draws to stop at is the index of that hit among independent draws in their
/// order, not the end of the item of work it was found in.
///
/// Where a budget ends the run first, the interval is [ClopperPearson]'s; the two together are exact, since
/// each limit is that of one of the two counts, read along the same boundary (`HitsRuleTest`).
///
/// Source: Haldane (1945), Biometrika 33, 222-225, for the estimate; Mendo and Hernando (2006), IEEE
/// Transactions on Communications 54, 231-241.
///
/// @param hits to stop at, at least 2
/// @param level of confidence, between 0 and 1
public record HitsRule(long hits, double level) {
    /// Word of the project file and of the commands.
    public static final String KIND = "hits";

    /// As many hits as a relative tolerance of some 1e-5 asks for.
    private static final long MOST = 100_000_000_000L;

    private static final String ASSUMPTION =
            "The draws are independent and were stopped at a number of hits chosen beforehand; nothing else is taken for"
                    + " granted.";

    public HitsRule {
        Level.check(level);
        if (hits < 2) {
            throw new IllegalArgumentException(hits + " hits");
        }
    }

    /// The fewest hits with which the estimate is off by at most this part of the probability, with the level
    /// wanted, however small the probability is. Empty where no number of hits that can be waited for is
    /// enough.
    ///
    /// @param relative tolerance, above 0
    public static Optional<HitsRule> of(double relative, double level) {
        Level.check(level);
        if (!(relative > 0)) {
            throw new IllegalArgumentException("relative tolerance " + relative);
        }
        if (within(MOST, relative) < level) {
            return Optional.empty();
        }
        long low = 1;
        long high = MOST;
        while (high - low > 1) {
            long r = low + (high - low) / 2;
            if (within(r, relative) >= level) {
                high = r;
            } else {
                low = r;
            }
        }
        return Optional.of(new HitsRule(high, level));
    }

    /// `P(|(r - 1)/G - 1| <= ε)` for a gamma variable G of shape r, which exceeds x where a Poisson number of
    /// mean x is below r. For p to 0, (n - 1) p is such a variable; for larger p the estimate strays less.
    static double within(long r, double relative) {
        double below = new Poisson((r - 1) / (1 + relative)).beyond(r - 1);
        double above = relative < 1 ? new Poisson((r - 1) / (1 - relative)).upTo(r - 1) : 0;
        return 1 - below - above;
    }

    /// Without bias.
    ///
    /// @param n draw at which the last hit was found
    public double estimate(long n) {
        check(n);
        return (hits - 1.0) / (n - 1.0);
    }

    /// The exact interval.
    ///
    /// @param n draw at which the last hit was found
    public Interval of(long n) {
        check(n);
        double tail = (1 - level) / 2;
        double low = ClopperPearson.lowerLimit(hits, n, 0, 1 - tail);
        double high = n == hits ? 1 : ClopperPearson.upperLimit(hits - 1, n - 1, 0, 1 - tail);
        return new Interval(low, high, level, KIND, ASSUMPTION, Optional.empty());
    }

    private void check(long n) {
        if (n < hits) {
            throw new IllegalArgumentException(String.format(Locale.ROOT, "%d hits in %d draws", hits, n));
        }
    }
}
