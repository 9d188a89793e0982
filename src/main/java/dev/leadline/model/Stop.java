package dev.leadline.model;

import dev.leadline.scheme.Scheme;
import java.util.OptionalDouble;

/// When a lane stops: once its rule is satisfied, and at the latest when a budget is used up.
///
/// @param draws evaluations at most
/// @param seconds of computing at most, empty for no limit
public record Stop(StopRule rule, long draws, OptionalDouble seconds) {
    /// Word of the rule that makes all draws, whatever they show.
    public static final String FIXED = StopRule.Fixed.WORD;

    /// Where a project says nothing.
    public static final long USUAL_DRAWS = 1_000_000;

    /// Where a project has a tolerance and says nothing else.
    public static final long PATIENT_DRAWS = 100_000_000;

    /// Beyond this, a year of computing on a hundred cores. As a budget it stands for none.
    public static final long MOST_DRAWS = 10_000_000_000_000L;

    /// All draws of a budget.
    public Stop(long draws, OptionalDouble seconds) {
        this(new StopRule.Fixed(), draws, seconds);
    }

    /// A number of draws fixed beforehand, where another rule would decide: the usual one, within the budget.
    public Stop fixed() {
        return rule instanceof StopRule.Fixed ? this : new Stop(Math.min(draws, USUAL_DRAWS), seconds);
    }

    /// The same budget with the rule of one lane: see [StopRule#within].
    public Stop within(Question question, Scheme scheme) {
        return new Stop(rule.within(question, scheme), draws, seconds);
    }
}
