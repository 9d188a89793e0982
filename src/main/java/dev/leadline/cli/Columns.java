package dev.leadline.cli;

import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.List;

/// Rows of a name, a value and a remark, set in columns.
final class Columns {

    private static final int LONGEST_NAME = 40;

    private record Row(String name, String value, String remark) {}

    private final List<Row> rows = new ArrayList<>();

    void add(String name, String value, String remark) {
        String shown = name.length() > LONGEST_NAME ? name.substring(0, LONGEST_NAME - 1) + "…" : name;
        rows.add(new Row(shown, value, remark));
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
}
