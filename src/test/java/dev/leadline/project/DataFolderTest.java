package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.leadline.model.DataFiles;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DataFolderTest {

    private static final Column ONLY = new Column.Only();

    @TempDir
    Path machine;

    private Path folder;
    private DataFiles files;

    @BeforeEach
    void aProject() throws IOException {
        folder = Files.createDirectories(machine.resolve("berth"));
        Files.createDirectories(folder.resolve("winter"));
        Files.createDirectories(machine.resolve("elsewhere"));
        Files.writeString(folder.resolve("waits.csv"), "3\n4\n");
        Files.writeString(folder.resolve("winter/waits.csv"), "5\n");
        Files.writeString(machine.resolve("elsewhere/secret.csv"), "6\n");
        files = DataFolder.beside(folder.resolve("berth.leadline"));
    }

    private List<Double> values(String file) {
        return files.column(file, ONLY).values();
    }

    private Problem refused(String file) {
        return assertThrows(Refusal.class, () -> files.column(file, ONLY), file)
                .problems()
                .getFirst();
    }

    private void refuses(String file, String primary, String hint) {
        var problem = refused(file);
        assertEquals("data", problem.place().path());
        assertEquals(primary, problem.primary());
        assertEquals(hint, problem.hint().orElseThrow());
    }

    @Test
    void readsBelowTheFolder() throws IOException {
        assertEquals(List.of(3.0, 4.0), values("waits.csv"));
        assertEquals(List.of(5.0), values("winter/waits.csv"));
        Files.createSymbolicLink(folder.resolve("latest.csv"), Path.of("winter/waits.csv"));
        assertEquals(List.of(5.0), values("latest.csv"));
    }

    @Test
    void staysBelowTheFolder() throws IOException {
        Files.createSymbolicLink(folder.resolve("out.csv"), machine.resolve("elsewhere/secret.csv"));
        Files.createSymbolicLink(folder.resolve("out"), machine.resolve("elsewhere"));
        Files.createSymbolicLink(folder.resolve("winter/twice.csv"), Path.of("../out.csv"));
        String hint = "Copy the file beside the project and name it alone.";
        for (String file : List.of(
                "../elsewhere/secret.csv",
                "winter/../../elsewhere/secret.csv",
                "winter/../waits.csv",
                machine.resolve("elsewhere/secret.csv").toString(),
                folder.resolve("waits.csv").toString(),
                "C:/secret.csv",
                "out.csv",
                "winter/twice.csv",
                "out/secret.csv",
                "out/secret")) {
            refuses(
                    file,
                    "the data file %s may lie outside the folder of the project".formatted(Shown.plain(file)),
                    hint);
        }
    }

    /// A whole folder may be a link, and then what it leads to is the folder.
    @Test
    void mayItselfBeALink() throws IOException {
        Path link = Files.createSymbolicLink(machine.resolve("link"), folder);
        assertEquals(
                List.of(3.0, 4.0),
                DataFolder.beside(link.resolve("berth.leadline"))
                        .column("waits.csv", ONLY)
                        .values());
    }

    @Test
    void refusesWhatIsNoFile() {
        refuses("wiats.csv", "there is no data file wiats.csv", "Was waits.csv meant?");
        refuses("winter/Waits.csv", "there is no data file winter/Waits.csv", "Was winter/waits.csv meant?");
        refuses("wintre/waits.csv", "there is no data file wintre/waits.csv", "Was winter/waits.csv meant?");
        refuses("tides.csv", "there is no data file tides.csv", OTHERWISE);
        refuses("winter", "there is a folder at winter, not a file", "Name a file in it, as winter/waits.csv.");
        refuses(".", "there is a folder at ., not a file", "Name a file in it, as ./waits.csv.");
        refuses(
                "winter\\waits.csv",
                "the name \"winter\\waits.csv\" of the data file has a backslash",
                "Write folder/file with a slash.");
        refuses(" ", "the data file has no name", "Write the name of a file that lies beside the project.");
        refuses(
                "a\0b",
                "\"a\\u0000b\" cannot be the name of a file",
                "Write the name of a file that lies beside the project.");
    }

    private static final String OTHERWISE = "Put the file beside the project, or write its name as it is there.";

    @Test
    void refusesWhatIsTooLarge() throws IOException {
        try (var large = new RandomAccessFile(folder.resolve("large.csv").toFile(), "rw")) {
            large.setLength(DataFolder.MOST_BYTES + 1L);
        }
        refuses("large.csv", "large.csv has more than 52,428,800 bytes", "Keep the one column that is needed.");
    }

    @Test
    void hasNoFolderBeforeTheProjectIsSaved() {
        files = DataFiles.NONE;
        assertEquals(
                "the data file \"waits.csv\" has no folder to be found in",
                refused("waits.csv").primary());
    }

    @Test
    void readsAgainWhatHasChanged() throws IOException {
        var first = files.column("waits.csv", ONLY);
        assertSame(first, files.column("waits.csv", ONLY));
        Path file = folder.resolve("waits.csv");
        Files.writeString(file, "7\n8\n");
        Files.setLastModifiedTime(
                file, FileTime.fromMillis(Files.getLastModifiedTime(file).toMillis() + 10));
        var second = files.column("waits.csv", ONLY);
        assertEquals(List.of(7.0, 8.0), second.values());
        assertNotEquals(first.hash(), second.hash());
    }

    @Test
    void forgetsWhatIsOldest() {
        var first = files.column("waits.csv", ONLY);
        for (int i = 1; i <= 8; i++) {
            var at = new Column.At(i);
            if (i == 1) {
                files.column("waits.csv", at);
            } else {
                assertThrows(Refusal.class, () -> files.column("waits.csv", at));
            }
        }
        var again = files.column("waits.csv", ONLY);
        assertNotEquals(System.identityHashCode(first), System.identityHashCode(again));
    }
}
