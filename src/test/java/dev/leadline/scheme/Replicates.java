package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.stream.IntStream;

/// The means of a function over independent replicates of a point set.
record Replicates(double[] means) {
    private static final int BLOCK = 1024;

    /// A function of points, one array for each coordinate, which it may overwrite.
    interface Integrand {
        void at(double[][] u, double[] y, int n);
    }

    /// A function of one point at a time.
    interface PointFunction extends Integrand {
        double at(double[][] u, int i);

        @Override
        default void at(double[][] u, double[] y, int n) {
            for (int i = 0; i < n; i++) {
                y[i] = at(u, i);
            }
        }
    }

    /// One randomised dimension.
    interface Dimension {
        Coordinate with(Stream numbers);
    }

    /// Over the first n points in these dimensions.
    ///
    /// @param seed of this experiment, fixed
    static Replicates of(int replicates, int n, Dimension[] dimensions, long seed, Integrand f) {
        return new Replicates(IntStream.range(0, replicates)
                .parallel()
                .mapToDouble(r -> mean(coordinates(dimensions, seed, r), n, f))
                .toArray());
    }

    static Coordinate[] coordinates(Dimension[] dimensions, long seed, int replicate) {
        return IntStream.range(0, dimensions.length)
                .mapToObj(j ->
                        dimensions[j].with(Stream.at(new Address(seed, Purpose.RUN, "A", replicate, "x" + (j + 1), 0))))
                .toArray(Coordinate[]::new);
    }

    static Dimension[] sobol(int dimensions, Scrambling scrambling) {
        return IntStream.rangeClosed(1, dimensions)
                .mapToObj(Sobol::dimension)
                .map(sobol -> (Dimension) numbers -> sobol.randomised(scrambling, numbers))
                .toArray(Dimension[]::new);
    }

    static Dimension[] lattice(int dimensions) {
        return IntStream.rangeClosed(1, dimensions)
                .mapToObj(Lattice::dimension)
                .map(lattice -> (Dimension) lattice::shifted)
                .toArray(Dimension[]::new);
    }

    /// Sums by blocks, so that rounding stays far below the differences of replicates.
    static double mean(Coordinate[] coordinates, int n, Integrand f) {
        int rows = Math.min(n, BLOCK);
        double[][] u = new double[coordinates.length][rows];
        double[] y = new double[rows];
        double sum = 0;
        for (int first = 0; first < n; first += rows) {
            for (int j = 0; j < u.length; j++) {
                coordinates[j].fill(u[j], first, rows);
            }
            f.at(u, y, rows);
            double part = 0;
            for (double value : y) {
                part += value;
            }
            sum += part;
        }
        return sum / n;
    }

    double mean() {
        return Arrays.stream(means).average().orElseThrow();
    }

    double variance() {
        return moment(2) * means.length / (means.length - 1);
    }

    double sd() {
        return Math.sqrt(variance());
    }

    double errorOfMean() {
        return sd() / Math.sqrt(means.length);
    }

    /// Standard error of the variance: from the fourth moment, as no normal distribution is assumed.
    double errorOfVariance() {
        double m2 = moment(2);
        return Math.sqrt((moment(4) - m2 * m2) / means.length);
    }

    private double moment(int order) {
        double mean = mean();
        return Arrays.stream(means)
                .map(m -> Math.pow(m - mean, order))
                .average()
                .orElseThrow();
    }

    /// Neither less nor more than `variance`, by four standard errors.
    void assertVariance(double variance, String what) {
        assertEquals(variance, variance(), 4 * errorOfVariance(), what + ": variance, times " + variance() / variance);
    }

    void assertMean(double mean, String what) {
        assertEquals(mean, mean(), 4 * errorOfMean(), what + ": mean");
    }
}
