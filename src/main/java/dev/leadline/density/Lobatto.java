package dev.leadline.density;

/// The Chebyshev-Lobatto points of the interval from 0 to 1: the cosines of equal angles, with both ends.
final class Lobatto {
    private static final int MOST = 16;
    private static final double[][] NODES = new double[MOST][];
    private static final double[][] MEASURED = new double[MOST][];

    static {
        MEASURED[1] = new double[] {0, 0.5, 1};
        for (int n = 2; n < MOST; n++) {
            NODES[n] = new double[n];
            for (int k = 0; k < n; k++) {
                NODES[n][k] = at((double) k / (n - 1));
            }
            MEASURED[n] = new double[n + 1];
            for (int k = 1; k < n; k++) {
                MEASURED[n][k] = at((k - 0.5) / (n - 1));
            }
            MEASURED[n][n] = 1;
        }
    }

    private Lobatto() {}

    private static double at(double turn) {
        return 0.5 * (1 - StrictMath.cos(Math.PI * turn));
    }

    /// @param n at least 2
    static double[] nodes(int n) {
        return NODES[n];
    }

    /// Both ends, and between the points the middle angles: there a polynomial through `n` of them errs most.
    ///
    /// @param n at least 1: the middle, for a constant
    static double[] measured(int n) {
        return MEASURED[n];
    }
}
