package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.StreamKey;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SidesTest {
    /// Record int-student-quantiles: t(.95, n - 1) is the limit of one side at 95 %.
    @ParameterizedTest
    @ValueSource(ints = {2, 5, 30, 120})
    void aLimitOfOneSideLeavesOutAllOnThatSide(int degrees) {
        double t = ReferenceValues.expected("int-student-quantiles", "t(0.95,%d)".formatted(degrees));
        var upper = Sides.UPPER.of(.95, level -> Student.of(10, 2, degrees + 1, level));
        assertEquals(10 + 2 * t, upper.high(), 1e-12);
        assertEquals(Double.NEGATIVE_INFINITY, upper.low());
        assertEquals(.95, upper.level());
        var lower = Sides.LOWER.of(.95, level -> Student.of(10, 2, degrees + 1, level));
        assertEquals(10 - 2 * t, lower.low(), 1e-12);
        assertEquals(Double.POSITIVE_INFINITY, lower.high());
    }

    /// Record int-rule-of-three: no limit is lost by doubling.
    @ParameterizedTest
    @ValueSource(longs = {10, 50, 1000, 1000000})
    void clopperAndPearsonStayExact(long n) {
        double limit = ReferenceValues.expected("int-rule-of-three", "upper95_one_sided_n" + n);
        var upper = ClopperPearson.of(0, n, 0, .95, Sides.UPPER);
        assertEquals(limit, upper.high(), 1e-14 * limit);
        assertEquals(.95, upper.level());
        assertTrue(upper.note().isEmpty());
        assertEquals(1 - limit, ClopperPearson.of(n, n, 0, .95, Sides.LOWER).low(), 1e-14);
    }

    @Test
    void whatIsLeftOutIsTheSameToTheBit() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 1000; i++) {
            double level = 1 - Math.exp(-1 - 20 * random.nextDouble());
            assertEquals(1 - level, (1 - Sides.UPPER.twoSided(level)) / 2);
        }
        for (long hits : new long[] {0, 3, 400, 1000}) {
            assertEquals(
                    ClopperPearson.upperLimit(hits, 1000, 7, .99),
                    ClopperPearson.of(hits, 1000, 7, .99, Sides.UPPER).high());
            assertEquals(
                    ClopperPearson.lowerLimit(hits, 1000, 7, .99),
                    ClopperPearson.of(hits, 1000, 7, .99, Sides.LOWER).low());
        }
    }

    @Test
    void failedEvaluationsAreStillTold() {
        assertEquals(
                "7 failed evaluations count as misses in the lower limit and as hits in the upper one",
                ClopperPearson.of(0, 1000, 7, .95, Sides.UPPER).note().orElseThrow());
        assertEquals(
                "an interval needs at least 1 draw",
                ClopperPearson.of(0, 0, 0, .95, Sides.UPPER).note().orElseThrow());
    }

    /// Of 0 and once 1 the bootstrap has no upper limit, which the lower one need not tell.
    @Test
    void whatTheOtherSideLacksIsNotTold() {
        var key = StreamKey.of(new Address(1, Purpose.BOOTSTRAP, "A", 0, "mean", 0));
        double[] values = {0, 0, 0, 0, 0, 1};
        var lower = Sides.LOWER.of(.95, level -> BootstrapT.of(values, level, key));
        assertTrue(lower.low() < .2 && lower.note().isEmpty());
        var upper = Sides.UPPER.of(.95, level -> BootstrapT.of(values, level, key));
        assertTrue(Double.isNaN(upper.high()) && upper.note().isPresent());
    }

    @Test
    void oneLimitReachesAsFarAsItLies() {
        assertEquals(
                3,
                Sides.UPPER
                        .of(.95, _ -> new Interval(1, 5, .9, "", "", Optional.empty()))
                        .reach(2));
        assertEquals(
                1,
                Sides.LOWER
                        .of(.95, _ -> new Interval(1, 5, .9, "", "", Optional.empty()))
                        .reach(2));
        assertEquals(
                3,
                Sides.BOTH
                        .of(.95, _ -> new Interval(1, 5, .9, "", "", Optional.empty()))
                        .reach(2));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, .4, .5, 1, Double.NaN})
    void refusesALevelThatOneSideCannotHave(double level) {
        assertThrows(IllegalArgumentException.class, () -> Sides.LOWER.twoSided(level));
    }
}
