package dev.leadline.density;

import dev.leadline.numeric.Power;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Arrays;

/// A sample smoothed with a Gaussian kernel: the mean of normal densities around each of its values.
///
/// Its variance is that of the sample (dividing by n) plus the square of the bandwidth: smoothing widens.
///
/// Error: see [Bumps].
///
/// @param standard around 0, in units of the bandwidth
/// @param bandwidth the standard deviation of the kernel
public record Smoothed(Density standard, double location, double bandwidth) implements Scaled {
    public static final int MOST_VALUES = 100_000;

    /// What the bandwidth is called that is chosen where none is given.
    public static final String RULE = "Silverman's rule of thumb, 0.9 min(sd, IQR/1.34) n^(-1/5)";

    private static final String BANDWIDTH = "bandwidth";

    /// The bandwidth by Silverman's rule of thumb, and the density with it.
    ///
    /// Source: Silverman (1986), Density Estimation for Statistics and Data Analysis, equation 3.31. The standard
    /// deviation divides by n - 1; quartiles are interpolated between ordered values at (n - 1) p; where they are
    /// equal, the standard deviation alone counts.
    ///
    /// @throws Refusal where the values cannot be smoothed
    public static Smoothed byRule(double... values) {
        refuseValues(values);
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        int n = sorted.length;
        double sd = Math.sqrt(Empirical.of(sorted).variance() * n / (n - 1));
        double range = (interpolated(sorted, .75) - interpolated(sorted, .25)) / 1.34;
        double spread = range > 0 ? Math.min(sd, range) : sd;
        return of(.9 * spread * Power.pow(n, -.2), values);
    }

    private static double interpolated(double[] sorted, double p) {
        double at = p * (sorted.length - 1);
        int below = (int) at;
        return below + 1 < sorted.length
                ? sorted[below] + (at - below) * (sorted[below + 1] - sorted[below])
                : sorted[below];
    }

    /// @throws Refusal where the values cannot be smoothed with this bandwidth
    public static Smoothed of(double bandwidth, double... values) {
        refuseValues(values);
        Rule.positive(BANDWIDTH, "", "It is the standard deviation of the kernel around each value.")
                .tryThis("Leave it out to have it chosen by rule, or draw the values themselves (empirical).")
                .broken(bandwidth)
                .ifPresent(problem -> {
                    throw new Refusal(problem);
                });
        double least = Arrays.stream(values).min().orElseThrow();
        double most = Arrays.stream(values).max().orElseThrow();
        double location = 0.5 * least + 0.5 * most;
        double[] z = new double[values.length];
        for (int i = 0; i < z.length; i++) {
            z[i] = (values[i] - location) / bandwidth;
        }
        double reach = 0.5 * most - 0.5 * least + Bumps.REACH * bandwidth;
        if (!(reach < Double.MAX_VALUE / 2)) {
            throw new Refusal(
                    Problem.of("values smoothed with bandwidth %s reach too far".formatted(Shortest.text(bandwidth)))
                            .because("They would exceed half the largest number there is, 1.8e308.")
                            .tryThis("Check the unit of the values, or take a smaller bandwidth.")
                            .at(Place.of(BANDWIDTH)));
        }
        if (!(bandwidth > 1e-12 * Math.max(Math.abs(least), Math.abs(most)))
                || !Arrays.stream(z).allMatch(Double::isFinite)) {
            throw tooNarrow(bandwidth);
        }
        return Bumps.of(z)
                .map(bumps -> new Smoothed(bumps, location, bandwidth))
                .orElseThrow(() -> tooNarrow(bandwidth));
    }

    private static Refusal tooNarrow(double bandwidth) {
        return new Refusal(Problem.of("bandwidth %s is too small for these values".formatted(Shortest.text(bandwidth)))
                .because("The values lie so many bandwidths apart that nothing is smoothed.")
                .tryThis("Take a larger one, or draw the values themselves (empirical).")
                .at(Place.of(BANDWIDTH)));
    }

    private static void refuseValues(double[] values) {
        if (values.length > MOST_VALUES) {
            throw new Refusal(Problem.of("there are %,d values to smooth".formatted(values.length))
                    .because("At most %,d are smoothed.".formatted(MOST_VALUES))
                    .tryThis("Draw the values themselves (empirical): with so many, smoothing changes little."));
        }
        if (Arrays.stream(values).distinct().limit(2).count() < 2) {
            throw new Refusal(Problem.of("all values are the same, %s".formatted(Shortest.text(values[0])))
                    .because("Their standard deviation is 0; there is nothing to smooth.")
                    .tryThis("For a fixed value use a constant."));
        }
    }

    @Override
    public double scale() {
        return bandwidth;
    }
}
