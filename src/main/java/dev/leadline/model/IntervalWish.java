package dev.leadline.model;

import dev.leadline.interval.Bounds;
import dev.leadline.interval.IntervalKind;
import java.util.Optional;

/// Which interval a question wants.
///
/// @param bounds of the outcomes, which bounded kinds need
public record IntervalWish(IntervalKind kind, Optional<Bounds> bounds) {
    public static final IntervalWish AUTO = new IntervalWish(IntervalKind.AUTO, Optional.empty());
}
