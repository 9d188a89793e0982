package dev.leadline.model;

import java.util.OptionalDouble;

/// The numerical tolerance: how far the half-width of the first answer may reach.
///
/// @param both true where absolute and relative must both be met, false where either will do
public record Tolerance(OptionalDouble absolute, OptionalDouble relative, boolean both) {}
