package dev.leadline.chart;

import dev.leadline.density.Portrait;
import dev.leadline.density.Support;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.OptionalDouble;
import org.jfree.chart.ui.RectangleEdge;

/// A density laid out for a size: it can be drawn, and says which value is at a pixel. Pixels count from the top left
/// and do not depend on the scale of an image.
///
/// Immutable, but for the axes of the charting library, which confine it to one thread at a time.
public final class DensityPicture {
    /// What stands above a value.
    public enum View {
        /// The density, or the probability of each value of a discrete one.
        PDF,

        /// The chance of a value up to this one.
        CDF,

        /// The chances of greater and of smaller values, on a logarithmic axis, down to one in a million.
        TAILS,

        /// The data against the values that the density has in their place.
        DATA_AGAINST_DENSITY
    }

    private static final double PEAK = 25;
    private static final double LEAST = 1e-6;
    private static final float[] DASHED = {6, 4};

    private final Portrait portrait;
    private final Observed observed;
    private final View view;
    private final Theme theme;
    private final int width;
    private final int height;
    private final Font font;
    private final Support over;
    private final Silhouette silhouette;
    private final Range values;
    private final Rectangle2D plot;
    private final Ticks xTicks;
    private final Ticks yTicks;
    private final String xName;
    private final String yName;

    private DensityPicture(
            Portrait portrait, Observed observed, View view, String name, Theme theme, int width, int height) {
        this.portrait = portrait;
        this.observed = observed;
        this.view = view;
        this.theme = theme;
        this.width = width;
        this.height = height;
        font = Typeface.sans(width < 420 ? 11 : 12);
        over = stretch(portrait, view);
        int line = font.getSize() + 8;
        int top = line + 6;
        int bottom = 2 * line + 4;
        silhouette = Silhouette.of(portrait, over, Math.max(2, width - 80), PEAK);
        values = values();
        yTicks = view == View.TAILS
                ? Ticks.powers(values, Math.max(2, (height - top - bottom) / (2 * line)))
                : Ticks.even(values, Math.max(3, (height - top - bottom) / (2 * line)));
        int left = 12
                + (int) Math.ceil(yTicks.all().stream()
                        .mapToDouble(tick -> Typeface.width(font, tick.label()))
                        .max()
                        .orElse(0));
        plot = new Rectangle2D.Double(left, top, Math.max(20, width - left - 14), Math.max(20, height - top - bottom));
        xTicks = Ticks.even(new Range(over.low(), over.high()), Math.max(2, (int) (plot.getWidth() / 80)));
        xName = named(name, xTicks);
        yName = named(
                switch (view) {
                    case PDF -> portrait.isDiscrete() ? "probability" : "density";
                    case CDF -> "chance of a value up to this one";
                    case TAILS -> "chance of a greater value (line), of one up to it (dashes)";
                    case DATA_AGAINST_DENSITY -> "data, in order, against the density's own values";
                },
                yTicks);
    }

    /// @param name of the axis, with its unit
    public static DensityPicture of(
            Portrait portrait, Observed observed, View view, String name, Theme theme, int width, int height) {
        return new DensityPicture(portrait, observed, view, name, theme, width, height);
    }

    public Portrait portrait() {
        return portrait;
    }

    public boolean hasData() {
        return !observed.values().isEmpty();
    }

    /// Where the curve stands, inside the axes.
    public Rectangle2D plot() {
        return (Rectangle2D) plot.clone();
    }

    /// The value at a pixel; of a discrete density the nearest one that it has. Empty outside the plot.
    public OptionalDouble valueAt(double x, double y) {
        if (!plot.contains(x, y)) {
            return OptionalDouble.empty();
        }
        double value = over.low() + (x - plot.getMinX()) / plot.getWidth() * (over.high() - over.low());
        return OptionalDouble.of(portrait.isDiscrete() ? portrait.nearest(value) : value);
    }

    /// Pixel of a value.
    public double xOf(double value) {
        return Silhouette.x(value, plot, over);
    }

    /// @param scale pixels of the image for one of the picture
    /// @return premultiplied, with nothing behind the curve
    public BufferedImage image(double scale) {
        var canvas = Canvas.of(width, height, scale);
        var g = canvas.graphics();
        g.setColor(theme.grid());
        for (var tick : yTicks.all()) {
            double y = yOf(tick.value());
            if (!tick.label().isEmpty() && y < plot.getMaxY() - 1) {
                g.draw(new Line2D.Double(plot.getMinX(), y, plot.getMaxX(), y));
            }
        }
        g.clip(new Rectangle2D.Double(plot.getX(), plot.getY() - 2, plot.getWidth(), plot.getHeight() + 2));
        g.setColor(theme.reference());
        g.setStroke(new BasicStroke(1.6f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        switch (view) {
            case PDF -> pdf(g);
            case CDF -> cdf(g);
            case TAILS -> tails(g);
            case DATA_AGAINST_DENSITY -> against(g);
        }
        g.setClip(null);
        axes(g);
        g.dispose();
        return canvas.image();
    }

    private void pdf(Graphics2D g) {
        double full = silhouette.highest() / values.high();
        var room = new Rectangle2D.Double(
                plot.getX(), plot.getMaxY() - full * plot.getHeight(), plot.getWidth(), full * plot.getHeight());
        silhouette.draw(g, room, over);
        if (!portrait.isDiscrete()) {
            marks(g);
        }
        g.setColor(data());
        g.setStroke(new BasicStroke(1.4f));
        if (!portrait.isDiscrete()) {
            var outline = new Path2D.Double();
            for (var bar : observed.histogram(over)) {
                double y = yOf(bar.chance() / (bar.to() - bar.from()));
                outline.moveTo(xOf(bar.from()), plot.getMaxY());
                outline.lineTo(xOf(bar.from()), y);
                outline.lineTo(xOf(bar.to()), y);
                outline.lineTo(xOf(bar.to()), plot.getMaxY());
            }
            g.draw(outline);
        }
        for (double value : observed.values()) {
            g.draw(new Line2D.Double(xOf(value), plot.getMaxY(), xOf(value), plot.getMaxY() - 6));
        }
    }

    /// Lines at the values that one in twenty falls below, half do, and one in twenty exceeds.
    private void marks(Graphics2D g) {
        g.setStroke(new BasicStroke(1, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10, new float[] {2, 3}, 0));
        g.setFont(font);
        double before = Double.NEGATIVE_INFINITY;
        for (var q : portrait.quantiles()) {
            boolean marked = q.below() == .05 || q.below() == .5 || q.above() == .05;
            double x = xOf(q.value());
            String text = q.below() == .5 ? "half" : "1 in 20";
            double wide = Typeface.width(font, text);
            if (marked && x - wide / 2 > before + 6 && x > plot.getMinX() && x < plot.getMaxX()) {
                g.setColor(theme.axis());
                g.draw(new Line2D.Double(x, plot.getMinY() + font.getSize() + 4, x, plot.getMaxY()));
                double from = Math.clamp(x - wide / 2, plot.getMinX() + 2, plot.getMaxX() - wide - 2);
                g.setColor(theme.ground());
                g.fill(new Rectangle2D.Double(from - 2, plot.getMinY(), wide + 4, font.getSize() + 3));
                g.setColor(theme.quiet());
                g.drawString(text, (float) from, (float) (plot.getMinY() + font.getSize()));
                before = x + wide / 2;
            }
        }
    }

    private void cdf(Graphics2D g) {
        g.draw(steps(true));
        g.setColor(data());
        g.setStroke(new BasicStroke(1.2f));
        g.draw(staircase(true));
    }

    private void tails(Graphics2D g) {
        g.draw(steps(false));
        g.setStroke(new BasicStroke(1.4f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, DASHED, 0));
        g.draw(steps(true));
        g.setColor(data());
        g.setStroke(new BasicStroke(1.2f));
        g.draw(staircase(false));
    }

    private void against(Graphics2D g) {
        g.setStroke(new BasicStroke(1.2f));
        g.draw(new Line2D.Double(xOf(over.low()), yOf(over.low()), xOf(over.high()), yOf(over.high())));
        g.setColor(data());
        int n = observed.values().size();
        for (int i = 0; i < n; i++) {
            double x = xOf(expected(i, n));
            double y = yOf(observed.values().get(i));
            g.draw(new java.awt.geom.Ellipse2D.Double(x - 2.5, y - 2.5, 5, 5));
        }
    }

    /// The value of the density that stands where the i-th of n data does.
    private double expected(int i, int n) {
        double p = (i + .5) / n;
        return p < .5 ? portrait.density().quantile(p) : portrait.density().upperQuantile((n - i - .5) / n);
    }

    /// The chances below, or above, column by column.
    private Path2D steps(boolean below) {
        var path = new Path2D.Double();
        int columns = (int) plot.getWidth();
        double before = Double.NaN;
        for (int i = 0; i <= columns; i++) {
            double x = over.low() + (over.high() - over.low()) * i / columns;
            double chance =
                    below ? portrait.density().cdf(x) : portrait.density().survival(x);
            double y = yOf(chance);
            if (i == 0) {
                path.moveTo(xOf(x), y);
            } else if (portrait.isDiscrete() && y != before) {
                path.lineTo(xOf(x), before);
            }
            path.lineTo(xOf(x), y);
            before = y;
        }
        return path;
    }

    /// The shares of the data.
    private Path2D staircase(boolean below) {
        var path = new Path2D.Double();
        var data = observed.values();
        int n = data.size();
        if (n == 0) {
            return path;
        }
        path.moveTo(plot.getMinX(), yOf(below ? 0 : 1));
        for (int i = 0; i < n; i++) {
            double x = xOf(data.get(i));
            path.lineTo(x, yOf((below ? i : n - i) / (double) n));
            if (below || i < n - 1) { // a logarithmic axis has no 0
                path.lineTo(x, yOf((below ? i + 1 : n - i - 1) / (double) n));
            }
        }
        if (below) {
            path.lineTo(plot.getMaxX(), yOf(1));
        }
        return path;
    }

    private Color data() {
        return theme.of(LaneLook.SECOND);
    }

    private Range values() {
        return switch (view) {
            case PDF -> {
                double data = portrait.isDiscrete()
                        ? 0
                        : observed.histogram(over).stream()
                                .mapToDouble(bar -> bar.chance() / (bar.to() - bar.from()))
                                .max()
                                .orElse(0);
                double highest = silhouette.highest();
                yield new Range(0, 1.16 * Math.max(highest, Math.min(data, 3 * highest)));
            }
            case CDF -> new Range(0, 1.04);
            case TAILS -> new Range(LEAST, 1.3);
            case DATA_AGAINST_DENSITY -> new Range(over.low(), over.high());
        };
    }

    private double yOf(double value) {
        double share = view == View.TAILS
                ? StrictMath.log(Math.max(value, LEAST / 10) / LEAST) / StrictMath.log(values.high() / LEAST)
                : (value - values.low()) / values.length();
        return plot.getMaxY() - share * plot.getHeight();
    }

    private static Support stretch(Portrait portrait, View view) {
        var stretch = view == View.TAILS ? portrait.tailsShown() : portrait.shown();
        return stretch.orElse(new Support(0, 1));
    }

    private static String named(String name, Ticks ticks) {
        return ticks.factor() == 0 ? name : name + ", in " + Typeset.power(ticks.factor());
    }

    private void axes(Graphics2D g) {
        var range = new Range(over.low(), over.high());
        Axes.even(range, xTicks, font, theme).draw(g, plot.getMaxY(), plot, plot, RectangleEdge.BOTTOM, null);
        var side = view == View.TAILS ? Axes.log(values, yTicks, font, theme) : Axes.even(values, yTicks, font, theme);
        side.draw(g, plot.getMinX(), plot, plot, RectangleEdge.LEFT, null);
        g.setFont(font);
        g.setColor(theme.ink());
        g.drawString(Typeface.fitted(font, yName, width - 16), 8, font.getSize() + 2);
        String fitted = Typeface.fitted(font, xName, (int) plot.getWidth());
        g.drawString(fitted, (float) (plot.getMaxX() - Typeface.width(font, fitted)), (float)
                (plot.getMaxY() + 2 * font.getSize() + 12));
    }
}
