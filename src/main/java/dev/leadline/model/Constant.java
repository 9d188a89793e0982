package dev.leadline.model;

/// A named number with its unit and source.
public record Constant(String name, double value, String unit, String label, String source) {}
