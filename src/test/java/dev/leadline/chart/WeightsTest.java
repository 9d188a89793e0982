package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Normal;
import dev.leadline.estimate.Extremes;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

class WeightsTest {
    /// Four draws of weights 1, 4, 1, 2, whose mean is 2.
    private static Trace weighed() {
        var extremes = new Extremes(2);
        extremes.add(new double[][] {{1, 0, 0, 0}, {1, 4, 1, 2}}, 4);
        extremes.look();
        var other = new Proposal(new TreeMap<>(Map.of(0, new Normal(0, 2))), Share.NONE, false, List.of());
        return new Trace(
                "B",
                new Scheme(new Independent(), Optional.of(other), List.of()),
                List.of(),
                List.of(),
                Optional.of(extremes.outermost()),
                List.of(),
                List.of(),
                Optional.empty());
    }

    private static Trace plain() {
        return new Trace("A", Scheme.of(new Independent()), List.of(), List.of(), List.of(), Optional.empty());
    }

    private static Weights of(Trace... traces) {
        return new Weights(
                "Invented", 7, List.of(traces).stream().map(Weights.Weighed::of).toList());
    }

    @Test
    void weightsAreOverTheirMeanTheLargestFirst() {
        var lane = of(weighed()).lanes().getFirst();
        assertEquals(
                List.of(2.0, 1.0, .5, .5),
                lane.largest().stream().map(Point::estimate).toList());
        assertEquals(.5, lane.share(1));
        assertEquals(.75, lane.share(2));
        assertEquals(64.0 / 22, lane.effective(), 1e-15); // (sum of w)^2 over the sum of w^2
    }

    @Test
    void readsRankAndShare() {
        var picture = Picture.of(of(plain(), weighed()), View.FOLLOWING, Theme.LIGHT, 900, 520);
        var reading = picture.at(picture.xOf(2), picture.yOf(1)).orElseThrow();
        assertEquals("B: weight 2 is 1 times the mean; the largest 2 have 75 % of all weight", reading.text());
        assertEquals(LaneLook.SECOND, reading.lanes().getFirst().look());
        picture.image(1);
    }

    @Test
    void isSeenWhereSomethingIsWeighed() {
        assertTrue(PictureKind.WEIGHTS.isSeen(List.of(plain(), weighed())));
        assertFalse(PictureKind.WEIGHTS.isSeen(List.of(plain())));
        assertTrue(PictureKind.ERROR_DECAY.isSeen(List.of(plain())));
        assertTrue(of(plain()).caption().contains("Lane A (independent): every draw counts 1."));
        assertEquals(
                List.of("every draw counts 1: no lane draws from other densities"),
                Picture.of(of(plain()), View.FOLLOWING, Theme.LIGHT, 400, 300).remarks());
    }
}
