package dev.leadline.chart;

import java.awt.Font;
import java.util.ArrayList;
import java.util.List;

/// Key to the picture, set in rows above the plot so that it never covers it. The first row shares its line with the
/// name of the values where both fit.
final class Legend {
    static final int SAMPLE = 34;
    private static final int GAP = 7;
    private static final int APART = 20;

    /// What an entry explains.
    sealed interface Of {
        record Lane(LaneLook look) implements Of {}

        record ReferenceLine() implements Of {}

        record Strip() implements Of {}

        /// Words only.
        record Remark() implements Of {}
    }

    record Entry(Of of, String text) {
        int sample() {
            return switch (of) {
                case Of.Remark _ -> 0;
                case Of.Lane _, Of.ReferenceLine _, Of.Strip _ -> SAMPLE + GAP;
            };
        }
    }

    /// An entry with its place: `x` of its left end, `row` counted from 0.
    record Placed(Entry entry, double x, int row) {
        double textX() {
            return x + entry.sample();
        }
    }

    private Legend() {}

    /// @param taken width that the name of the values takes in row 0
    static List<Placed> set(List<Entry> entries, Font font, double left, double right, double taken) {
        double all = entries.stream().mapToDouble(e -> width(e, font)).sum() + APART * (entries.size() - 1.0);
        boolean beside = taken + 2 * APART + all <= right - left;
        var placed = new ArrayList<Placed>();
        double x = beside ? right - all : left;
        int row = beside ? 0 : 1;
        for (var entry : entries) {
            if (x > left && x + width(entry, font) > right + .5) {
                x = left;
                row++;
            }
            var fitted = new Entry(entry.of(), Typeface.fitted(font, entry.text(), right - x - entry.sample() + .5));
            placed.add(new Placed(fitted, x, row));
            x += width(fitted, font) + APART;
        }
        return placed;
    }

    private static double width(Entry entry, Font font) {
        return entry.sample() + Typeface.width(font, entry.text());
    }
}
