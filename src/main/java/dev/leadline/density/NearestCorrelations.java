package dev.leadline.density;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/// The possible correlations nearest to some that are not, by the sum of squared changes: alternating projections
/// onto the matrices without negative eigenvalues and those with 1 on the diagonal, with Dykstra's correction.
///
/// Source: Higham (2002), Computing the nearest correlation matrix, IMA Journal of Numerical Analysis 22, 329-343.
/// Eigenvalues are kept a little above 0, so that the factor exists.
final class NearestCorrelations {
    private static final double LEAST_EIGENVALUE = 1e-8;
    private static final double CLOSE = 1e-11;
    private static final int TRIALS = 5_000;

    private NearestCorrelations() {}

    static Correlations of(Correlations given) {
        RealMatrix y = new Array2DRowRealMatrix(given.rows(), false);
        RealMatrix correction = new Array2DRowRealMatrix(given.size(), given.size());
        for (int trial = 0; trial < TRIALS; trial++) {
            RealMatrix r = y.subtract(correction);
            RealMatrix x = withoutNegativeEigenvalues(r);
            correction = x.subtract(r);
            RealMatrix before = y;
            y = withOnes(x);
            if (y.subtract(before).getNorm() < CLOSE * given.size()) {
                break;
            }
        }
        return possible(y);
    }

    private static RealMatrix withoutNegativeEigenvalues(RealMatrix matrix) {
        var decomposition = new EigenDecomposition(matrix);
        RealMatrix d = decomposition.getD();
        for (int i = 0; i < d.getRowDimension(); i++) {
            d.setEntry(i, i, Math.max(d.getEntry(i, i), LEAST_EIGENVALUE));
        }
        RealMatrix v = decomposition.getV();
        return symmetric(v.multiply(d).multiply(v.transpose()));
    }

    /// Rounding errors would make a later decomposition take it for another kind of matrix.
    private static RealMatrix symmetric(RealMatrix matrix) {
        return matrix.add(matrix.transpose()).scalarMultiply(0.5);
    }

    private static RealMatrix withOnes(RealMatrix matrix) {
        RealMatrix ones = matrix.copy();
        for (int i = 0; i < ones.getRowDimension(); i++) {
            ones.setEntry(i, i, 1);
        }
        return ones;
    }

    /// Drawn towards 0 where rounding errors still stand in the way.
    private static Correlations possible(RealMatrix matrix) {
        double kept = 1;
        while (true) {
            double[][] rows = matrix.scalarMultiply(kept).getData();
            for (int i = 0; i < rows.length; i++) {
                rows[i][i] = 1;
            }
            var correlations = Correlations.of(rows);
            if (correlations.arePossible()) {
                return correlations;
            }
            kept -= 1e-8 + (1 - kept);
        }
    }
}
