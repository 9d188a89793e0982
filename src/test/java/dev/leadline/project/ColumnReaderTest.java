package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.DensityDraft.Column;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ColumnReaderTest {

    record Case(String name, Column column, String text, String expected) {
        @Override
        public String toString() {
            return name;
        }
    }

    static Stream<Case> cases() throws IOException {
        try (InputStream in = ColumnReaderTest.class.getResourceAsStream("/project/data.txt")) {
            String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
            return Arrays.stream(text.split("(?m)^== ")).skip(1).map(ColumnReaderTest::parsed);
        }
    }

    private static Case parsed(String block) {
        String[] parts = block.split("(?m)^--\n");
        String[] head = parts[0].split("\n", 2);
        String[] name = head[0].split(" \\| ");
        String text = head[1].replace('→', '\t').replace('⏎', '\r').replace('§', '\ufeff');
        return new Case(name[0], name.length == 1 ? new Column.Only() : column(name[1]), text, parts[1].strip());
    }

    private static Column column(String text) {
        return text.startsWith("\"")
                ? new Column.Named(text.substring(1, text.length() - 1))
                : new Column.At(Long.parseLong(text));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("cases")
    void readsOrRefuses(Case file) {
        String found;
        try {
            var column = read(file.text.getBytes(StandardCharsets.UTF_8), file.column);
            found = (column.header() + ": "
                            + column.values().stream().map(String::valueOf).collect(Collectors.joining(" "))
                            + "\n" + shown(column.notes().stream()))
                    .strip();
        } catch (Refusal refusal) {
            found = shown(refusal.problems().stream());
        }
        assertEquals(file.expected, found);
    }

    private static dev.leadline.model.DataColumn read(byte[] bytes, Column column) {
        return ColumnReader.read("waits.csv", bytes, column);
    }

    private static String shown(Stream<Problem> problems) {
        return problems.map(p -> "%s: %s / %s / %s"
                        .formatted(
                                p.place().path(),
                                p.primary(),
                                p.detail().orElse("-"),
                                p.hint().orElse("-")))
                .collect(Collectors.joining("\n"));
    }

    private static String refusalOf(byte[] bytes) {
        return assertThrows(Refusal.class, () -> read(bytes, new Column.Only()))
                .problems()
                .getFirst()
                .primary();
    }

    @Test
    void refusesWhatIsNotUtf8() {
        byte[] bytes = "hours\n3\n4 ?\n".getBytes(StandardCharsets.UTF_8);
        bytes[10] = (byte) 0xb5;
        assertEquals("waits.csv is not UTF-8 text (byte 10, line 3)", refusalOf(bytes));
        assertEquals(
                "waits.csv is not UTF-8 text (byte 0, line 1)",
                refusalOf("hours\n3\n".getBytes(StandardCharsets.UTF_16)));
    }

    @Test
    void takesAMillionRowsAndNoMore() {
        var most = read("1\n".repeat(1_000_000).getBytes(StandardCharsets.UTF_8), new Column.Only());
        assertEquals(1_000_000, most.values().size());
        assertEquals(
                "waits.csv has more than 1,000,000 rows",
                refusalOf("1\n".repeat(1_000_001).getBytes(StandardCharsets.UTF_8)));
    }

    @Test
    void takesNoEndlessLine() {
        assertEquals(
                "waits.csv has a line of more than 10,000 cells",
                refusalOf(("x\n" + ",".repeat(10_000)).getBytes(StandardCharsets.UTF_8)));
    }

    @Test
    void cannotSteerATerminal() {
        var refusal = assertThrows(
                Refusal.class, () -> read("a\u001b[31m,b\n1,2\n".getBytes(StandardCharsets.UTF_8), new Column.Only()));
        assertTrue(refusal.problems().stream().noneMatch(p -> p.toString().contains("\u001b")));
    }

    /// `printf 'hours\n3.5\n' | sha256sum`.
    @Test
    void tellsTheHashOfTheFile() {
        assertEquals(
                "06ad061e34fdb12efdc0d79b743061ff20a864c747acfd4c4c401229f5fe7aa8",
                read("hours\n3.5\n".getBytes(StandardCharsets.UTF_8), new Column.Only())
                        .hash());
    }
}
