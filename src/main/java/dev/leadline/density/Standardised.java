package dev.leadline.density;

/// A density as `location + scale * shape`.
///
/// @param scale negative where the shape is mirrored
/// @param shape equal shapes are equal objects (records), so that they serve as the key of a table
public record Standardised(Density shape, double location, double scale) {}
