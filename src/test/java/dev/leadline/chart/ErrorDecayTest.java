package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Project;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.LongToDoubleFunction;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;

class ErrorDecayTest {
    /// Marks at powers of two from 2^6 to 2^20 about an estimate of 10.
    private static Series marks(String lane, LongToDoubleFunction halfWidth) {
        List<Point> points = LongStream.rangeClosed(6, 20)
                .map(k -> 1L << k)
                .mapToObj(n -> new Point(n, 10, 10 - halfWidth.applyAsDouble(n), 10 + halfWidth.applyAsDouble(n)))
                .toList();
        return new Series(lane, "independent", points, OptionalLong.empty(), 0);
    }

    private static ErrorDecay decay(Series... lanes) {
        return new ErrorDecay(
                "Invented",
                "moment",
                "kN m",
                .95,
                7,
                Invented.absolute(.01),
                List.of(lanes).stream()
                        .map(lane -> new ErrorDecay.Decay(lane, OptionalDouble.of(-.5)))
                        .toList());
    }

    private static Picture picture(ErrorDecay decay) {
        return Picture.of(decay, View.FOLLOWING, Theme.LIGHT, 900, 520);
    }

    @Test
    void aPowerOfTheDrawsHasItsExponentAsSlope() {
        for (double slope : new double[] {-.5, -1, -1.5}) {
            var lane = decay(marks("A", n -> Math.pow(n, slope))).lanes().getFirst();
            assertEquals(slope, lane.slope().orElseThrow(), 1e-6); // limits about 10 keep six digits of 1e-9
        }
    }

    @Test
    void theSlopeIsThatOfTheLaterPart() {
        var bent = decay(marks("A", n -> n < 5000 ? 1 : Math.pow(n / 5000.0, -1)))
                .lanes()
                .getFirst();
        assertEquals(-1, bent.slope().orElseThrow(), 1e-12);
    }

    @Test
    void noSlopeOfFewMarks() {
        var few = new Series("A", "", marks("A", n -> 1.0 / n).points().subList(0, 3), OptionalLong.empty(), 0);
        assertTrue(decay(few).lanes().getFirst().slope().isEmpty());
    }

    @Test
    void readsTheHalfWidthAtItsPixel() {
        var picture = picture(decay(marks("A", n -> Math.pow(n, -.5)), marks("B", n -> 1.0 / n)));
        double x = picture.xOf(1 << 14);
        var reading = picture.at(x, picture.yOf(.01)).orElseThrow();
        assertEquals(16384, reading.draws(), 1e-6 * 16384);
        assertEquals(.01, reading.value(), 1e-9);
        assertEquals(picture.yOf(1.0 / 128), reading.lanes().getFirst().y(), 1e-9);
        assertEquals("A: ± 0.00781 kN m after 16,384 draws    B: ± 6.1e-5 kN m after 16,384 draws", reading.text());
    }

    @Test
    void theToleranceIsInSightWhereItIsNotFarOff() {
        assertTrue(picture(decay(marks("A", n -> Math.pow(n, -.5)))).values().contains(.01));
        assertFalse(picture(decay(marks("A", n -> 1e6 * n))).values().contains(.01));
    }

    @Test
    void zoomsOnLogarithmicAxesAboutThePointer() {
        var picture = picture(decay(marks("A", n -> Math.pow(n, -.5))));
        var plot = picture.plot();
        var before = picture.at(plot.getCenterX(), plot.getCenterY()).orElseThrow();
        var view = picture.zoomed(plot.getCenterX(), plot.getCenterY(), .5);
        assertEquals(before.draws(), middle(view.draws().orElseThrow()), 1e-9 * before.draws());
        assertEquals(before.value(), middle(view.values().orElseThrow()), 1e-9 * before.value());
    }

    /// On a logarithmic axis.
    private static double middle(Range range) {
        return Math.sqrt(range.low() * range.high());
    }

    @Test
    void marksWithoutAnIntervalAreSaidAndDrawnAsNothing() {
        var none = decay(marks("A", _ -> Double.NaN));
        picture(none).image(1);
        assertEquals(
                "no interval yet after 64 draws",
                ReadingText.ofReach(none.lanes().getFirst().series().points().getFirst(), "m"));
        assertTrue(none.caption().contains("Lane A (independent): no interval yet."));
    }

    /// Owen (1997), Annals of Statistics 25, 1541-1562: of a smooth integrand nested scrambling has a variance of
    /// n^-3 up to logarithms, a slope of -3/2 of its root; independent draws have -1/2.
    @Test
    void evenPointsDecayFasterThanIndependentOnes() throws InterruptedException {
        var project = Project.of(ProjectFile.parse("""
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"mean": "x^2"}, "stop": {"rule": "fixed", "draws": 200000}, "seed": 7,
                 "lanes": [{"name": "A", "points": "independent"},
                           {"name": "B", "points": "scrambled-sobol", "replicates": 16}]}
                """));
        try (var study = Study.start(project.question(), project.plan(), 1, _ -> {})) {
            var traces = study.await().lanes().stream().map(LaneState::trace).toList();
            var decay = ErrorDecay.of(project.question(), project.plan(), traces);
            assertEquals(-.5, decay.lanes().getFirst().slope().orElseThrow(), .05);
            assertEquals(OptionalDouble.of(-.5), decay.lanes().getFirst().promised());
            assertEquals(-1.5, decay.lanes().getLast().slope().orElseThrow(), .2);
            assertEquals(OptionalDouble.empty(), decay.lanes().getLast().promised());
            assertEquals(
                    Optional.of("slope −0.50 (promised −½)"),
                    Caption.slope(decay.lanes().getFirst()));
        }
    }
}
