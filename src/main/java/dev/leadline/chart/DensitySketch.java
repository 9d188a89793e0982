package dev.leadline.chart;

import dev.leadline.density.Portrait;
import java.awt.BasicStroke;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;

/// The small drawing of a density in an input's row, without axes.
public final class DensitySketch {
    private static final double PEAK = 9;

    private DensitySketch() {}

    /// @param scale pixels of the image for one of the picture
    /// @return premultiplied, with nothing behind the curve
    public static BufferedImage image(Portrait portrait, int width, int height, double scale, Theme theme) {
        var canvas = Canvas.of(width, height, scale);
        var g = canvas.graphics();
        var plot = new Rectangle2D.Double(1, 1, width - 2, height - 2.5);
        g.setColor(theme.reference());
        g.setStroke(new BasicStroke(1.2f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        g.setClip(plot);
        portrait.shown()
                .ifPresent(over -> Silhouette.of(portrait, over, (int) plot.getWidth(), PEAK)
                        .draw(g, plot, over));
        g.setClip(null);
        g.setColor(theme.axis());
        g.fill(new Rectangle2D.Double(plot.getX(), plot.getMaxY(), plot.getWidth(), 1));
        g.dispose();
        return canvas.image();
    }
}
