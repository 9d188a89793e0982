package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ClopperPearsonTest {
    private static final double STATED_ERROR = 1e-14;

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
            var interval = ClopperPearson.of(
                    Long.parseLong(numbers[0]), Long.parseLong(numbers[1]), 0, Double.parseDouble(numbers[2]));
            within(tolerance, ReferenceValues.expected(entry, "clopper_pearson_low"), interval.low());
            within(tolerance, ReferenceValues.expected(entry, "clopper_pearson_high"), interval.high());
            checked++;
        }
        assertEquals(11, checked);
    }

    /// Made by `limits.py` with 50 digits; the error that [ClopperPearson] states.
    @ParameterizedTest(name = "{0} of {1}, level {2}")
    @CsvFileSource(resources = "/interval/clopper-pearson.csv", numLinesToSkip = 2)
    void agreesWithFiftyDigits(long hits, long n, double level, double low, double high) {
        var interval = ClopperPearson.of(hits, n, 0, level);
        within(STATED_ERROR, low, interval.low());
        within(STATED_ERROR, high, interval.high());
    }

    /// Record int-rule-of-three.
    @ParameterizedTest
    @ValueSource(longs = {10, 20, 30, 50, 100, 300, 1000, 3000, 1000000})
    void givesALimitWithoutHits(long n) {
        var id = "int-rule-of-three";
        double limit = ReferenceValues.expected(id, "upper95_one_sided_n" + n);
        within(1e-14, limit, ClopperPearson.upperLimit(0, n, 0, .95));
        within(1e-14, 1 - limit, ClopperPearson.lowerLimit(n, n, 0, .95));
    }

    @Test
    void isNeverZeroWide() {
        var none = ClopperPearson.of(0, 1000, 0, .95);
        assertEquals(0, none.low());
        // 1 - 0.025^(1/1000)
        within(1e-5, .00368208, none.high());
        assertEquals(
                "no hit in 1,000 draws: below 0.0030 with 95 % one-sided confidence",
                none.note().orElseThrow());
        var all = ClopperPearson.of(1000, 1000, 0, .95);
        within(1e-5, 1 - .00368208, all.low());
        assertEquals(1, all.high());
        assertEquals(
                "every one of 1,000 draws is a hit: above 0.997 with 95 % one-sided confidence",
                all.note().orElseThrow());
    }

    @Test
    void isLopsidedWithFewHits() {
        for (long hits : new long[] {1, 5, 15}) {
            assertTrue(ClopperPearson.of(hits, 10_000, 0, .95).lopsided(hits * 1e-4), hits + " hits");
            assertTrue(ClopperPearson.of(10_000 - hits, 10_000, 0, .95).lopsided(1 - hits * 1e-4), hits + " misses");
        }
        assertFalse(ClopperPearson.of(25, 10_000, 0, .95).lopsided(25e-4));
        assertTrue(ClopperPearson.of(89, 9_000, 1_000, .95).lopsided(89 / 9e3), "failed evaluations");
    }

    /// Of 10,000 hits: .05^(1/10,000) = .99970047, exactly, is never below what is said.
    @Test
    void saysTheLimitsInDigitsThatMean() {
        var all = ClopperPearson.of(10_000, 10_000, 0, .95);
        assertEquals(
                "every one of 10,000 draws is a hit: above 0.9997 with 95 % one-sided confidence",
                all.note().orElseThrow());
        // 1 - .05/3 is .98333…
        var third = ClopperPearson.of(3, 10_000, 0, 1 - .05 / 3);
        assertEquals("98.33 %", third.percent());
        assertEquals(
                "99.99366 %", ClopperPearson.of(3, 10_000, 0, .9999366575163338).percent());
        assertEquals("99 %", ClopperPearson.of(3, 10_000, 0, Math.nextDown(.99)).percent());
        assertEquals("97.5 %", ClopperPearson.of(3, 10_000, 0, .975).percent());
    }

    /// With k hits of n and f failed, any number of hits from k to k + f of n + f is possible.
    @Test
    void bracketsWhatFailed() {
        var interval = ClopperPearson.of(7, 990, 10, .95);
        assertEquals(ClopperPearson.of(7, 1000, 0, .95).low(), interval.low());
        assertEquals(ClopperPearson.of(17, 1000, 0, .95).high(), interval.high());
        assertTrue(interval.note().orElseThrow().startsWith("10 failed evaluations count as misses in the lower"));
        assertEquals(ClopperPearson.upperLimit(17, 1000, 0, .95), ClopperPearson.upperLimit(7, 990, 10, .95));
        assertEquals(ClopperPearson.lowerLimit(7, 1000, 0, .95), ClopperPearson.lowerLimit(7, 990, 10, .95));
        var onlyFailed = ClopperPearson.of(0, 0, 5, .95);
        assertEquals(0, onlyFailed.low());
        assertEquals(1, onlyFailed.high());
        var noHit = ClopperPearson.of(0, 995, 5, .95);
        assertEquals(ClopperPearson.of(5, 1000, 0, .95).high(), noHit.high());
    }

    @Test
    void needsADraw() {
        var interval = ClopperPearson.of(0, 0, 0, .95);
        assertTrue(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
        assertEquals("an interval needs at least 1 draw", interval.note().orElseThrow());
    }

    /// Record int-binomial-coverage, and three more that were enumerated apart from this code to 4 digits: the sum of
    /// the binomial probabilities, here those of Commons Statistics, of the counts whose interval holds p.
    @ParameterizedTest(name = "n = {0}, p = {1}")
    @CsvSource({
        "20, 0.1, 0.988746865835491, 1e-10",
        "50, 0.02, 0.9822419193020284, 1e-10",
        "100, 0.5, 0.9647997997822951, 1e-10",
        "1000, 0.001, 0.9810731665496396, 1e-10",
        "1000, 1e-4, 0.9953, 5e-5",
        "1000, 5e-3, 0.9799, 5e-5",
        "10000, 1e-3, 0.9755, 5e-5"
    })
    void hasItsExactCoverage(int n, double p, double coverage, double tolerance) {
        var counts = BinomialDistribution.of(n, p);
        double sum = 0;
        for (int k = 0; k <= n; k++) {
            double probability = counts.probability(k);
            if (probability > 1e-18) {
                var interval = ClopperPearson.of(k, n, 0, .95);
                sum += interval.low() <= p && p <= interval.high() ? probability : 0;
            }
        }
        assertEquals(coverage, sum, tolerance);
    }

    @Test
    void refusesImpossibleCounts() {
        assertThrows(IllegalArgumentException.class, () -> ClopperPearson.of(-1, 10, 0, .95));
        assertThrows(IllegalArgumentException.class, () -> ClopperPearson.of(11, 10, 0, .95));
        assertThrows(IllegalArgumentException.class, () -> ClopperPearson.of(1, 10, -1, .95));
        assertThrows(IllegalArgumentException.class, () -> ClopperPearson.of(1, 10, 0, Double.NaN));
    }
}
