package dev.leadline.formula;

/// A named intermediate formula.
///
/// @param comment what stands after `#`, by habit the unit; empty where nothing does
public record Step(String name, Formula formula, String comment) {}
