package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class PictureTest {
    private static final View LOG = View.FOLLOWING;
    private static final View LINEAR = LOG.withLogDraws(false);

    private static Picture picture(Settling settling, View view) {
        return Picture.of(settling, view, Theme.LIGHT, 900, 520);
    }

    static Stream<Arguments> runsWithAnInterval() {
        return Stream.of(
                Arguments.of("mean", Invented.mean("A", "independent", 18_430, 5200, 4_000_000, 11)),
                Arguments.of("wild beginning", Invented.wild().lanes().getFirst()),
                Arguments.of("no hit", Invented.noHit().lanes().getFirst()),
                Arguments.of("gaps", Invented.gaps().lanes().getFirst()));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("runsWithAnInterval")
    void latestIntervalTakesAFairPartOfTheHeight(String name, Series lane) {
        var settling = Invented.settling("x", "1", Optional.empty(), Optional.empty(), List.of(lane));
        var last = lane.points().getLast();
        double share =
                (last.high() - last.low()) / picture(settling, LOG).values().length();
        assertTrue(share > .1 && share < .5, name + ": " + share);
    }

    @Test
    void latestPointIsAlwaysInSight() {
        for (var settling : everything()) {
            for (var view : List.of(LOG, LINEAR)) {
                var shown = picture(settling, view);
                for (var lane : settling.lanes()) {
                    lane.last().ifPresent(point -> {
                        assertTrue(shown.draws().contains(point.draws()), settling.toString());
                        assertTrue(
                                !Double.isFinite(point.estimate())
                                        || shown.values().contains(point.estimate()),
                                () -> shown.values() + " lacks " + point);
                    });
                }
            }
        }
    }

    @Test
    void jumpInTheLaterPartIsInSight() {
        var lane = Invented.jumps().lanes().getFirst();
        var shown = picture(Invented.jumps(), LOG);
        var last = lane.points().getLast();
        double longest = 5 * (last.high() - last.low());
        for (int i = lane.points().size() - 1; i >= 0; i--) {
            var point = lane.points().get(i);
            if (point.high() - point.low() > longest) {
                break;
            }
            assertTrue(shown.values().contains(point.low()) && shown.values().contains(point.high()), point.toString());
        }
    }

    @Test
    void referenceFarAwayDoesNotFlattenThePicture() {
        assertFalse(picture(Invented.wild(), LOG).values().contains(9.5));
        assertTrue(picture(Invented.smoothMean(), LOG).values().contains(18_432.7));
    }

    @Test
    void nothingNegativeIsShownAsIfItCouldBe() {
        var values = picture(Invented.rareEvent(3_000_000), LOG).values();
        assertTrue(values.low() < 0 && values.low() > -.05 * values.high(), values.toString());
    }

    @Test
    void logarithmicAxisShowsFourDecadesAndLinearAllFromZero() {
        double last =
                Invented.smoothMean().lanes().getFirst().points().getLast().draws();
        assertEquals(last / 1e4, picture(Invented.smoothMean(), LOG).draws().low(), 1e-9 * last);
        assertEquals(0, picture(Invented.smoothMean(), LINEAR).draws().low());
    }

    @Test
    void readingIsTheInverseOfDrawing() {
        for (var view : List.of(LOG, LINEAR)) {
            var shown = picture(Invented.fourLanes(), view);
            var plot = shown.plot();
            for (double x = plot.getMinX(); x < plot.getMaxX(); x += 7.3) {
                double y = plot.getMinY() + (x * 3.1) % plot.getHeight();
                var reading = shown.at(x, y).orElseThrow();
                assertEquals(x, shown.xOf(reading.draws()), 1e-6);
                assertEquals(y, shown.yOf(reading.value()), 1e-6);
            }
        }
    }

    @Test
    void readingFindsTheNearestMarkOfEveryLane() {
        var settling = Invented.fourLanes();
        var shown = picture(settling, LOG);
        var plot = shown.plot();
        for (double x = plot.getMinX(); x < plot.getMaxX(); x += 11) {
            var reading = shown.at(x, plot.getCenterY()).orElseThrow();
            assertEquals(4, reading.lanes().size());
            for (int i = 0; i < 4; i++) {
                var at = reading.lanes().get(i);
                assertEquals(settling.lanes().get(i).lane(), at.lane());
                double nearest = Double.POSITIVE_INFINITY;
                for (var point : settling.lanes().get(i).points()) {
                    nearest = Math.min(nearest, Math.abs(shown.xOf(point.draws()) - x));
                }
                assertEquals(nearest, Math.abs(at.x() - x), 1e-9);
                assertEquals(at.y(), shown.yOf(at.point().estimate()));
            }
        }
    }

    @Test
    void nothingIsReadOutsideThePlot() {
        var shown = picture(Invented.smoothMean(), LOG);
        assertEquals(Optional.empty(), shown.at(2, 300));
        assertEquals(Optional.empty(), shown.at(300, 518));
    }

    /// What the reading says stands where the picture has it: the marker of the latest mark in the lane's colour, the
    /// band's fill inside its limits only, the axis of the library at the edge of the plot.
    @Test
    void drawingStandsWhereReadingSays() {
        var settling = Invented.settling(
                "x",
                "1",
                Optional.empty(),
                Optional.empty(),
                Invented.smoothMean().lanes());
        for (var theme : List.of(Theme.LIGHT, Theme.DARK)) {
            var shown = Picture.of(settling, LOG, theme, 900, 520);
            var image = shown.image(1);
            var plot = shown.plot();
            var last = settling.lanes().getFirst().points().getLast();
            double x = shown.xOf(last.draws());
            assertEquals(theme.of(LaneLook.FIRST).getRGB(), rgb(image, x, shown.yOf(last.estimate())));
            assertNotEquals(theme.ground().getRGB(), rgb(image, x - 12, shown.yOf(last.high()) + 9));
            assertEquals(theme.ground().getRGB(), rgb(image, x + 12, shown.yOf(last.high()) + 9));
            assertEquals(theme.ground().getRGB(), rgb(image, x - 12, shown.yOf(last.high()) - 40));
            assertNotEquals(theme.ground().getRGB(), rgb(image, plot.getMaxX() - 9, plot.getMaxY()));
            assertEquals(theme.ground().getRGB(), rgb(image, plot.getMaxX() - 9, plot.getMaxY() + 7));
        }
    }

    private static int rgb(BufferedImage image, double x, double y) {
        return image.getRGB((int) Math.floor(x), (int) Math.floor(y));
    }

    @Test
    void zoomingKeepsThePixelAndComesBack() {
        for (var view : List.of(LOG, LINEAR)) {
            var whole = picture(Invented.smoothMean(), view);
            double x = 411;
            double y = 222;
            var before = whole.at(x, y).orElseThrow();
            var near = picture(Invented.smoothMean(), whole.zoomed(x, y, .5));
            // The margin depends on the labels, so the pixel of the value is found again, not assumed.
            assertEquals(
                    x - whole.plot().getMinX(),
                    near.xOf(before.draws()) - near.plot().getMinX(),
                    .05 * x);
            assertEquals(
                    whole.values().length() / 2,
                    near.values().length(),
                    1e-9 * whole.values().length());
            assertTrue(near.draws().contains(before.draws()) && near.values().contains(before.value()));
            var back = near.zoomed(near.xOf(before.draws()), near.yOf(before.value()), 2);
            same(whole.values(), back.values().orElseThrow());
            double moved =
                    picture(Invented.smoothMean(), back).xOf(whole.draws().low())
                            - whole.plot().getMinX();
            assertEquals(0, moved, 8);
        }
    }

    @Test
    void zoomAboutAPixelOfOnePictureIsExact() {
        var whole = picture(Invented.smoothMean(), LOG);
        var at = whole.at(411, 222).orElseThrow();
        var view = whole.zoomed(411, 222, .25);
        double share = (411 - whole.plot().getMinX()) / whole.plot().getWidth();
        double left = Math.log(view.draws().orElseThrow().low());
        double right = Math.log(view.draws().orElseThrow().high());
        assertEquals(Math.log(at.draws()), left + share * (right - left), 1e-9);
        assertEquals(Math.log(whole.draws().high() / whole.draws().low()) / 4, right - left, 1e-9);
        double down = (222 - whole.plot().getMinY()) / whole.plot().getHeight();
        var values = view.values().orElseThrow();
        assertEquals(at.value(), values.high() - down * values.length(), 1e-9 * at.value());
    }

    @Test
    void panningMovesAndComesBack() {
        for (var view : List.of(LOG, LINEAR)) {
            var whole = picture(Invented.smoothMean(), view);
            var moved = picture(Invented.smoothMean(), whole.panned(0, 30));
            same(
                    new Range(
                            whole.values().low()
                                    + 30
                                            * whole.values().length()
                                            / whole.plot().getHeight(),
                            whole.values().high()
                                    + 30
                                            * whole.values().length()
                                            / whole.plot().getHeight()),
                    moved.values());
            assertEquals(view.draws(), whole.panned(0, 30).draws());
            var aside = picture(Invented.smoothMean(), whole.panned(25, 0));
            same(whole.draws(), aside.panned(-25, 0).draws().orElseThrow());
            assertEquals(whole.panned(25, 0).values(), view.values());
        }
    }

    @Test
    void resetFollowsAgain() {
        var whole = picture(Invented.smoothMean(), LINEAR);
        var view = whole.zoomed(300, 300, .3);
        assertEquals(LINEAR, view.reset());
        assertEquals(view, view.withLogDraws(false));
        assertEquals(Optional.empty(), view.withLogDraws(true).draws());
        assertEquals(view.values(), view.withLogDraws(true).values());
    }

    @Test
    void overTheLabelsOfAnAxisOnlyThatAxisZooms() {
        var whole = picture(Invented.smoothMean(), LOG);
        assertEquals(Optional.empty(), whole.zoomed(10, 200, .5).draws());
        assertEquals(Optional.empty(), whole.zoomed(400, 505, .5).values());
        assertTrue(whole.zoomed(10, 200, .5).values().isPresent());
    }

    @Test
    void zoomingHasLimitsAndStaysDrawable() {
        for (var view : List.of(LOG, LINEAR)) {
            for (double factor : new double[] {.2, 5}) {
                var now = view;
                for (int i = 0; i < 60; i++) {
                    now = picture(Invented.smoothMean(), now).zoomed(500, 200, factor);
                }
                var shown = picture(Invented.smoothMean(), now);
                shown.image(1);
                assertTrue(shown.at(500, 200).isPresent());
                assertEquals(now.values(), shown.zoomed(500, 200, factor).values());
            }
        }
    }

    static List<Settling> everything() {
        var huge = new Point(64, 1e300, -1e308, 1e308);
        return List.of(
                Invented.rareEvent(100_000),
                Invented.noHit(),
                Invented.smoothMean(),
                Invented.wild(),
                Invented.jumps(),
                Invented.gaps(),
                Invented.fourLanes(),
                Invented.empty(),
                Invented.settling("no lanes", "", Optional.empty(), Optional.empty(), List.of()),
                Invented.of(new Point(64, 3, 2, 4)),
                Invented.of(new Point(64, 0, 0, 0)),
                Invented.of(new Point(1, -7, -7, -7), new Point(2, -7, -7, -7)),
                Invented.of(new Point(64, 3, Double.NaN, Double.NaN)),
                Invented.of(new Point(64, Double.NaN, Double.NaN, Double.NaN)),
                Invented.of(
                        new Point(64, Double.NaN, Double.NaN, Double.NaN),
                        new Point(128, Double.NaN, Double.NaN, Double.NaN)),
                Invented.of(new Point(64, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.NaN)),
                Invented.of(huge),
                Invented.of(huge, new Point(128, -1e300, -1.7e308, 1.7e308)),
                Invented.of(new Point(64, 1e-300, 0, 2e-300), new Point(128, 1.5e-300, 1e-300, 2e-300)),
                Invented.of(new Point(64, 4.9e-324, 0, 1e-323)),
                Invented.of(new Point(64, 1, 1 - 1e-15, 1 + 1e-15)),
                Invented.of(new Point(64, 1e300, -1e300, 1e305), new Point(1_000_000_000_000L, 1, .9, 1.1)),
                Invented.of(new Point(1, 5, 4, 6), new Point(Long.MAX_VALUE, 5, 4, 6)));
    }

    @Test
    void drawsWhateverComes() {
        for (var settling : everything()) {
            for (var view : List.of(LOG, LINEAR)) {
                var image = Picture.of(settling, view, Theme.DARK, 420, 260).image(1);
                assertTrue(coloursOf(image) > 2, settling.toString());
            }
            Picture.of(settling, LOG, Theme.LIGHT, 0, 0).image(1);
            var shown = Picture.of(settling, LOG, Theme.LIGHT, 1200, 700);
            shown.at(600, 350);
            Picture.of(settling, shown.zoomed(600, 350, .5), Theme.LIGHT, 1200, 700)
                    .image(2);
            Picture.of(settling, shown.panned(5000, -5000), Theme.LIGHT, 1200, 700)
                    .image(1);
        }
    }

    private static long coloursOf(BufferedImage image) {
        int w = image.getWidth();
        return java.util.Arrays.stream(image.getRGB(0, 0, w, image.getHeight(), null, 0, w))
                .distinct()
                .count();
    }

    @Test
    void imageHasTheScaleAskedFor() {
        var image =
                Picture.of(Invented.smoothMean(), LOG, Theme.LIGHT, 600, 400).image(1.5);
        assertEquals(900, image.getWidth());
        assertEquals(600, image.getHeight());
    }

    /// The any-time band stands outside the interval, and only where it is kept.
    @Test
    void drawsTheAnyTimeBandWhereThereIsOne() {
        var point = new Point(64, 5, 4, 6, 1, 9);
        var kept = Invented.of(point, new Point(1000, 5, 4, 6, 1, 9));
        var without = Invented.of(new Point(64, 5, 4, 6), new Point(1000, 5, 4, 6));
        var view = new View(Optional.of(new Range(64, 1000)), Optional.of(new Range(0, 10)), true);
        var shown = picture(kept, view);
        double x = shown.plot().getMinX() + 51;
        assertNotEquals(Theme.LIGHT.ground().getRGB(), rgb(shown.image(1), x, shown.yOf(8.3)));
        assertEquals(Theme.LIGHT.ground().getRGB(), rgb(picture(without, view).image(1), x, shown.yOf(8.3)));
    }

    private static void same(Range expected, Range actual) {
        assertEquals(expected.low(), actual.low(), 1e-9 * expected.length());
        assertEquals(expected.high(), actual.high(), 1e-9 * expected.length());
    }
}
