package dev.leadline.model;

import java.util.OptionalDouble;

/// When a lane stops: at whichever comes first.
///
/// @param draws evaluations at most
/// @param seconds of computing at most, empty for no limit
public record Stop(long draws, OptionalDouble seconds) {
    /// The rule of a project that names none.
    public static final String FIXED = "fixed";

    /// Where a project says nothing.
    public static final long USUAL_DRAWS = 1_000_000;

    /// Beyond this, a year of computing on a hundred cores.
    public static final long MOST_DRAWS = 10_000_000_000_000L;
}
