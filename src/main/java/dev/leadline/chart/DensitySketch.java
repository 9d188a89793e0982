package dev.leadline.chart;

import dev.leadline.density.Density;
import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.Optional;
import org.jfree.chart.ui.RectangleEdge;

/// The curve of a density, from the small drawing in an input's row to a large one with an axis.
///
/// Shown is the stretch between the .1 % and the 99.9 % quantile, cut where a tail is so long that the middle would
/// shrink to a needle (six times the distance between the quartiles from the median), and drawn to the end of the
/// support where that is near. The height is the probability that falls on a pixel's width, not the density at a
/// point, so a peak without bound is as high as what it holds.
public final class DensitySketch {
    private static final double TAIL = .001;
    private static final int WITH_AXIS = 90;

    /// A peak is cut at so many times the mean height.
    private static final double PEAK = 9;

    private DensitySketch() {}

    /// @param name of the axis, drawn from a height of 90 pixels on
    /// @param scale pixels of the image for one of the picture
    /// @return premultiplied, with nothing behind the curve
    public static BufferedImage image(Density density, String name, int width, int height, double scale, Theme theme) {
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
        var shown = shown(density);
        shown.ifPresent(range -> {
            var curve = curve(density, range, plot);
            g.clip(new Rectangle2D.Double(plot.getX(), 0, plot.getWidth(), plot.getMaxY() + 1));
            var filled = new Path2D.Double(curve);
            filled.lineTo(plot.getMaxX(), plot.getMaxY());
            filled.lineTo(plot.getMinX(), plot.getMaxY());
            filled.closePath();
            g.setColor(theme.reference());
            g.setComposite(AlphaComposite.SrcOver.derive(.18f));
            g.fill(filled);
            g.setComposite(AlphaComposite.SrcOver);
            g.setStroke(new BasicStroke(axis ? 1.6f : 1.2f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
            g.draw(curve);
            g.setClip(null);
        });
        if (axis) {
            var font = Typeface.sans(12);
            var range = shown.orElse(new Range(0, 1));
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

    /// The stretch that is drawn; empty where the density has no quantiles to go by.
    static Optional<Range> shown(Density density) {
        double median = density.quantile(.5);
        double spread = density.quantile(.75) - density.quantile(.25);
        double low = end(
                density.quantile(TAIL), median - 6 * spread, density.support().low(), -spread);
        double high = end(
                density.upperQuantile(TAIL),
                median + 6 * spread,
                density.support().high(),
                spread);
        if (!(low < high && Double.isFinite(high - low))) {
            return Optional.empty();
        }
        double margin = .04 * (high - low);
        return Optional.of(new Range(low - margin, high + margin));
    }

    /// @param spread distance of the quartiles, negative for the lower end
    private static double end(double quantile, double cut, double support, double spread) {
        boolean beyond = spread < 0 ? !(quantile >= cut) : !(quantile <= cut);
        double end = beyond ? cut : quantile;
        return Math.abs(support - end) <= Math.abs(spread) ? support : end;
    }

    private static Path2D curve(Density density, Range range, Rectangle2D plot) {
        int columns = Math.max(2, (int) plot.getWidth());
        double step = range.length() / columns;
        var heights = new double[columns];
        double before = density.cdf(range.low());
        double highest = 0;
        for (int i = 0; i < columns; i++) {
            double upTo = density.cdf(range.low() + (i + 1) * step);
            heights[i] = Math.min(PEAK / columns, Math.max(0, upTo - before));
            highest = Math.max(highest, heights[i]);
            before = upTo;
        }
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
