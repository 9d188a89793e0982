package dev.leadline.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/// The variance of a statistic from what it becomes when one group of observations after the other is left out.
///
/// Groups need not be equal in size; where each is one observation this is the ordinary jackknife. Degrees of freedom
/// count groups by their sizes: for equal ones their number less 1.
///
/// Source: Busing, Meijer and van der Leeden (1999), Statistics and Computing 9, 3-8.
public final class Jackknife {
    private Jackknife() {}

    /// @param sizes of the groups, in any unit
    /// @param whole the statistic of all groups
    /// @param without the statistic of all groups but one, for each
    public static Logarithm of(double[] sizes, double whole, double[] without) {
        int groups = sizes.length;
        double all = Arrays.stream(sizes).sum();
        double corrected = groups * whole;
        for (int j = 0; j < groups; j++) {
            corrected -= (1 - sizes[j] / all) * without[j];
        }
        double variance = 0;
        double squares = 0;
        for (int j = 0; j < groups; j++) {
            double times = all / sizes[j];
            double pseudo = times * whole - (times - 1) * without[j];
            variance += (pseudo - corrected) * (pseudo - corrected) / (times - 1) / groups;
            squares += sizes[j] * sizes[j];
        }
        return new Logarithm(whole, variance, all * all / squares - 1);
    }

    /// The sums of all groups but one, for each.
    public static List<Accumulator> without(List<Accumulator> groups) {
        int count = groups.size();
        int components = groups.getFirst().components();
        var after = new ArrayList<Accumulator>();
        after.add(new Accumulator(components));
        for (int j = count - 1; j > 0; j--) {
            var sum = groups.get(j).copy();
            sum.merge(after.getLast());
            after.add(sum);
        }
        var before = new Accumulator(components);
        var without = new ArrayList<Accumulator>();
        for (int j = 0; j < count; j++) {
            var sum = before.copy();
            sum.merge(after.get(count - 1 - j));
            without.add(sum);
            before.merge(groups.get(j));
        }
        return without;
    }

    /// The logarithm of the variance of a mean's observations, from their fourth moment: the limit of leaving out one
    /// after the other. Unbiased for normal observations.
    public static Logarithm ofVariance(Accumulator sums, int k) {
        double n = sums.count();
        return new Logarithm(
                StrictMath.log(sums.variance(k)), Math.max(0, sums.excessKurtosis(k) + 2) / (n - 1), n - 1);
    }
}
