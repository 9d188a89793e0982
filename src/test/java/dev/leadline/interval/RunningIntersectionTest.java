package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Estimate;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class RunningIntersectionTest {
    private static Interval between(double low, double high) {
        return new Interval(low, high, .95, AnyTimeChance.KIND, "", Optional.empty());
    }

    private static RunningIntersection start(double low, double high) {
        return new RunningIntersection(between(low, high));
    }

    private static void isBetween(double low, double high, RunningIntersection running) {
        assertEquals(low, running.interval().low());
        assertEquals(high, running.interval().high());
    }

    @Test
    void keepsTheTightestLimits() {
        var running = start(.1, .5);
        isBetween(.2, .5, running.and(between(.2, .6)));
        isBetween(.2, .4, running.and(between(.2, .6)).and(between(0, .4)));
        isBetween(.1, .5, running);
    }

    @Test
    void waitsForLimitsThatDoNotExistYet() {
        isBetween(.1, .5, start(Double.NaN, .5).and(between(.1, Double.NaN)));
    }

    /// And does not forget that they have.
    @Test
    void saysThatMarksContradict() {
        var empty = start(.1, .2).and(between(.3, .4));
        assertTrue(Double.isNaN(empty.interval().low())
                && Double.isNaN(empty.interval().high()));
        assertTrue(empty.interval().note().orElseThrow().startsWith("the bands of the marks so far have nothing"));
        assertSame(empty, empty.and(between(.1, .2)));
    }

    @Test
    void isForExactBandsAlone() {
        var mean = AnyTimeMean.tunedTo(1e4, .95).of(new Estimate(1, 1, 999), 1000);
        assertThrows(IllegalArgumentException.class, () -> new RunningIntersection(mean));
        assertThrows(IllegalArgumentException.class, () -> new RunningIntersection(Student.of(1, 1, 1000, .95)));
        assertThrows(IllegalArgumentException.class, () -> start(0, 1).and(mean));
        var other = AnyTimeChance.tunedTo(1e4, .9).of(1, 10, 0);
        assertThrows(IllegalArgumentException.class, () -> start(0, 1).and(other));
    }
}
