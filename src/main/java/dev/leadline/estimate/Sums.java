package dev.leadline.estimate;

import java.util.Arrays;

/// Count, means, sums of products of deviations, and of their third and fourth powers. Mutable, confined to one worker.
final class Sums {
    final int components;
    long count;
    final double[] mean;

    /// What is missing from each mean: a mean is carried as the unrounded sum of both, since one rounding for each
    /// block would add up to more than the standard error where the mean is large beside the spread.
    final double[] meanRest;

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
        meanRest = new double[components];
        products = new double[at(components, 0)];
        cubes = new double[components];
        fourths = new double[components];
        min = new double[components];
        max = new double[components];
        ones = new long[components];
        zeroOrOne = new boolean[components];
        Arrays.fill(min, Double.POSITIVE_INFINITY);
        Arrays.fill(max, Double.NEGATIVE_INFINITY);
        Arrays.fill(zeroOrOne, true);
    }

    static int at(int j, int k) {
        return j * (j + 1) / 2 + k;
    }

    void set(Sums other) {
        count = other.count;
        copy(other.mean, mean);
        copy(other.meanRest, meanRest);
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

    /// Adds what `later` has seen: Pébay's pairwise formulas, in shares of the count so that no power of it overflows.
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
            double d = toMean(later, j);
            double m2a = products[at(j, j)];
            double m2b = later.products[at(j, j)];
            fourths[j] += later.fourths[j]
                    + d
                            * (here * b * (a * a - a * b + b * b) * d * d * d
                                    + 6 * d * (a * a * m2b + b * b * m2a)
                                    + 4 * (a * later.cubes[j] - b * cubes[j]));
            cubes[j] += later.cubes[j] + d * (here * b * (a - b) * d * d + 3 * (a * m2b - b * m2a));
            for (int k = 0; k <= j; k++) {
                products[at(j, k)] += later.products[at(j, k)] + here * b * d * toMean(later, k);
            }
            min[j] = Math.min(min[j], later.min[j]);
            max[j] = Math.max(max[j], later.max[j]);
            ones[j] += later.ones[j];
            zeroOrOne[j] &= later.zeroOrOne[j];
        }
        for (int j = 0; j < components; j++) {
            double d = toMean(later, j);
            if (Double.isFinite(d)) {
                moveMean(j, b * d);
            } else {
                mean[j] = a * mean[j] + b * later.mean[j];
                meanRest[j] = 0;
            }
        }
        count += later.count;
    }

    private double toMean(Sums later, int k) {
        return (later.mean[k] - mean[k]) + (later.meanRest[k] - meanRest[k]);
    }

    /// Adds to a mean and keeps what rounding takes away: Knuth's exact sum of two numbers.
    void moveMean(int k, double by) {
        double old = mean[k];
        double step = by + meanRest[k];
        double moved = old + step;
        double back = moved - old;
        mean[k] = moved;
        meanRest[k] = (old - (moved - back)) + (step - back);
    }
}
