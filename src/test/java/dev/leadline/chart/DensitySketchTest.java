package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Portrait;
import java.awt.image.BufferedImage;
import java.util.List;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.UniformContinuousDistribution;
import org.junit.jupiter.api.Test;

class DensitySketchTest {
    private static Portrait portrait(ContinuousDistribution of) {
        return Portrait.of(new Borrowed(of));
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
