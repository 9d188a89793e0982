package dev.leadline.estimate;

/// The mean of a component, corrected by others whose means are known to be 0, with the coefficients that explain it
/// best in the same observations.
///
/// The standard error counts that the coefficients were fitted: `s² (1/n + d' S⁻¹ d)` with the means `d` of the
/// controls, their centred sums of squares `S` and `n - q - 1` degrees of freedom; exact for normal outcomes. The fit
/// costs a bias of the order of 1/n.
///
/// Source: Lavenberg and Welch (1981), Management Science 27, 322-335.
public final class Regression {
    /// A control of which the others leave less than this share of its variance says nothing of its own.
    private static final double COLLINEAR = 1e-10;

    private Regression() {}

    /// Observations below which so many controls are not fitted: ten for each.
    public static long fewest(int controls) {
        return 10L * controls + 2;
    }

    /// @param k the component sought
    /// @param first component of the first control; the others follow
    /// @param controls how many
    public static Estimate of(Accumulator sums, int k, int first, int controls) {
        long n = sums.count();
        if (n < fewest(controls)) {
            return new Estimate(Double.NaN, Double.NaN, n - controls - 1);
        }
        // Cholesky's factor of the covariances of controls and outcome; rows of collinear controls are left out.
        int size = controls + 1;
        double[][] factor = new double[size][size];
        double[] means = new double[size];
        int used = 0;
        for (int i = 0; i < size; i++) {
            int ki = i < controls ? first + i : k;
            double mean = sums.mean(ki);
            for (int j = 0; j < i; j++) {
                double sum = sums.covariance(ki, first + j);
                for (int m = 0; m < j; m++) {
                    sum -= factor[i][m] * factor[j][m];
                }
                factor[i][j] = factor[j][j] == 0 ? 0 : sum / factor[j][j];
                mean -= factor[i][j] * means[j];
            }
            double left = sums.covariance(ki, ki);
            for (int m = 0; m < i; m++) {
                left -= factor[i][m] * factor[i][m];
            }
            if (i == controls) {
                double residual = Math.max(left, 0) * (n - 1) / (n - used - 1);
                double distance = 0;
                for (int m = 0; m < controls; m++) {
                    distance += means[m] * means[m];
                }
                double variance = residual * (1.0 / n + distance / (n - 1));
                return new Estimate(mean, Math.sqrt(variance), n - used - 1);
            }
            boolean counts = left > COLLINEAR * sums.covariance(ki, ki);
            factor[i][i] = counts ? Math.sqrt(left) : 0;
            means[i] = counts ? mean / factor[i][i] : 0;
            used += counts ? 1 : 0;
        }
        throw new IllegalStateException();
    }
}
