package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class HitsRuleTest {
    /// The chance that the r-th hit comes at draw n.
    private static double comesAt(long n, int r, double p) {
        return p * BinomialDistribution.of((int) n - 1, p).probability(r - 1);
    }

    /// Sizes found apart from this code, each the first at which the gamma distribution says so.
    @ParameterizedTest(name = "ε = {0}, level {1}: {2}")
    @CsvSource({".5, .95, 17", ".2, .95, 97", ".1, .95, 385", ".05, .95, 1537", ".01, .95, 38415", ".1, .99, 672"})
    void waitsForSoManyHits(double relative, double level, long hits) {
        assertEquals(hits, HitsRule.of(relative, level).orElseThrow().hits());
    }

    /// By the gamma distribution of Commons Statistics: no smaller number will do, of all there are.
    @ParameterizedTest
    @ValueSource(doubles = {.8, .5, .3, .2})
    void waitsForNoMoreThanItMust(double relative) {
        long hits = HitsRule.of(relative, .95).orElseThrow().hits();
        for (long r = 2; r <= hits; r++) {
            var wait = GammaDistribution.of(r, 1);
            double within = wait.probability((r - 1) / (1 + relative), (r - 1) / (1 - relative));
            assertEquals(r == hits, within >= .95, r + " hits: " + within);
        }
    }

    /// However likely the event is, and not in the limit of rare ones alone.
    @ParameterizedTest(name = "ε = {0}, p = {1}")
    @CsvSource({".5, .5", ".5, .1", ".5, .01", ".2, .5", ".2, .1", ".2, .01", ".1, .9", ".1, .1"})
    void keepsItsTolerance(double relative, double p) {
        var rule = HitsRule.of(relative, .95).orElseThrow();
        int r = (int) rule.hits();
        double within = 0;
        double all = 0;
        for (long n = r; all < 1 - 1e-10; n++) {
            double here = comesAt(n, r, p);
            all += here;
            within += Math.abs(rule.estimate(n) / p - 1) <= relative ? here : 0;
        }
        assertTrue(within >= .95, "within its tolerance with " + within);
    }

    /// Added up over all numbers of draws. With 10 hits of chance .01 the coverage was .950 in an experiment.
    @ParameterizedTest(name = "{0} hits, p = {1}")
    @CsvSource({"10, .01", "10, .3", "2, .05", "17, .005"})
    void isWithoutBiasAndCovers(int r, double p) {
        var rule = new HitsRule(r, .95);
        double mean = 0;
        double all = 0;
        double tooLow = 0;
        double tooHigh = 0;
        for (long n = r; all < 1 - 1e-9; n++) {
            double here = comesAt(n, r, p);
            all += here;
            mean += here * rule.estimate(n);
            if (here > 1e-12) {
                var interval = rule.of(n);
                tooLow += interval.high() < p ? here : 0;
                tooHigh += interval.low() > p ? here : 0;
            }
        }
        assertEquals(1, mean / p, 1e-8);
        assertTrue(tooLow <= .025 + 1e-9 && tooHigh <= .025 + 1e-9, tooLow + " and " + tooHigh);
        // Counts are separate, so it covers with a little more; rare events leave hardly any gap.
        assertTrue(p > .01 || tooLow + tooHigh > .049, "misses with " + (tooLow + tooHigh));
    }

    /// A budget ends the run first, and the interval is that of Clopper and Pearson: each side is still
    /// missed with at most 2.5 %.
    @ParameterizedTest(name = "{0} hits, p = {1}, {2} draws at most")
    @CsvSource({"10, .01, 1000", "10, .01, 500", "10, .01, 2000", "5, .3, 15", "385, .1, 3800"})
    void coversWhereABudgetEndsItFirst(int r, double p, int budget) {
        var rule = new HitsRule(r, .95);
        double tooLow = 0;
        double tooHigh = 0;
        double all = 0;
        for (long n = r; n <= budget; n++) {
            double here = comesAt(n, r, p);
            all += here;
            tooLow += rule.of(n).high() < p ? here : 0;
            tooHigh += rule.of(n).low() > p ? here : 0;
        }
        var counts = BinomialDistribution.of(budget, p);
        for (int k = 0; k < r; k++) {
            double here = counts.probability(k);
            all += here;
            var interval = ClopperPearson.of(k, budget, 0, .95);
            tooLow += interval.high() < p ? here : 0;
            tooHigh += interval.low() > p ? here : 0;
        }
        assertEquals(1, all, 1e-9);
        assertTrue(tooLow <= .025 && tooHigh <= .025, tooLow + " and " + tooHigh);
    }

    /// `[Beta⁻¹(α/2; r, n-r+1), Beta⁻¹(1-α/2; r, n-r)]` by Commons Statistics.
    @Test
    void hasTheLimitsOfABeta() {
        var interval = new HitsRule(17, .95).of(400);
        assertEquals(BetaDistribution.of(17, 384).inverseCumulativeProbability(.025), interval.low(), 1e-9);
        assertEquals(BetaDistribution.of(17, 383).inverseCumulativeProbability(.975), interval.high(), 1e-9);
        assertEquals(16 / 399.0, new HitsRule(17, .95).estimate(400));
        assertEquals("hits", interval.kind());
        var every = new HitsRule(17, .95).of(17);
        assertEquals(1, every.high());
        assertEquals(1, new HitsRule(17, .95).estimate(17));
        // p^17 = .025
        assertEquals(Math.pow(.025, 1 / 17.0), every.low(), 1e-12);
    }

    @Test
    void refusesWhatMakesNoSense() {
        assertTrue(HitsRule.of(1e-7, .95).isEmpty());
        assertThrows(IllegalArgumentException.class, () -> HitsRule.of(0, .95));
        assertThrows(IllegalArgumentException.class, () -> HitsRule.of(.1, 1));
        assertThrows(IllegalArgumentException.class, () -> new HitsRule(1, .95));
        assertThrows(IllegalArgumentException.class, () -> new HitsRule(10, .95).of(9));
    }
}
