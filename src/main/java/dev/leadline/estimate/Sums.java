package dev.leadline.estimate;

import java.util.Arrays;

/// Count, means, sums of products of deviations, and of their third and fourth powers. Mutable, confined to one worker.
final class Sums {
    final int components;
    long count;
    final double[] mean;

    /// Sums of products of deviations of components j ≥ k, at `j(j+1)/2 + k`.
    final double[] products;

    /// Sums of cubes of deviations.
    final double[] cubes;

    /// Sums of fourth powers of deviations.
    final double[] fourths;

    final double[] min;
    final double[] max;

    /// Number of values that are 1; counts only while `zeroOrOne`.
    final long[] ones;

    /// Whether every value was 0 or 1.
    final boolean[] zeroOrOne;

    Sums(int components) {
        this.components = components;
        mean = new double[components];
        products = new double[at(components, 0)];
        cubes = new double[components];
        fourths = new double[components];
        min = new double[components];
        max = new double[components];
        ones = new long[components];
        zeroOrOne = new boolean[components];
        clear();
    }

    static int at(int j, int k) {
        return j * (j + 1) / 2 + k;
    }

    void clear() {
        count = 0;
        Arrays.fill(mean, 0);
        Arrays.fill(products, 0);
        Arrays.fill(cubes, 0);
        Arrays.fill(fourths, 0);
        Arrays.fill(min, Double.POSITIVE_INFINITY);
        Arrays.fill(max, Double.NEGATIVE_INFINITY);
        Arrays.fill(ones, 0);
        Arrays.fill(zeroOrOne, true);
    }

    void set(Sums other) {
        count = other.count;
        copy(other.mean, mean);
        copy(other.products, products);
        copy(other.cubes, cubes);
        copy(other.fourths, fourths);
        copy(other.min, min);
        copy(other.max, max);
        System.arraycopy(other.ones, 0, ones, 0, components);
        System.arraycopy(other.zeroOrOne, 0, zeroOrOne, 0, components);
    }

    private static void copy(double[] from, double[] to) {
        System.arraycopy(from, 0, to, 0, to.length);
    }

    /// Adds what `later` has seen; shares of the count, not counts, so that no power of them overflows.
    ///
    /// Source: Pébay (2008), Formulas for robust, one-pass parallel computation of covariances and arbitrary-order
    /// statistical moments, SAND2008-6212.
    void merge(Sums later) {
        if (later.count == 0) {
            return;
        }
        if (count == 0) {
            set(later);
            return;
        }
        double here = count;
        double there = later.count;
        double a = here / (here + there);
        double b = there / (here + there);
        for (int j = 0; j < components; j++) {
            double d = later.mean[j] - mean[j];
            double m2a = products[at(j, j)];
            double m2b = later.products[at(j, j)];
            fourths[j] += later.fourths[j]
                    + d
                            * (here * b * (a * a - a * b + b * b) * d * d * d
                                    + 6 * d * (a * a * m2b + b * b * m2a)
                                    + 4 * (a * later.cubes[j] - b * cubes[j]));
            cubes[j] += later.cubes[j] + d * (here * b * (a - b) * d * d + 3 * (a * m2b - b * m2a));
            for (int k = 0; k <= j; k++) {
                products[at(j, k)] += later.products[at(j, k)] + here * b * d * (later.mean[k] - mean[k]);
            }
            min[j] = Math.min(min[j], later.min[j]);
            max[j] = Math.max(max[j], later.max[j]);
            ones[j] += later.ones[j];
            zeroOrOne[j] &= later.zeroOrOne[j];
        }
        for (int j = 0; j < components; j++) {
            mean[j] += b * (later.mean[j] - mean[j]);
        }
        count += later.count;
    }
}
