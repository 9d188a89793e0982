package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Borrowed;
import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.density.Portrait;
import dev.leadline.density.Typed;
import dev.leadline.density.TypedText;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.UniformContinuousDistribution;
import org.junit.jupiter.api.Test;

class DensitySketchTest {
    private static Portrait portrait(ContinuousDistribution of) {
        return Portrait.of(Borrowed.of(of));
    }

    @Test
    void curveIsHighestWhereTheProbabilityIs() {
        var image = DensitySketch.image(portrait(NormalDistribution.of(7, 2)), 72, 20, 1, Theme.LIGHT);
        assertEquals(1, top(image, 36), 1.01);
        assertTrue(top(image, 20) > top(image, 36) + 3);
        assertTrue(top(image, 4) >= 17);
    }

    @Test
    void drawsSmallAndLargeWhateverThePeak() {
        for (ContinuousDistribution of : List.of(
                GammaDistribution.of(.3, 2),
                BetaDistribution.of(.5, .5),
                BetaDistribution.of(4, 10),
                UniformContinuousDistribution.of(0, 1e-300),
                NormalDistribution.of(1e12, 1e-3),
                NormalDistribution.of(0, 1e300))) {
            for (var theme : List.of(Theme.LIGHT, Theme.DARK)) {
                assertTrue(inked(DensitySketch.image(portrait(of), 72, 20, 2, theme)) > 100, "" + of);
                assertTrue(
                        inked(DensityPicture.of(
                                                portrait(of),
                                                Observed.NONE,
                                                DensityPicture.View.PDF,
                                                "v, m/s",
                                                theme,
                                                480,
                                                240)
                                        .image(1))
                                > 1000,
                        "" + of);
            }
        }
    }

    /// Steep stretches of the outline.
    ///
    /// @param at value where it begins
    /// @param wide how far it reaches, in pixels
    private record Rise(double at, double wide) {}

    /// Rises, or falls, by more than a tenth of the height.
    private static List<Rise> rises(Density density) {
        var portrait = Portrait.of(density);
        var over = portrait.shown().orElseThrow();
        var plot = new Rectangle2D.Double(0, 0, 400, 100);
        var outline = Silhouette.of(portrait, over, 400, 25).curve(plot, over).getPathIterator(null);
        var rises = new ArrayList<Rise>();
        double[] at = new double[2];
        double[] next = new double[2];
        for (outline.currentSegment(at); !outline.isDone(); outline.next()) {
            outline.currentSegment(next);
            double rise = (at[1] - next[1]) / plot.getHeight();
            if (Math.abs(rise) > .1) {
                rises.add(new Rise(over.low() + at[0] / 400 * (over.high() - over.low()), next[0] - at[0]));
            }
            System.arraycopy(next, 0, at, 0, 2);
        }
        return rises;
    }

    @Test
    void jumpsAreUpright() {
        var uniform = rises(Catalogue.named("uniform").of(Map.of("from", 0.0, "to", 1.0)));
        upright(uniform, 0, 1);
        var swing = rises(Catalogue.named("arcsine").of(Map.of("from", -1.0, "to", 1.0)));
        upright(List.of(swing.getFirst(), swing.getLast()), -1, 1);
        // 4 from 0 to .1, then 2 to .3, then 1 to .5
        var steps = Typed.of(
                        new TypedText("[x>=0 & x<0.5]*(1 + [x<0.3] + 2*[x<0.1])", -1, 1, List.of(), false),
                        "x",
                        new LinkedHashMap<>())
                .density();
        upright(rises(steps), 0, .1, .3, .5);
    }

    private static void upright(List<Rise> rises, double... places) {
        assertEquals(places.length, rises.size());
        for (int k = 0; k < places.length; k++) {
            assertEquals(places[k], rises.get(k).at(), 1e-6);
            assertEquals(0, rises.get(k).wide());
        }
    }

    private static int top(BufferedImage image, int x) {
        int y = 0;
        while (y < image.getHeight() && image.getRGB(x, y) >>> 24 < 120) {
            y++;
        }
        return y;
    }

    private static int inked(BufferedImage image) {
        int count = 0;
        for (int y = 0; y < image.getHeight(); y++) {
            for (int x = 0; x < image.getWidth(); x++) {
                count += image.getRGB(x, y) >>> 24 > 0 ? 1 : 0;
            }
        }
        return count;
    }
}
