package dev.leadline.scheme;

/// Where the points of an item of work lie in their lane.
///
/// @param item its index; growing points need no more
/// @param replicate from 0; always 0 for growing points
/// @param firstPoint index of its first point, in its replicate
public record Stretch(long item, int replicate, long firstPoint) {}
