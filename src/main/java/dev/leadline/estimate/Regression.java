package dev.leadline.estimate;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/// The mean of a component, corrected by others whose means are known to be 0, with the coefficients that
/// explain it best in the same observations.
///
/// The standard error counts that the coefficients were fitted: `s² (1/n + d' S⁻¹ d)` with the means `d`
/// of the controls, their centred sums of squares `S` and `n - q - 1` degrees of freedom; exact for normal
/// outcomes (`RegressionTest`). The fit costs a bias of the order of 1/n, which [CrossFit] has not.
///
/// Source: Lavenberg and Welch (1981), Management Science 27, 322-335.
public final class Regression {
    /// A control of which the others leave less than this share of its variance says nothing of its own.
    private static final double COLLINEAR = 1e-10;

    /// An outcome of which the controls leave less than this share of its variance is a combination of them.
    private static final double ROUNDING = 1e-13;

    /// A control whose part is smaller than this share of a standard deviation does not explain another.
    private static final double PART = 1e-6;

    private final long n;
    private final int controls;

    /// Cholesky's factor of the covariances of controls and outcome, which is the last; columns of
    /// controls that are left out are 0.
    private final double[][] factor;

    private final double[] deviations;

    /// Means, of each what those before it leave.
    private final double[] means;

    private final List<Integer> used = new ArrayList<>();
    private final double value;

    /// @param k the component sought
    /// @param first component of the first control; the others follow
    /// @param controls how many
    public Regression(Accumulator sums, int k, int first, int controls) {
        this.n = sums.count();
        this.controls = controls;
        this.factor = new double[controls + 1][controls + 1];
        this.deviations = new double[controls + 1];
        this.means = new double[controls + 1];
        for (int i = 0; i <= controls; i++) {
            int component = i < controls ? first + i : k;
            deviations[i] = Math.sqrt(sums.covariance(component, component));
            means[i] = sums.mean(component);
            for (int j : used) {
                double sum = sums.covariance(component, first + j);
                for (int m : used.subList(0, used.indexOf(j))) {
                    sum -= factor[i][m] * factor[j][m];
                }
                factor[i][j] = sum / factor[j][j];
                means[i] -= factor[i][j] * means[j];
            }
            double left = sums.covariance(component, component);
            for (int m : used) {
                left -= factor[i][m] * factor[i][m];
            }
            double least = (i < controls ? COLLINEAR : ROUNDING) * deviations[i] * deviations[i];
            factor[i][i] = left > least ? Math.sqrt(left) : 0;
            if (i < controls && factor[i][i] > 0) {
                means[i] /= factor[i][i];
                used.add(i);
            }
        }
        this.value = means[controls];
    }

    /// Observations below which so many controls are not fitted: ten for each.
    public static long fewest(int controls) {
        return 10L * controls;
    }

    /// The standard error is exactly 0 where the controls explain every outcome.
    ///
    /// @param errors bounds of the errors of the controls' means
    public Estimate estimate(double[] errors) {
        double deviation = deviations[controls];
        if (!Double.isFinite(deviation)) {
            return new Estimate(value, deviation, degrees());
        }
        double distance = 0;
        for (int m : used) {
            distance += means[m] * means[m];
        }
        double variance = residual() * (1.0 / n + distance / (n - 1));
        return new Estimate(value, Math.sqrt(variance), degrees(), bias(errors));
    }

    private long degrees() {
        return n - used.size() - 1;
    }

    /// Variance of the outcomes about what the controls explain.
    private double residual() {
        double left = factor[controls][controls];
        return left * left * (n - 1) / degrees();
    }

    private double bias(double[] errors) {
        double[] coefficients = coefficients();
        return IntStream.range(0, controls)
                .mapToDouble(c -> Math.abs(coefficients[c]) * errors[c])
                .sum();
    }

    /// Of each control; 0 for those left out.
    public double[] coefficients() {
        return coefficients(controls);
    }

    /// Those that explain control, or outcome, `i` by the controls before it that are used.
    private double[] coefficients(int i) {
        double[] left = factor[i].clone();
        double[] coefficients = new double[controls];
        for (int j : used.reversed()) {
            if (j < i) {
                coefficients[j] = left[j] / factor[j][j];
                for (int m = 0; m < j; m++) {
                    left[m] -= coefficients[j] * factor[j][m];
                }
            }
        }
        return coefficients;
    }

    /// Of the variance of the outcomes, the share that the controls explain.
    public double share() {
        double ratio = factor[controls][controls] / deviations[controls];
        return 1 - ratio * ratio;
    }

    /// Student's t of the coefficient of a control: how many standard errors it is from 0.
    public double significance(int control) {
        double[] unit = new double[controls];
        double sum = 0;
        for (int i : used) {
            double x = i == control ? 1 : 0;
            for (int m : used) {
                if (m < i) {
                    x -= factor[i][m] * unit[m];
                }
            }
            unit[i] = x / factor[i][i];
            sum += unit[i] * unit[i];
        }
        return coefficients()[control] / Math.sqrt(residual() * sum / (n - 1));
    }

    /// Controls that others explain, and which are therefore left out.
    public List<LeftOut> leftOut() {
        return IntStream.range(0, controls)
                .filter(c -> factor[c][c] == 0)
                .mapToObj(c -> {
                    double[] parts = coefficients(c);
                    return new LeftOut(
                            c,
                            used.stream()
                                    .filter(j -> Math.abs(parts[j]) * deviations[j] > PART * deviations[c])
                                    .toList());
                })
                .toList();
    }

    /// @param control its index among the controls
    /// @param by those that explain it; empty where it does not vary
    public record LeftOut(int control, List<Integer> by) {
        public LeftOut {
            by = List.copyOf(by);
        }
    }
}
