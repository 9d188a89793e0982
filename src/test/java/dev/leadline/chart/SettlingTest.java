package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Tolerance;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

class SettlingTest {
    private static Settling with(Tolerance tolerance, Point... latest) {
        var lanes = java.util.stream.IntStream.range(0, latest.length)
                .mapToObj(i -> new Series(
                        "ABCD".substring(i, i + 1), "independent", List.of(latest[i]), OptionalLong.empty(), 0))
                .toList();
        return Invented.settling("x", "m", Optional.empty(), Optional.of(tolerance), lanes);
    }

    private static Tolerance tolerance(double absolute, double relative, boolean both) {
        return new Tolerance(OptionalDouble.of(absolute), OptionalDouble.of(relative), both);
    }

    @Test
    void stripStandsAroundTheSharpestLane() {
        var settling = with(
                new Tolerance(OptionalDouble.of(2), OptionalDouble.empty(), false),
                new Point(100, 50, 40, 60),
                new Point(100, 48, 47, 49));
        assertEquals(Optional.of(new Range(46, 50)), settling.strip());
    }

    @Test
    void eitherIsTheWiderAndBothTheNarrower() {
        var point = new Point(100, 50, 40, 60);
        assertEquals(
                Optional.of(new Range(45, 55)),
                with(tolerance(2, .1, false), point).strip());
        assertEquals(
                Optional.of(new Range(48, 52)),
                with(tolerance(2, .1, true), point).strip());
    }

    @Test
    void noStripAroundNothing() {
        var relative = new Tolerance(OptionalDouble.empty(), OptionalDouble.of(.1), false);
        assertEquals(Optional.empty(), with(relative, new Point(100, 0, 0, .1)).strip());
        assertEquals(
                Optional.empty(),
                with(relative, new Point(100, Double.NaN, 0, .1)).strip());
        assertEquals(Optional.empty(), with(relative).strip());
    }

    @Test
    void rowsAreEveryMarkOfEveryLane() {
        var settling = Invented.fourLanes();
        assertEquals(
                settling.lanes().stream().mapToInt(l -> l.points().size()).sum(),
                settling.rows().size());
        assertEquals("D", settling.rows().getLast().lane());
        assertEquals(
                settling.lanes().getLast().points().getLast(),
                settling.rows().getLast().point());
    }

    @Test
    void fourLanesAtMost() {
        var lane = Invented.smoothMean().lanes().getFirst();
        assertThrows(
                IllegalArgumentException.class,
                () -> Invented.settling("x", "", Optional.empty(), Optional.empty(), Collections.nCopies(5, lane)));
    }

    @Test
    void captionSaysEveryNumberWithItsDoubt() {
        var lane = new Series(
                "A", "independent", List.of(new Point(2_000_000, 1.26e-5, 7.7e-6, 1.946e-5)), OptionalLong.of(25), 3);
        String caption = Caption.of(Invented.settling(
                "chance per year",
                "1/a",
                Optional.of(new dev.leadline.model.Reference(1.2568e-5, 4e-9, "")),
                Invented.relative(.1),
                List.of(lane)));
        for (var part : List.of(
                "estimate of chance per year",
                "Lane A (independent): 1.26×10⁻⁵ 1/a",
                "95 % interval 7.7×10⁻⁶ to 1.95×10⁻⁵",
                "after 2,000,000 draws",
                "over finite evaluations only (3 left out)",
                "reference value 1.2568×10⁻⁵ ± 4×10⁻⁹ 1/a",
                "±10 %",
                "Seed 20261201",
                "sampling error only")) {
            assertTrue(caption.contains(part), part + " in: " + caption);
        }
    }

    @Test
    void captionOfNoHitIsALimitAndNeverZeroPlusMinusZero() {
        String caption = Caption.of(Invented.noHit());
        assertTrue(caption.contains("draws without a hit"), caption);
        assertTrue(caption.contains("interval 0 to 5.7×10⁻⁵"), caption);
    }
}
