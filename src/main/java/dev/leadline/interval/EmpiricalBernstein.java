package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;

/// The interval of Maurer and Pontil for a mean of independent observations that lie within known bounds:
/// it holds with at least its level at any n, whatever the density, and is shorter than Hoeffding's where
/// the variance is small.
///
/// Each tail has half of what the level leaves out. Equal observations are no exception: then the length is
/// that of the term in `1/n`.
///
/// Source: Maurer and Pontil (2009), Empirical Bernstein bounds and sample variance penalization, theorem
/// 4.
public final class EmpiricalBernstein {
    /// Word of the project file and of the commands.
    public static final String KIND = "empirical-bernstein";

    private static final String ASSUMPTION =
            "The observations are independent and lie within the bounds stated; nothing else is taken for granted.";

    private EmpiricalBernstein() {}

    /// Both limits.
    public static Interval of(Accumulator sums, int k, double least, double most, double level) {
        return of(sums, k, least, most, level, Sides.BOTH);
    }

    /// @param least bound of the observations of component k
    /// @param most bound, above `least`
    public static Interval of(Accumulator sums, int k, double least, double most, double level, Sides sides) {
        Level.check(level);
        double range = most - least;
        double sd = Math.sqrt(sums.variance(k)) / range;
        // a variance that underflows is below 1e-300
        double variance = Double.isNaN(sd) ? 0 : sd * sd;
        return Bounded.refusal(sums, k, 2, least, most)
                .map(note -> Interval.none(level, KIND, ASSUMPTION, note))
                .orElseGet(() -> Bounded.interval(
                        sums.mean(k),
                        at -> range * halfWidth(sums.count(), variance, at),
                        least,
                        most,
                        level,
                        sides,
                        KIND,
                        ASSUMPTION));
    }

    /// Half the length where the bounds are 1 apart.
    ///
    /// @param variance unbiased, of the observations
    static double halfWidth(long n, double variance, double level) {
        double log = StrictMath.log(4 / (1 - level));
        return Math.sqrt(2 * variance * log / n) + 7 * log / (3 * (n - 1.0));
    }
}
