package dev.leadline.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/// The outermost values of components of draws, and the sums that say how much of all they make. Confined
/// to one worker; its memory does not grow with the draws.
///
/// Draws one by one, where an [Accumulator] may see observations of several. Which values are kept depends
/// neither on how draws are divided over calls nor on the [Floor] of a part, where it is that of values
/// before it; the sums do depend on the division, so that the order of merging must be fixed.
///
/// Cost: nothing to speak of for a block of draws in which none is outermost and all have one sign.
public final class Extremes {
    /// Greatest and smallest values kept of each component: the tail of 1.8 million draws, and the cut-off.
    public static final int KEPT = 4096;

    /// Tails are looked at again after so many times the draws.
    private static final double OFTEN = 2;

    private final boolean[] watched;
    private final boolean weighted;
    private final Side[] upper;
    private final Side[] lower;
    private final double[] size;
    private final double[] squares;
    private final double[] ownSquares;
    private final long[] nonzero;
    private long draws;

    private final Outermost.Component[] seen;
    private long looked;

    /// Of every component, the last of which is the weight.
    public Extremes(int components) {
        this(all(components), true);
    }

    private static boolean[] all(int components) {
        boolean[] all = new boolean[components];
        Arrays.fill(all, true);
        return all;
    }

    /// @param watched which components to look at
    /// @param weighted whether the last component is the weight, that the others are multiplied by
    public Extremes(boolean[] watched, boolean weighted) {
        this.watched = watched.clone();
        this.weighted = weighted;
        int components = watched.length;
        upper = new Side[components];
        lower = new Side[components];
        Arrays.setAll(upper, _ -> new Side());
        Arrays.setAll(lower, _ -> new Side());
        size = new double[components];
        squares = new double[components];
        ownSquares = new double[components];
        nonzero = new long[components];
        seen = new Outermost.Component[components];
        Arrays.fill(seen, Outermost.UNSEEN);
    }

    /// Values that cannot be among the outermost: up to `above`, and with the other sign up to `below`.
    ///
    /// @param above of each component; none where every value counts, or none does
    public record Floor(double[] above, double[] below, double other) {
        /// Every value may be outermost.
        public static final Floor OPEN = new Floor(new double[0], new double[0], Double.NEGATIVE_INFINITY);

        /// No value is kept, only sums are.
        public static final Floor CLOSED = new Floor(new double[0], new double[0], Double.POSITIVE_INFINITY);

        private double above(int k) {
            return k < above.length ? above[k] : other;
        }

        private double below(int k) {
            return k < below.length ? below[k] : other;
        }
    }

    /// The floor of values that come later: so many are above it that none below can be outermost.
    public Floor floor() {
        return new Floor(
                Arrays.stream(upper).mapToDouble(side -> side.threshold).toArray(),
                Arrays.stream(lower).mapToDouble(side -> side.threshold).toArray(),
                Double.NEGATIVE_INFINITY);
    }

    /// Adds the first `rows` draws; values that are not finite count nothing.
    ///
    /// @param values one array for each component
    public void add(double[][] values, int rows) {
        draws += rows;
        for (int k = 0; k < upper.length; k++) {
            if (watched[k]) {
                add(k, values[k], rows);
                addOwnSquares(k, values, rows);
            }
        }
    }

    /// The same where an accumulator took in the same draws just before, whose sums need not be made again.
    public void add(double[][] values, int rows, Accumulator same) {
        Sums block = same.last();
        if (block.count != rows) {
            add(values, rows);
            return;
        }
        draws += rows;
        for (int k = 0; k < upper.length; k++) {
            if (watched[k]) {
                double mean = block.mean[k];
                squares[k] += block.products[Sums.at(k, k)] + rows * mean * mean;
                addSizes(k, values[k], rows, rows * mean, block.min[k], block.max[k]);
                addOwnSquares(k, values, rows);
            }
        }
    }

    /// `weight outcome²`, of outcomes by their weights.
    private void addOwnSquares(int k, double[][] values, int rows) {
        if (!weighted) {
            return;
        }
        double[] weights = values[values.length - 1];
        double sum = 0;
        for (int i = 0; i < rows; i++) {
            double square = values[k][i] * (values[k][i] / weights[i]);
            sum += Double.isFinite(square) ? square : 0;
        }
        ownSquares[k] += sum;
    }

    private void addSizes(int k, double[] values, int rows, double sum, double least, double greatest) {
        boolean isOneSided = least > 0 || greatest < 0;
        size[k] += isOneSided ? Math.abs(sum) : sizes(values, rows);
        nonzero[k] += isOneSided ? rows : rows - zeros(values, rows);
        upper[k].addAbove(values, rows, greatest);
        lower[k].addBelow(values, rows, least);
    }

    private void add(int k, double[] values, int rows) {
        double least = Double.POSITIVE_INFINITY;
        double greatest = Double.NEGATIVE_INFINITY;
        double sum = 0;
        double sumOfSquares = 0;
        // Even and odd side by side: one of each would wait for itself.
        double otherLeast = least;
        double otherGreatest = greatest;
        double otherSum = 0;
        double otherSquares = 0;
        int i = 0;
        for (; i + 1 < rows; i += 2) {
            double x = values[i];
            double y = values[i + 1];
            least = x < least ? x : least;
            otherLeast = y < otherLeast ? y : otherLeast;
            greatest = x > greatest ? x : greatest;
            otherGreatest = y > otherGreatest ? y : otherGreatest;
            sum += x;
            otherSum += y;
            sumOfSquares = Math.fma(x, x, sumOfSquares);
            otherSquares = Math.fma(y, y, otherSquares);
        }
        if (i < rows) {
            double x = values[i];
            least = x < least ? x : least;
            greatest = x > greatest ? x : greatest;
            sum += x;
            sumOfSquares = Math.fma(x, x, sumOfSquares);
        }
        least = Math.min(least, otherLeast);
        greatest = Math.max(greatest, otherGreatest);
        sum += otherSum;
        sumOfSquares += otherSquares;
        if (!Double.isFinite(sum)) {
            double[] finite =
                    Arrays.stream(values, 0, rows).filter(Double::isFinite).toArray();
            if (finite.length < rows) {
                add(k, finite, finite.length);
                return;
            }
        }
        squares[k] += sumOfSquares;
        addSizes(k, values, rows, sum, least, greatest);
    }

    /// Side by side, since one sum would wait for itself.
    private static double sizes(double[] x, int rows) {
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        int i = 0;
        for (; i + 3 < rows; i += 4) {
            a += Math.abs(x[i]);
            b += Math.abs(x[i + 1]);
            c += Math.abs(x[i + 2]);
            d += Math.abs(x[i + 3]);
        }
        for (; i < rows; i++) {
            a += Math.abs(x[i]);
        }
        return (a + b) + (c + d);
    }

    private static int zeros(double[] x, int rows) {
        int zeros = 0;
        for (int i = 0; i < rows; i++) {
            zeros += x[i] == 0 ? 1 : 0;
        }
        return zeros;
    }

    /// Adds what `later` has seen, as if its draws had come after those seen here; `later` stays as it is.
    public void merge(Extremes later) {
        draws += later.draws;
        for (int k = 0; k < upper.length; k++) {
            upper[k].merge(later.upper[k]);
            lower[k].merge(later.lower[k]);
            size[k] += later.size[k];
            squares[k] += later.squares[k];
            ownSquares[k] += later.ownSquares[k];
            nonzero[k] += later.nonzero[k];
        }
    }

    public Extremes copy() {
        var copy = new Extremes(watched, weighted);
        copy.merge(this);
        return copy;
    }

    /// Forgets everything; what comes next is up to `floor` not outermost.
    public void clear(Floor floor) {
        draws = 0;
        looked = 0;
        for (int k = 0; k < upper.length; k++) {
            upper[k].clear(floor.above(k));
            lower[k].clear(floor.below(k));
            size[k] = 0;
            squares[k] = 0;
            ownSquares[k] = 0;
            nonzero[k] = 0;
        }
    }

    /// Looks at the tails, where there are twice the draws of the last time.
    public void follow() {
        if (draws >= OFTEN * looked) {
            look();
        }
    }

    /// Looks at the tails.
    public void look() {
        if (looked == draws) {
            return;
        }
        looked = draws;
        for (int k = 0; k < upper.length; k++) {
            if (watched[k]) {
                double[] greatest = k == upper.length - 1 ? upper[k].falling() : new double[0];
                seen[k] = new Outermost.Component(0, 0, 0, 0, 0, greatest, upper[k].tail(draws), lower[k].tail(draws));
            }
        }
    }

    /// What is known now; of the tails, when they were looked at last.
    public Outermost outermost() {
        List<Outermost.Component> components = new ArrayList<>();
        for (int k = 0; k < upper.length; k++) {
            components.add(
                    watched[k]
                            ? new Outermost.Component(
                                    nonzero[k],
                                    size[k],
                                    squares[k],
                                    ownSquares[k],
                                    Math.max(upper[k].max, lower[k].max),
                                    seen[k].greatest(),
                                    seen[k].above(),
                                    seen[k].below())
                            : Outermost.UNSEEN);
        }
        return new Outermost(draws, components);
    }

    /// The greatest of many values, at most [#KEPT] when they are read.
    private static final class Side {
        private double[] values = new double[16];
        private int count;
        private double max = Double.NEGATIVE_INFINITY;

        /// Nothing up to it is among them.
        private double threshold = Double.NEGATIVE_INFINITY;

        /// Four at a time: where few are above the threshold, the loop goes as fast as it reads.
        void addAbove(double[] x, int rows, double greatest) {
            double t = threshold;
            if (!(greatest > t)) {
                return;
            }
            int i = 0;
            for (; i + 3 < rows; i += 4) {
                if (x[i] > t || x[i + 1] > t || x[i + 2] > t || x[i + 3] > t) {
                    add(x[i]);
                    add(x[i + 1]);
                    add(x[i + 2]);
                    add(x[i + 3]);
                    t = threshold;
                }
            }
            for (; i < rows; i++) {
                add(x[i]);
            }
        }

        void addBelow(double[] x, int rows, double least) {
            double t = -threshold;
            if (!(least < t)) {
                return;
            }
            int i = 0;
            for (; i + 3 < rows; i += 4) {
                if (x[i] < t || x[i + 1] < t || x[i + 2] < t || x[i + 3] < t) {
                    add(-x[i]);
                    add(-x[i + 1]);
                    add(-x[i + 2]);
                    add(-x[i + 3]);
                    t = -threshold;
                }
            }
            for (; i < rows; i++) {
                add(-x[i]);
            }
        }

        private void add(double x) {
            if (!(x > threshold)) {
                return;
            }
            if (count == values.length) {
                grow();
            }
            values[count++] = x;
            max = Math.max(max, x);
        }

        private void grow() {
            if (count < 2 * KEPT) {
                values = Arrays.copyOf(values, 2 * count);
                return;
            }
            toFront(values, count, KEPT);
            count = KEPT;
            threshold = Arrays.stream(values, 0, KEPT).min().orElseThrow();
        }

        /// Hoare's partitions, until the greatest stand in front.
        private static void toFront(double[] x, int count, int greatest) {
            int low = 0;
            int high = count - 1;
            while (low < high) {
                double a = x[low];
                double b = x[(low + high) / 2];
                double c = x[high];
                double middle = Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
                int i = low;
                int j = high;
                while (i <= j) {
                    while (x[i] > middle) {
                        i++;
                    }
                    while (x[j] < middle) {
                        j--;
                    }
                    if (i <= j) {
                        double swapped = x[i];
                        x[i++] = x[j];
                        x[j--] = swapped;
                    }
                }
                if (greatest - 1 <= j) {
                    high = j;
                } else if (greatest - 1 >= i) {
                    low = i;
                } else {
                    return;
                }
            }
        }

        void merge(Side later) {
            for (int i = 0; i < later.count; i++) {
                add(later.values[i]);
            }
        }

        TailIndex tail(long draws) {
            return TailIndex.of(falling(TailIndex.length(draws) + 1), draws);
        }

        double[] falling() {
            return falling(KEPT);
        }

        private double[] falling(int most) {
            double[] greatest = Arrays.copyOf(values, count);
            int n = Math.min(count, Math.min(most, KEPT));
            toFront(greatest, count, n);
            Arrays.sort(greatest, 0, n);
            double[] falling = new double[n];
            Arrays.setAll(falling, i -> greatest[n - 1 - i]);
            return falling;
        }

        void clear(double floor) {
            count = 0;
            max = Double.NEGATIVE_INFINITY;
            threshold = floor;
        }
    }
}
