package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// How often a 95 % interval holds what it should, over repetitions with our own streams.
///
/// The expected coverages are those of an independent experiment with at least 20,000 repetitions (standard error at
/// most .0016). With R repetitions here the gate is four joint standard errors: a right program fails a case with
/// probability 6e-5, and at R = 4,000 a coverage that is off by .02 is noticed nearly always.
class CoverageTest {
    private static final long SEED = 20261201;
    private static final double OTHER_ERROR = 0.0016;

    private static DoubleUnaryOperator quantile(String density) {
        var normal = NormalDistribution.of(0, 1);
        return switch (density) {
            case "normal" -> normal::inverseCumulativeProbability;
            case "exponential" -> u -> -Math.log(u);
            case "lognormal" -> u -> Math.exp(normal.inverseCumulativeProbability(u));
            default -> throw new IllegalArgumentException(density);
        };
    }

    private static double mean(String density) {
        return switch (density) {
            case "normal" -> 0;
            case "exponential" -> 1;
            default -> Math.exp(.5);
        };
    }

    @ParameterizedTest(name = "{0}, n = {1}: {2}")
    @CsvSource({
        "normal, 10, .951",
        "exponential, 10, .901",
        "exponential, 30, .928",
        "exponential, 100, .941",
        "lognormal, 30, .883",
        "lognormal, 100, .917"
    })
    void studentCoversAsItShould(String density, int n, double coverage) {
        int repetitions = 4_000;
        var quantile = quantile(density);
        double mean = mean(density);
        var values = new double[1][n];
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            Stream.at(new Address(SEED, Purpose.RUN, "A", 0, density + " " + n, r))
                    .fill(values[0], 0, n);
            for (int i = 0; i < n; i++) {
                values[0][i] = quantile.applyAsDouble(values[0][i]);
            }
            var sums = new Accumulator(1);
            sums.add(values, 0, n);
            var interval = Student.of(sums, 0, .95);
            covered += interval.low() <= mean && mean <= interval.high() ? 1 : 0;
        }
        gate(coverage, covered, repetitions, OTHER_ERROR);
    }

    /// Against the exact coverages of [ClopperPearsonTest].
    @ParameterizedTest(name = "n = {0}, p = {1}: {2}")
    @CsvSource({"100, .5, .9648", "1000, 1e-3, .98107", "1000, 5e-3, .9799"})
    void clopperPearsonCoversAsItShould(int n, double p, double coverage) {
        int repetitions = 4_000;
        var values = new double[1][n];
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            Stream.at(new Address(SEED, Purpose.RUN, "A", 0, "event " + n + " " + p, r))
                    .fill(values[0], 0, n);
            for (int i = 0; i < n; i++) {
                values[0][i] = values[0][i] < p ? 1 : 0;
            }
            var sums = new Accumulator(1);
            sums.add(values, 0, n);
            var interval = ClopperPearson.of(sums.hits(0).orElseThrow(), n, sums.excluded(), .95);
            covered += interval.low() <= p && p <= interval.high() ? 1 : 0;
        }
        gate(coverage, covered, repetitions, 0);
    }

    private static void gate(double expected, int covered, int repetitions, double otherError) {
        double here = (double) covered / repetitions;
        double error = Math.sqrt(expected * (1 - expected) / repetitions + otherError * otherError);
        assertTrue(
                Math.abs(here - expected) <= 4 * error,
                () -> here + " where " + expected + " ± " + 4 * error + " was expected, seed " + SEED);
    }
}
