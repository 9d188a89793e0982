package dev.leadline.density;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;

/// The member of a family under which values are most likely, and how far it is from them.
///
/// The distances are those of the fitted member: they say which family follows the values more closely. They are no
/// tests, and have no p-values here: the usual tables hold for a density that was chosen without looking at the values,
/// and a fitted one is always nearer.
///
/// @param parameters as the project file has them
/// @param free how many of them were fitted
/// @param used how many values it was fitted to: those above a threshold, else all
/// @param kolmogorovSmirnov largest difference between the share of values up to x and `cdf(x)`
/// @param andersonDarling the squares of all differences, weighed by one over their variance: tails count more; `NaN`
///     for discrete families, where it is not defined
public record Fit(
        String family,
        SequencedMap<String, Double> parameters,
        Density density,
        int free,
        int used,
        double logLikelihood,
        double kolmogorovSmirnov,
        double andersonDarling) {

    /// A theoretical quantile at `(i - 1/2) / n`, and the i-th of the ordered values.
    public record Point(double quantile, double value) {}

    public Fit {
        parameters = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(parameters));
    }

    /// @param sorted the values that it was fitted to
    static Fit of(String family, SequencedMap<String, Double> parameters, Density density, int free, double[] sorted) {
        return new Fit(
                family,
                parameters,
                density,
                free,
                sorted.length,
                logLikelihood(density, sorted),
                Distances.kolmogorovSmirnov(density, sorted),
                density.isDiscrete() ? Double.NaN : Distances.andersonDarling(density, sorted));
    }

    static double logLikelihood(Density density, double[] values) {
        double[] logs = new double[values.length];
        density.logPdf(values, logs, values.length);
        double sum = 0;
        double lost = 0;
        for (double log : logs) {
            double next = sum + log;
            lost += Math.abs(sum) >= Math.abs(log) ? sum - next + log : log - next + sum;
            sum = next;
        }
        return Double.isInfinite(sum) ? sum : sum + lost;
    }

    /// Akaike's information criterion: twice the number of fitted parameters less twice the log-likelihood. Smaller is
    /// better; only differences between fits to the same values mean something.
    public double aic() {
        return 2 * free - 2 * logLikelihood;
    }

    /// For a plot of quantiles against quantiles: on the diagonal where the values follow the density.
    ///
    /// @param sorted the values that it was fitted to
    public List<Point> points(double... sorted) {
        int n = sorted.length;
        List<Point> points = new ArrayList<>(n);
        for (int i = 0; i < n; i++) {
            double quantile = 2 * i < n ? density.quantile((i + .5) / n) : density.upperQuantile((n - i - .5) / n);
            points.add(new Point(quantile, sorted[i]));
        }
        return points;
    }
}
