package dev.leadline.chart;

import dev.leadline.density.Portrait;
import dev.leadline.density.Portrait.Bar;
import dev.leadline.density.Support;
import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.stream.DoubleStream;
import org.jfree.chart.ui.RectangleEdge;

/// The curve of a density, from the small drawing in an input's row to a large one with an axis.
///
/// The height is the probability that falls on a pixel's width, not the density at a point, so a peak without bound is
/// as high as what it holds. A discrete density has bars.
public final class DensitySketch {
    private static final int WITH_AXIS = 90;

    /// A peak is cut at so many times the mean height.
    private static final double PEAK = 9;

    private DensitySketch() {}

    /// @param name of the axis, drawn from a height of 90 pixels on
    /// @param scale pixels of the image for one of the picture
    /// @return premultiplied, with nothing behind the curve
    public static BufferedImage image(
            Portrait portrait, String name, int width, int height, double scale, Theme theme) {
        var image = new BufferedImage(
                (int) Math.round(width * scale), (int) Math.round(height * scale), BufferedImage.TYPE_INT_ARGB_PRE);
        var g = image.createGraphics();
        g.transform(AffineTransform.getScaleInstance(scale, scale));
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        boolean axis = height >= WITH_AXIS;
        var plot = axis
                ? new Rectangle2D.Double(16, 8, width - 32, height - 52)
                : new Rectangle2D.Double(1, 1, width - 2, height - 2.5);
        var shown = portrait.shown();
        shown.ifPresent(over -> {
            g.clip(new Rectangle2D.Double(plot.getX(), 0, plot.getWidth(), plot.getMaxY() + 1));
            g.setColor(theme.reference());
            draw(g, portrait, over, plot, axis ? 1.6f : 1.2f);
            g.setClip(null);
        });
        if (axis) {
            var font = Typeface.sans(12);
            var range = shown.map(over -> new Range(over.low(), over.high())).orElse(new Range(0, 1));
            var ticks = Ticks.even(range, Math.max(2, (int) (plot.getWidth() / 90)));
            Axes.even(range, ticks, font, theme).draw(g, plot.getMaxY(), plot, plot, RectangleEdge.BOTTOM, null);
            String label = ticks.factor() == 0 ? name : name + ", in " + Typeset.power(ticks.factor());
            g.setFont(font);
            g.setColor(theme.ink());
            g.drawString(label, (float) (plot.getMaxX() - Typeface.width(font, label)), (float) (plot.getMaxY() + 37));
        } else {
            g.setColor(theme.axis());
            g.fill(new Rectangle2D.Double(plot.getX(), plot.getMaxY(), plot.getWidth(), 1));
        }
        g.dispose();
        return image;
    }

    private static void draw(Graphics2D g, Portrait portrait, Support over, Rectangle2D plot, float width) {
        double scale = plot.getWidth() / (over.high() - over.low());
        if (portrait.isDiscrete()) {
            var bars = portrait.bars();
            double highest = bars.stream().mapToDouble(Bar::chance).max().orElse(1);
            for (var bar : bars) {
                double height = bar.chance() / highest * (plot.getHeight() - 1);
                double thick = Math.max(bar.to() - bar.from() > 0 ? (bar.to() - bar.from()) * scale - .4 : 2, .6);
                double x = plot.getMinX() + (bar.middle() - over.low()) * scale;
                g.fill(new Rectangle2D.Double(x - thick / 2, plot.getMaxY() - height, thick, height));
            }
            return;
        }
        var curve = curve(portrait, over, plot);
        var filled = new Path2D.Double(curve);
        filled.closePath();
        g.setComposite(AlphaComposite.SrcOver.derive(.18f));
        g.fill(filled);
        g.setComposite(AlphaComposite.SrcOver);
        g.setStroke(new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        g.draw(curve);
    }

    private static Path2D curve(Portrait portrait, Support over, Rectangle2D plot) {
        int columns = Math.max(2, (int) plot.getWidth());
        var heights = portrait.curve(over, columns).stream()
                .mapToDouble(bar -> Math.min(PEAK / columns, bar.chance()))
                .toArray();
        double highest = DoubleStream.of(heights).max().orElse(0);
        var path = new Path2D.Double();
        path.moveTo(plot.getMinX(), plot.getMaxY());
        for (int i = 0; i < columns; i++) {
            double x = plot.getMinX() + plot.getWidth() * (i + .5) / columns;
            double share = highest > 0 ? heights[i] / highest : 0;
            path.lineTo(x, plot.getMaxY() - share * (plot.getHeight() - 1));
        }
        path.lineTo(plot.getMaxX(), plot.getMaxY());
        return path;
    }
}
