package dev.leadline.estimate;

/// What is asked for of an outcome `h(X)`.
public sealed interface Estimand {
    /// Word of the project file and of the commands.
    String word();

    /// How many formulas it is asked of.
    default int formulas() {
        return 1;
    }

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

    /// The smallest value that outcomes do not exceed with probability `at` or more.
    ///
    /// @param at between 0 and 1
    record Quantile(double at) implements Estimand {
        @Override
        public String word() {
            return "quantile";
        }
    }

    /// The mean of the worst part of the outcomes, those beyond the quantile; of an atom at the quantile so much
    /// belongs
    /// to the part that it has the probability `1 - at`.
    ///
    /// @param at between 0 and 1
    record TailMean(double at) implements Estimand {
        @Override
        public String word() {
            return "tailMean";
        }
    }

    /// The mean of one formula over the mean of another.
    record Ratio() implements Estimand {
        @Override
        public String word() {
            return "ratio";
        }

        @Override
        public int formulas() {
            return 2;
        }
    }

    /// The standard deviation of the outcomes.
    record StandardDeviation() implements Estimand {
        @Override
        public String word() {
            return "standardDeviation";
        }
    }

    /// The whole distribution of the outcomes: mean, standard uncertainty, coverage intervals.
    ///
    /// @param coverage part of the outcomes that a coverage interval holds, between 0 and 1; not the confidence
    record Distribution(double coverage) implements Estimand {
        @Override
        public String word() {
            return "distribution";
        }
    }
}
