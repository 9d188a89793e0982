package dev.leadline.chart;

import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;
import java.util.function.ToDoubleFunction;
import org.jfree.chart.axis.AxisSpace;
import org.jfree.chart.axis.ValueAxis;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.chart.ui.RectangleInsets;

/// A picture of a run laid out for a size: it can be drawn, says what stands at a pixel, and answers to a mouse
/// with the next [View]. Pixels count from the top left and do not depend on the scale of an image.
///
/// Cost: layout and drawing of one lane with 1,534 marks at 1200 by 700 took a median of 11 ms of processor time
/// and 27 ms at most (40 runs after warm-up, one of two busy cores; `ShowPictures` in the tests measures it).
///
/// Confined to one thread at a time, because the axes of the charting library are; nothing in it changes after it was
/// made.
public abstract sealed class Picture
        permits SettlingPicture, ErrorDecayPicture, OutcomesPicture, WeightsPicture, RepeatedPicture {
    /// Smallest size in which every label still has room.
    public static final int LEAST_WIDTH = 240;

    public static final int LEAST_HEIGHT = 160;

    private static final float[] DASH_DOT = {9, 3, 2, 3};
    static final int MARKER_APART = 96;
    static final double MARKER = 4;

    /// One of the two axes.
    ///
    /// @param unit empty for none
    record Scale(Range range, boolean log, String name, String unit) {
        Ticks ticks(int most) {
            return log ? Ticks.powers(range, most) : Ticks.even(range, most);
        }

        ValueAxis axis(Ticks ticks, Font font, Theme theme) {
            return log ? Axes.log(range, ticks, font, theme) : Axes.even(range, ticks, font, theme);
        }

        private String named(Ticks ticks) {
            String shown = Typeset.unit(unit);
            if (ticks.factor() == 0) {
                return shown.isEmpty() ? name : name + ", " + shown;
            }
            return name + ", in " + Typeset.quantity(Typeset.power(ticks.factor()), unit);
        }
    }

    final View view;
    final Theme theme;
    final Rectangle2D plot;
    private final int width;
    private final int height;
    private final Font font;
    private final Scale across;
    private final Scale up;
    private final ValueAxis drawsAxis;
    private final ValueAxis valuesAxis;
    private final String drawsName;
    private final String valuesName;
    private final List<Legend.Placed> legend;

    Picture(View view, Theme theme, int width, int height, Scale across, Scale up, List<Legend.Entry> key) {
        this.view = view;
        this.theme = theme;
        this.width = Math.max(width, LEAST_WIDTH);
        this.height = Math.max(height, LEAST_HEIGHT);
        this.font = Typeface.sans(this.width < 560 ? 11 : 12);
        this.across = across;
        this.up = up;

        int line = font.getSize() + 8;
        int bottom = 2 * line + 6;
        int right = 16;
        var valueTicks = up.ticks(Math.max(2, (this.height - bottom - 2 * line) / (3 * line)));
        int left = 12
                + (int) Math.ceil(valueTicks.all().stream()
                        .mapToDouble(tick -> Typeface.width(font, tick.label()))
                        .max()
                        .orElse(0));
        int room = this.width - right - left;
        var drawTicks = across.ticks(Math.max(2, room / (across.log() ? 80 : 100)));
        this.valuesName = Typeface.fitted(font, up.named(valueTicks), this.width - 24);
        this.drawsName = across.named(drawTicks);
        this.legend = Legend.set(key, font, 12, 36 + Typeface.width(font, valuesName), this.width - right);
        int rows = legend.stream().mapToInt(Legend.Placed::row).max().orElse(0) + 1;
        int top = 8 + rows * line + 6;
        this.plot = new Rectangle2D.Double(left, top, room, Math.max(40, this.height - top - bottom));
        this.drawsAxis = across.axis(drawTicks, font, theme);
        this.valuesAxis = up.axis(valueTicks, font, theme);
    }

    /// Smaller sizes than the least ones are drawn at those, and cut.
    public static Picture of(Subject subject, View view, Theme theme, int width, int height) {
        return switch (subject) {
            case Settling settling -> new SettlingPicture(settling, view, theme, width, height);
            case Repeated repeated -> new RepeatedPicture(repeated, view, theme, width, height);
            case Outcomes outcomes -> new OutcomesPicture(outcomes, view, theme, width, height);
            case Weights weights -> new WeightsPicture(weights, view, theme, width, height);
            case ErrorDecay decay -> new ErrorDecayPicture(decay, view, theme, width, height);
        };
    }

    public final int width() {
        return width;
    }

    public final int height() {
        return height;
    }

    /// Range of draws that is shown.
    public final Range draws() {
        return across.range();
    }

    /// Range of values that is shown.
    public final Range values() {
        return up.range();
    }

    /// Where the marks stand, inside the axes.
    public final Rectangle2D plot() {
        return (Rectangle2D) plot.clone();
    }

    public final double xOf(double drawsAt) {
        return drawsAxis.valueToJava2D(drawsAt, plot, RectangleEdge.BOTTOM);
    }

    public final double yOf(double value) {
        return valuesAxis.valueToJava2D(value, plot, RectangleEdge.LEFT);
    }

    final double drawsAt(double x) {
        return drawsAxis.java2DToValue(x, plot, RectangleEdge.BOTTOM);
    }

    final double valueAt(double y) {
        return valuesAxis.java2DToValue(y, plot, RectangleEdge.LEFT);
    }

    /// What stands at a pixel; empty outside the plot.
    public final Optional<Reading> at(double x, double y) {
        return plot.contains(x, y) ? Optional.of(new Reading(drawsAt(x), valueAt(y), read(x))) : Optional.empty();
    }

    /// What each lane has there.
    abstract List<Reading.At> read(double x);

    abstract boolean isSensibleAcross(Range range);

    abstract boolean isSensibleUp(Range range);

    /// Below the grid.
    abstract void drawGround(Graphics2D g);

    abstract void drawMarks(Graphics2D g);

    /// Said inside the plot.
    abstract List<String> remarks();

    final OptionalInt nearest(List<Point> points, double x) {
        int low = 0;
        int high = points.size();
        while (low < high) {
            int middle = (low + high) >>> 1;
            if (xOf(points.get(middle).draws()) < x) {
                low = middle + 1;
            } else {
                high = middle;
            }
        }
        if (points.isEmpty()) {
            return OptionalInt.empty();
        }
        boolean before = low == points.size()
                || low > 0
                        && x - xOf(points.get(low - 1).draws())
                                < xOf(points.get(low).draws()) - x;
        return OptionalInt.of(before ? low - 1 : low);
    }

    /// Zoomed about a pixel, which keeps its values: `factor` .5 shows half of what is shown now. Over the labels of an
    /// axis only that axis is zoomed. At the limits of an axis it stays as it is.
    public final View zoomed(double x, double y, double factor) {
        boolean alongDraws = x >= plot.getMinX();
        boolean alongValues = y <= plot.getMaxY();
        double left = x - (x - plot.getMinX()) * factor;
        double right = x + (plot.getMaxX() - x) * factor;
        double top = y - (y - plot.getMinY()) * factor;
        double bottom = y + (plot.getMaxY() - y) * factor;
        return new View(
                alongDraws ? Optional.of(drawsBetween(left, right)) : view.draws(),
                alongValues ? Optional.of(valuesBetween(top, bottom)) : view.values(),
                view.logDraws());
    }

    /// Moved with the mouse: what stood at a pixel then stands `dx` further right and `dy` further down.
    public final View panned(double dx, double dy) {
        return new View(
                dx == 0 ? view.draws() : Optional.of(drawsBetween(plot.getMinX() - dx, plot.getMaxX() - dx)),
                dy == 0 ? view.values() : Optional.of(valuesBetween(plot.getMinY() - dy, plot.getMaxY() - dy)),
                view.logDraws());
    }

    private Range drawsBetween(double left, double right) {
        return stretch(drawsAt(left), drawsAt(right))
                .filter(this::isSensibleAcross)
                .orElse(across.range());
    }

    private Range valuesBetween(double top, double bottom) {
        return stretch(valueAt(bottom), valueAt(top)).filter(this::isSensibleUp).orElse(up.range());
    }

    private static Optional<Range> stretch(double low, double high) {
        return low < high && Double.isFinite(low) && Double.isFinite(high)
                ? Optional.of(new Range(low, high))
                : Optional.empty();
    }

    /// @param scale pixels of the image for one of the picture
    /// @return opaque, premultiplied
    public final BufferedImage image(double scale) {
        var image = new BufferedImage(
                (int) Math.round(width * scale), (int) Math.round(height * scale), BufferedImage.TYPE_INT_ARGB_PRE);
        var g = image.createGraphics();
        g.transform(AffineTransform.getScaleInstance(scale, scale));
        draw(g);
        g.dispose();
        return image;
    }

    /// Draws the whole picture, its ground too, at the origin.
    public final void draw(Graphics2D g) {
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.setColor(theme.ground());
        g.fill(new Rectangle2D.Double(0, 0, width, height));
        inPlot(g, this::drawGround);
        drawAxes(g);
        inPlot(g, this::drawMarks);
        drawNames(g);
        drawRemarks(g);
    }

    private void inPlot(Graphics2D g, Consumer<Graphics2D> drawing) {
        var clip = g.getClip();
        g.clip(new Rectangle2D.Double(plot.getX(), plot.getY(), plot.getWidth() + 1, plot.getHeight()));
        drawing.accept(g);
        g.setClip(clip);
    }

    /// A strip of the numerical tolerance, its edges drawn.
    final void strip(Graphics2D g, double top, double bottom) {
        g.setColor(theme.strip());
        g.fill(between(top, bottom));
        g.setColor(theme.stripEdge());
        g.setStroke(new BasicStroke(.8f));
        horizontal(g, top);
        horizontal(g, bottom);
    }

    final Rectangle2D between(double top, double bottom) {
        double from = Math.clamp(top, plot.getMinY() - 2, plot.getMaxY() + 2);
        double to = Math.clamp(bottom, plot.getMinY() - 2, plot.getMaxY() + 2);
        return new Rectangle2D.Double(plot.getMinX(), from, plot.getWidth(), to - from);
    }

    final void horizontal(Graphics2D g, double y) {
        if (plot.getMinY() <= y && y <= plot.getMaxY()) {
            g.draw(new Line2D.Double(plot.getMinX(), y, plot.getMaxX(), y));
        }
    }

    private void drawAxes(Graphics2D g) {
        var frame = new XYPlot(null, drawsAxis, valuesAxis, new XYLineAndShapeRenderer());
        frame.setBackgroundPaint(null);
        frame.setOutlineVisible(false);
        frame.setInsets(RectangleInsets.ZERO_INSETS);
        frame.setAxisOffset(RectangleInsets.ZERO_INSETS);
        frame.setDomainGridlinePaint(theme.grid());
        frame.setRangeGridlinePaint(theme.grid());
        frame.setDomainGridlineStroke(new BasicStroke(1));
        frame.setRangeGridlineStroke(new BasicStroke(1));
        frame.setFixedRangeAxisSpace(space(plot.getMinX(), width - plot.getMaxX(), 0, 0));
        frame.setFixedDomainAxisSpace(space(0, 0, plot.getMinY(), height - plot.getMaxY()));
        frame.draw(g, new Rectangle2D.Double(0, 0, width, height), null, null, null);
    }

    private static AxisSpace space(double left, double right, double top, double bottom) {
        var space = new AxisSpace();
        space.setLeft(left);
        space.setRight(right);
        space.setTop(top);
        space.setBottom(bottom);
        return space;
    }

    /// Of the coverage intervals of outcomes.
    static BasicStroke bracketStroke(boolean shortest) {
        return shortest
                ? new BasicStroke(2, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, new float[] {5, 3}, 0)
                : new BasicStroke(2);
    }

    final int fontSize() {
        return font.getSize();
    }

    static BasicStroke outerStroke() {
        return new BasicStroke(1, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, new float[] {1.5f, 2.5f}, 0);
    }

    static Color faint(Color c) {
        return new Color(c.getRed(), c.getGreen(), c.getBlue(), 170);
    }

    static BasicStroke dashDot() {
        return new BasicStroke(1.4f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, DASH_DOT, 0);
    }

    /// A lane in pixels.
    final class Trace {
        final LaneLook look;
        private final double[] x;
        private final List<Point> points;
        private final Rectangle2D sight =
                new Rectangle2D.Double(plot.getX() - 40, plot.getY() - 40, plot.getWidth() + 80, plot.getHeight() + 80);

        Trace(List<Point> points, LaneLook look) {
            this.points = points;
            this.look = look;
            this.x = points.stream().mapToDouble(p -> xOf(p.draws())).toArray();
        }

        private double[] pixels(ToDoubleFunction<Point> of) {
            return points.stream().mapToDouble(p -> yOf(of.applyAsDouble(p))).toArray();
        }

        void between(Graphics2D g, double share, ToDoubleFunction<Point> low, ToDoubleFunction<Point> high) {
            g.setColor(theme.band(look, share));
            g.fill(Trail.between(x, pixels(low), pixels(high)));
        }

        void edge(Graphics2D g, ToDoubleFunction<Point> of) {
            g.setColor(theme.of(look));
            g.setStroke(look.edge());
            g.draw(trail(of));
        }

        /// Fine dots, lighter than the edge of the interval inside.
        void outerEdge(Graphics2D g, ToDoubleFunction<Point> of) {
            g.setColor(faint(theme.of(look)));
            g.setStroke(outerStroke());
            g.draw(trail(of));
        }

        void line(Graphics2D g, ToDoubleFunction<Point> of) {
            g.setColor(theme.of(look));
            g.setStroke(look.line());
            g.draw(trail(of));
        }

        private Path2D trail(ToDoubleFunction<Point> of) {
            return Trail.line(x, pixels(of), sight);
        }

        /// About one in a hundred pixels, each lane at its own places, always at a mark and always at the last one.
        void markers(Graphics2D g, ToDoubleFunction<Point> of) {
            double next = plot.getMinX() + MARKER_APART * (look.ordinal() + .6) / LaneLook.values().length;
            for (int i = 0; i < x.length; i++) {
                boolean last = i == x.length - 1;
                if (last || x[i] >= next && x[x.length - 1] - x[i] > MARKER_APART / 3.0) {
                    double y = yOf(of.applyAsDouble(points.get(i)));
                    if (plot.getMinY() - MARKER <= y && y <= plot.getMaxY() + MARKER) {
                        marker(g, look, x[i], y);
                    }
                    next = Math.max(next + MARKER_APART, x[i] + MARKER_APART / 4.0);
                }
            }
        }
    }

    final void marker(Graphics2D g, LaneLook look, double x, double y) {
        var shape = AffineTransform.getTranslateInstance(x, y).createTransformedShape(look.marker(MARKER));
        g.setColor(theme.ground());
        g.setStroke(new BasicStroke(2.4f));
        g.draw(shape);
        g.setColor(theme.of(look));
        g.fill(shape);
    }

    private void drawNames(Graphics2D g) {
        g.setFont(font);
        g.setColor(theme.ink());
        int line = font.getSize() + 8;
        text(g, valuesName, 12, 8 + line - 6.0);
        text(g, drawsName, plot.getMaxX() - Typeface.width(font, drawsName), height - 9.0);
        for (var placed : legend) {
            double middle = 8 + (placed.row() + .5) * line;
            drawSample(g, placed, middle);
            g.setColor(theme.ink());
            text(g, placed.entry().text(), placed.textX(), middle + font.getSize() * .36);
        }
    }

    private static void text(Graphics2D g, String text, double x, double baseline) {
        g.drawString(text, (float) x, (float) baseline);
    }

    private void drawSample(Graphics2D g, Legend.Placed placed, double middle) {
        double from = placed.x();
        double to = from + Legend.SAMPLE;
        var box = new Rectangle2D.Double(from, middle - 6, Legend.SAMPLE, 12);
        switch (placed.entry().of()) {
            case Legend.Of.Lane(var look) -> {
                g.setColor(theme.band(look, 1));
                g.fill(box);
                g.setColor(theme.of(look));
                g.setStroke(look.edge());
                g.draw(new Line2D.Double(from, middle - 6, to, middle - 6));
                g.draw(new Line2D.Double(from, middle + 6, to, middle + 6));
                g.setStroke(look.line());
                g.draw(new Line2D.Double(from, middle, to, middle));
                marker(g, look, (from + to) / 2, middle);
            }
            case Legend.Of.Trail(var look) -> {
                g.setColor(theme.of(look));
                g.setStroke(look.line());
                g.draw(new Line2D.Double(from, middle, to, middle));
                marker(g, look, (from + to) / 2, middle);
            }
            case Legend.Of.Upright(var look, boolean marked) -> {
                double x = (from + to) / 2;
                g.setColor(theme.of(look));
                g.setStroke(new BasicStroke(2));
                g.draw(new Line2D.Double(x, middle - 6, x, middle + 6));
                if (marked) {
                    marker(g, look, x, middle - 4);
                }
            }
            case Legend.Of.Spread(var look) -> {
                g.setColor(theme.band(look, 1));
                g.fill(box);
                g.setColor(theme.of(look));
                g.setStroke(look.edge());
                g.draw(box);
            }
            case Legend.Of.Band(var look) -> {
                g.setColor(theme.band(look, .5));
                g.fill(box);
                g.setColor(faint(theme.of(look)));
                g.setStroke(outerStroke());
                g.draw(new Line2D.Double(from, middle - 6, to, middle - 6));
                g.draw(new Line2D.Double(from, middle + 6, to, middle + 6));
            }
            case Legend.Of.Place(var look) -> {
                double x = (from + to) / 2;
                g.setColor(theme.band(look, 2));
                g.fill(new Rectangle2D.Double(x - 7, middle - 7, 14, 14));
                g.setColor(theme.of(look));
                g.setStroke(look.line());
                g.draw(new Line2D.Double(x, middle - 7, x, middle + 7));
                marker(g, look, x, middle);
            }
            case Legend.Of.Bracket(boolean shortest) -> {
                g.setColor(theme.coverage());
                g.setStroke(bracketStroke(shortest));
                g.draw(new Line2D.Double(from, middle, to, middle));
                g.setStroke(new BasicStroke(2));
                g.draw(new Line2D.Double(from, middle - 5, from, middle + 5));
                g.draw(new Line2D.Double(to, middle - 5, to, middle + 5));
            }
            case Legend.Of.Below _ -> {
                g.setColor(theme.strip());
                g.fill(box);
                g.setColor(theme.stripEdge());
                g.setStroke(new BasicStroke(.8f));
                g.draw(new Line2D.Double(from, middle - 6, to, middle - 6));
            }
            case Legend.Of.ReferenceLine _ -> {
                g.setColor(theme.reference());
                g.setStroke(dashDot());
                g.draw(new Line2D.Double(from, middle, to, middle));
            }
            case Legend.Of.Strip _ -> {
                g.setColor(theme.strip());
                g.fill(box);
                g.setColor(theme.stripEdge());
                g.setStroke(new BasicStroke(.8f));
                g.draw(new Line2D.Double(from, middle - 6, to, middle - 6));
                g.draw(new Line2D.Double(from, middle + 6, to, middle + 6));
            }
            case Legend.Of.Remark _ -> {}
        }
    }

    private void drawRemarks(Graphics2D g) {
        g.setFont(font);
        double baseline = plot.getMinY() + font.getSize() + 8;
        for (var remark : remarks()) {
            String fitted = Typeface.fitted(font, remark, plot.getWidth() - 16);
            haloed(g, fitted, plot.getMinX() + 10, baseline);
            baseline += font.getSize() + 6;
        }
    }

    /// Readable over whatever is drawn there.
    private void haloed(Graphics2D g, String text, double x, double baseline) {
        var box = new Rectangle2D.Double(
                x - 4, baseline - font.getSize(), Typeface.width(font, text) + 8, font.getSize() + 5);
        var composite = g.getComposite();
        g.setComposite(AlphaComposite.SrcOver.derive(.85f));
        g.setColor(theme.ground());
        g.fill(box);
        g.setComposite(composite);
        g.setColor(theme.ink());
        text(g, text, x, baseline);
    }
}
