package dev.leadline.interval;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.Optional;

/// Where a stated share of the values of an outcome lies, by the values of many draws in increasing order.
/// It says how the outcome varies, not how well anything is known: it does not shrink with more draws.
///
/// Of M values the interval reaches over `q = p M` ranks, rounded to a whole number; the symmetric one
/// leaves out as many below as above, the shortest one is the first of the shortest.
///
/// Source: JCGM 101:2008, 7.7. From memory.
///
/// @param low smallest value; `NaN` where M is too small
/// @param high largest value, likewise
/// @param probability p
/// @param lowRank rank of `low`, from 1 on; 0 where M is too small
/// @param highRank rank of `high`
/// @param note why there is none, and which M would do
public record CoverageInterval(
        double low, double high, double probability, long lowRank, long highRank, Optional<String> note) {
    /// Word of the project file and of the commands.
    public static final String SYMMETRIC = "symmetric";

    public static final String SHORTEST = "shortest";

    /// As many values below as above, or one more above.
    ///
    /// @param sorted values, increasing
    /// @param probability p, between 0 and 1
    public static CoverageInterval symmetric(double[] sorted, double probability) {
        long reach = reach(sorted.length, probability);
        long left = sorted.length - reach;
        return left < 1 ? none(sorted.length, probability) : at((left + 1) / 2, reach, sorted, probability);
    }

    /// The shortest, and of equally short ones the first.
    public static CoverageInterval shortest(double[] sorted, double probability) {
        int reach = Math.toIntExact(reach(sorted.length, probability));
        if (sorted.length - reach < 1) {
            return none(sorted.length, probability);
        }
        int best = 0;
        for (int i = 1; i + reach < sorted.length; i++) {
            if (sorted[i + reach] - sorted[i] < sorted[best + reach] - sorted[best]) {
                best = i;
            }
        }
        return at(best + 1, reach, sorted, probability);
    }

    /// The rank of the lower end of the symmetric interval of so many values; 0 where they are too few. The
    /// upper end is [#reach] ranks on.
    public static long symmetricRank(long values, double probability) {
        return (values - reach(values, probability) + 1) / 2;
    }

    /// Ranks from one end to the other: `p M`, of the decimal p, halves rounded up.
    public static long reach(long values, double probability) {
        if (!(probability > 0 && probability < 1)) {
            throw new IllegalArgumentException("coverage probability " + probability);
        }
        return BigDecimal.valueOf(probability)
                .multiply(BigDecimal.valueOf(values))
                .setScale(0, RoundingMode.HALF_UP)
                .longValueExact();
    }

    private static CoverageInterval at(long rank, long reach, double[] sorted, double probability) {
        return new CoverageInterval(
                sorted[Math.toIntExact(rank - 1)],
                sorted[Math.toIntExact(rank + reach - 1)],
                probability,
                rank,
                rank + reach,
                Optional.empty());
    }

    private static CoverageInterval none(long values, double probability) {
        // rounding p M stays below M where M (1 - p) is more than a half
        var above = BigDecimal.ONE.subtract(BigDecimal.valueOf(probability));
        var needed = new BigDecimal("0.5").divideToIntegralValue(above).add(BigDecimal.ONE);
        return new CoverageInterval(
                Double.NaN,
                Double.NaN,
                probability,
                0,
                0,
                Optional.of("%s of the values need at least %s of them; so far there %s %d"
                        .formatted(
                                Interval.percent(probability),
                                needed.toPlainString(),
                                values == 1 ? "is" : "are",
                                values)));
    }
}
