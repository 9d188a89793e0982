package dev.leadline.estimate;

import java.util.OptionalLong;

/// Moments of a stream of observations, each a small vector: mean, covariance, skewness, kurtosis, smallest and largest
/// value of the components. Confined to one worker; its memory does not grow with the observations.
///
/// An observation with any component that is not finite is left whole out of the sums and counted in [#excluded()].
///
/// The bits depend on how the observations are divided over calls of [#add] and [#merge], and on their order, so those
/// must be fixed; the values hardly do.
public final class Accumulator {
    /// Observations reduced at a time, by two passes over numbers that stay in the first cache.
    private static final int BLOCK = 1024;

    private final int components;
    private final Sums total;
    private final Sums block;
    private final double[][] kept;
    private final double[][] deviations;
    private long excluded;

    /// @param components of an observation, at least 1
    public Accumulator(int components) {
        if (components < 1) {
            throw new IllegalArgumentException("an observation has at least one component, not " + components);
        }
        this.components = components;
        total = new Sums(components);
        block = new Sums(components);
        kept = new double[components][BLOCK];
        deviations = new double[components][BLOCK];
    }

    /// Adds the observations with indices `from` (inclusive) to `to` (exclusive).
    ///
    /// @param values one array for each component, one element for each observation; not changed
    public void add(double[][] values, int from, int to) {
        if (values.length != components) {
            throw new IllegalArgumentException(values.length + " components where " + components + " were declared");
        }
        for (int start = from; start < to; start += BLOCK) {
            addBlock(values, start, Math.min(start + BLOCK, to));
        }
    }

    private void addBlock(double[][] values, int from, int to) {
        long bad = 0;
        for (double[] column : values) {
            bad |= notFinite(column, from, to);
        }
        if (bad < 0) {
            int rows = keepFinite(values, from, to);
            excluded += to - from - rows;
            reduce(kept, 0, rows);
        } else {
            reduce(values, from, to);
        }
        total.merge(block);
    }

    /// Negative where some value is infinite or not a number: its exponent is all ones, and one more carries into the
    /// sign.
    private static long notFinite(double[] x, int from, int to) {
        long carry = 0;
        for (int i = from; i < to; i++) {
            carry |= (Double.doubleToRawLongBits(x[i]) & 0x7FF0000000000000L) + 0x0010000000000000L;
        }
        return carry;
    }

    private int keepFinite(double[][] values, int from, int to) {
        int rows = 0;
        for (int i = from; i < to; i++) {
            boolean finite = true;
            for (int k = 0; k < components; k++) {
                kept[k][rows] = values[k][i];
                finite &= Double.isFinite(values[k][i]);
            }
            if (finite) {
                rows++;
            }
        }
        return rows;
    }

    private void reduce(double[][] values, int from, int to) {
        block.clear();
        if (from == to) {
            return;
        }
        block.count = to - from;
        for (int k = 0; k < components; k++) {
            reduceComponent(values[k], from, to, k);
            for (int j = 0; j < k; j++) {
                block.products[Sums.at(k, j)] = product(deviations[k], deviations[j], to - from);
            }
        }
    }

    private void reduceComponent(double[] x, int from, int to, int k) {
        int n = to - from;
        double low = x[from];
        double high = x[from];
        double sum = 0;
        for (int i = from; i < to; i++) {
            low = Math.min(low, x[i]);
            high = Math.max(high, x[i]);
            sum += x[i];
        }
        block.min[k] = low;
        block.max[k] = high;
        double mean = low == high ? low : sum / n;
        if (Double.isInfinite(mean)) {
            mean = 0;
            for (int i = from; i < to; i++) {
                mean += x[i] / n;
            }
        }
        double[] d = deviations[k];
        double rest = 0;
        double squares = 0;
        double cubes = 0;
        double fourths = 0;
        for (int i = 0; i < n; i++) {
            double e = x[from + i] - mean;
            d[i] = e;
            double square = e * e;
            rest += e;
            squares += square;
            cubes += square * e;
            fourths += square * square;
        }
        block.mean[k] = mean + rest / n;
        block.products[Sums.at(k, k)] = squares;
        block.cubes[k] = cubes;
        block.fourths[k] = fourths;
        countOnes(x, from, to, k);
    }

    private void countOnes(double[] x, int from, int to, int k) {
        long ones = 0;
        long others = 0;
        for (int i = from; i < to; i++) {
            ones += x[i] == 1 ? 1 : 0;
            others += x[i] == 0 || x[i] == 1 ? 0 : 1;
        }
        block.ones[k] = ones;
        block.zeroOrOne[k] = others == 0;
    }

    private static double product(double[] a, double[] b, int n) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }

    /// Adds what `later` has seen, as if its observations had come after those seen here.
    public void merge(Accumulator later) {
        if (later.components != components) {
            throw new IllegalArgumentException(
                    "merging " + later.components + " components into " + components + " makes no sense");
        }
        total.merge(later.total);
        excluded += later.excluded;
    }

    public Accumulator copy() {
        var copy = new Accumulator(components);
        copy.merge(this);
        return copy;
    }

    public int components() {
        return components;
    }

    /// Observations in the sums.
    public long count() {
        return total.count;
    }

    /// Observations left out because a component was not finite.
    public long excluded() {
        return excluded;
    }

    /// `NaN` where there is no observation.
    public double mean(int k) {
        return total.count == 0 ? Double.NaN : constant(k) ? total.min[k] : total.mean[k];
    }

    /// Unbiased sample covariance, the products of deviations divided by `count - 1`; `NaN` for fewer than two
    /// observations, exactly 0 where a component is constant.
    public double covariance(int j, int k) {
        if (total.count < 2) {
            return Double.NaN;
        }
        if (constant(j) || constant(k)) {
            return 0;
        }
        return total.products[Sums.at(Math.max(j, k), Math.min(j, k))] / (total.count - 1);
    }

    /// Unbiased sample variance; see [#covariance].
    public double variance(int k) {
        return covariance(k, k);
    }

    /// Standard error of the mean; `NaN` for fewer than two observations, exactly 0 where the component is constant.
    public double standardError(int k) {
        return Math.sqrt(variance(k) / total.count);
    }

    /// Sample skewness G1 of Joanes and Gill (1998); `NaN` for fewer than three observations or where there is no
    /// spread.
    public double skewness(int k) {
        double n = total.count;
        double squares = total.products[Sums.at(k, k)];
        if (total.count < 3 || constant(k)) {
            return Double.NaN;
        }
        double spread = squares / n;
        return total.cubes[k] / n / (spread * Math.sqrt(spread)) * (Math.sqrt(n * (n - 1)) / (n - 2));
    }

    /// Sample excess kurtosis G2 of Joanes and Gill (1998), 0 in expectation for normal data; `NaN` for fewer than four
    /// observations or where there is no spread.
    public double excessKurtosis(int k) {
        double n = total.count;
        double squares = total.products[Sums.at(k, k)];
        if (total.count < 4 || constant(k)) {
            return Double.NaN;
        }
        double spread = squares / n;
        double g2 = total.fourths[k] / n / (spread * spread) - 3;
        return (n - 1) / ((n - 2) * (n - 3)) * ((n + 1) * g2 + 6);
    }

    /// `∞` where there is no observation.
    public double min(int k) {
        return total.min[k];
    }

    /// `-∞` where there is no observation.
    public double max(int k) {
        return total.max[k];
    }

    /// Whether every value seen was the same; false where there is none.
    public boolean constant(int k) {
        return total.min[k] == total.max[k];
    }

    /// How many values were 1, where every value so far was 0 or 1; empty otherwise.
    public OptionalLong hits(int k) {
        return total.zeroOrOne[k] ? OptionalLong.of(total.ones[k]) : OptionalLong.empty();
    }
}
