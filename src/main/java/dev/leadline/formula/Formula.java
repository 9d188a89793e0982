package dev.leadline.formula;

/// A checked formula.
///
/// @param text as written
/// @param canonical its tokens joined by one space, without comments: equal for formulas that differ in spacing only
public record Formula(String text, String canonical) {}
