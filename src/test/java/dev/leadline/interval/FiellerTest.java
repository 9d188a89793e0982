package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.RatioOfMeans;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FiellerTest {
    /// The definition: at a limit the mean of `numerator - r denominator` is t of its standard errors from
    /// 0.
    private static double statistic(RatioOfMeans ratio, double r) {
        double off = ratio.numerator() - r * ratio.denominator();
        return off
                * off
                / (ratio.varianceOfNumerator() - 2 * r * ratio.covariance() + r * r * ratio.varianceOfDenominator());
    }

    @ParameterizedTest
    @CsvSource({
        "3, 2, .04, .01, .02, 20",
        "-3, 2, .04, .01, .02, 20",
        "3, -2, .04, -.01, .02, 5",
        "0, 2, .04, .01, .02, 20",
        "1e-3, 1, 1e-4, 0, .05, 100",
        "5, 1, 1, .3, .12, 1000"
    })
    void limitsLieTErrorsAway(double up, double down, double above, double both, double below, long degrees) {
        var ratio = new RatioOfMeans(up, down, above, both, below, degrees);
        var interval = Fieller.of(ratio, .95);
        double t = Student.quantile(degrees, .95);
        assertEquals(t * t, statistic(ratio, interval.low()), 1e-11 * t * t);
        assertEquals(t * t, statistic(ratio, interval.high()), 1e-11 * t * t);
        assertTrue(interval.low() < ratio.value() && ratio.value() < interval.high());
        assertEquals("fieller", interval.kind());
    }

    @Test
    void unitsDoNotMatter() {
        var interval = Fieller.of(new RatioOfMeans(3, 2, .04, .01, .02, 20), .95);
        double up = 0x1p200;
        double down = 0x1p-150;
        var scaled = Fieller.of(
                new RatioOfMeans(3 * up, 2 * down, .04 * up * up, .01 * up * down, .02 * down * down, 20), .95);
        assertEquals(interval.low() * up / down, scaled.low());
        assertEquals(interval.high() * up / down, scaled.high());
    }

    /// A denominator known exactly: Student's limits, divided by it.
    @Test
    void isStudentsOverAConstant() {
        var interval = Fieller.of(new RatioOfMeans(3, 2, .04, 0, 0, 9), .95);
        var student = Student.of(1.5, .1, 10, .95);
        assertEquals(student.low(), interval.low(), 1e-14);
        assertEquals(student.high(), interval.high(), 1e-14);
    }

    /// `(10 - r)² <= t² (1 + r²)` with t² = 3.93: `r² + 6.83 r - 32.8 >= 0`, from -10.1 down and 3.25 up;
    /// by hand.
    @Test
    void tellsASetOfTwoPieces() {
        var interval = Fieller.of(new RatioOfMeans(10, 1, 1, 0, 1, 100), .95);
        assertTrue(interval.isNone());
        assertEquals(
                "the denominator's mean is within its error of 0: the ratio is at most -10.1 or at least 3.25, and no"
                        + " limit on either side can be given; make more draws",
                interval.note().orElseThrow());
    }

    @Test
    void tellsThatNoRatioCanBeExcluded() {
        var interval = Fieller.of(new RatioOfMeans(1, 1, 1, 0, 1, 100), .95);
        assertTrue(interval.isNone());
        assertEquals(
                "the denominator's mean is within its error of 0: no ratio can be excluded; make more draws",
                interval.note().orElseThrow());
    }

    @Test
    void isCalledForWhereTheDenominatorIsUncertain() {
        assertEquals(
                "delta",
                Fieller.orDelta(new RatioOfMeans(3, 2, .04, 0, .0399, 99), .95).kind());
        assertEquals(
                "fieller",
                Fieller.orDelta(new RatioOfMeans(3, 2, .04, 0, .0401, 99), .95).kind());
        assertTrue(Fieller.of(new RatioOfMeans(3, 2, 0, 0, 0, 99), .95)
                .note()
                .orElseThrow()
                .startsWith("every value"));
    }

    /// Exponential over lognormal, 30 pairs: .948 against .929 of an independent experiment (standard error
    /// at most .0016).
    @Test
    void coversWhereThePlainIntervalFallsShort() {
        var random = Observed.random(20261201);
        double ratio = Observed.EXPONENTIAL.mean / Observed.LOGNORMAL_1.mean;
        int repetitions = 20_000;
        int fieller = 0;
        int delta = 0;
        for (int r = 0; r < repetitions; r++) {
            var means = RatioOfMeans.of(
                    Observed.sums(Observed.EXPONENTIAL.draws(random, 30), Observed.LOGNORMAL_1.draws(random, 30)),
                    0,
                    1);
            fieller += holds(Fieller.of(means, .95), ratio) ? 1 : 0;
            delta += holds(Delta.of(means.estimate(), .95), ratio) ? 1 : 0;
        }
        CoverageTest.gate(.948, fieller, repetitions, .0016);
        CoverageTest.gate(.929, delta, repetitions, .0016);
    }

    /// A set that has no limits holds what lies in it; here the only one that can be met is all numbers.
    private static boolean holds(Interval interval, double ratio) {
        return interval.isNone() || interval.low() <= ratio && ratio <= interval.high();
    }
}
