package dev.leadline.scheme;

/// A control variate: a formula of the inputs whose mean is known.
///
/// @param formula its text, as written
/// @param mean its expected value under the inputs' own densities
/// @param error bound of the error of the mean, 0 where it is exact
public record Control(String formula, double mean, double error) {}
