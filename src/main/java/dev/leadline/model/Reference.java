package dev.leadline.model;

/// What the first answer is compared with, as far as a question says it.
public sealed interface Reference {

    /// A value known from elsewhere.
    ///
    /// @param error its standard uncertainty or bound, 0 where exact or not stated
    record Stated(double value, double error, String source) implements Reference {}

    /// The value of a closed form over constants.
    record ClosedForm(String formula, double value) implements Reference {}

    /// What quadrature will find.
    record Quadrature() implements Reference {}
}
