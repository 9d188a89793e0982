package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Normal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Optional;

/// The mean of normal densities of standard deviation 1 around each of the values.
///
/// The line is cut into pieces one wide, or half of that in the tails, in each of which the density is a
/// polynomial of degree 15 to rounding error. Beyond the distance of nine from every value, and where a tail
/// has less than `1e-17`, the sum of the normal distributions themselves is taken, as far as they contribute.
///
/// Error: cdf `1e-15` of the mass; relative `1e-11` in tails; density relative `1e-11` (`SmoothedTest`).
final class Bumps implements Shape {
    static final double REACH = 9;

    private static final dev.leadline.density.Normal.Standard NORMAL = new dev.leadline.density.Normal.Standard();

    /// Pieces whose middle is farther than this from every value are half as wide: there the density falls steeply.
    private static final double STEEP = 4;

    private static final double WIDE = 1;
    private static final double NARROW = 0.5;

    private static final int MOST_PIECES = 100_000;
    private static final int BLOCK = 1024;

    /// A normal density that is smaller than the greatest by more than `exp(-37)` in all adds nothing.
    private static final double NOTHING = 37;

    private static final double FAR_TAIL = 1e-17;

    /// Below this part of the height of a piece, its polynomial has too few digits.
    private static final double LOW = 1e-4;

    private static final int TRIALS = 200;

    private final Empirical values;
    private final double[] sorted;
    private final Pieces pieces;

    private Bumps(Empirical values, double[] sorted, Piece[] pieces) {
        this.values = values;
        this.sorted = sorted;
        this.pieces = new Pieces(pieces);
    }

    /// Empty where more pieces would be needed than are kept.
    static Optional<Bumps> of(double... z) {
        double[] sorted = z.clone();
        Arrays.sort(sorted);
        var pieces = new ArrayList<Piece>();
        var scratch = new double[BLOCK];
        for (int i = 0; i < sorted.length; ) {
            double from = sorted[i] - REACH;
            while (i + 1 < sorted.length && sorted[i + 1] - sorted[i] <= 2 * REACH) {
                i++;
            }
            double to = sorted[i++] + REACH;
            while (from < to) {
                if (pieces.size() == MOST_PIECES) {
                    return Optional.empty();
                }
                double high = Math.min(to, from + (nearest(sorted, from + WIDE / 2) > STEEP ? NARROW : WIDE));
                pieces.add(piece(sorted, from, high, scratch));
                from = high;
            }
        }
        return Optional.of(new Bumps(Empirical.of(sorted), sorted, pieces.toArray(Piece[]::new)));
    }

    private static Piece piece(double[] sorted, double low, double high, double[] scratch) {
        var heights = new double[Chebyshev.POINTS];
        for (int j = 0; j < heights.length; j++) {
            double t = Chebyshev.NODES[j];
            double x = t < 0 ? low + 0.5 * (high - low) * (1 + t) : high - 0.5 * (high - low) * (1 - t);
            heights[j] = density(sorted, x, scratch);
        }
        return Smooth.of(low, high, Chebyshev.coefficients(heights));
    }

    /// The first of the values that is not below x.
    private static int first(double[] sorted, double x) {
        int low = 0;
        int high = sorted.length;
        while (low < high) {
            int middle = (low + high) >>> 1;
            if (sorted[middle] < x) {
                low = middle + 1;
            } else {
                high = middle;
            }
        }
        return low;
    }

    /// How far from x a value must lie to add nothing beside the nearest.
    private static double reach(double[] sorted, double x) {
        double nearest = nearest(sorted, x);
        return Math.sqrt(nearest * nearest + 2 * (NOTHING + Log.log(sorted.length)));
    }

    private static double nearest(double[] sorted, double x) {
        int i = first(sorted, x);
        return Math.min(
                i > 0 ? x - sorted[i - 1] : Double.POSITIVE_INFINITY,
                i < sorted.length ? sorted[i] - x : Double.POSITIVE_INFINITY);
    }

    private static double density(double[] sorted, double x, double[] scratch) {
        double reach = reach(sorted, x);
        int to = first(sorted, x + reach);
        double sum = 0;
        for (int from = first(sorted, x - reach); from < to; from += BLOCK) {
            int n = Math.min(BLOCK, to - from);
            for (int i = 0; i < n; i++) {
                scratch[i] = sorted[from + i] - x;
            }
            Normal.pdf(scratch, scratch, n);
            sum += sum(scratch, n);
        }
        return sum / sorted.length;
    }

    /// The tail on one side by its terms; relatively accurate where it is small.
    ///
    /// @param side -1 for the lower tail, 1 for the upper
    private double tail(double x, int side) {
        double reach = reach(sorted, x);
        var scratch = new double[BLOCK];
        int from = side < 0 ? 0 : first(sorted, x - reach);
        int to = side < 0 ? first(sorted, x + reach) : sorted.length;
        double sum = 0;
        for (; from < to; from += BLOCK) {
            int n = Math.min(BLOCK, to - from);
            for (int i = 0; i < n; i++) {
                scratch[i] = side * (sorted[from + i] - x);
            }
            Normal.cdf(scratch, scratch, n);
            sum += sum(scratch, n);
        }
        return sum / sorted.length;
    }

    private static double sum(double[] terms, int n) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += terms[i];
        }
        return sum;
    }

    @Override
    public double pdf(double z) {
        int i = pieces.at(z);
        if (i >= 0 && z <= pieces.get(i).high()) {
            var piece = (Smooth) pieces.get(i);
            double height = piece.height(z);
            if (height > LOW * piece.mass() / (piece.high() - piece.low())) {
                return height;
            }
        }
        return Double.isNaN(z) ? z : Double.isInfinite(z) ? 0 : density(sorted, z, new double[BLOCK]);
    }

    /// Far out, where the density itself underflows, by the nearest value alone.
    @Override
    public double logPdf(double z) {
        double height = pdf(z);
        if (height > 1e-290 || Double.isNaN(z) || Double.isInfinite(z)) {
            return Log.log(height);
        }
        double reach = reach(sorted, z);
        double nearest = nearest(sorted, z);
        double sum = 0;
        for (int k = first(sorted, z - reach); k < first(sorted, z + reach); k++) {
            double d = Math.abs(sorted[k] - z);
            sum += Exp.exp(-0.5 * (d - nearest) * (d + nearest));
        }
        return NORMAL.logPdf(nearest) + Log.log(sum / sorted.length);
    }

    @Override
    public double cdf(double z) {
        if (Double.isNaN(z)) {
            return z;
        }
        double p = pieces.cdf(z);
        return p > FAR_TAIL ? p : Double.isInfinite(z) ? 0 : tail(z, -1);
    }

    @Override
    public double survival(double z) {
        if (Double.isNaN(z)) {
            return z;
        }
        double q = pieces.survival(z);
        return q > FAR_TAIL ? q : Double.isInfinite(z) ? 0 : tail(z, 1);
    }

    @Override
    public double inner(double p) {
        return p > FAR_TAIL ? pieces.quantile(p) : far(p, -1);
    }

    @Override
    public double upperInner(double q) {
        return q > FAR_TAIL ? pieces.upperQuantile(q) : far(q, 1);
    }

    /// The quantile far out, between those of a single bump at the outermost value, of its own mass and of all; by
    /// halving.
    private double far(double q, int side) {
        double outermost = side < 0 ? sorted[0] : sorted[sorted.length - 1];
        double near = outermost - side * Normal.quantile(Math.min(0.5, q * sorted.length));
        double far = outermost - side * Normal.quantile(q);
        for (int i = 0; i < TRIALS; i++) {
            double middle = 0.5 * near + 0.5 * far;
            if (middle == near || middle == far) {
                break;
            }
            if (tail(middle, side) > q) {
                near = middle;
            } else {
                far = middle;
            }
        }
        return far;
    }

    @Override
    public double mean() {
        return values.mean();
    }

    @Override
    public double variance() {
        return values.variance() + 1;
    }

    @Override
    public double skewness() {
        double v = values.variance();
        double part = v / (v + 1);
        return values.skewness() * part * Math.sqrt(part);
    }

    @Override
    public double excessKurtosis() {
        double v = values.variance();
        double part = v / (v + 1);
        return values.excessKurtosis() * part * part;
    }

    @Override
    public Support support() {
        return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Bumps that && values.equals(that.values);
    }

    @Override
    public int hashCode() {
        return values.hashCode();
    }

    @Override
    public String toString() {
        return "Bumps[" + values + "]";
    }
}
