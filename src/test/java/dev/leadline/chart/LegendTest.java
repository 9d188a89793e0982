package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class LegendTest {
    private static final List<Legend.Entry> ENTRIES = List.of(
            new Legend.Entry(new Legend.Of.Lane(LaneLook.FIRST), "A  independent"),
            new Legend.Entry(new Legend.Of.Lane(LaneLook.SECOND), "B  scrambled Sobol', 16 replicates"),
            new Legend.Entry(new Legend.Of.Remark(), "95 % intervals"),
            new Legend.Entry(
                    new Legend.Of.Lane(LaneLook.THIRD),
                    "C  a scheme whose settings take more words than any picture of a sensible width has room for at all"),
            new Legend.Entry(new Legend.Of.ReferenceLine(), "reference 1.2568×10⁻⁵"),
            new Legend.Entry(new Legend.Of.Strip(), "numerical tolerance ±10 %"));

    /// Also where the name of the values leaves no room in the first row.
    @ParameterizedTest(name = "{0} pixels wide")
    @ValueSource(ints = {240, 420, 700, 900, 1200, 2400})
    void entriesNeitherOverlapNorLeaveTheirRow(int width) {
        var font = Typeface.sans(12);
        for (double firstLeft : new double[] {12, 200, width + 50.0}) {
            var placed = Legend.set(ENTRIES, font, 12, firstLeft, width - 16.0);
            assertEquals(ENTRIES.size(), placed.size());
            int row = 0;
            double free = firstLeft;
            for (var entry : placed) {
                if (entry.row() > row) {
                    row = entry.row();
                    free = 12;
                }
                double end = entry.textX() + Typeface.width(font, entry.entry().text());
                assertTrue(entry.row() == row && entry.x() >= free - .01 && end <= width - 15.99, entry.toString());
                free = end + 10;
            }
        }
    }
}
