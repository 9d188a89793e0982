package dev.leadline.model;

import dev.leadline.formula.Working;
import java.util.List;
import java.util.Optional;

/// What is asked: answers wanted, formulas, inputs, reference, tolerance. Checked and immutable.
///
/// @param working the compiled formulas; its columns are `inputs`, its components those of `asks` in order
/// @param reference of the first answer
/// @param tolerance on the first answer
public record Question(
        String title,
        String notes,
        boolean safety,
        List<Constant> constants,
        List<Input> inputs,
        Optional<Dependence> dependence,
        Working working,
        List<Ask> asks,
        Optional<Reference> reference,
        double confidence,
        Optional<Tolerance> tolerance,
        IntervalWish interval) {
    public Question {
        constants = List.copyOf(constants);
        inputs = List.copyOf(inputs);
        asks = List.copyOf(asks);
    }

    /// The same question to another tolerance.
    public Question to(Tolerance other) {
        return new Question(
                title,
                notes,
                safety,
                constants,
                inputs,
                dependence,
                working,
                asks,
                reference,
                confidence,
                Optional.of(other),
                interval);
    }

    /// Of each interval and band, so that those of K answers hold together: `1 - (1 - confidence) / K` (Bonferroni).
    public double level() {
        return asks.size() == 1 ? confidence : 1 - (1 - confidence) / asks.size();
    }
}
