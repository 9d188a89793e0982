package dev.leadline.problem;

import java.util.Optional;

/// What is wrong, in words for a person.
///
/// @param primary one line, no full stop: what is wrong and the value that is wrong
/// @param detail why it matters, or what was expected
/// @param hint what to try next; empty when there is nothing sensible to try
/// @param place where the person can go and change it
public record Problem(String primary, Optional<String> detail, Optional<String> hint, Place place) {
    public static Problem of(String primary) {
        return new Problem(primary, Optional.empty(), Optional.empty(), Place.NOWHERE);
    }

    public Problem because(String newDetail) {
        return new Problem(primary, Optional.of(newDetail), hint, place);
    }

    public Problem tryThis(String newHint) {
        return new Problem(primary, detail, Optional.of(newHint), place);
    }

    public Problem at(Place newPlace) {
        return new Problem(primary, detail, hint, newPlace);
    }

    /// The same problem, in the text or field that stands at `path`.
    public Problem in(String path) {
        return at(place.in(path));
    }
}
