package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

class WilsonTest {
    private static final double STATED_ERROR = 1e-15;

    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Record int-binomial.
    @Test
    void agreesWithTheTable() {
        double tolerance = ReferenceValues.relativeTolerance("int-binomial");
        int checked = 0;
        for (var entry : ReferenceValues.record("int-binomial").required("cases")) {
            var numbers = entry.required("label")
                    .asString()
                    .replaceAll("[^0-9.,]", "")
                    .split(",");
            var interval = Wilson.of(
                    Long.parseLong(numbers[0]), Long.parseLong(numbers[1]), 0, Double.parseDouble(numbers[2]));
            within(tolerance, ReferenceValues.expected(entry, "wilson_low"), interval.low());
            within(tolerance, ReferenceValues.expected(entry, "wilson_high"), interval.high());
            checked++;
        }
        assertEquals(11, checked);
    }

    /// Made by `fixed_draws.py` with 50 digits; the error that [Wilson] states.
    @ParameterizedTest(name = "{0} of {1}, level {2}")
    @CsvFileSource(resources = "/interval/wilson.csv", numLinesToSkip = 2)
    void agreesWithFiftyDigits(long hits, long n, double level, double low, double high) {
        var interval = Wilson.of(hits, n, 0, level);
        within(STATED_ERROR, low, interval.low());
        within(STATED_ERROR, high, interval.high());
    }

    /// Record int-binomial-coverage, and three more that were enumerated apart from this code to 4 digits:
    /// the sum of the binomial probabilities, here those of Commons Statistics, of the counts whose
    /// interval holds p.
    @ParameterizedTest(name = "n = {0}, p = {1}")
    @CsvSource({
        "20, 0.1, 0.9568255047155, 1e-10",
        "50, 0.02, 0.9215722516490, 1e-10",
        "100, 0.5, 0.9431120663590, 1e-10",
        "1000, 0.001, 0.9197906571598, 1e-10",
        "1000, 1e-4, .9048, 5e-5",
        "1000, 5e-3, .9619, 5e-5",
        "10000, 1e-3, .9627, 5e-5"
    })
    void hasItsExactCoverage(int n, double p, double coverage, double tolerance) {
        var counts = BinomialDistribution.of(n, p);
        double sum = 0;
        for (int k = 0; k <= n; k++) {
            var interval = Wilson.of(k, n, 0, .95);
            sum += interval.low() <= p && p <= interval.high() ? counts.probability(k) : 0;
        }
        assertEquals(coverage, sum, tolerance);
    }

    @Test
    void isNeverZeroWideAndStaysWithinZeroAndOne() {
        for (long n : new long[] {1, 2, 1000, 10_000_000_000_000L}) {
            var none = Wilson.of(0, n, 0, .95);
            assertEquals(0, none.low());
            assertTrue(none.high() > 0 && none.high() < 1);
            var all = Wilson.of(n, n, 0, .95);
            assertEquals(1, all.high());
            assertTrue(all.low() > 0 && all.low() < 1);
        }
    }

    /// With k hits of n and f failed, any number of hits from k to k + f of n + f is possible.
    @Test
    void bracketsWhatFailed() {
        var interval = Wilson.of(7, 990, 10, .95);
        assertEquals(Wilson.of(7, 1000, 0, .95).low(), interval.low());
        assertEquals(Wilson.of(17, 1000, 0, .95).high(), interval.high());
        assertEquals(
                "10 failed evaluations count as misses in the lower limit and as hits in the upper one",
                interval.note().orElseThrow());
        var onlyFailed = Wilson.of(0, 0, 5, .95);
        assertEquals(0, onlyFailed.low());
        assertEquals(1, onlyFailed.high());
    }

    @Test
    void refusesImpossibleCounts() {
        assertTrue(Wilson.of(0, 0, 0, .95).isNone());
        assertThrows(IllegalArgumentException.class, () -> Wilson.of(-1, 10, 0, .95));
        assertThrows(IllegalArgumentException.class, () -> Wilson.of(11, 10, 0, .95));
        assertThrows(IllegalArgumentException.class, () -> Wilson.of(1, 10, -1, .95));
        assertThrows(IllegalArgumentException.class, () -> Wilson.of(1, 10, 0, 1));
    }
}
