package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Normal;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TwoStageTest {
    private static final long SEED = 20261201;

    /// With the constants of the paper (arXiv 1208.4318), computed apart from this code, to the unit.
    @ParameterizedTest(name = "level {0}, {1} draws first, inflation {2}")
    @CsvSource({
        ".95, 1000, 1.2, 3.3920, 79581",
        ".95, 10000, 1.2, 24.9393, 122217",
        ".95, 10000, 1.1, 8.7231, 75779",
        ".99, 10000, 1.2, 5.6915, 214832"
    })
    void agreesToTheUnit(double level, long first, double inflation, double kurtosis, long second) {
        var rule = new TwoStage(level, first, inflation);
        assertEquals(kurtosis, rule.largestKurtosis(), 5e-5);
        assertEquals(second, rule.second(1, .01).orElseThrow());
        assertEquals(second, rule.second(1e6, 1e4).orElseThrow());
    }

    /// Where few draws are enough, Chebyshev's inequality asks for fewer: `1.44 / (α_µ ε²)`, `α_µ =
    /// .025/.975`.
    @Test
    void takesTheBetterOfTwoInequalities() {
        assertEquals(
                Math.round(Math.ceil(1.44 / (.025 / .975) / 9)),
                TwoStage.of(.95).second(1, 3).orElseThrow());
    }

    @Test
    void saysWhatItCannot() {
        var rule = TwoStage.of(.95);
        assertTrue(rule.second(0, .01).isEmpty());
        assertTrue(rule.second(Double.NaN, .01).isEmpty());
        assertTrue(rule.second(1, 1e-12).isEmpty());
        assertThrows(IllegalArgumentException.class, () -> rule.second(1, 0));
        assertThrows(IllegalArgumentException.class, () -> new TwoStage(.95, 3, 1.2));
        assertThrows(IllegalArgumentException.class, () -> new TwoStage(.95, 1000, 1));
        var interval = rule.of(2, .25);
        assertTrue(interval.low() == 1.75 && interval.high() == 2.25);
        assertEquals(
                "The draws are independent, and the kurtosis of the values is at most 24.9.", interval.assumption());
    }

    /// It holds with at least its level, on exponential values too, of kurtosis 9; here always, since the
    /// inequalities leave much room.
    @Test
    void keepsItsPromise() {
        var rule = TwoStage.of(.95);
        for (int r = 0; r < 100; r++) {
            double sd = Math.sqrt(sums("first", r, 10_000, u -> -Math.log(u)).variance(0));
            int n = Math.toIntExact(rule.second(sd, .05).orElseThrow());
            double mean = sums("second", r, n, u -> -Math.log(u)).mean(0);
            assertEquals(1, mean, .05, "repetition " + r);
        }
    }

    /// Its sizes by the t of Commons Statistics, and its promise on normal values, which is exact: of 4,000
    /// repetitions 95 % hold, within four standard errors, and the tolerance is kept by no fewer.
    @Test
    void steinIsExactForNormalValues() {
        var rule = new Stein(.95, 10);
        double t = TDistribution.of(9).inverseSurvivalProbability(.025);
        assertEquals(Math.ceil(t * t * 4 / .09), rule.all(2, .3));
        assertEquals(10, rule.all(1e-3, .3));
        int held = 0;
        int kept = 0;
        int repetitions = 4_000;
        for (int r = 0; r < repetitions; r++) {
            var sums = sums("stein", r, 10, Normal::quantile);
            double sd = Math.sqrt(sums.variance(0));
            int n = (int) rule.all(sd, .5);
            if (n > 10) {
                sums.merge(sums("more", r, n - 10, Normal::quantile));
            }
            var interval = rule.of(sums.mean(0), sd, n);
            held += interval.low() <= 0 && interval.high() >= 0 ? 1 : 0;
            kept += Math.abs(sums.mean(0)) <= .5 ? 1 : 0;
        }
        double error = Math.sqrt(.95 * .05 / repetitions);
        assertEquals(.95, (double) held / repetitions, 4 * error);
        assertTrue((double) kept / repetitions >= .95 - 4 * error);
        assertTrue(Double.isNaN(rule.of(1, 0, 10).low()));
    }

    private static Accumulator sums(String name, long item, int n, DoubleUnaryOperator quantile) {
        var values = new double[1][n];
        Stream.at(new Address(SEED, Purpose.RUN, "A", 0, name, item)).fill(values[0], 0, n);
        for (int i = 0; i < n; i++) {
            values[0][i] = quantile.applyAsDouble(values[0][i]);
        }
        var sums = new Accumulator(1);
        sums.add(values, 0, n);
        return sums;
    }
}
