package dev.leadline.interval;

/// Between what every outcome lies, as the question states it.
public record Bounds(double low, double high) {}
