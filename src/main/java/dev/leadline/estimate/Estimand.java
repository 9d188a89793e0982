package dev.leadline.estimate;

/// What is asked for of an outcome.
public sealed interface Estimand {
    /// Word of the project file and of the commands.
    String word();

    /// `E[h(X)]`.
    record Mean() implements Estimand {
        @Override
        public String word() {
            return "mean";
        }
    }

    /// The integral of `g` over the ranges of the integration variables, in expectation over the other inputs.
    record Integral() implements Estimand {
        @Override
        public String word() {
            return "integral";
        }
    }

    /// The probability of an event.
    record Probability() implements Estimand {
        @Override
        public String word() {
            return "probability";
        }
    }
}
