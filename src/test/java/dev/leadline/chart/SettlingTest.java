package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Project;
import dev.leadline.model.Tolerance;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import dev.leadline.trace.Trace;
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

    /// A tolerance of 10 % about 55 allows 5, because the true value may be as low as 50.
    @Test
    void eitherIsTheWiderAndBothTheNarrower() {
        var point = new Point(100, 55, 45, 65);
        same(50, 60, with(tolerance(2, .1, false), point).strip().orElseThrow());
        same(53, 57, with(tolerance(2, .1, true), point).strip().orElseThrow());
    }

    private static void same(double low, double high, Range range) {
        assertEquals(low, range.low(), 1e-9);
        assertEquals(high, range.high(), 1e-9);
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
    void takesEachAnswerOfARun() throws InterruptedException {
        var project = Project.of(ProjectFile.parse("""
            {"leadline": 1, "title": "Three answers",
             "inputs": [{"name": "x", "unit": "m", "density": {"family": "uniform", "from": 0, "to": 2}}],
             "ask": [{"mean": "x", "unit": "m", "label": "mean depth"}, {"probability": "x > 3"}, {"mean": "x^2"}],
             "reference": {"value": 1}, "tolerance": {"relative": 0.1},
             "stop": {"rule": "fixed", "draws": 20000}, "seed": 11}\
            """));
        List<Trace> traces;
        try (var study = Study.start(project.question(), project.plan(), 2, _ -> {})) {
            traces = study.await().lanes().stream().map(LaneState::trace).toList();
        }
        var first = Settling.of(project.question(), project.plan(), traces);
        assertEquals("mean depth", first.quantity());
        // Bonferroni: 1 - .05/3
        assertEquals(.98333333, first.level(), 1e-8);
        assertEquals("m", first.unit());
        assertEquals(11, first.seed());
        assertTrue(first.reference().isPresent() && first.strip().isPresent());
        var lane = first.lanes().getFirst();
        var marks = traces.getFirst().marks();
        assertEquals(marks.size(), lane.points().size());
        assertEquals(
                marks.getLast().answers().getFirst().estimate(),
                lane.points().getLast().estimate());
        assertEquals(
                marks.getLast().answers().getFirst().interval().high(),
                lane.points().getLast().high());
        var second = Settling.of(project.question(), project.plan(), traces, 1);
        assertTrue(second.quantity().startsWith("probability of "), second.quantity());
        assertTrue(second.reference().isEmpty() && second.tolerance().isEmpty());
        assertTrue(second.lanes().getFirst().withoutHit());
        assertEquals(0, second.lanes().getFirst().points().getLast().estimate());
        Picture.of(second, View.FOLLOWING, Theme.LIGHT, 420, 260).image(1);
        var third = Settling.of(project.question(), project.plan(), traces, 2);
        assertEquals(
                marks.getLast().answers().get(2).estimate(),
                third.lanes().getFirst().points().getLast().estimate());
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
                Optional.of(Invented.stated(1.2568e-5, 4e-9, "")),
                Invented.relative(.1),
                List.of(lane)));
        for (var part : List.of(
                "estimate of chance per year",
                "Lane A (independent): 1.26×10⁻⁵ 1/a",
                "95 % interval 0.77×10⁻⁵ to 1.95×10⁻⁵",
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
        assertTrue(caption.contains("interval 0 to 5.8×10⁻⁵"), caption);
    }

    @Test
    void theAnyTimeBandLiesOutsideTheInterval() {
        var points = List.of(
                new Point(100, 1, .8, 1.2, .5, 1.5),
                new Point(200, 1, .9, 1.1, .75, 1.25),
                new Point(400, 1, .9, 1.1, .8, 1.2));
        var banded = Invented.of(points.toArray(Point[]::new));
        var picture = Picture.of(banded, View.FOLLOWING, Theme.LIGHT, 900, 520);
        assertTrue(picture.values().contains(.8) && picture.values().contains(1.2));
        assertTrue(banded.caption().contains("any-time band, which holds at every look"));
        var reading = picture.at(picture.xOf(400), picture.yOf(1)).orElseThrow().text();
        assertTrue(reading.contains("any-time band 0.80 to 1.20"), reading);
        var plain = Invented.of(new Point(100, 1, .8, 1.2), new Point(200, 1, .9, 1.1));
        assertFalse(plain.caption().contains("any-time"));
        var image = picture.image(1);
        int inBand = image.getRGB((int) picture.xOf(300), (int) picture.yOf(1.17));
        int inInterval = image.getRGB((int) picture.xOf(300), (int) picture.yOf(1.07));
        int outside = image.getRGB(
                (int) picture.xOf(300), (int) picture.yOf(picture.values().high()) + 2);
        assertTrue((outside & 0xff0000) > (inBand & 0xff0000), "the band is a fill");
        assertTrue((inBand & 0xff0000) > (inInterval & 0xff0000), "the interval is a stronger one");
    }

    @Test
    void whatIsProvisionalIsSaid() {
        var points = List.of(new Point(100, 1, .8, 1.2), new Point(200, 1, .9, 1.1));
        var series = new Series("A", "independent", points, OptionalLong.empty(), 0, true);
        var settling = Invented.settling("fuel", "t", Optional.empty(), Optional.empty(), List.of(series));
        assertTrue(settling.caption().contains("provisional"));
        assertTrue(Picture.of(settling, View.FOLLOWING, Theme.LIGHT, 900, 520).remarks().stream()
                .anyMatch(remark -> remark.startsWith("lane A: provisional")));
    }
}
