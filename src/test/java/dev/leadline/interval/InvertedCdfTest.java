package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Quantile;
import dev.leadline.numeric.Normal;
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

    /// Weighted draws, from the light side: .949 of `weighted_quantiles.py` (standard error .0015), with
    /// estimates that spread five times less than self-normalised ones.
    @Test
    void coversWeightedQuantilesFromTheLightSide() {
        var random = Observed.random(20261201);
        double shift = 2.5;
        double sought = Normal.upperQuantile(.001);
        int n = 1_000;
        int repetitions = 3_000;
        int covered = 0;
        double squares = 0;
        double squaresOfOwn = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] falling = Observed.NORMAL.draws(random, n);
            Arrays.setAll(falling, i -> -shift - falling[i]);
            Arrays.sort(falling);
            Arrays.setAll(falling, i -> -falling[i]);
            var weights = new double[n];
            Arrays.setAll(weights, i -> Math.exp(shift * shift / 2 - shift * falling[i]));
            double total = Arrays.stream(weights).sum();
            double quantile = beyond(falling, weights, n * .001);
            double own = beyond(falling, weights, total * .001);
            squares += (quantile - sought) * (quantile - sought);
            squaresOfOwn += (own - sought) * (own - sought);
            var hits = new double[n];
            Arrays.setAll(hits, i -> falling[i] > quantile ? weights[i] : 0);
            var cdf = InvertedCdf.of(.999, Observed.sums(hits).standardError(0), n - 1, .95);
            var interval = cdf.interval(
                    beyond(falling, weights, n * (1 - cdf.low())), beyond(falling, weights, n * (1 - cdf.high())));
            covered += interval.low() <= sought && sought <= interval.high() ? 1 : 0;
        }
        CoverageTest.gate(.9487, covered, repetitions, .0015);
        assertTrue(squaresOfOwn > 10 * squares);
    }

    /// The least of the values of which no more than `weight` lies above.
    private static double beyond(double[] falling, double[] weights, double weight) {
        double above = 0;
        int i = 0;
        while (i < falling.length - 1 && above + weights[i] <= weight) {
            above += weights[i];
            i++;
        }
        return falling[i];
    }

    @Test
    void givesOneSideAlone() {
        var upper = InvertedCdf.of(.99, .01, 100, .95, Sides.UPPER);
        assertTrue(Double.isNaN(upper.high()));
        assertTrue(upper.note().orElseThrow().startsWith("no upper limit"));
        var lower = InvertedCdf.of(.99, .01, 100, .95, Sides.LOWER);
        assertEquals(.99 - .01 * Student.quantile(100, .9), lower.low(), 1e-15);
        assertTrue(lower.note().isEmpty());
        var interval = lower.interval(3, 7);
        assertEquals(3, interval.low());
        assertEquals(Double.POSITIVE_INFINITY, interval.high());
        assertEquals(
                Double.NEGATIVE_INFINITY,
                InvertedCdf.of(.5, .01, 100, .95, Sides.UPPER).interval(3, 7).low());
    }
}
