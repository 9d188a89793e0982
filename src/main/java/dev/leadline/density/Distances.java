package dev.leadline.density;

import dev.leadline.numeric.Log;

/// How far a density is from ordered values.
final class Distances {

    private Distances() {}

    /// The largest difference between the share of values up to x and `cdf(x)`, on both sides of every step; of a
    /// discrete density both step at the same values.
    static double kolmogorovSmirnov(Density density, double... sorted) {
        int n = sorted.length;
        double largest = 0;
        for (int i = 0; i < n; ) {
            int end = i + 1;
            while (end < n && sorted[end] == sorted[i]) {
                end++;
            }
            double x = sorted[i];
            double before = density.isDiscrete() ? density.cdf(Math.nextDown(x)) : density.cdf(x);
            largest = Math.max(largest, Math.abs(before - (double) i / n));
            largest = Math.max(largest, Math.abs(density.cdf(x) - (double) end / n));
            i = end;
        }
        return largest;
    }

    /// Source: Anderson and Darling (1954), Journal of the American Statistical Association 49, 765-769.
    static double andersonDarling(Density density, double... sorted) {
        int n = sorted.length;
        double sum = 0;
        for (int i = 0; i < n; i++) {
            double below = Log.log(density.cdf(sorted[i]));
            double above = Log.log(density.survival(sorted[n - 1 - i]));
            sum += (2.0 * i + 1) / n * (below + above);
        }
        return -n - sum;
    }
}
