package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.FixedWidth;
import dev.leadline.interval.HitsRule;
import dev.leadline.scheme.Scheme;
import java.util.Optional;
import java.util.OptionalLong;

/// What a lane waits for before it stops, beside its budget.
public sealed interface StopRule {
    /// Of the project file and of the commands.
    String word();

    /// The rule by which a lane of such a scheme stops.
    default StopRule within(Question question, Scheme scheme) {
        return this;
    }

    /// All draws of the budget, whatever they show.
    record Fixed() implements StopRule {
        static final String WORD = "fixed";

        @Override
        public String word() {
            return WORD;
        }
    }

    /// The any-time band of the first answer is within the tolerance.
    ///
    /// For a probability with a relative tolerance, among independent draws that count 1 each, the hits rule
    /// takes its place: it is exact, and stops sooner.
    ///
    /// @param guardDraws least draws before the band is looked at; empty for the usual ones
    /// @param guardHits least hits, or misses where those are rarer; likewise
    record AnyTime(OptionalLong guardDraws, OptionalLong guardHits) implements StopRule {
        public static final String WORD = "any-time";

        @Override
        public String word() {
            return WORD;
        }

        @Override
        public StopRule within(Question question, Scheme scheme) {
            return question.asks().getFirst().estimand() instanceof Estimand.Probability && scheme.isPlain()
                    ? hits(question)
                            .<StopRule>map(rule -> new Hits(rule.hits()))
                            .orElse(this)
                    : this;
        }
    }

    /// As many hits as make the relative tolerance.
    static Optional<HitsRule> hits(Question question) {
        return question.tolerance()
                .filter(tolerance -> tolerance.absolute().isEmpty())
                .flatMap(tolerance -> HitsRule.of(tolerance.relative().getAsDouble(), question.level()));
    }

    /// So many hits of the event that is asked for first.
    record Hits(long hits) implements StopRule {
        public static final String WORD = HitsRule.KIND;

        @Override
        public String word() {
            return WORD;
        }
    }

    /// As many fresh draws as a first stage says, with a guarantee where the kurtosis is bounded.
    ///
    /// @param first observations of the first stage
    /// @param inflation of the standard deviation that it found
    record TwoStage(long first, double inflation) implements StopRule {
        public static final String WORD = dev.leadline.interval.TwoStage.KIND;

        @Override
        public String word() {
            return WORD;
        }
    }

    /// As many draws as the first of them say, exact for normal outcomes.
    ///
    /// @param first observations of the first stage
    record Stein(long first) implements StopRule {
        public static final String WORD = dev.leadline.interval.Stein.KIND;

        /// Where a project says nothing.
        public static final long USUAL_FIRST = 1000;

        @Override
        public String word() {
            return WORD;
        }
    }

    /// The plain interval is within the tolerance: true in the limit of small tolerances only.
    ///
    /// @param guardDraws,guardHits as of [AnyTime]
    record AsymptoticWidth(OptionalLong guardDraws, OptionalLong guardHits) implements StopRule {
        public static final String WORD = FixedWidth.KIND;

        @Override
        public String word() {
            return WORD;
        }
    }

    /// The results have settled as JCGM 101:2008, 7.9, says; no promise goes with it.
    ///
    /// @param digits of the standard uncertainty that count
    record Jcgm101(int digits) implements StopRule {
        public static final String WORD = dev.leadline.interval.Jcgm101.KIND;

        @Override
        public String word() {
            return WORD;
        }
    }
}
