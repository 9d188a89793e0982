package dev.leadline.scheme;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Objects;
import java.util.stream.Stream;

/// The tables of this package: lines of text, those that start with `#` said of the others.
final class TextResource {
    private TextResource() {}

    /// The lines that hold numbers.
    static Stream<String> lines(String name) {
        try (var in = Objects.requireNonNull(TextResource.class.getResourceAsStream(name), name)) {
            return new String(in.readAllBytes(), StandardCharsets.US_ASCII)
                    .lines()
                    .filter(line -> !line.startsWith("#"));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
