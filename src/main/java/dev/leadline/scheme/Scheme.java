package dev.leadline.scheme;

/// How a lane samples: a layout of points.
public record Scheme(Points points) {}
