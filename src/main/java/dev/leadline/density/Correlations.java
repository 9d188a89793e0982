package dev.leadline.density;

import java.util.Arrays;
import java.util.Optional;

/// Correlations of each of several inputs with each other; 1 of an input with itself. Immutable.
///
/// Not every such table is a correlation matrix: where `x` goes with `y` and `y` with `z`, `x` cannot go against `z`.
public final class Correlations {
    /// What an input must have left of its variance, given those before it.
    private static final double LEAST_LEFT = 1e-10;

    private final double[][] rows;

    private Correlations(double[][] rows) {
        this.rows = rows;
    }

    /// All 0.
    public static Correlations none(int size) {
        return new Correlations(identity(size));
    }

    /// @param rows symmetric, with 1 on the diagonal
    static Correlations of(double[][] rows) {
        return new Correlations(copy(rows));
    }

    public Correlations with(int i, int j, double correlation) {
        double[][] changed = copy(rows);
        changed[i][j] = correlation;
        changed[j][i] = correlation;
        return new Correlations(changed);
    }

    /// Those of some of the inputs, in the order given.
    ///
    /// @param inputs indices
    public Correlations of(int... inputs) {
        double[][] some = new double[inputs.length][inputs.length];
        for (int i = 0; i < inputs.length; i++) {
            for (int j = 0; j < inputs.length; j++) {
                some[i][j] = rows[inputs[i]][inputs[j]];
            }
        }
        return new Correlations(some);
    }

    public int size() {
        return rows.length;
    }

    public double at(int i, int j) {
        return rows[i][j];
    }

    double[][] rows() {
        return copy(rows);
    }

    /// Whether there are variables so correlated, none of them given by the others.
    public boolean arePossible() {
        return factor().isPresent();
    }

    /// The nearest that are possible.
    public Correlations nearest() {
        return NearestCorrelations.of(this);
    }

    /// The lower triangular L with `L Lᵀ` these correlations (Cholesky); empty where there is none, or where it
    /// divides by almost nothing.
    Optional<double[][]> factor() {
        int n = rows.length;
        double[][] factor = new double[n][];
        for (int i = 0; i < n; i++) {
            factor[i] = new double[i + 1];
            double left = 1;
            for (int j = 0; j < i; j++) {
                double sum = rows[i][j];
                for (int k = 0; k < j; k++) {
                    sum = Math.fma(-factor[i][k], factor[j][k], sum);
                }
                factor[i][j] = sum / factor[j][j];
                left = Math.fma(-factor[i][j], factor[i][j], left);
            }
            if (!(left > LEAST_LEFT)) {
                return Optional.empty();
            }
            factor[i][i] = Math.sqrt(left);
        }
        return Optional.of(factor);
    }

    private static double[][] identity(int size) {
        double[][] rows = new double[size][size];
        for (int i = 0; i < size; i++) {
            rows[i][i] = 1;
        }
        return rows;
    }

    private static double[][] copy(double[][] rows) {
        return Arrays.stream(rows).map(double[]::clone).toArray(double[][]::new);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Correlations correlations && Arrays.deepEquals(rows, correlations.rows);
    }

    @Override
    public int hashCode() {
        return Arrays.deepHashCode(rows);
    }

    @Override
    public String toString() {
        return Arrays.deepToString(rows);
    }
}
