package dev.leadline.estimate;

import java.util.Arrays;
import java.util.function.IntPredicate;

/// How two columns go together. `NaN` where all values of a column are equal.
public final class Association {
    private Association() {}

    /// Pearson's correlation of the values.
    public static double pearson(double[] x, double[] y) {
        double meanX = Arrays.stream(x).average().orElse(Double.NaN);
        double meanY = Arrays.stream(y).average().orElse(Double.NaN);
        double xx = 0;
        double yy = 0;
        double xy = 0;
        for (int i = 0; i < x.length; i++) {
            double a = x[i] - meanX;
            double b = y[i] - meanY;
            xx = Math.fma(a, a, xx);
            yy = Math.fma(b, b, yy);
            xy = Math.fma(a, b, xy);
        }
        return xy / (Math.sqrt(xx) * Math.sqrt(yy));
    }

    /// Ranks from 0, equal values sharing the mean of theirs. Spearman's correlation is [Pearson's][#pearson] of them.
    public static double[] ranks(double[] x) {
        double[] sorted = x.clone();
        Arrays.sort(sorted);
        double[] ranks = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            ranks[i] = 0.5 * (below(sorted, x[i]) + below(sorted, Math.nextUp(x[i])) - 1);
        }
        return ranks;
    }

    /// Spearman's correlation of the distribution that the rows were drawn from, without bias where it has no equal
    /// values: the correlation of the ranks of n rows has the mean `((n - 2) ρ + 3 τ) / (n + 1)`, with Kendall's τ.
    /// Where there are equal values it is the correlation of the ranks.
    ///
    /// Source: Hoeffding (1948), Annals of Mathematical Statistics 19, 293-325, section 9c.
    ///
    /// @param x ranks, as is `y`
    public static double spearman(double[] x, double[] y) {
        double ofRanks = pearson(x, y);
        if (hasEqual(x) || hasEqual(y)) {
            return ofRanks;
        }
        double n = x.length;
        return ((n + 1) * ofRanks - 3 * kendall(x, y)) / (n - 2);
    }

    /// Equal values that share their mean rank have smaller squares.
    private static boolean hasEqual(double[] ranks) {
        double n = ranks.length;
        double squares = Arrays.stream(ranks).map(rank -> rank * rank).sum();
        return squares < (n - 1) * n * (2 * n - 1) / 6;
    }

    /// Kendall's correlation, the form for ties (tau-b): pairs of rows in the same order in both columns less those in
    /// opposite order, over the root of the pairs that differ in the one times those that differ in the other.
    ///
    /// Source: Knight (1966), Journal of the American Statistical Association 61, 436-439: the pairs in opposite
    /// order are the exchanges of a merge sort by y after a sort by x.
    ///
    /// @param x its order is all that counts, so that ranks do
    public static double kendall(double[] x, double[] y) {
        int n = x.length;
        double[] sortedX = x.clone();
        double[] sortedY = y.clone();
        Arrays.sort(sortedX);
        Arrays.sort(sortedY);
        long[] rows = new long[n];
        for (int i = 0; i < n; i++) {
            rows[i] = (long) below(sortedX, x[i]) << 32 | below(sortedY, y[i]);
        }
        Arrays.sort(rows);
        int[] order = new int[n];
        for (int i = 0; i < n; i++) {
            order[i] = (int) rows[i];
        }
        long all = pairs(n);
        long equalX = equal(n, i -> rows[i] >> 32 == rows[i - 1] >> 32);
        long equalY = equal(n, i -> sortedY[i] == sortedY[i - 1]);
        long equalBoth = equal(n, i -> rows[i] == rows[i - 1]);
        long opposite = exchanges(order, new int[n], 0, n);
        double difference = all - equalX - equalY + equalBoth - 2 * opposite;
        return difference / (Math.sqrt(all - equalX) * Math.sqrt(all - equalY));
    }

    /// How many values are smaller.
    private static int below(double[] sorted, double x) {
        int from = 0;
        int to = sorted.length;
        while (from < to) {
            int middle = (from + to) >>> 1;
            if (sorted[middle] < x) {
                from = middle + 1;
            } else {
                to = middle;
            }
        }
        return from;
    }

    /// Pairs of equal rows among `n` in order.
    ///
    /// @param asBefore whether a row equals the one before it
    private static long equal(int n, IntPredicate asBefore) {
        long pairs = 0;
        int run = 0;
        for (int i = 1; i < n; i++) {
            run = asBefore.test(i) ? run + 1 : 0;
            pairs += run;
        }
        return pairs;
    }

    private static long pairs(long n) {
        return n * (n - 1) / 2;
    }

    /// Sorts a stretch; how many neighbours a sort by exchanges would have swapped.
    private static long exchanges(int[] y, int[] other, int from, int to) {
        if (to - from < 2) {
            return 0;
        }
        int middle = (from + to) >>> 1;
        long exchanges = exchanges(y, other, from, middle) + exchanges(y, other, middle, to);
        System.arraycopy(y, from, other, from, to - from);
        int left = from;
        int right = middle;
        for (int i = from; i < to; i++) {
            if (right == to || left < middle && other[left] <= other[right]) {
                y[i] = other[left++];
            } else {
                y[i] = other[right++];
                exchanges += middle - left;
            }
        }
        return exchanges;
    }
}
