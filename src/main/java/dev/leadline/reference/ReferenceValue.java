package dev.leadline.reference;

import dev.leadline.model.Question;
import dev.leadline.model.Reference;
import java.util.Optional;
import java.util.OptionalLong;

/// What the first answer is compared with, as far as it is known. Immutable.
public sealed interface ReferenceValue {

    /// @param error 0 where exact or not stated
    /// @param source where it comes from; empty where not stated
    /// @param evaluations behind a value found by quadrature; empty for others
    record Known(double value, double error, Kind kind, String source, OptionalLong evaluations)
            implements ReferenceValue {}

    /// Quadrature is not at its end.
    record Sought() implements ReferenceValue {}

    /// Quadrature found none.
    ///
    /// @param reason as "the integral does not seem to converge"
    record Unknown(String reason) implements ReferenceValue {}

    enum Kind {
        /// Its error is a standard uncertainty, or a bound.
        STATED("stated"),
        /// Its error is that of rounding.
        CLOSED_FORM("closed form"),
        /// Its error is a bound.
        QUADRATURE("quadrature");

        private final String word;

        Kind(String word) {
            this.word = word;
        }

        public String word() {
            return word;
        }
    }

    /// Relative error of a closed form where nothing cancels: some roundings.
    double ROUNDING = 0x1p-50;

    /// What is known before quadrature; empty where the question has no reference.
    static Optional<ReferenceValue> of(Question question) {
        return question.reference().map(reference -> switch (reference) {
            case Reference.Stated(double value, double error, var source) ->
                new Known(value, error, Kind.STATED, source, OptionalLong.empty());
            case Reference.ClosedForm(var formula, double value) ->
                new Known(value, ROUNDING * Math.abs(value), Kind.CLOSED_FORM, formula, OptionalLong.empty());
            case Reference.Quadrature _ -> new Sought();
        });
    }

    /// The value, where there is one.
    default Optional<Known> known() {
        return this instanceof Known known ? Optional.of(known) : Optional.empty();
    }
}
