package dev.leadline.problem;

import java.util.Optional;

/// Where a person can go and change what is wrong: a JSON path of the project (RFC 9535, `$.steps[1]`; empty when the
/// text stands alone), and the stretch of the text there.
public record Place(String path, Optional<Span> span) {
    public static final Place NOWHERE = new Place("", Optional.empty());

    public static Place of(String path) {
        return new Place(path, Optional.empty());
    }

    public static Place of(Span span) {
        return new Place("", Optional.of(span));
    }

    /// The same stretch, in the text that stands at `path`.
    public Place in(String newPath) {
        return new Place(newPath, span);
    }
}
