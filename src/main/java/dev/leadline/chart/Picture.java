package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.numeric.Rounding;
import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
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

/// The *Settling* picture laid out for a size: it can be drawn, says what stands at a pixel, and answers to a mouse
/// with the next [View]. Pixels count from the top left and do not depend on the scale of an image.
///
/// Cost: layout and drawing of one lane with 1,534 marks at 1200 by 700 took a median of 11 ms of processor time
/// and 27 ms at most (40 runs after warm-up, one of two busy cores; `ShowPictures` in the tests measures it).
///
/// Confined to one thread at a time, because the axes of the charting library are; nothing in it changes after it was
/// made.
public final class Picture {
    /// Smallest size in which every label still has room.
    public static final int LEAST_WIDTH = 240;

    public static final int LEAST_HEIGHT = 160;

    private static final float[] DASH_DOT = {9, 3, 2, 3};
    private static final int MARKER_APART = 96;
    private static final double MARKER = 4;

    private final Settling settling;
    private final View view;
    private final Theme theme;
    private final int width;
    private final int height;
    private final Font font;
    private final Range draws;
    private final Range values;
    private final ValueAxis drawsAxis;
    private final ValueAxis valuesAxis;
    private final String drawsName;
    private final String valuesName;
    private final List<Legend.Placed> legend;
    private final Rectangle2D plot;

    private Picture(Settling settling, View view, Theme theme, int width, int height) {
        this.settling = settling;
        this.view = view;
        this.theme = theme;
        this.width = Math.max(width, LEAST_WIDTH);
        this.height = Math.max(height, LEAST_HEIGHT);
        this.font = Typeface.sans(this.width < 560 ? 11 : 12);
        this.draws = view.draws().orElseGet(() -> Framing.draws(settling, view.logDraws()));
        this.values = view.values().orElseGet(() -> Framing.values(settling));

        int line = font.getSize() + 8;
        int bottom = 2 * line + 6;
        int right = 16;
        var valueTicks = Ticks.even(values, Math.max(2, (this.height - bottom - 2 * line) / (3 * line)));
        int left = 12
                + (int) Math.ceil(valueTicks.all().stream()
                        .mapToDouble(tick -> Typeface.width(font, tick.label()))
                        .max()
                        .orElse(0));
        int room = this.width - right - left;
        var drawTicks = view.logDraws()
                ? Ticks.powers(draws, Math.max(2, room / 80))
                : Ticks.even(draws, Math.max(2, room / 100));
        this.valuesName = Typeface.fitted(
                font, named("estimate of " + settling.quantity(), valueTicks, settling.unit()), this.width - 24);
        this.drawsName = named("draws", drawTicks, "");
        this.legend = Legend.set(entries(), font, 12, 36 + Typeface.width(font, valuesName), this.width - right);
        int rows = legend.stream().mapToInt(Legend.Placed::row).max().orElse(0) + 1;
        int top = 8 + rows * line + 6;
        this.plot = new Rectangle2D.Double(left, top, room, Math.max(40, this.height - top - bottom));
        this.drawsAxis =
                view.logDraws() ? Axes.log(draws, drawTicks, font, theme) : Axes.even(draws, drawTicks, font, theme);
        this.valuesAxis = Axes.even(values, valueTicks, font, theme);
    }

    /// Smaller sizes than the least ones are drawn at those, and cut.
    public static Picture of(Settling settling, View view, Theme theme, int width, int height) {
        return new Picture(settling, view, theme, width, height);
    }

    public int width() {
        return width;
    }

    public int height() {
        return height;
    }

    /// Range of draws that is shown.
    public Range draws() {
        return draws;
    }

    /// Range of values that is shown.
    public Range values() {
        return values;
    }

    /// Where the marks stand, inside the axes.
    public Rectangle2D plot() {
        return (Rectangle2D) plot.clone();
    }

    public double xOf(double drawsAt) {
        return drawsAxis.valueToJava2D(drawsAt, plot, RectangleEdge.BOTTOM);
    }

    public double yOf(double value) {
        return valuesAxis.valueToJava2D(value, plot, RectangleEdge.LEFT);
    }

    private double drawsAt(double x) {
        return drawsAxis.java2DToValue(x, plot, RectangleEdge.BOTTOM);
    }

    private double valueAt(double y) {
        return valuesAxis.java2DToValue(y, plot, RectangleEdge.LEFT);
    }

    /// What stands at a pixel; empty outside the plot.
    public Optional<Reading> at(double x, double y) {
        if (!plot.contains(x, y)) {
            return Optional.empty();
        }
        var lanes = new ArrayList<Reading.At>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            var lane = settling.lanes().get(i);
            var look = LaneLook.values()[i];
            nearest(lane.points(), x).ifPresent(k -> {
                var point = lane.points().get(k);
                lanes.add(new Reading.At(lane.lane(), look, point, xOf(point.draws()), yOf(point.estimate())));
            });
        }
        return Optional.of(new Reading(drawsAt(x), valueAt(y), lanes));
    }

    private OptionalInt nearest(List<Point> points, double x) {
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
    public View zoomed(double x, double y, double factor) {
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
    public View panned(double dx, double dy) {
        return new View(
                dx == 0 ? view.draws() : Optional.of(drawsBetween(plot.getMinX() - dx, plot.getMaxX() - dx)),
                dy == 0 ? view.values() : Optional.of(valuesBetween(plot.getMinY() - dy, plot.getMaxY() - dy)),
                view.logDraws());
    }

    private Range drawsBetween(double left, double right) {
        double low = drawsAt(left);
        double high = drawsAt(right);
        double most = Framing.draws(settling, view.logDraws()).high();
        boolean sensible = view.logDraws()
                ? low >= .1 && high <= 30 * most && high >= 1.01 * low
                : low >= -most && high <= 3 * most && high - low >= 1 && high - low >= 1e-9 * high;
        return sensible ? new Range(low, high) : draws;
    }

    private Range valuesBetween(double top, double bottom) {
        double low = valueAt(bottom);
        double high = valueAt(top);
        var most = Framing.outermost(settling);
        boolean sensible = most.contains(low)
                && most.contains(high)
                && high - low >= Framing.LEAST
                && high - low >= 1e-11 * Math.max(Math.abs(low), Math.abs(high));
        return sensible ? new Range(low, high) : values;
    }

    /// @param scale pixels of the image for one of the picture
    /// @return opaque, premultiplied
    public BufferedImage image(double scale) {
        var image = new BufferedImage(
                (int) Math.round(width * scale), (int) Math.round(height * scale), BufferedImage.TYPE_INT_ARGB_PRE);
        var g = image.createGraphics();
        g.transform(AffineTransform.getScaleInstance(scale, scale));
        draw(g);
        g.dispose();
        return image;
    }

    /// Draws the whole picture, its ground too, at the origin.
    public void draw(Graphics2D g) {
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.setColor(theme.ground());
        g.fill(new Rectangle2D.Double(0, 0, width, height));
        inPlot(g, this::drawStrip);
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

    private void drawStrip(Graphics2D g) {
        settling.strip().ifPresent(strip -> {
            double top = yOf(strip.high());
            double bottom = yOf(strip.low());
            g.setColor(theme.strip());
            g.fill(between(top, bottom));
            g.setColor(theme.stripEdge());
            g.setStroke(new BasicStroke(.8f));
            horizontal(g, top);
            horizontal(g, bottom);
        });
    }

    private Rectangle2D between(double top, double bottom) {
        double from = Math.clamp(top, plot.getMinY() - 2, plot.getMaxY() + 2);
        double to = Math.clamp(bottom, plot.getMinY() - 2, plot.getMaxY() + 2);
        return new Rectangle2D.Double(plot.getMinX(), from, plot.getWidth(), to - from);
    }

    private void horizontal(Graphics2D g, double y) {
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

    private void drawMarks(Graphics2D g) {
        var lanes = new ArrayList<Drawn>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            lanes.add(new Drawn(settling.lanes().get(i), LaneLook.values()[i]));
        }
        lanes.forEach(lane -> lane.fill(g));
        drawReference(g);
        lanes.forEach(lane -> lane.edges(g));
        lanes.forEach(lane -> lane.line(g));
        lanes.forEach(lane -> lane.markers(g));
    }

    private void drawReference(Graphics2D g) {
        settling.reference().ifPresent(reference -> {
            if (reference.error() > 0) {
                g.setColor(theme.reference());
                var composite = g.getComposite();
                g.setComposite(AlphaComposite.SrcOver.derive(.18f));
                g.fill(between(yOf(reference.value() + reference.error()), yOf(reference.value() - reference.error())));
                g.setComposite(composite);
            }
            g.setColor(theme.reference());
            g.setStroke(dashDot());
            horizontal(g, yOf(reference.value()));
        });
    }

    private static BasicStroke dashDot() {
        return new BasicStroke(1.4f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, DASH_DOT, 0);
    }

    /// A lane in pixels.
    private final class Drawn {
        private final Series lane;
        private final LaneLook look;
        private final double[] x;

        /// Many bands over each other stay light.
        private final double share = settling.lanes().size() > 2 ? .6 : 1;

        private final Rectangle2D sight =
                new Rectangle2D.Double(plot.getX() - 40, plot.getY() - 40, plot.getWidth() + 80, plot.getHeight() + 80);

        Drawn(Series lane, LaneLook look) {
            this.lane = lane;
            this.look = look;
            this.x = pixels(p -> xOf(p.draws()));
        }

        private double[] pixels(ToDoubleFunction<Point> of) {
            return lane.points().stream().mapToDouble(of).toArray();
        }

        void fill(Graphics2D g) {
            g.setColor(theme.band(look, .5 * share));
            g.fill(Trail.between(x, pixels(p -> yOf(p.bandLow())), pixels(p -> yOf(p.bandHigh()))));
            g.setColor(theme.band(look, share));
            g.fill(Trail.between(x, pixels(p -> yOf(p.low())), pixels(p -> yOf(p.high()))));
        }

        void edges(Graphics2D g) {
            g.setColor(theme.of(look));
            g.setStroke(look.edge());
            g.draw(trail(pixels(p -> yOf(p.low()))));
            g.draw(trail(pixels(p -> yOf(p.high()))));
        }

        void line(Graphics2D g) {
            g.setColor(theme.of(look));
            g.setStroke(look.line());
            g.draw(trail(pixels(p -> yOf(p.estimate()))));
        }

        private Path2D trail(double[] y) {
            return Trail.line(x, y, sight);
        }

        /// About one in a hundred pixels, each lane at its own places, always at a mark and always at the last one.
        void markers(Graphics2D g) {
            double next = plot.getMinX() + MARKER_APART * (look.ordinal() + .6) / LaneLook.values().length;
            for (int i = 0; i < x.length; i++) {
                boolean last = i == x.length - 1;
                if (last || x[i] >= next && x[x.length - 1] - x[i] > MARKER_APART / 3.0) {
                    double y = yOf(lane.points().get(i).estimate());
                    if (plot.getMinY() - MARKER <= y && y <= plot.getMaxY() + MARKER) {
                        marker(g, look, x[i], y);
                    }
                    next = Math.max(next + MARKER_APART, x[i] + MARKER_APART / 4.0);
                }
            }
        }
    }

    private void marker(Graphics2D g, LaneLook look, double x, double y) {
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

    private List<Legend.Entry> entries() {
        var entries = new ArrayList<Legend.Entry>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            var lane = settling.lanes().get(i);
            entries.add(new Legend.Entry(new Legend.Of.Lane(LaneLook.values()[i]), lane.lane() + "  " + lane.scheme()));
        }
        if (!entries.isEmpty()) {
            entries.add(new Legend.Entry(new Legend.Of.Remark(), Interval.percent(settling.level()) + " intervals"));
        }
        settling.reference()
                .ifPresent(reference -> entries.add(new Legend.Entry(
                        new Legend.Of.ReferenceLine(),
                        "reference " + Typeset.number(reference.value(), 8) + whereabouts(reference.value()))));
        settling.strip()
                .flatMap(_ -> settling.tolerance())
                .ifPresent(asked -> entries.add(new Legend.Entry(
                        new Legend.Of.Strip(), "numerical tolerance " + Caption.of(asked, settling.unit()))));
        return entries;
    }

    private String whereabouts(double value) {
        return value > values.high() ? " (above the picture)" : value < values.low() ? " (below the picture)" : "";
    }

    private static String named(String name, Ticks ticks, String unit) {
        String shown = Typeset.unit(unit);
        if (ticks.factor() == 0) {
            return shown.isEmpty() ? name : name + ", " + shown;
        }
        return name + ", in " + Typeset.quantity(Typeset.power(ticks.factor()), unit);
    }

    private void drawRemarks(Graphics2D g) {
        var remarks = new ArrayList<String>();
        if (settling.lanes().stream().allMatch(lane -> lane.points().isEmpty())) {
            remarks.add("no draws yet");
        }
        for (var lane : settling.lanes()) {
            remark(lane).ifPresent(remarks::add);
            if (lane.nonFinite() > 0) {
                remarks.add("lane " + lane.lane() + ": over finite evaluations only, " + Typeset.count(lane.nonFinite())
                        + " left out");
            }
        }
        g.setFont(font);
        double baseline = plot.getMinY() + font.getSize() + 8;
        for (var remark : remarks) {
            String fitted = Typeface.fitted(font, remark, plot.getWidth() - 16);
            haloed(g, fitted, plot.getMinX() + 10, baseline);
            baseline += font.getSize() + 6;
        }
    }

    private Optional<String> remark(Series lane) {
        var last = lane.last();
        if (last.isEmpty()) {
            return Optional.empty();
        }
        var point = last.get();
        String name = "lane " + lane.lane() + ": ";
        if (lane.withoutHit()) {
            var limit = Double.isFinite(point.high())
                    ? ", so at most " + Typeset.quantity(Typeset.set(Rounding.atMost(point.high())), settling.unit())
                            + " (" + Interval.percent(settling.level()) + ")"
                    : "";
            return Optional.of(name + "no hit in " + Typeset.count(point.draws()) + " draws" + limit);
        }
        if (!Double.isFinite(point.estimate())) {
            return Optional.of(name + "no estimate yet");
        }
        if (!(Double.isFinite(point.low()) && Double.isFinite(point.high()))) {
            return Optional.of(name + "no interval yet");
        }
        return Optional.empty();
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
