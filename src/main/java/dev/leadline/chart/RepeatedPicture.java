package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.study.RehearsalText;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.util.List;
import java.util.function.ToDoubleFunction;

/// The *Rehearsal* picture: an upright stroke for each interval, those that miss the value in another colour
/// and with a mark at the end that is nearer to it.
final class RepeatedPicture extends Picture {
    private static final LaneLook HELD = LaneLook.FIRST;
    private static final LaneLook MISSED = LaneLook.SECOND;

    /// Part of the limits on either side that may lie beyond the picture.
    private static final double WILD = .005;

    /// Opacity of strokes that stand apart, and of those that cover each other.
    private static final double APART = .8;

    private static final double DENSE = .3;

    private final Repeated repeated;
    private final List<Repeated.Placed> placed;
    private final List<Point> points;

    RepeatedPicture(Repeated repeated, View view, Theme theme, int width, int height) {
        this(repeated, repeated.placed(), view, theme, width, height);
    }

    private RepeatedPicture(
            Repeated repeated, List<Repeated.Placed> placed, View view, Theme theme, int width, int height) {
        super(
                view,
                theme,
                width,
                height,
                new Scale(
                        view.draws().orElseGet(() -> ranks(placed)),
                        false,
                        "repetitions in the order of their intervals",
                        ""),
                new Scale(
                        view.values().orElseGet(() -> values(repeated, placed)),
                        false,
                        repeated.answer().ask().name(),
                        repeated.answer().ask().unit()),
                key(repeated));
        this.repeated = repeated;
        this.placed = placed;
        this.points = placed.stream().map(Repeated.Placed::point).toList();
    }

    private static List<Legend.Entry> key(Repeated repeated) {
        var answer = repeated.answer();
        int missed = answer.missedLow() + answer.missedHigh();
        return List.of(
                new Legend.Entry(new Legend.Of.Upright(HELD, false), "hold the value: " + Typeset.count(answer.held())),
                new Legend.Entry(
                        new Legend.Of.Upright(MISSED, true),
                        "miss it: %s (%s below it, %s above)"
                                .formatted(
                                        Typeset.count(missed),
                                        Typeset.count(answer.missedLow()),
                                        Typeset.count(answer.missedHigh()))),
                new Legend.Entry(new Legend.Of.ReferenceLine(), "value sought"));
    }

    private static Range ranks(List<Repeated.Placed> placed) {
        double most = Math.max(10, placed.size());
        return new Range(1 - .02 * most, 1.02 * most);
    }

    private static Range values(Repeated repeated, List<Repeated.Placed> placed) {
        double value = repeated.answer().sought().value();
        double low = Math.min(value, limit(placed, Point::low, WILD));
        double high = Math.max(value, limit(placed, Point::high, 1 - WILD));
        double pad = high > low ? .06 * (high - low) : Math.max(1e-300, Math.abs(value));
        return new Range(low - pad, high + pad);
    }

    /// Of the finite ones; 0 where there is none.
    private static double limit(List<Repeated.Placed> placed, ToDoubleFunction<Point> of, double part) {
        double[] limits = placed.stream()
                .map(Repeated.Placed::point)
                .mapToDouble(of)
                .filter(Double::isFinite)
                .sorted()
                .toArray();
        return limits.length == 0
                ? 0
                : limits[(int) Math.clamp(Math.round(part * limits.length), 0L, limits.length - 1L)];
    }

    @Override
    List<Reading.At> read(double x) {
        var nearest = nearest(points, x);
        if (nearest.isEmpty()) {
            return List.of();
        }
        var one = placed.get(nearest.getAsInt());
        var point = one.point();
        return List.of(new Reading.At(
                repeated.rehearsal().lane(),
                one.missed() ? MISSED : HELD,
                ReadingText.ofRepetition(one, repeated.answer().ask().unit()),
                point,
                xOf(point.draws()),
                yOf(point.estimate())));
    }

    @Override
    boolean isSensibleAcross(Range range) {
        var all = ranks(placed);
        return range.high() - range.low() >= 2
                && range.low() >= all.low() - all.high()
                && range.high() <= 2 * all.high();
    }

    @Override
    boolean isSensibleUp(Range range) {
        var all = values(repeated, placed);
        double length = all.high() - all.low();
        return range.high() - range.low() >= 1e-6 * length && range.high() - range.low() <= 1e4 * length;
    }

    @Override
    void drawGround(Graphics2D g) {
        var sought = repeated.answer().sought();
        if (sought.error() > 0) {
            g.setColor(new Color(
                    theme.reference().getRed(),
                    theme.reference().getGreen(),
                    theme.reference().getBlue(),
                    60));
            g.fill(between(yOf(sought.value() + sought.error()), yOf(sought.value() - sought.error())));
        }
    }

    @Override
    void drawMarks(Graphics2D g) {
        double apart = xOf(2) - xOf(1);
        var stroke =
                new BasicStroke((float) Math.clamp(.6 * apart, .6, 3), BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER);
        g.setStroke(stroke);
        var colour = theme.of(HELD);
        double opacity = apart >= 1.5 ? APART : DENSE;
        g.setColor(new Color(colour.getRed(), colour.getGreen(), colour.getBlue(), (int) Math.round(255 * opacity)));
        placed.stream().filter(one -> !one.missed()).forEach(one -> upright(g, one.point()));
        var missed = placed.stream().filter(Repeated.Placed::missed).toList();
        g.setColor(theme.of(MISSED));
        missed.forEach(one -> upright(g, one.point()));
        double value = repeated.answer().sought().value();
        missed.forEach(one -> end(g, one.point(), value));
        g.setColor(theme.reference());
        g.setStroke(dashDot());
        horizontal(g, yOf(value));
    }

    private void upright(Graphics2D g, Point point) {
        double top = Math.max(yOf(point.high()), plot.getMinY() - 2);
        double bottom = Math.min(yOf(point.low()), plot.getMaxY() + 2);
        if (top < bottom) {
            double x = xOf(point.draws());
            g.draw(new Line2D.Double(x, top, x, bottom));
        }
    }

    private void end(Graphics2D g, Point point, double value) {
        double y = yOf(point.high() < value ? point.high() : point.low());
        g.fill(AffineTransform.getTranslateInstance(xOf(point.draws()), y)
                .createTransformedShape(MISSED.marker(placed.size() > 400 ? MARKER / 2 : MARKER)));
    }

    @Override
    List<String> remarks() {
        var answer = repeated.answer();
        if (placed.isEmpty()) {
            return List.of("no interval yet");
        }
        String rate = "%s of %s intervals of %s hold the value; stated: %s"
                .formatted(
                        RehearsalText.rate(answer),
                        Typeset.count(answer.bounded()),
                        RehearsalText.draws(repeated.rehearsal()),
                        Interval.percent(answer.level()));
        return answer.unbounded() == 0
                ? List.of(rate)
                : List.of(
                        rate,
                        answer.unbounded() == 1
                                ? "1 repetition has no interval"
                                : Typeset.count(answer.unbounded()) + " repetitions have no interval");
    }
}
