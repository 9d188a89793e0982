package dev.leadline.desktop.stage;

import dev.leadline.chart.Point;
import dev.leadline.chart.Reading;
import dev.leadline.desktop.style.Figures;
import dev.leadline.interval.Interval;
import dev.leadline.numeric.Rounding;
import java.util.stream.Collectors;

/// What the mouse reads in a picture, in one line.
final class ReadingText {
    private ReadingText() {}

    /// As `A: 1.3e-5 ± .7e-5 after 1,120,000 draws`.
    static String of(Reading reading, String unit) {
        return reading.lanes().stream()
                .map(at -> at.lane() + ": " + of(at.point(), unit))
                .collect(Collectors.joining("    "));
    }

    private static String of(Point p, String unit) {
        String after = " after " + Figures.count(p.draws()) + " draws";
        String in = unit.isEmpty() ? "" : " " + unit;
        double half = (p.high() - p.low()) / 2;
        if (!Double.isFinite(p.estimate())) {
            return "no estimate yet" + after;
        }
        if (!(half > 0)) {
            return Figures.number(p.estimate()) + in + after;
        }
        var text = Rounding.of(p.estimate(), half);
        if (Interval.lopsided(p.estimate(), p.low(), p.high())) {
            return text.value() + in + ", between " + text.down(p.low()) + " and " + text.up(p.high()) + after;
        }
        return text.value() + " \u00b1 " + text.uncertainty().orElse("") + in + after;
    }
}
