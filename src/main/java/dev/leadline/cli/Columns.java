package dev.leadline.cli;

import java.io.PrintWriter;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/// Rows of a name, a number and a remark, set in columns.
final class Columns {

    private static final int LONGEST_NAME = 40;
    private static final MathContext DIGITS = new MathContext(8);

    /// Whole numbers of so many digits are written out.
    private static final int WRITTEN_OUT = 12;

    private record Row(String name, String value, String remark) {}

    private final List<Row> rows = new ArrayList<>();

    void add(String name, double value, String remark) {
        String shown = name.length() > LONGEST_NAME ? name.substring(0, LONGEST_NAME - 1) + "…" : name;
        rows.add(new Row(shown, text(value), remark));
    }

    void print(PrintWriter out) {
        int names = rows.stream().mapToInt(row -> row.name.length()).max().orElse(0);
        int values = rows.stream().mapToInt(row -> row.value.length()).max().orElse(0);
        for (Row row : rows) {
            String line = "  " + row.name + " ".repeat(names - row.name.length()) + "  "
                    + " ".repeat(values - row.value.length()) + row.value + "  " + row.remark;
            out.println(line.stripTrailing());
        }
    }

    private static String text(double value) {
        if (!Double.isFinite(value)) {
            return String.valueOf(value);
        }
        BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
        return rounded.scale() < 0 && rounded.precision() - rounded.scale() <= WRITTEN_OUT
                ? rounded.toPlainString()
                : rounded.toString().replace("E+", "e").replace("E", "e");
    }
}
