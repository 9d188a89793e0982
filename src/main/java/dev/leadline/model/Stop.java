package dev.leadline.model;

import java.util.OptionalDouble;

/// When a lane stops.
///
/// @param draws evaluations at most
/// @param seconds of computing at most, empty for no limit
public record Stop(long draws, OptionalDouble seconds) {}
