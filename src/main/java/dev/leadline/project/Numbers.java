package dev.leadline.project;

import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVRecord;

/// The numbers of a column as they are read, and the cells that hold none. Confined to one reading.
final class Numbers {

    private static final int MOST_SHOWN = 5;

    private final String name;
    private final boolean comma;
    private final List<Double> values = new ArrayList<>();
    private final Rows missing = new Rows();
    private final Rows wrong = new Rows();
    private final Rows points = new Rows();
    private final Rows commas = new Rows();

    /// Rows of one kind: how many, and what the first of them hold.
    private static final class Rows {
        private final List<String> cells = new ArrayList<>();
        private final List<Long> numbers = new ArrayList<>();
        private long count;

        void add(CSVRecord row, String cell) {
            count++;
            if (cells.size() < MOST_SHOWN) {
                cells.add(cell);
                numbers.add(row.getRecordNumber());
            }
        }

        /// As `rows 4, 9 and 3 more`.
        String rows() {
            return (count == 1 ? "row " : "rows ")
                    + listed(numbers.stream()
                            .map(n -> String.format(Locale.ROOT, "%,d", n))
                            .toList());
        }

        /// As `"3 h" in row 4, "x" in row 9 and 3 more`.
        String contents() {
            List<String> all = new ArrayList<>();
            for (int i = 0; i < cells.size(); i++) {
                all.add(String.format(Locale.ROOT, "%s in row %,d", Shown.quoted(cells.get(i)), numbers.get(i)));
            }
            return listed(all);
        }

        private String listed(List<String> all) {
            if (count > all.size()) {
                return String.format(Locale.ROOT, "%s and %,d more", String.join(", ", all), count - all.size());
            }
            return all.size() == 1
                    ? all.getFirst()
                    : String.join(", ", all.subList(0, all.size() - 1)) + " and " + all.getLast();
        }
    }

    /// @param name in words, as `column hours`
    /// @param comma whether a decimal comma is read
    Numbers(String name, boolean comma) {
        this.name = name;
        this.comma = comma;
    }

    /// The cell of one row; a row that ends before it has none.
    void take(CSVRecord row, int index) {
        String text = index < row.size() ? row.get(index).strip() : "";
        var cell = Cell.of(text, comma);
        switch (cell) {
            case WHOLE, POINT, COMMA -> values.add(Cell.value(text));
            case MISSING -> missing.add(row, text);
            case ENDLESS, TEXT -> wrong.add(row, text);
        }
        if (cell == Cell.POINT) {
            points.add(row, text);
        } else if (cell == Cell.COMMA) {
            commas.add(row, text);
        }
    }

    List<Double> values(String file) {
        if (wrong.count > 0) {
            boolean one = wrong.count == 1;
            throw DataFolder.refusal(Problem.of(String.format(
                            Locale.ROOT,
                            "%s of %s has %s: %s",
                            name,
                            file,
                            one ? "a cell that is no number" : "%,d cells that are no numbers".formatted(wrong.count),
                            wrong.contents()))
                    .because("Draws are taken from the numbers of the column.")
                    .tryThis(hint(wrong.cells.getFirst())));
        }
        if (points.count > 0 && commas.count > 0) {
            throw DataFolder.refusal(Problem.of("%s of %s has decimal points and decimal commas".formatted(name, file))
                    .because("%s, but %s; one of them may separate thousands.".formatted(first(points), first(commas)))
                    .tryThis("Write all numbers one way, without separators of thousands."));
        }
        if (values.isEmpty()) {
            throw DataFolder.refusal(Problem.of("%s of %s holds no numbers".formatted(name, file))
                    .because("An input from data draws from at least one.")
                    .tryThis("See whether another column was meant."));
        }
        return values;
    }

    private static String first(Rows rows) {
        return "%s stands in row %d".formatted(Shown.quoted(rows.cells.getFirst()), rows.numbers.getFirst());
    }

    private String hint(String cell) {
        if (Cell.of(cell, comma) == Cell.ENDLESS) {
            return "Leave a cell empty where nothing was measured; such rows are left out and counted.";
        }
        if (Cell.of(cell, true) == Cell.COMMA) {
            return "A decimal comma is read where columns are separated by semicolons or tabs; else write a point.";
        }
        if (cell.matches("[+-]?\\d{1,3}(?:[., '\u00a0\u202f]\\d{3})+(?:[.,]\\d+)?")) {
            return "Write numbers without separators of thousands.";
        }
        if (cell.matches("[+-]?[\\d.,]+\\s*[^\\d\\s].*")) {
            return "Write the number alone; its unit is said by the input.";
        }
        return "Correct these cells, or empty them: rows without a number are left out and counted.";
    }

    Stream<Problem> notes(String file) {
        var notes = new ArrayList<Problem>();
        if (missing.count > 0) {
            notes.add(Problem.of(String.format(Locale.ROOT, "%s of %s has no number in %s", name, file, missing.rows()))
                    .because(String.format(
                            Locale.ROOT,
                            "%s left out; %,d %s.",
                            missing.count == 1 ? "That row is" : "These rows are",
                            values.size(),
                            values.size() == 1 ? "value remains" : "values remain")));
        }
        if (commas.count > 0) {
            notes.add(Problem.of("the commas in %s of %s are read as decimal commas".formatted(name, file))
                    .because("%s is %s."
                            .formatted(Shown.quoted(commas.cells.getFirst()), Cell.value(commas.cells.getFirst()))));
        }
        return notes.stream().map(note -> note.at(Place.of("data")));
    }
}
