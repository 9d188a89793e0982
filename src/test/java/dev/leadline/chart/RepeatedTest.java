package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.model.Ask;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Repetition;
import dev.leadline.trace.Sought;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class RepeatedTest {
    private static Repetition repetition(double estimate, double low, double high) {
        return new Repetition(estimate, .5, new Interval(low, high, .95, "student", "", Optional.empty()));
    }

    private static Repeated of(double value, List<Repetition> repetitions) {
        var answer = new Rehearsed(
                new Ask(new Estimand.Mean(), List.of("x"), "m3", "volume"),
                .95,
                new Sought(value, 0, "", 0),
                repetitions);
        return new Repeated(
                "Invented",
                new Rehearsal("B", "antithetic", 100, 100, repetitions.size(), Optional.empty(), 0, List.of(answer)),
                answer);
    }

    /// Twenty intervals of length 2 about 1, 2 … 20, in disorder; 10 lies in those about 9, 10 and 11.
    private static Repeated twenty() {
        var repetitions = new ArrayList<Repetition>();
        for (int i = 0; i < 20; i++) {
            double middle = 1 + (7 * i) % 20;
            repetitions.add(repetition(middle, middle - 1, middle + 1));
        }
        return of(10, repetitions);
    }

    @Test
    void intervalsStandInTheirOrder() {
        var placed = twenty().placed();
        for (int i = 0; i < 20; i++) {
            assertEquals(i + 1, placed.get(i).point().draws());
            assertEquals(i + 1, placed.get(i).point().estimate());
            assertEquals(i + 1 < 9 || i + 1 > 11, placed.get(i).missed());
        }
    }

    @Test
    void readsTheIntervalAtAPixel() {
        var picture = Picture.of(twenty(), View.FOLLOWING, Theme.LIGHT, 900, 520);
        assertEquals(
                "B: 9.0 m³, interval 8.0 to 10.0, holds the value",
                picture.at(picture.xOf(9), picture.yOf(9)).orElseThrow().text());
        assertEquals(
                "B: 3.0 m³, interval 2.0 to 4.0, misses the value",
                picture.at(picture.xOf(3), picture.yOf(9)).orElseThrow().text());
        assertEquals(
                List.of("15.0 % ± 8.0 % of 20 intervals of 100 draws hold the value; stated: 95 %"), picture.remarks());
    }

    /// Those that miss have the colour of the second lane, those that hold that of the first.
    @Test
    void missesAreOfAnotherColour() {
        var picture = Picture.of(twenty(), View.FOLLOWING, Theme.LIGHT, 900, 520);
        BufferedImage image = picture.image(1);
        int missed = image.getRGB((int) picture.xOf(3), (int) picture.yOf(3)) & 0xFFFFFF;
        assertEquals(Theme.LIGHT.of(LaneLook.SECOND).getRGB() & 0xFFFFFF, missed);
        int held = image.getRGB((int) picture.xOf(9), (int) picture.yOf(9)) & 0xFFFFFF;
        assertTrue((held & 0xFF) > (held >> 16 & 0xFF), () -> "teal: " + Integer.toHexString(held));
    }

    /// A limit that does not exist has no end in the picture; repetitions without an interval are told.
    @Test
    void missingLimitsReachTheEdge() {
        var picture = Picture.of(
                of(
                        10,
                        List.of(
                                repetition(9, 8, Double.NaN),
                                repetition(11, 10.5, 12),
                                repetition(10, Double.NaN, Double.NaN))),
                View.FOLLOWING,
                Theme.LIGHT,
                600,
                400);
        assertEquals("1 repetition has no interval", picture.remarks().getLast());
        picture.image(1);
        assertEquals(
                List.of("no interval yet"),
                Picture.of(of(10, List.of()), View.FOLLOWING, Theme.LIGHT, 400, 300)
                        .remarks());
    }

    @Test
    void saysWhatItShows() {
        String caption = twenty().caption();
        assertTrue(
                caption.startsWith(
                        "Intervals of 20 repetitions of lane B (antithetic), of 100 draws each, for volume, ordered by"
                                + " their"),
                caption);
        assertTrue(
                caption.contains("3 of 20 intervals hold the value, 15.0 % ± 8.0 %; 8 lie below it, 9 above."),
                caption);
    }
}
