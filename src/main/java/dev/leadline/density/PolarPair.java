package dev.leadline.density;

import dev.leadline.numeric.GaussLegendre;

/// By quadrature in polar coordinates.
///
/// Two values behind the inputs are `R cos θ` and `R sin(θ + α)`, with θ uniform, R independent of it and `sin α` the
/// correlation of the normals. The integrand is as smooth for α near a right angle as for any.
///
/// Error: 1e-7 for smooth densities, 1e-4 for discrete ones of many values (`TiedPairTest`).
final class PolarPair implements TiedPair {
    private static final int SMOOTH_RADII = 96;
    private static final int SMOOTH_ANGLES = 256;
    private static final int ROUGH_RADII = 256;
    private static final int ROUGH_ANGLES = 1024;

    /// So far out, a turn by a small angle goes from one end of the densities to the other.
    private static final double FAR = 1e6;

    /// No farther than a draw: `exp(-r²/2)` is `2^-53`.
    private static final double FARTHEST = 8.57;

    private static final double RIGHT = Math.PI / 2;

    /// Its multiples, modulo 1, are spread evenly.
    private static final double GOLDEN = 0.6180339887498949;

    private static final double SMALLEST = 0x1p-53;
    private static final double LARGEST = 1 - 0x1p-53;

    private final Mixing mixing;
    private final Inversion second;
    private final double[] radii;
    private final double[] weights;
    private final double[] cosines;
    private final double[] sines;
    private final double[] values;
    private final double[] column;

    PolarPair(Mixing mixing, Density one, Density other) {
        this.mixing = mixing;
        this.second = Inversion.of(other);
        boolean rough = one.isDiscrete() || other.isDiscrete() || mixing.radius(FARTHEST) > FAR;
        int angles = rough ? ROUGH_ANGLES : SMOOTH_ANGLES;
        var rule = GaussLegendre.of(rough ? ROUGH_RADII : SMOOTH_RADII);
        this.radii = new double[rule.nodes().length];
        this.weights = new double[radii.length];
        double total = 0;
        for (int i = 0; i < radii.length; i++) {
            double r = FARTHEST / 2 * (1 + rule.nodes()[i]);
            radii[i] = mixing.radius(r);
            weights[i] = rule.weights()[i] * r * StrictMath.exp(-r * r / 2);
            total += weights[i] * angles;
        }
        for (int i = 0; i < radii.length; i++) {
            weights[i] /= total;
        }
        this.cosines = new double[angles];
        this.sines = new double[angles];
        for (int j = 0; j < angles; j++) {
            double angle = 2 * Math.PI * (j + 0.5) / angles;
            cosines[j] = StrictMath.cos(angle);
            sines[j] = StrictMath.sin(angle);
        }
        this.values = new double[radii.length * angles];
        this.column = new double[angles];
        var first = Inversion.of(one);
        for (int i = 0; i < radii.length; i++) {
            fill(i, RIGHT, first);
            System.arraycopy(column, 0, values, i * angles, angles);
        }
    }

    @Override
    public double correlation(double alpha) {
        int angles = column.length;
        double a = 0;
        double b = 0;
        double aa = 0;
        double bb = 0;
        double ab = 0;
        // Moments about a value in the middle, which cancels less.
        double middleA = values[angles / 4];
        double middleB = Double.NaN;
        for (int i = 0; i < radii.length; i++) {
            fill(i, alpha, second);
            middleB = i == 0 ? column[0] : middleB;
            double sumA = 0;
            double sumB = 0;
            double sumAa = 0;
            double sumBb = 0;
            double sumAb = 0;
            for (int j = 0; j < angles; j++) {
                double x = values[i * angles + j] - middleA;
                double y = column[j] - middleB;
                sumA += x;
                sumB += y;
                sumAa = Math.fma(x, x, sumAa);
                sumBb = Math.fma(y, y, sumBb);
                sumAb = Math.fma(x, y, sumAb);
            }
            double weight = weights[i];
            a = Math.fma(weight, sumA, a);
            b = Math.fma(weight, sumB, b);
            aa = Math.fma(weight, sumAa, aa);
            bb = Math.fma(weight, sumBb, bb);
            ab = Math.fma(weight, sumAb, ab);
        }
        return (ab - a * b) / Math.sqrt((aa - a * a) * (bb - b * b));
    }

    /// The values of one input at all angles of a radius, those behind it `R sin(θ + α)`. Each radius has angles of its
    /// own, between those of the others: a step from one value to another may lie along a ray.
    private void fill(int radius, double alpha, Inversion inversion) {
        double turned = alpha + 2 * Math.PI / column.length * (radius * GOLDEN % 1);
        double c = StrictMath.cos(turned) * radii[radius];
        double s = StrictMath.sin(turned) * radii[radius];
        for (int j = 0; j < column.length; j++) {
            column[j] = Math.fma(c, sines[j], s * cosines[j]);
        }
        mixing.probabilities(column, column.length);
        for (int j = 0; j < column.length; j++) {
            column[j] = Math.min(Math.max(column[j], SMALLEST), LARGEST);
        }
        inversion.fill(column, column, column.length);
    }
}
