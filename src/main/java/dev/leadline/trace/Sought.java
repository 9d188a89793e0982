package dev.leadline.trace;

/// The value that repetitions of a set-up are judged by.
///
/// @param error its standard uncertainty, 0 where exact
/// @param source where it is from
/// @param draws of a run made for it; 0 where it was known before
public record Sought(double value, double error, String source, long draws) {}
