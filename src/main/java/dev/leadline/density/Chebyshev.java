package dev.leadline.density;

/// Polynomials through sixteen points, as sums of Chebyshev polynomials on `[-1, 1]`.
///
/// The points are the roots of the next Chebyshev polynomial: none lies at an end, where a density may be infinite.
///
/// Source: Trefethen (2013), Approximation Theory and Approximation Practice, chapters 3 and 19. From memory.
final class Chebyshev {
    static final int POINTS = 16;

    /// Rising.
    static final double[] NODES = new double[POINTS];

    /// Of the integral over `[-1, 1]` from the values at the nodes (Fejér's first rule).
    static final double[] WEIGHTS = new double[POINTS];

    private static final double[][] BASIS = new double[POINTS][POINTS];

    static {
        for (int j = 0; j < POINTS; j++) {
            double angle = Math.PI * (2 * (POINTS - 1 - j) + 1) / (2 * POINTS);
            NODES[j] = StrictMath.cos(angle);
            for (int k = 0; k < POINTS; k++) {
                BASIS[k][j] = (k == 0 ? 1.0 : 2.0) / POINTS * StrictMath.cos(k * angle);
            }
            double sum = 1;
            for (int k = 1; k < POINTS / 2; k++) {
                sum -= 2 * StrictMath.cos(2 * k * angle) / (4.0 * k * k - 1);
            }
            WEIGHTS[j] = 2 * sum / POINTS;
        }
    }

    private Chebyshev() {}

    /// Of the polynomial with these values at the nodes, lowest degree first.
    static double[] coefficients(double[] values) {
        var c = new double[POINTS];
        for (int k = 0; k < POINTS; k++) {
            double sum = 0;
            for (int j = 0; j < POINTS; j++) {
                sum = Math.fma(BASIS[k][j], values[j], sum);
            }
            c[k] = sum;
        }
        return c;
    }

    /// Of the integral from -1 on.
    static double[] antiderivative(double[] c) {
        int n = c.length;
        var b = new double[n + 1];
        double start = 0;
        for (int k = 1; k <= n; k++) {
            double next = k + 1 < n ? c[k + 1] : 0;
            b[k] = ((k == 1 ? 2 : 1) * c[k - 1] - next) / (2 * k);
            start += k % 2 == 0 ? -b[k] : b[k];
        }
        b[0] = start;
        return b;
    }

    /// Clenshaw's sum.
    static double at(double[] c, double t) {
        double twice = 2 * t;
        double b1 = 0;
        double b2 = 0;
        for (int k = c.length - 1; k > 0; k--) {
            double b = Math.fma(twice, b1, c[k] - b2);
            b2 = b1;
            b1 = b;
        }
        return Math.fma(t, b1, c[0] - b2);
    }

    /// The derivative, from those of the polynomials: `T'(k + 1) = 2 T(k) + 2 t T'(k) - T'(k - 1)`.
    static double slope(double[] c, double t) {
        double before = 1;
        double now = t;
        double slopeBefore = 0;
        double slopeNow = 1;
        double sum = 0;
        for (int k = 1; k < c.length; k++) {
            sum = Math.fma(c[k], slopeNow, sum);
            double next = 2 * t * now - before;
            double slopeNext = 2 * now + 2 * t * slopeNow - slopeBefore;
            before = now;
            now = next;
            slopeBefore = slopeNow;
            slopeNow = slopeNext;
        }
        return sum;
    }
}
