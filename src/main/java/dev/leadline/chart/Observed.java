package dev.leadline.chart;

import dev.leadline.density.Portrait.Bar;
import dev.leadline.density.Support;
import java.util.ArrayList;
import java.util.List;

/// Data that a density comes from, or is compared with; often none.
///
/// @param values in ascending order
public record Observed(List<Double> values) {
    public static final Observed NONE = new Observed(List.of());

    private static final int MOST_CLASSES = 40;

    public Observed {
        values = values.stream().sorted().toList();
    }

    /// Classes of equal width over a stretch, about as many as twice the cube root of the number of values; what lies
    /// beyond counts for the height of the rest.
    List<Bar> histogram(Support over) {
        int n = values.size();
        if (n < 5) {
            return List.of();
        }
        int classes = (int) Math.clamp(Math.ceil(2 * StrictMath.cbrt(n)), 4, MOST_CLASSES);
        double from = Math.max(over.low(), values.getFirst());
        double to = Math.min(over.high(), values.getLast());
        if (!(from < to)) {
            return List.of();
        }
        double width = (to - from) / classes;
        var counts = new int[classes];
        for (double value : values) {
            if (value >= from && value <= to) {
                counts[Math.min(classes - 1, (int) ((value - from) / width))]++;
            }
        }
        var bars = new ArrayList<Bar>();
        for (int i = 0; i < classes; i++) {
            bars.add(new Bar(from + i * width, from + (i + 1) * width, counts[i] / (double) n));
        }
        return bars;
    }
}
