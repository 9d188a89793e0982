package dev.leadline.project;

import dev.leadline.model.DataColumn;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/// Reads one column of a file of comma-separated values.
///
/// Rows are counted as a spreadsheet counts them, from 1, headers included.
public final class ColumnReader {

    static final int MOST_ROWS = 1_000_000;

    private static final int MOST_HEADERS_SHOWN = 8;

    private final String file;
    private final Column wanted;
    private final char separator;
    private final List<Problem> notes = new ArrayList<>();

    private ColumnReader(String file, Column wanted, char separator) {
        this.file = file;
        this.wanted = wanted;
        this.separator = separator;
    }

    /// @param file its name, for messages
    /// @throws Refusal with what is wrong, at `data` or `column`
    public static DataColumn read(String file, byte[] bytes, Column wanted) {
        String text = DataText.of(file, bytes);
        var reader = new ColumnReader(file, wanted, DataText.separator(text));
        return reader.read(text, Fingerprint.sha256(bytes));
    }

    private DataColumn read(String text, String hash) {
        var format = CSVFormat.DEFAULT
                .builder()
                .setDelimiter(separator)
                .setIgnoreEmptyLines(false)
                .get();
        try (var parser = format.parse(new StringReader(text))) {
            try {
                return column(parser.iterator(), hash);
            } catch (UncheckedIOException e) {
                throw DataFolder.refusal(Problem.of(String.format(
                                Locale.ROOT,
                                "the double quotes of %s do not match (line %,d)",
                                file,
                                parser.getCurrentLineNumber()))
                        .because("A cell in quotes ends at the next quote; a quote within it is written twice.")
                        .tryThis("Correct the quotes of that line or of one before it."));
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private DataColumn column(Iterator<CSVRecord> records, String hash) {
        if (!records.hasNext()) {
            throw DataFolder.refusal(Problem.of("%s is empty".formatted(file))
                    .because("A column of data has at least one number.")
                    .tryThis("See whether the data were saved."));
        }
        CSVRecord first = records.next();
        Optional<CSVRecord> second = records.hasNext() ? Optional.of(records.next()) : Optional.empty();
        int index = index(first);
        boolean headed = hasHeader(first, second, index);
        String header = headed ? first.get(index).strip() : "";
        var column = new Numbers(name(header, index), separator != ',');
        if (!headed) {
            column.take(first, index);
        }
        second.ifPresent(row -> take(column, row, index, first.size()));
        while (records.hasNext()) {
            take(column, records.next(), index, first.size());
        }
        return new DataColumn(
                header,
                column.values(file),
                Stream.concat(notes.stream(), column.notes(file)).toList(),
                hash);
    }

    private void take(Numbers column, CSVRecord row, int index, int columns) {
        if (row.getRecordNumber() > MOST_ROWS) {
            throw DataFolder.refusal(
                    Problem.of(String.format(Locale.ROOT, "%s has more than %,d rows", file, MOST_ROWS))
                            .because("So many are read at most.")
                            .tryThis("Take a part of the rows by chance, or fit a family to them."));
        }
        if (row.size() > columns) {
            throw DataFolder.refusal(Problem.of(String.format(
                            Locale.ROOT,
                            "row %,d of %s has %d cells but the first row has %d",
                            row.getRecordNumber(),
                            file,
                            row.size(),
                            columns))
                    .because("It cannot be told which of them belongs to the column.")
                    .tryThis(
                            separator == ','
                                    ? "Write numbers with a decimal point, or separate columns by semicolons."
                                    : "Put texts that hold the separator in double quotes."));
        }
        column.take(row, index);
    }

    /// Of the column, from 0.
    private int index(CSVRecord first) {
        return switch (wanted) {
            case Column.Only() -> {
                if (first.size() > 1) {
                    throw atColumn(Problem.of("%s has %d columns and none is named".formatted(file, first.size()))
                            .because(columns(first))
                            .tryThis("Add \"column\" with a header in double quotes, or its number from 1."));
                }
                yield 0;
            }
            case Column.At(long index) -> {
                if (index > first.size()) {
                    throw atColumn(Problem.of(String.format(
                                    Locale.ROOT, "column is %,d but %s has %d", index, file, first.size()))
                            .because(columns(first))
                            .tryThis("Columns are counted from 1."));
                }
                yield Math.toIntExact(index) - 1;
            }
            case Column.Named(String header) -> named(header, first);
        };
    }

    private int named(String header, CSVRecord first) {
        List<String> headers = first.stream().map(String::strip).toList();
        int[] found = IntStream.range(0, headers.size())
                .filter(i -> headers.get(i).equals(header.strip()))
                .toArray();
        if (found.length == 1) {
            return found[0];
        }
        String shown = Shown.quoted(header);
        if (found.length > 1) {
            throw atColumn(Problem.of("%s has %d columns %s".formatted(file, found.length, shown))
                    .because("It cannot be told which is meant.")
                    .tryThis("Give its number from 1, as %d.".formatted(found[0] + 1)));
        }
        Problem problem = Problem.of("%s has no column %s".formatted(file, shown));
        if (headers.stream().allMatch(cell -> Cell.of(cell, separator != ',') != Cell.TEXT)) {
            throw atColumn(problem.because("Its first row holds numbers, not headers.")
                    .tryThis("Give the number of the column from 1."));
        }
        throw atColumn(problem.because(columns(first))
                .tryThis(Nearest.to(header, headers)
                        .map(near -> "Was %s meant?".formatted(Shown.quoted(near)))
                        .orElse("Write a header of the first row, or the number of the column from 1.")));
    }

    /// A first row is headers where its cell in the column is a text, or where a text stands above a number.
    private boolean hasHeader(CSVRecord first, Optional<CSVRecord> second, int index) {
        if (wanted instanceof Column.Named || cell(first, index) == Cell.TEXT) {
            return true;
        }
        boolean textAboveNumber = second.isPresent()
                && IntStream.range(0, Math.min(first.size(), second.get().size()))
                        .anyMatch(i -> cell(first, i) == Cell.TEXT
                                && cell(second.get(), i).isNumber());
        boolean anyText = IntStream.range(0, first.size()).anyMatch(i -> cell(first, i) == Cell.TEXT);
        if (anyText && cell(first, index).isNumber()) {
            notes.add(Problem.of("%s in row 1 of %s is taken as a %s"
                            .formatted(Shown.quoted(first.get(index)), file, textAboveNumber ? "header" : "value"))
                    .because(
                            textAboveNumber
                                    ? "Another cell of that row is a text that stands above a number."
                                    : "No cell of that row is a text that stands above a number.")
                    .at(Place.of("data")));
        }
        return textAboveNumber;
    }

    private Cell cell(CSVRecord row, int index) {
        return Cell.of(row.get(index), separator != ',');
    }

    private String name(String header, int index) {
        return header.isEmpty() ? "column %d".formatted(index + 1) : "column %s".formatted(Shown.plain(header));
    }

    private static String columns(CSVRecord first) {
        String names = String.join(
                ", ",
                first.stream().limit(MOST_HEADERS_SHOWN).map(Shown::quoted).toList());
        return "Its first row is %s%s.".formatted(names, first.size() > MOST_HEADERS_SHOWN ? ", …" : "");
    }

    private static Refusal atColumn(Problem problem) {
        return new Refusal(problem.at(Place.of("column")));
    }
}
