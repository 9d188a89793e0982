package dev.leadline.model;

import dev.leadline.problem.Refusal;

/// A project after every check: the question and how it is to be run, beside the draft they came from.
public record Project(Draft draft, Question question, Plan plan) {
    /// @throws Refusal with every problem found, each at its JSON path in the draft
    public static Project of(Draft draft) {
        throw new UnsupportedOperationException();
    }
}
