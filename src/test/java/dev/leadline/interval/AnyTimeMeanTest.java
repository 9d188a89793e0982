package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import java.util.regex.Pattern;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class AnyTimeMeanTest {
    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Made by `any_time.py` with Lambert's function of mpmath at 60 digits; the error stated.
    @ParameterizedTest(name = "tuned to {0}, level {1}, at {3}")
    @CsvFileSource(resources = "/interval/any-time-mean.csv", numLinesToSkip = 2)
    void agreesWithLambert(double tuned, double level, double rhoSquared, double at, double halfWidth) {
        var band = AnyTimeMean.tunedTo(tuned, level);
        within(1e-12, rhoSquared, 1 / band.mixture().rho());
        within(1e-12, halfWidth, band.unit(at));
    }

    /// Record int-cs-asymptotic.
    @Test
    void agreesWithTheRecord() {
        var id = "int-cs-asymptotic";
        double tolerance = ReferenceValues.relativeTolerance(id);
        var form = Pattern.compile("halfwidth\\(t=(\\d+),rho=([.\\d]+),alpha=0.05,sd=1\\)");
        int checked = 0;
        for (var entry : ReferenceValues.record(id).required("expected")) {
            var match = form.matcher(entry.required("name").asString());
            if (match.matches()) {
                double rho = Double.parseDouble(match.group(2));
                var band = new AnyTimeMean(new NormalMixture(1 / (rho * rho), .95));
                within(tolerance, entry.required("value").asDouble(), band.unit(Double.parseDouble(match.group(1))));
                checked++;
            }
        }
        assertEquals(8, checked);
        var tuned = AnyTimeMean.tunedTo(500, .95);
        within(
                tolerance,
                ReferenceValues.expected(id, "rho_exact_for_t=500"),
                1 / Math.sqrt(tuned.mixture().rho()));
        within(tolerance, ReferenceValues.expected(id, "halfwidth(t=500, rho_exact)"), tuned.unit(500));
        within(
                tolerance,
                ReferenceValues.expected(id, "rho_approx_for_t=500"),
                1 / Math.sqrt(NormalMixture.tunedTo(500, .95).rho()));
    }

    /// Computed with the formula of the authors' code, apart from this one, to four digits.
    @ParameterizedTest(name = "n = {0}: {1}")
    @CsvSource({"1e2, 4.563", "1e3, 1.951", "1e4, 1.549", "1e5, 1.656", "1e6, 1.820", "1e7, 1.976", "1e8, 2.123"})
    void isSoMuchWiderThanTheFixedInterval(double n, double times) {
        assertEquals(times, AnyTimeMean.tunedTo(AnyTimeMean.DRAWS, .95).overFixed(n), 5e-4);
    }

    /// What tuning promises.
    @ParameterizedTest
    @ValueSource(doubles = {10, 1000, 1e4, 1e7})
    void isNarrowestWhereItIsTunedTo(double n) {
        double tuned = AnyTimeMean.tunedTo(n, .95).unit(n);
        assertTrue(tuned < AnyTimeMean.tunedTo(.99 * n, .95).unit(n));
        assertTrue(tuned < AnyTimeMean.tunedTo(1.01 * n, .95).unit(n));
    }

    @Test
    void makesTheBandOfAnEstimate() {
        var band = AnyTimeMean.tunedTo(1e4, .95);
        // At n = 1e4: 1.548560 times the z of 95 %.
        double errors = 1.548560 * NormalDistribution.of(0, 1).inverseCumulativeProbability(.975);
        var interval = band.of(new Estimate(5, .01, 9_999), 10_000);
        within(1e-6, .01 * errors, interval.halfWidth());
        assertEquals(10, interval.low() + interval.high(), 1e-12);
        assertEquals("any-time-mean", interval.kind());
        assertEquals(.95, interval.level());
        assertTrue(interval.note().isEmpty());
        var biased = band.of(new Estimate(5, .01, 9_999, .5), 10_000);
        within(1e-12, interval.halfWidth() + .5, biased.halfWidth());
    }

    @Test
    void saysWhyThereIsNone() {
        var band = AnyTimeMean.tunedTo(1e4, .95);
        assertEquals("an interval needs at least 2 observations; so far there is 1", note(band, 3));
        assertTrue(note(band, 3, 3, 3).startsWith("every value seen so far is equal (3)"));
        assertTrue(note(band, 1e200, 2e200, 4e200).contains("overflow"));
        assertTrue(note(band, 1e-200, 2e-200, 4e-200).contains("underflow"));
        assertThrows(IllegalArgumentException.class, () -> AnyTimeMean.tunedTo(1e4, 1));
        assertThrows(IllegalArgumentException.class, () -> AnyTimeMean.tunedTo(1e4, Double.NaN));
    }

    private static String note(AnyTimeMean band, double... values) {
        var sums = new Accumulator(1);
        sums.add(new double[][] {values}, 0, values.length);
        var interval = band.of(Estimate.mean(sums, 0), values.length);
        assertTrue(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
        return interval.note().orElseThrow();
    }
}
