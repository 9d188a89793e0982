package dev.leadline.estimate;

import java.util.Arrays;

/// The outermost values of each component of weighted draws, and the sums that say how much of all they make.
/// Confined to one worker; its memory does not grow with the draws.
///
/// Draws one by one, where an [Accumulator] sees observations of several. Which values are kept does not depend on
/// how draws are divided over calls; the sums do, so that the order of merging must be fixed.
public final class Extremes {
    /// Largest and smallest values kept of each component.
    public static final int KEPT = 1024;

    private final Side[] upper;
    private final Side[] lower;
    private final double[] size;
    private final double[] squares;
    private final double[] ownSquares;
    private final long[] nonzero;
    private long draws;

    public Extremes(int components) {
        upper = new Side[components];
        lower = new Side[components];
        Arrays.setAll(upper, _ -> new Side());
        Arrays.setAll(lower, _ -> new Side());
        size = new double[components];
        squares = new double[components];
        ownSquares = new double[components];
        nonzero = new long[components];
    }

    /// Adds the first `rows` draws; values that are not finite count nothing.
    ///
    /// @param values one array for each component
    public void add(double[][] values, int rows) {
        draws += rows;
        for (int k = 0; k < upper.length; k++) {
            add(k, values[k], rows);
            ownSquares[k] += ownSquares(values[k], values[upper.length - 1], rows);
        }
    }

    /// `weight outcome²`, of outcomes by their weights.
    private static double ownSquares(double[] values, double[] weights, int rows) {
        double sum = 0;
        for (int i = 0; i < rows; i++) {
            double square = values[i] * (values[i] / weights[i]);
            sum += Double.isFinite(square) ? square : 0;
        }
        return sum;
    }

    private void add(int k, double[] values, int rows) {
        double sum = 0;
        double sumOfSquares = 0;
        long count = 0;
        for (int i = 0; i < rows; i++) {
            double x = values[i];
            sum += Math.abs(x);
            sumOfSquares = Math.fma(x, x, sumOfSquares);
            count += x == 0 ? 0 : 1;
        }
        if (!Double.isFinite(sum)) {
            double[] finite = finite(values, rows);
            if (finite.length < rows) {
                add(k, finite, finite.length);
                return;
            }
        }
        size[k] += sum;
        squares[k] += sumOfSquares;
        nonzero[k] += count;
        Side above = upper[k];
        Side below = lower[k];
        for (int i = 0; i < rows; i++) {
            if (values[i] > above.threshold) {
                above.add(values[i]);
            }
            if (-values[i] > below.threshold) {
                below.add(-values[i]);
            }
        }
    }

    private static double[] finite(double[] values, int rows) {
        return Arrays.stream(values, 0, rows).filter(Double::isFinite).toArray();
    }

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
        var copy = new Extremes(upper.length);
        copy.merge(this);
        return copy;
    }

    public void clear() {
        draws = 0;
        for (int k = 0; k < upper.length; k++) {
            upper[k].clear();
            lower[k].clear();
            size[k] = 0;
            squares[k] = 0;
            ownSquares[k] = 0;
            nonzero[k] = 0;
        }
    }

    public int components() {
        return upper.length;
    }

    /// Draws seen.
    public long draws() {
        return draws;
    }

    /// Draws whose value is neither 0 nor not finite.
    public long nonzero(int k) {
        return nonzero[k];
    }

    /// The greatest values above 0, at most [#KEPT], the greatest first.
    public double[] greatest(int k) {
        return upper[k].falling();
    }

    /// The sizes of the smallest values below 0, at most [#KEPT], the greatest first.
    public double[] greatestBelow(int k) {
        return lower[k].falling();
    }

    /// The share of the sum of all sizes that the greatest one has; `NaN` where all are 0.
    public double largestShare(int k) {
        return Math.max(upper[k].max, lower[k].max) / size[k];
    }

    /// How many equal values would estimate their mean as well: the square of the sum of sizes over that of squares.
    public double effective(int k) {
        return size[k] * (size[k] / squares[k]);
    }

    /// The mean square that an outcome has where nothing is weighted, as far as these draws tell. The last
    /// component are the weights.
    public double ownSquare(int k) {
        return ownSquares[k] / size[size.length - 1];
    }

    /// The greatest of many values, at most [#KEPT].
    private static final class Side {
        private double[] values = new double[16];
        private int count;
        private double max;

        /// Nothing up to it is among them.
        private double threshold;

        void add(double x) {
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
            } else {
                keep();
            }
        }

        /// Throws away what is not among the greatest.
        private void keep() {
            if (count > KEPT) {
                Arrays.sort(values, 0, count);
                System.arraycopy(values, count - KEPT, values, 0, KEPT);
                count = KEPT;
                threshold = values[0];
            }
        }

        void merge(Side later) {
            for (int i = 0; i < later.count; i++) {
                add(later.values[i]);
            }
        }

        double[] falling() {
            double[] sorted = Arrays.copyOf(values, count);
            Arrays.sort(sorted);
            int n = Math.min(count, KEPT);
            double[] falling = new double[n];
            Arrays.setAll(falling, i -> sorted[sorted.length - 1 - i]);
            return falling;
        }

        void clear() {
            count = 0;
            max = 0;
            threshold = 0;
        }
    }
}
