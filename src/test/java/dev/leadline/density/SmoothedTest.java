package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/// Smoothed samples against `density/smoothed.csv` (mpmath, 60 digits, `smoothed.py`).
class SmoothedTest {

    /// As [Bumps] says; the far tails are better.
    private static final double RELATIVE = 1e-11;

    private static final Map<String, Smoothed> SAMPLES = new HashMap<>();

    static Stream<String[]> rows(String kind) {
        try (var in = SmoothedTest.class.getResourceAsStream("/density/smoothed.csv")) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .map(line -> line.split(","))
                    .filter(row -> row[0].equals(kind));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static {
        rows("values").forEach(row -> {
            double[] values = Arrays.stream(row[3].split(" "))
                    .mapToDouble(Double::parseDouble)
                    .toArray();
            SAMPLES.put(
                    row[1],
                    row[2].isEmpty() ? Smoothed.byRule(values) : Smoothed.of(Double.parseDouble(row[2]), values));
        });
    }

    static Stream<String[]> points() {
        return rows("at");
    }

    static Stream<String[]> moments() {
        return rows("moments");
    }

    private static double number(String text) {
        return Double.parseDouble(text);
    }

    /// Beside the error that is promised stands that of x itself, which is rounded at its distance from the middle.
    @ParameterizedTest(name = "{1} at {2}")
    @MethodSource("points")
    void agreesWithSixtyDigits(
            String kind, String name, String x, String pdf, String log, String cdf, String survival) {
        var density = SAMPLES.get(name);
        double at = number(x);
        assertEquals(number(pdf), density.pdf(at), RELATIVE * number(pdf));
        assertEquals(number(log), density.logPdf(at), RELATIVE);
        assertEquals(number(cdf), density.cdf(at), RELATIVE * number(cdf));
        assertEquals(number(survival), density.survival(at), RELATIVE * number(survival));
        assertEquals(number(cdf), density.cdf(at), 1e-15 + number(pdf) * Math.ulp(at - density.location()));
        double p = Math.min(number(cdf), number(survival));
        if (p > 1e-300) {
            double back = number(cdf) < .5 ? density.quantile(number(cdf)) : density.upperQuantile(number(survival));
            // where the density is flat to nothing any x is right
            assertEquals(at, back, Math.max(1e-13 * Math.abs(at), RELATIVE * p / number(pdf) + 2e-16 / number(pdf)));
        }
    }

    @ParameterizedTest(name = "{1}")
    @MethodSource("moments")
    void hasBandwidthByRuleAndMoments(
            String kind,
            String name,
            String bandwidth,
            String mean,
            String variance,
            String skewness,
            String kurtosis) {
        var density = SAMPLES.get(name);
        assertEquals(number(bandwidth), density.bandwidth(), 1e-14 * number(bandwidth));
        assertEquals(number(mean), density.mean(), 1e-14 * Math.sqrt(number(variance)));
        assertEquals(number(variance), density.variance(), 1e-14 * number(variance));
        assertEquals(number(skewness), density.skewness(), 1e-13);
        assertEquals(number(kurtosis), density.excessKurtosis(), 1e-13 * Math.max(1, number(kurtosis)));
    }

    private static double[] waits(int n) {
        var random = new SplittableRandom(20261201);
        return random.doubles(n, 1e-9, 1)
                .map(u -> 3 * Math.pow(-Math.log(u), 1.2))
                .toArray();
    }

    /// Measured: 0.3 s for 10,000 values, with other work on a machine of 2 cores.
    @ParameterizedTest(name = "{0} values")
    @ValueSource(ints = {2, 240, 10_000})
    void drawsByATable(int n) {
        var values = waits(n);
        long start = System.nanoTime();
        var inversion = Inversion.of(Smoothed.byRule(values));
        double seconds = (System.nanoTime() - start) * 1e-9;
        assertTrue(inversion.uError() <= 1e-12, "u-error " + inversion.uError());
        assertTrue(seconds < 5, "took " + seconds + " s");
        // against the sum of normal distributions of a library
        double[] u = {1e-12, 1e-3, .1, .4, .5, .9, .999, 1 - 1e-9};
        double[] x = new double[u.length];
        inversion.fill(u, x, u.length);
        double h = Smoothed.byRule(values).bandwidth();
        var kernel = NormalDistribution.of(0, h);
        for (int i = 0; i < u.length; i++) {
            double at = x[i];
            double cdf = Arrays.stream(values)
                    .map(v -> kernel.cumulativeProbability(at - v))
                    .sum();
            assertEquals(u[i], cdf / n, 2e-12, "u = " + u[i]);
        }
    }

    /// Measured: 3 s.
    @Test
    void takesAHundredThousandValues() {
        var inversion = Inversion.of(Smoothed.byRule(waits(100_000)));
        assertTrue(inversion.uError() <= 1e-12);
        refused("there are 100,001 values to smooth", () -> Smoothed.byRule(waits(100_001)));
    }

    @Test
    void isToldByValuesAndBandwidth() {
        assertEquals(Smoothed.of(1, 0, 3), Smoothed.of(1, 3, 0));
        assertNotEquals(Smoothed.of(1, 0, 3), Smoothed.of(1.5, 3, 0));
        var two = Inversion.of(Smoothed.of(1, 0, 3)).hash();
        assertEquals(two, Inversion.of(Smoothed.of(2, 100, 106)).hash());
        assertNotEquals(two, Inversion.of(Smoothed.of(1, 0, 3.5)).hash());
    }

    @Test
    void refusesWhatCannotBeSmoothed() {
        refused("all values are the same, 3", () -> Smoothed.byRule(3, 3, 3));
        refused("all values are the same, 3", () -> Smoothed.of(1, 3));
        refused("bandwidth is 0 but must be greater than 0", () -> Smoothed.of(0, 3, 4));
        refused("bandwidth is NaN but must be greater than 0", () -> Smoothed.of(Double.NaN, 3, 4));
        refused("bandwidth is ∞ but must be a finite number", () -> Smoothed.of(Double.POSITIVE_INFINITY, 3, 4));
        refused("values smoothed with bandwidth 1e308 reach too far", () -> Smoothed.of(1e308, 3, 4));
        refused("values smoothed with bandwidth 2 reach too far", () -> Smoothed.of(2, -1e308, 1e308));
        refused("bandwidth 1e-300 is too small for these values", () -> Smoothed.of(1e-300, 3, 4));
        refused("bandwidth 1e-7 is too small for these values", () -> Smoothed.of(1e-7, waits(10_000)));
    }

    private static void refused(String primary, org.junit.jupiter.api.function.Executable of) {
        assertEquals(
                List.of(primary),
                assertThrows(Refusal.class, of).problems().stream()
                        .map(problem -> problem.primary())
                        .toList());
    }
}
