package dev.leadline.density;

import dev.leadline.numeric.Log;
import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;

/// The values of a sample, each as likely as it is frequent. Its moments are those of the distribution: the variance
/// divides by n.
///
/// Probabilities are counts over n, so that both tails are correctly rounded. Draws need no table: the k-th of n
/// ordered values is drawn for u from `(k - 1) / n` to `k / n`.
public final class Empirical implements Shape, ClosedForm {
    private final double[] sorted;
    private final double mean;
    private final double variance;
    private final double skewness;
    private final double excessKurtosis;
    private final String hash;

    private Empirical(double[] sorted) {
        this.sorted = sorted;
        double scale = Math.max(Math.abs(sorted[0]), Math.abs(sorted[sorted.length - 1]));
        // sums of values up to 1 cannot overflow
        double unit = scale > 0 ? Math.scalb(1.0, Math.getExponent(scale)) : 1;
        double middle = mean(sorted, 0, unit, 1);
        double m = middle + mean(sorted, middle, unit, 1);
        double m2 = mean(sorted, m, unit, 2);
        mean = m * unit;
        variance = m2 * unit * unit;
        skewness = mean(sorted, m, unit, 3) / (m2 * Math.sqrt(m2));
        excessKurtosis = mean(sorted, m, unit, 4) / (m2 * m2) - 3;
        hash = hash(sorted);
    }

    /// @param values at least one, all finite; in any order
    public static Empirical of(double... values) {
        if (values.length == 0 || !Arrays.stream(values).allMatch(Double::isFinite)) {
            throw new IllegalArgumentException("an empirical density needs finite values");
        }
        double[] sorted = values.clone();
        for (int i = 0; i < sorted.length; i++) {
            sorted[i] += 0.0; // one zero, not two
        }
        Arrays.sort(sorted);
        return new Empirical(sorted);
    }

    /// The mean of powers of `x / unit - about`.
    private static double mean(double[] x, double about, double unit, int power) {
        double sum = 0;
        for (double value : x) {
            double d = value / unit - about;
            double square = d * d;
            sum += switch (power) {
                case 1 -> d;
                case 2 -> square;
                case 3 -> square * d;
                default -> square * square;
            };
        }
        return sum / x.length;
    }

    private static String hash(double[] values) {
        var bytes = ByteBuffer.allocate(8 * values.length);
        bytes.asDoubleBuffer().put(values);
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes.array()));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }

    /// How many values are at most x.
    private int upTo(double x) {
        int low = 0;
        int high = sorted.length;
        while (low < high) {
            int middle = (low + high) >>> 1;
            if (sorted[middle] <= x) {
                low = middle + 1;
            } else {
                high = middle;
            }
        }
        return low;
    }

    @Override
    public void fill(double[] u, double[] x, int n) {
        int last = sorted.length - 1;
        for (int i = 0; i < n; i++) {
            x[i] = sorted[Math.min(Math.max((int) Math.ceil(u[i] * sorted.length) - 1, 0), last)];
        }
    }

    @Override
    public double inner(double p) {
        return at(Math.ceil(p * sorted.length * (1 - Discrete.ROUNDING)) - 1);
    }

    @Override
    public double upperInner(double q) {
        return at(sorted.length - 1 - Math.floor(q * sorted.length * (1 + Discrete.ROUNDING)));
    }

    private double at(double index) {
        return sorted[(int) Math.min(Math.max(index, 0), sorted.length - 1)];
    }

    /// The probability of x.
    @Override
    public double pdf(double x) {
        return Double.isNaN(x) ? x : (double) (upTo(x) - upTo(Math.nextDown(x))) / sorted.length;
    }

    @Override
    public double logPdf(double x) {
        return Log.log(pdf(x));
    }

    @Override
    public double cdf(double x) {
        return Double.isNaN(x) ? x : (double) upTo(x) / sorted.length;
    }

    @Override
    public double survival(double x) {
        return Double.isNaN(x) ? x : (double) (sorted.length - upTo(x)) / sorted.length;
    }

    @Override
    public double mean() {
        return mean;
    }

    @Override
    public double variance() {
        return variance;
    }

    @Override
    public double skewness() {
        return skewness;
    }

    @Override
    public double excessKurtosis() {
        return excessKurtosis;
    }

    @Override
    public boolean isDiscrete() {
        return true;
    }

    @Override
    public Support support() {
        return new Support(sorted[0], sorted[sorted.length - 1]);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Empirical that && Arrays.equals(sorted, that.sorted);
    }

    @Override
    public int hashCode() {
        return hash.hashCode();
    }

    /// Names the values by their hash, which is what tells one from another.
    @Override
    public String toString() {
        return "Empirical[n=" + sorted.length + ", sha256=" + hash + "]";
    }
}
