package dev.leadline.project;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;

/// The projects of `project/refused.txt`, which says what is wrong with each.
public final class RefusedProjects {

    /// @param expected every problem, as `path | primary`; a primary of `~` is left to the package that words it
    public record Case(String name, String text, List<String> expected) {
        @Override
        public String toString() {
            return name;
        }
    }

    private static final String INPUT =
            "\"inputs\": [{\"name\": \"x\", \"density\": {\"family\": \"uniform\", \"from\": 0, \"to\": 1}}]";
    private static final String ASK = "\"ask\": {\"mean\": \"x\"}";

    private RefusedProjects() {}

    public static Stream<Case> all() {
        try (InputStream in = RefusedProjects.class.getResourceAsStream("/project/refused.txt")) {
            String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
            return Arrays.stream(text.split("(?m)^== ")).skip(1).map(RefusedProjects::parsed);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static Case parsed(String block) {
        String[] parts = block.split("(?m)^--\n");
        int end = parts[0].indexOf('\n');
        String text = parts[0].substring(end + 1).replace("INPUT", INPUT).replace("ASK", ASK);
        return new Case(
                parts[0].substring(0, end),
                text.endsWith("\n") ? text.substring(0, text.length() - 1) : text,
                parts[1].lines().toList());
    }
}
