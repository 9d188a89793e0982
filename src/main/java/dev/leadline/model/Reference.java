package dev.leadline.model;

/// A value to compare the first answer with.
///
/// @param error its standard uncertainty or bound, 0 where exact or not stated
public record Reference(double value, double error, String source) {}
