package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/// What the README says of densities is what the program does.
class ReadmeTest {
    private static final Path DATA = Path.of("sample-projects", "waits.csv");

    @TempDir
    Path folder;

    private static String densities() throws IOException {
        String all = Files.readString(Path.of("README.md"));
        int from = all.indexOf("### What is known about an input");
        return all.substring(from, all.indexOf("\n## ", from));
    }

    @Test
    void everyDensityCanBeDrawnFrom() throws IOException {
        Files.copy(DATA, folder.resolve("waits.csv"));
        var lines = densities().lines().filter(line -> line.startsWith("{\"")).toList();
        assertTrue(lines.size() >= 8, lines.toString());
        for (String density : lines) {
            var project = Files.writeString(
                    folder.resolve("one.leadline"),
                    "{\"leadline\": 1, \"inputs\": [{\"name\": \"s\", \"density\": %s}], \"ask\": {\"mean\": \"s\"}}"
                            .formatted(density));
            var outcome = leadline("check", project);
            assertEquals(0, outcome.exitCode(), density + outcome.err());
        }
    }

    @Test
    void everyCommandOfFamiliesRuns() throws IOException {
        var commands = Pattern.compile("leadline (families[^`\n]*)")
                .matcher(densities())
                .results()
                .map((MatchResult found) -> found.group(1))
                .toList();
        assertTrue(commands.size() >= 4, commands.toString());
        for (String command : commands) {
            Object[] words = Arrays.stream(command.strip().split(" "))
                    .map(word -> word.equals("waits.csv") ? DATA.toString() : word)
                    .toArray();
            var outcome = leadline(words);
            assertEquals(0, outcome.exitCode(), command + outcome.err());
        }
    }

    /// The ways that are named in brackets are the beginnings of titles or words.
    @Test
    void everyWayThatIsNamedIsThere() throws IOException {
        String ways = leadline("families", "--known").out();
        String named = densities().replaceAll("(?s).*lists the ways \\(([^)]*?)[ \u2026]*\\).*", "$1");
        for (String way : named.split(", ")) {
            assertTrue(ways.contains(way.replaceFirst("^an? ", "")), way);
        }
    }
}
