package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

class AnyTimeChanceTest {
    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Record int-cs-bernoulli, the variant with a prior for each p.
    @ParameterizedTest
    @CsvSource({"700, 1000, 100", "15, 50, 50"})
    void agreesWithTheRecord(long hits, long n, double tuned) {
        var id = "int-cs-bernoulli";
        var name = "howard_variant(%d,%d,t_opt=%.0f)".formatted(hits, n, tuned);
        double tolerance = ReferenceValues.relativeTolerance(id);
        var interval = AnyTimeChance.tunedTo(tuned, .95).of(hits, n, 0);
        within(tolerance, ReferenceValues.expected(id, name + " low"), interval.low());
        within(tolerance, ReferenceValues.expected(id, name + " high"), interval.high());
    }

    /// By the authors' formula, computed apart from this code to seven digits.
    @ParameterizedTest
    @CsvSource({
        "700, 1000, 100, .6516298, .7459495",
        "5, 50, 50, .0130218, .2692647",
        "1, 50, 50, 0, .1348916",
        "0, 50, 50, 0, .0769696"
    })
    void agreesWithSevenDigits(long hits, long n, double tuned, double low, double high) {
        var interval = AnyTimeChance.tunedTo(tuned, .95).of(hits, n, 0);
        assertEquals(low, interval.low(), 6e-8);
        assertEquals(high, interval.high(), 6e-8);
    }

    /// Made by `any_time.py` from the definition at 60 digits; the error stated.
    @ParameterizedTest(name = "{0} of {1}, tuned to {2}, level {3}")
    @CsvFileSource(resources = "/interval/any-time-chance.csv", numLinesToSkip = 2)
    void agreesWithSixtyDigits(long hits, long n, double tuned, double level, double low, double high, double missing) {
        var interval = AnyTimeChance.tunedTo(tuned, level).of(hits, n, 0);
        within(1e-10, low, interval.low());
        within(1e-10, high, interval.high());
        var mirrored = AnyTimeChance.tunedTo(tuned, level).of(n - hits, n, 0);
        within(1e-10, missing, mirrored.low());
    }

    /// Every count at several n: p is either below, in or above the band, once each. So the search may trust
    /// a change of sign, and limits rise with the count, which the bracket of failed evaluations needs.
    @ParameterizedTest(name = "n = {0}, tuned to {1}")
    @CsvSource({"10, 5", "10, 1e4", "100, 5", "100, 1000", "400, 5", "400, 1e4"})
    void isOneInterval(int n, double tuned) {
        var band = AnyTimeChance.tunedTo(tuned, .95);
        double most = -Math.log(.05);
        double before = -1;
        double beforeHigh = -1;
        for (int k = 0; k <= n; k++) {
            var interval = band.of(k, n, 0);
            assertTrue(interval.low() >= before && interval.high() >= beforeHigh);
            before = interval.low();
            beforeHigh = interval.high();
            for (double s = -20; s <= 20; s += .02) {
                double p = 1 / (1 + Math.exp(-s));
                boolean in = band.log(k, n, p, 1 / (1 + Math.exp(s))) < most;
                if (Math.abs(p - interval.low()) > 1e-9 && Math.abs(p - interval.high()) > 1e-9) {
                    assertEquals(interval.low() < p && p < interval.high(), in, k + " of " + n + ", p = " + p);
                }
            }
        }
    }

    /// The chance to miss p at any of the first n draws, added up exactly: a right band keeps it below 5 %.
    @ParameterizedTest(name = "p = {0}, tuned to {1}, {2} draws")
    @CsvSource({".5, 1000, 3000", ".1, 100, 3000", ".01, 1e4, 10000", ".001, 1e4, 10000", ".999, 500, 5000"})
    void seldomMissesAtAnyTime(double p, double tuned, int draws) {
        var ranks = AnyTimeQuantile.tunedTo(tuned, p, .95);
        var band = AnyTimeChance.tunedTo(tuned, .95);
        // The counts whose band holds p lie together: isOneInterval.
        double missed = new BernoulliWalk(p).everOutside(draws, n -> ranks.lowerRank(n), n -> ranks.upperRank(n) - 1);
        assertTrue(missed > .002 && missed <= .05, () -> "missed with " + missed);
        long n = draws;
        assertTrue(band.of(ranks.lowerRank(n), n, 0).high() >= p);
        assertTrue(band.of(ranks.upperRank(n) - 1, n, 0).low() <= p);
    }

    /// Draws that bands take to the tolerance .001 where hits come as expected, found by halving: what tuning
    /// to the tolerance costs beside tuning to the chance.
    @ParameterizedTest(name = "p = {0}")
    @CsvSource({".05, .01", ".5, .12", ".005, .6", ".95, .01"})
    void isTunedToATolerance(double p, double more) {
        double draws = drawsTo(.001, p, AnyTimeChance.forTolerance(.001, .95));
        double best = Double.POSITIVE_INFINITY;
        for (double tuned = 1e4; tuned < 1e7; tuned *= 1.2) {
            best = Math.min(best, drawsTo(.001, p, AnyTimeChance.tunedTo(tuned, .95)));
        }
        double times = draws / best;
        assertTrue(times >= .99 && times <= 1 + more, () -> times + " times as many draws");
    }

    private static double drawsTo(double tolerance, double p, AnyTimeChance band) {
        long few = 100;
        long many = 100_000_000;
        while (many - few > 1) {
            long n = (few + many) / 2;
            if (band.of(Math.round(n * p), n, 0).halfWidth() <= tolerance) {
                many = n;
            } else {
                few = n;
            }
        }
        return many;
    }

    @Test
    void bracketsWhatFailed() {
        var band = AnyTimeChance.tunedTo(1000, .95);
        var interval = band.of(7, 990, 10);
        assertEquals(band.of(7, 1000, 0).low(), interval.low());
        assertEquals(band.of(17, 1000, 0).high(), interval.high());
        assertEquals(
                "10 failed evaluations count as misses in the lower limit and as hits in the upper one",
                interval.note().orElseThrow());
        var onlyFailed = band.of(0, 0, 5);
        assertEquals(0, onlyFailed.low());
        assertEquals(1, onlyFailed.high());
    }

    @Test
    void isNeverZeroWide() {
        var band = AnyTimeChance.tunedTo(1e4, .95);
        var none = band.of(0, 1000, 0);
        assertTrue(none.low() == 0 && none.high() > 3e-3 && none.high() < 2e-2);
        var all = band.of(1000, 1000, 0);
        assertEquals(1, all.high());
        assertEquals(1 - none.high(), all.low(), 1e-15);
        var nothing = band.of(0, 0, 0);
        assertTrue(Double.isNaN(nothing.low()) && Double.isNaN(nothing.high()));
        assertEquals("an interval needs at least 1 draw", nothing.note().orElseThrow());
    }

    @Test
    void refusesImpossibleCounts() {
        var band = AnyTimeChance.tunedTo(1e4, .95);
        assertThrows(IllegalArgumentException.class, () -> band.of(-1, 10, 0));
        assertThrows(IllegalArgumentException.class, () -> band.of(11, 10, 0));
        assertThrows(IllegalArgumentException.class, () -> band.of(1, 10, -1));
        assertThrows(IllegalArgumentException.class, () -> AnyTimeChance.tunedTo(1e4, 0));
    }
}
