package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;

/// Hoeffding's interval for a mean of independent observations that lie within known bounds: it holds with
/// at least its level at any n, whatever the density. It looks at the bounds alone, so that it is long
/// where most values lie close together.
///
/// Source: Hoeffding (1963), Journal of the American Statistical Association 58, 13-30, theorem 2.
public final class Hoeffding {
    /// Word of the project file and of the commands.
    public static final String KIND = "hoeffding";

    private static final String ASSUMPTION =
            "The observations are independent and lie within the bounds stated; nothing else is taken for granted.";

    private Hoeffding() {}

    /// Both limits.
    public static Interval of(Accumulator sums, int k, double least, double most, double level) {
        return of(sums, k, least, most, level, Sides.BOTH);
    }

    /// @param least bound of the observations of component k
    /// @param most bound, above `least`
    public static Interval of(Accumulator sums, int k, double least, double most, double level, Sides sides) {
        Level.check(level);
        return Bounded.refusal(sums, k, 1, least, most)
                .map(note -> Interval.none(level, KIND, ASSUMPTION, note))
                .orElseGet(() -> Bounded.interval(
                        sums.mean(k),
                        at -> (most - least) * halfWidth(sums.count(), at),
                        least,
                        most,
                        level,
                        sides,
                        KIND,
                        ASSUMPTION));
    }

    /// Half the length where the bounds are 1 apart.
    static double halfWidth(long n, double level) {
        return Math.sqrt(StrictMath.log(2 / (1 - level)) / (2.0 * n));
    }
}
