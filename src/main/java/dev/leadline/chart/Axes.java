package dev.leadline.chart;

import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.geom.Rectangle2D;
import java.util.List;
import org.jfree.chart.axis.AxisState;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.NumberTick;
import org.jfree.chart.axis.TickType;
import org.jfree.chart.axis.ValueAxis;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.chart.ui.TextAnchor;

/// Axes of the charting library with our ticks and our look.
final class Axes {
    private Axes() {}

    static ValueAxis even(Range range, Ticks ticks, Font font, Theme theme) {
        return dressed(new Even(ticks), range, font, theme);
    }

    static ValueAxis log(Range range, Ticks ticks, Font font, Theme theme) {
        return dressed(new Log(ticks), range, font, theme);
    }

    private static ValueAxis dressed(ValueAxis axis, Range range, Font font, Theme theme) {
        axis.setRange(new org.jfree.data.Range(range.low(), range.high()), true, false);
        axis.setTickLabelFont(font);
        axis.setTickLabelPaint(theme.quiet());
        axis.setTickMarkPaint(theme.axis());
        axis.setAxisLinePaint(theme.axis());
        axis.setTickMarkOutsideLength(4);
        axis.setMinorTickMarkOutsideLength(2);
        axis.setMinorTickMarksVisible(true);
        return axis;
    }

    private static List<NumberTick> placed(Ticks ticks, RectangleEdge edge) {
        var anchor = edge == RectangleEdge.BOTTOM ? TextAnchor.TOP_CENTER : TextAnchor.CENTER_RIGHT;
        return ticks.all().stream()
                .map(tick -> new NumberTick(
                        tick.label().isEmpty() ? TickType.MINOR : TickType.MAJOR,
                        tick.value(),
                        tick.label(),
                        anchor,
                        TextAnchor.CENTER,
                        0))
                .toList();
    }

    private static final class Even extends NumberAxis {
        private static final long serialVersionUID = 1;
        private final transient Ticks ticks;

        Even(Ticks ticks) {
            this.ticks = ticks;
        }

        @Override
        public List<NumberTick> refreshTicks(Graphics2D g2, AxisState state, Rectangle2D area, RectangleEdge edge) {
            return placed(ticks, edge);
        }
    }

    private static final class Log extends LogAxis {
        private static final long serialVersionUID = 1;
        private final transient Ticks ticks;

        Log(Ticks ticks) {
            this.ticks = ticks;
        }

        @Override
        public List<NumberTick> refreshTicks(Graphics2D g2, AxisState state, Rectangle2D area, RectangleEdge edge) {
            return placed(ticks, edge);
        }
    }
}
