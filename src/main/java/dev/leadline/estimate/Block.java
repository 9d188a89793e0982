package dev.leadline.estimate;

/// Reduces a block of observations to its sums, in two passes over numbers that stay in the first cache: the mean, then
/// the deviations from it. Confined to one worker.
///
/// Partial sums run side by side, three or four at a time, in a fixed order: that many fit into the registers of a
/// processor with sixteen of them, and one would wait for itself. More precise than one running sum, too.
final class Block {
    /// Observations at most.
    static final int SIZE = 1024;

    private static final int QUARTER = SIZE / 4;

    private final Sums sums;

    /// Deviations of each component from its mean; only where there are products of components to sum.
    private final double[][] deviations;

    private final double[] folded = new double[QUARTER];

    Block(int components) {
        sums = new Sums(components);
        deviations = new double[components > 1 ? components : 0][SIZE];
    }

    /// What the last call of [#reduce] found; valid until the next.
    Sums sums() {
        return sums;
    }

    /// Takes the observations with indices `from` (inclusive) to `to` (exclusive), at least one and at most [#SIZE] of
    /// them. False, with sums that mean nothing, where some component of some observation is not finite.
    boolean reduce(double[][] values, int from, int to) {
        sums.count = to - from;
        for (int k = 0; k < values.length; k++) {
            sums.meanRest[k] = 0;
            sums.zeroOrOne[k] = isZeroOrOne(values[k], from, to);
            if (sums.zeroOrOne[k]) {
                event(values[k], from, to, k);
                continue;
            }
            double sum = sumAndRange(values[k], from, to, k);
            if (!Double.isFinite(sum) && !allFinite(values[k], from, to)) {
                return false;
            }
            sums.mean[k] = mean(values[k], from, to, sum, k);
            powers(values[k], from, to, k);
        }
        if (values.length > 1) {
            products(values, from, to);
        }
        return true;
    }

    private static boolean allFinite(double[] x, int from, int to) {
        for (int i = from; i < to; i++) {
            if (!Double.isFinite(x[i])) {
                return false;
            }
        }
        return true;
    }

    private double sumAndRange(double[] x, int from, int to, int k) {
        double low = x[from];
        double high = x[from];
        double s0 = 0;
        double s1 = 0;
        double s2 = 0;
        double s3 = 0;
        int i = from;
        for (; i + 3 < to; i += 4) {
            double a = x[i];
            double b = x[i + 1];
            double c = x[i + 2];
            double d = x[i + 3];
            // A branch that is hardly ever taken is cheaper than Math.min, which looks for NaN and -0.
            if (a < low) low = a;
            if (a > high) high = a;
            if (b < low) low = b;
            if (b > high) high = b;
            if (c < low) low = c;
            if (c > high) high = c;
            if (d < low) low = d;
            if (d > high) high = d;
            s0 += a;
            s1 += b;
            s2 += c;
            s3 += d;
        }
        for (; i < to; i++) {
            low = Math.min(low, x[i]);
            high = Math.max(high, x[i]);
            s0 += x[i];
        }
        sums.min[k] = low;
        sums.max[k] = high;
        return (s0 + s1) + (s2 + s3);
    }

    private double mean(double[] x, int from, int to, double sum, int k) {
        if (sums.min[k] == sums.max[k]) {
            return sums.min[k];
        }
        if (Double.isFinite(sum)) {
            return sum / sums.count;
        }
        double scaled = 0;
        for (int i = from; i < to; i++) {
            scaled += x[i] / SIZE;
        }
        return scaled / sums.count * SIZE;
    }

    /// Whether every value is 0 or 1: only these equal their square. The first value spares the rest where the answer
    /// is no.
    private boolean isZeroOrOne(double[] x, int from, int to) {
        if (x[from] != 0 && x[from] != 1) {
            return false;
        }
        double off = 0;
        if (isWhole(from, to)) {
            for (int i = 0; i < QUARTER; i++) {
                folded[i] = offSquare(x[i])
                        + offSquare(x[i + QUARTER])
                        + offSquare(x[i + 2 * QUARTER])
                        + offSquare(x[i + 3 * QUARTER]);
            }
            off = foldedSum();
        } else {
            for (int i = from; i < to; i++) {
                off += offSquare(x[i]);
            }
        }
        return off == 0;
    }

    private static double offSquare(double x) {
        return Math.abs(x * x - x);
    }

    private static double ones(double[] x, int from, int to) {
        double ones = 0;
        for (int i = from; i < to; i++) {
            ones += x[i];
        }
        return ones;
    }

    private double onesOfWhole(double[] x) {
        for (int i = 0; i < QUARTER; i++) {
            folded[i] = x[i] + x[i + QUARTER] + x[i + 2 * QUARTER] + x[i + 3 * QUARTER];
        }
        return foldedSum();
    }

    /// Sums in which the order does not matter are folded element by element from four quarters of a whole block to
    /// one, which the compiler vectorises, and only then added one by one, which it does not.
    private static boolean isWhole(int from, int to) {
        return from == 0 && to == SIZE;
    }

    private double foldedSum() {
        double sum = 0;
        for (int i = 0; i < QUARTER; i++) {
            sum += folded[i];
        }
        return sum;
    }

    /// The sums of zeros and ones, all of which follow from how many ones there are.
    private void event(double[] x, int from, int to, int k) {
        double hits = isWhole(from, to) ? onesOfWhole(x) : ones(x, from, to);
        long ones = (long) hits;
        sums.ones[k] = ones;
        sums.min[k] = ones == sums.count ? 1 : 0;
        sums.max[k] = ones == 0 ? 0 : 1;
        sums.mean[k] = (double) ones / sums.count;
        double p = hits / sums.count;
        double q = (sums.count - hits) / sums.count;
        double squares = hits * q;
        sums.products[Sums.at(k, k)] = squares;
        sums.cubes[k] = squares * (q - p);
        sums.fourths[k] = squares * (q * q - q * p + p * p);
    }

    private void powers(double[] x, int from, int to, int k) {
        double mean = sums.mean[k];
        double r0 = 0;
        double r1 = 0;
        double r2 = 0;
        double s0 = 0;
        double s1 = 0;
        double s2 = 0;
        double c0 = 0;
        double c1 = 0;
        double c2 = 0;
        double f0 = 0;
        double f1 = 0;
        double f2 = 0;
        int i = from;
        for (; i + 2 < to; i += 3) {
            double a = x[i] - mean;
            double b = x[i + 1] - mean;
            double c = x[i + 2] - mean;
            double aa = a * a;
            double bb = b * b;
            double cc = c * c;
            r0 += a;
            r1 += b;
            r2 += c;
            s0 += aa;
            s1 += bb;
            s2 += cc;
            c0 = Math.fma(aa, a, c0);
            c1 = Math.fma(bb, b, c1);
            c2 = Math.fma(cc, c, c2);
            f0 = Math.fma(aa, aa, f0);
            f1 = Math.fma(bb, bb, f1);
            f2 = Math.fma(cc, cc, f2);
        }
        for (; i < to; i++) {
            double a = x[i] - mean;
            double aa = a * a;
            r0 += a;
            s0 += aa;
            c0 = Math.fma(aa, a, c0);
            f0 = Math.fma(aa, aa, f0);
        }
        moveToTrueMean(k, r0 + r1 + r2, s0 + s1 + s2, c0 + c1 + c2, f0 + f1 + f2);
    }

    /// The mean was rounded, so the deviations do not quite sum to 0; what they do sum to says how far it was off.
    private void moveToTrueMean(int k, double rest, double squares, double cubes, double fourths) {
        double off = Double.isFinite(squares) ? rest / sums.count : 0;
        sums.products[Sums.at(k, k)] = off == 0 ? squares : squares - off * rest;
        sums.cubes[k] = off == 0 ? cubes : cubes - 3 * off * squares;
        sums.fourths[k] = off == 0 ? fourths : fourths - 4 * off * cubes;
        sums.moveMean(k, off);
    }

    private void products(double[][] values, int from, int to) {
        int n = to - from;
        for (int k = 0; k < values.length; k++) {
            subtract(values[k], from, n, sums.mean[k], deviations[k]);
            for (int j = 0; j < k; j++) {
                sums.products[Sums.at(k, j)] = product(deviations[k], deviations[j], n);
            }
        }
    }

    private static void subtract(double[] x, int from, int n, double mean, double[] deviations) {
        for (int i = 0; i < n; i++) {
            deviations[i] = x[from + i] - mean;
        }
    }

    private static double product(double[] a, double[] b, int n) {
        double s0 = 0;
        double s1 = 0;
        double s2 = 0;
        double s3 = 0;
        int i = 0;
        for (; i + 3 < n; i += 4) {
            s0 = Math.fma(a[i], b[i], s0);
            s1 = Math.fma(a[i + 1], b[i + 1], s1);
            s2 = Math.fma(a[i + 2], b[i + 2], s2);
            s3 = Math.fma(a[i + 3], b[i + 3], s3);
        }
        for (; i < n; i++) {
            s0 = Math.fma(a[i], b[i], s0);
        }
        return (s0 + s1) + (s2 + s3);
    }
}
