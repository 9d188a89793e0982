package dev.leadline.formula;

/// A function that formulas may call.
///
/// @param least number of values it takes at least
/// @param most number of values it takes at most; [Integer#MAX_VALUE] where there is no limit
/// @param form how it is written, as `atan2(y, x)`
/// @param meaning one line, in the field's words
public record Function(String name, int least, int most, String form, String meaning) {}
