package dev.leadline.chart;

import java.awt.Font;
import java.util.ArrayList;
import java.util.List;

/// Key to the picture, set in rows above the plot so that it never covers it, each flush right. The first row shares
/// its line with the name of the values.
final class Legend {
    static final int SAMPLE = 30;
    private static final int GAP = 7;
    private static final int APART = 18;

    /// What an entry explains.
    sealed interface Of {
        record Lane(LaneLook look) implements Of {}

        /// The line and marker of a lane, without a band.
        record Trail(LaneLook look) implements Of {}

        /// An interval on its own, with a mark at its end or without.
        record Upright(LaneLook look, boolean marked) implements Of {}

        /// The any-time band outside an interval.
        record Band(LaneLook look) implements Of {}

        /// How outcomes lie.
        record Spread(LaneLook look) implements Of {}

        /// Where an answer lies among outcomes, with its interval.
        record Place(LaneLook look) implements Of {}

        /// A coverage interval of outcomes.
        record Bracket(boolean shortest) implements Of {}

        record ReferenceLine() implements Of {}

        record Strip() implements Of {}

        /// What lies below a line.
        record Below() implements Of {}

        /// Words only.
        record Remark() implements Of {}
    }

    record Entry(Of of, String text) {
        int sample() {
            return switch (of) {
                case Of.Remark _ -> 0;
                case Of.Lane _,
                        Of.Trail _,
                        Of.Upright _,
                        Of.Band _,
                        Of.Spread _,
                        Of.Place _,
                        Of.Bracket _,
                        Of.ReferenceLine _,
                        Of.Strip _,
                        Of.Below _ -> SAMPLE + GAP;
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

    /// @param left end of every row but the first
    /// @param firstLeft where the first row may start
    static List<Placed> set(List<Entry> entries, Font font, double left, double firstLeft, double right) {
        var placed = new ArrayList<Placed>();
        var row = new ArrayList<Entry>();
        int rows = 0;
        double room = right - firstLeft;
        for (var entry : entries) {
            while (length(row, font) + (row.isEmpty() ? 0 : APART) + width(entry, font) > room
                    && !(row.isEmpty() && rows > 0)) {
                place(row, rows++, font, right, placed);
                row.clear();
                room = right - left;
            }
            row.add(fitted(entry, font, room));
        }
        place(row, rows, font, right, placed);
        return placed;
    }

    private static void place(List<Entry> row, int index, Font font, double right, List<Placed> placed) {
        double x = right - length(row, font);
        for (var entry : row) {
            placed.add(new Placed(entry, x, index));
            x += width(entry, font) + APART;
        }
    }

    private static Entry fitted(Entry entry, Font font, double room) {
        return new Entry(entry.of(), Typeface.fitted(font, entry.text(), room - entry.sample()));
    }

    private static double length(List<Entry> row, Font font) {
        return row.stream().mapToDouble(e -> width(e, font)).sum() + APART * Math.max(0, row.size() - 1);
    }

    private static double width(Entry entry, Font font) {
        return entry.sample() + Typeface.width(font, entry.text());
    }
}
