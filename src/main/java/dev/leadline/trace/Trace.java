package dev.leadline.trace;

import java.util.List;
import java.util.Optional;

/// What a lane has shown so far. Immutable.
///
/// @param lane its name
/// @param scheme in words
/// @param marks oldest first; empty before the first item is in
/// @param failures the first 20
/// @param stopReason empty while the lane runs or pauses
public record Trace(String lane, String scheme, List<Mark> marks, List<Failure> failures, Optional<String> stopReason) {
    public Trace {
        failures = List.copyOf(failures);
    }

    public Optional<Mark> last() {
        return marks.isEmpty() ? Optional.empty() : Optional.of(marks.getLast());
    }

    public boolean finished() {
        return stopReason.isPresent();
    }
}
