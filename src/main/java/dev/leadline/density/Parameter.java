package dev.leadline.density;

/// A parameter of a family.
///
/// @param name as in the project file
/// @param rule what it must be, in words, as `greater than 0`
/// @param optional whether it may be left out
/// @param use what it means, in a few words
public record Parameter(String name, String rule, boolean optional, String use) {}
