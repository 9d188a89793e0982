package dev.leadline.interval;

import dev.leadline.numeric.Rounding;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;
import java.util.Optional;

/// The exact interval of Clopper and Pearson for a probability, from hits among independent draws.
///
/// It covers with at least its level, often with more. Error of the limits: a relative 1e-14, to 1e11 draws
/// (`ClopperPearsonTest`).
///
/// Source: Clopper and Pearson (1934), Biometrika 26, 404-413.
public final class ClopperPearson {
    /// Word of the project file and of the commands.
    public static final String KIND = "clopper-pearson";

    private static final String ASSUMPTION = "The draws are independent; nothing else is taken for granted.";

    private ClopperPearson() {}

    /// The two-sided interval. With failed evaluations it holds whatever those would have been: its lower limit takes
    /// them for misses, its upper one for hits.
    ///
    /// @param hits among the draws that could be evaluated
    /// @param n draws that could be evaluated
    /// @param failed draws that could not
    /// @param level of confidence, between 0 and 1
    public static Interval of(long hits, long n, long failed, double level) {
        check(hits, n, failed, level);
        long all = n + failed;
        if (all == 0) {
            return new Interval(
                    Double.NaN, Double.NaN, level, KIND, ASSUMPTION, Optional.of("an interval needs at least 1 draw"));
        }
        double tail = (1 - level) / 2;
        return new Interval(
                low(hits, all, tail),
                high(hits + failed, all, tail),
                level,
                KIND,
                ASSUMPTION,
                note(hits, n, failed, level));
    }

    /// The limits wanted; see [#of(long, long, long, double)].
    public static Interval of(long hits, long n, long failed, double level, Sides sides) {
        var interval = sides.of(level, twoSided -> of(hits, n, failed, twoSided));
        return sides == Sides.BOTH || n + failed == 0
                ? interval
                : new Interval(interval.low(), interval.high(), level, KIND, ASSUMPTION, bracket(failed));
    }

    private static Optional<String> bracket(long failed) {
        return failed == 0
                ? Optional.empty()
                : Optional.of(String.format(Locale.ROOT, "%,d failed evaluations", failed)
                        + " count as misses in the lower limit and as hits in the upper one");
    }

    private static Optional<String> note(long hits, long n, long failed, double level) {
        String bracket = bracket(failed).map(text -> "; " + text).orElse("");
        String percent = Interval.percent(level);
        if (hits == 0 && n > 0) {
            return Optional.of("no hit in " + draws(n) + ": below " + Rounding.atMost(upperLimit(0, n, failed, level))
                    + " with " + percent + " one-sided confidence" + bracket);
        }
        if (hits == n && n > 0) {
            return Optional.of("every one of " + draws(n) + " is a hit: above "
                    + downFromOne(lowerLimit(hits, n, failed, level)) + " with " + percent
                    + " one-sided confidence"
                    + bracket);
        }
        return bracket(failed);
    }

    /// Rounded down, to three significant digits of what is missing to 1: 0.99963 says more than 0.999.
    private static String downFromOne(double limit) {
        BigDecimal missing = BigDecimal.ONE.subtract(BigDecimal.valueOf(limit));
        return BigDecimal.ONE
                .subtract(missing.round(new MathContext(3, RoundingMode.CEILING)))
                .stripTrailingZeros()
                .toPlainString();
    }

    private static String draws(long n) {
        return n == 1 ? "1 draw" : String.format(Locale.ROOT, "%,d draws", n);
    }

    /// The one-sided upper limit: not above it with confidence `level`.
    public static double upperLimit(long hits, long n, long failed, double level) {
        check(hits, n, failed, level);
        return high(hits + failed, n + failed, 1 - level);
    }

    /// The one-sided lower limit: not below it with confidence `level`.
    public static double lowerLimit(long hits, long n, long failed, double level) {
        check(hits, n, failed, level);
        return low(hits, n + failed, 1 - level);
    }

    private static void check(long hits, long n, long failed, double level) {
        if (hits < 0 || hits > n || failed < 0) {
            throw new IllegalArgumentException(hits + " hits of " + n + " draws, " + failed + " failed");
        }
        Level.check(level);
    }

    private static double low(long k, long n, double tail) {
        return k == 0 ? 0 : k == n ? allHits(n, tail) : probability(k, n - k + 1, -LogOdds.upper(n - k + 1, k, tail));
    }

    private static double high(long k, long n, double tail) {
        return k == n ? 1 : k == 0 ? noHit(n, tail) : probability(k + 1, n - k, LogOdds.upper(k + 1, n - k, tail));
    }

    /// `p^n = tail`.
    private static double allHits(long n, double tail) {
        return StrictMath.exp(StrictMath.log(tail) / n);
    }

    /// `(1-p)^n = tail`.
    private static double noHit(long n, double tail) {
        return -StrictMath.expm1(StrictMath.log(tail) / n);
    }

    private static double probability(double a, double b, double s) {
        double odds = a / b * StrictMath.exp(s);
        return odds / (1 + odds);
    }
}
