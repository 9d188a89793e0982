package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Jackknife;
import dev.leadline.estimate.LogDeviation;
import dev.leadline.estimate.Logarithm;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class LogScaleTest {
    @Test
    void mapsStudentsLimits() {
        var interval = LogScale.of(new Logarithm(Math.log(5), .04, 9), .95);
        assertEquals(Math.log(5) - .2 * Student.quantile(9, .95), Math.log(interval.low()), 1e-14);
        assertEquals(25, interval.low() * interval.high(), 1e-12);
        assertEquals("log-scale", interval.kind());
    }

    /// Coverage of the standard deviation of 1,000 observations, of an independent experiment (standard
    /// error at most .0016), by the sums of one component and by those of two.
    @ParameterizedTest
    @CsvSource({"EXPONENTIAL, .939", "LOGNORMAL_1, .868"})
    void coversAsItShould(Observed density, double coverage) {
        var random = Observed.random(20261201);
        int repetitions = 6_000;
        int n = 1_000;
        int byOne = 0;
        int byTwo = 0;
        var squares = new double[n];
        for (int r = 0; r < repetitions; r++) {
            double[] values = density.draws(random, n);
            for (int i = 0; i < n; i++) {
                values[i] -= density.mean;
                squares[i] = values[i] * values[i];
            }
            Accumulator sums = Observed.sums(values, squares);
            byOne += holds(Jackknife.ofVariance(sums, 0).times(.5), density.sd);
            byTwo += holds(LogDeviation.of(sums, 0, 1), density.sd);
        }
        CoverageTest.gate(coverage, byOne, repetitions, .0016);
        CoverageTest.gate(coverage, byTwo, repetitions, .0016);
    }

    /// The standard deviation of a fair coin, .5, is the greatest there is: a sum over all numbers of heads
    /// of their exact chances (commons-statistics).
    @ParameterizedTest
    @ValueSource(ints = {10, 30, 100, 1_000})
    void holdsForAFairCoin(int n) {
        double covered = 0;
        for (int heads = 1; heads < n; heads++) {
            double[] values = new double[n];
            double[] squares = new double[n];
            for (int i = 0; i < n; i++) {
                values[i] = i < heads ? .5 : -.5;
                squares[i] = .25;
            }
            covered += BinomialDistribution.of(n, .5).probability(heads)
                    * holds(LogDeviation.of(Observed.sums(values, squares), 0, 1), .5);
        }
        assertTrue(covered >= .95, "covers " + covered);
    }

    private static int holds(Logarithm logarithm, double sd) {
        var interval = LogScale.of(logarithm, .95);
        return interval.low() <= sd && sd <= interval.high() ? 1 : 0;
    }

    @Test
    void saysWhyThereIsNone() {
        assertEquals("an interval needs at least 2 observations", note(new double[] {1}));
        assertEquals(
                "the values seen so far show no spread to build an interval from", note(new double[] {4, 4, 4, 4}));
        assertTrue(note(new double[] {1e90, 2e90, 5e90, 7e90}).contains("too large"));
    }

    private static String note(double[] values) {
        var interval =
                LogScale.of(Jackknife.ofVariance(Observed.sums(values), 0).times(.5), .95);
        assertTrue(interval.isNone());
        return interval.note().orElseThrow();
    }
}
