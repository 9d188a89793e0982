package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Quantile;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class InvertedCdfTest {
    @Test
    void asksForTheQuantilesOfTwoProbabilities() {
        var cdf = InvertedCdf.of(.9, .02, 15, .95);
        double half = .02 * Student.quantile(15, .95);
        assertEquals(.9 - half, cdf.low(), 1e-15);
        assertEquals(.9 + half, cdf.high(), 1e-15);
        assertTrue(cdf.note().isEmpty());
        var interval = cdf.interval(3, 5);
        assertEquals(3, interval.low());
        assertEquals(5, interval.high());
        assertEquals("inverted-cdf", interval.kind());
    }

    /// By hand: 1.984 standard errors of .01, .0198, against .01 on the short side: 1.1 times 1.98² is 4.3.
    @Test
    void saysWhereALimitIsMissing() {
        var upper = InvertedCdf.of(.99, .01, 100, .95);
        assertTrue(Double.isNaN(upper.high()) && upper.low() > 0);
        assertEquals(
                "no upper limit at this n: the chance of not exceeding the quantile is uncertain by 0.02; needs about"
                        + " 4.3 times as many draws",
                upper.note().orElseThrow());
        var interval = upper.interval(1, 2);
        assertEquals(1, interval.low());
        assertTrue(Double.isNaN(interval.high()));
        assertTrue(InvertedCdf.of(.01, .01, 100, .95).note().orElseThrow().startsWith("no lower limit"));
        assertTrue(InvertedCdf.of(.5, .3, 100, .95).note().orElseThrow().startsWith("no limit on either side"));
        assertTrue(InvertedCdf.of(.5, 0, 100, .95).note().orElseThrow().contains("no spread"));
        assertTrue(InvertedCdf.of(.5, Double.NaN, 0, .95).note().orElseThrow().contains("at least 2"));
        assertThrows(IllegalArgumentException.class, () -> InvertedCdf.of(1, .1, 9, .95));
    }

    /// Median of 400 exponential draws, whose distribution function has the standard error `1/40` there:
    /// covered as often as said, to the step of a rank.
    @Test
    void coversAsItSays() {
        var random = Observed.random(20261201);
        var cdf = InvertedCdf.of(.5, 1 / 40.0, 399, .95);
        int repetitions = 4_000;
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] sorted = Observed.EXPONENTIAL.draws(random, 400);
            Arrays.sort(sorted);
            var interval = cdf.interval(
                    sorted[(int) Quantile.rank(400, cdf.low()) - 1], sorted[(int) Quantile.rank(400, cdf.high()) - 1]);
            covered += interval.low() <= Math.log(2) && Math.log(2) <= interval.high() ? 1 : 0;
        }
        // a rank more or less is .04 · 2 φ(2) of the coverage
        assertEquals(.95, (double) covered / repetitions, 4 * Math.sqrt(.95 * .05 / repetitions) + .005);
    }
}
