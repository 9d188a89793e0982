package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.interval.Stein;
import dev.leadline.interval.TwoStage;
import dev.leadline.model.Components;
import dev.leadline.model.StopRule;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Course;
import dev.leadline.trace.Course.Judged;
import dev.leadline.trace.FirstStage;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/// Stops after as many draws as a first stage has said.
abstract class StoppingInStages implements Stopping {
    final int component;
    final int perObservation;
    final double tolerance;
    final long most;
    Optional<FirstStage> stage = Optional.empty();

    private StoppingInStages(Recipe recipe, long most) {
        this.component = Components.first(recipe.asks(), 0);
        this.perObservation = recipe.lane().scheme().drawsPerObservation();
        this.tolerance = recipe.question().tolerance().orElseThrow().absolute().orElseThrow();
        this.most = most;
    }

    /// Freezes what the stage came to.
    void found(Accumulator sums, long draws, boolean inAnswer, OptionalDouble largestKurtosis, OptionalLong wanted) {
        stage = Optional.of(new FirstStage(
                draws,
                sums.count(),
                inAnswer,
                Math.sqrt(sums.variance(component)),
                sums.excessKurtosis(component) + 3,
                largestKurtosis,
                wanted));
    }

    private OptionalLong wanted() {
        return stage.map(FirstStage::wanted).orElse(OptionalLong.empty());
    }

    /// Draws that the stage has asked for; more than there may be where that is so.
    private OptionalLong wantedDraws() {
        var observations = wanted();
        return observations.isEmpty()
                ? observations
                : OptionalLong.of(
                        observations.getAsLong() > Long.MAX_VALUE / perObservation
                                ? Long.MAX_VALUE
                                : observations.getAsLong() * perObservation);
    }

    @Override
    public long draws(long budget) {
        return Math.min(budget, wantedDraws().orElse(budget));
    }

    /// Whether all draws that the stage has asked for can be made.
    boolean isAffordable() {
        var draws = wantedDraws();
        return draws.isPresent() && draws.getAsLong() <= most;
    }

    @Override
    public String allMade(String usual) {
        if (stage.isEmpty()) {
            return usual + ", the first stage not over";
        }
        if (wanted().isEmpty()) {
            return usual + "; the first stage cannot tell how many are enough";
        }
        return String.format(
                Locale.ROOT,
                isAffordable()
                        ? "all %,d draws made that the first stage asks for"
                        : usual + "; the first stage asks for %,d",
                wantedDraws().getAsLong());
    }

    @Override
    public List<Answer> ended(List<Answer> answers) {
        Answer first = answers.getFirst();
        return isKept(first)
                ? Stopping.first(answers, first.ended(first.estimate(), first.standardError(), own(first)))
                : answers;
    }

    abstract Interval own(Answer answer);

    /// Whether an answer is of all the draws that the stage has asked for.
    boolean isKept(Answer answer) {
        return isAffordable() && (answer.observations() + answer.nonFinite()) >= wanted().getAsLong();
    }

    /// A stage of draws of its own, and fresh ones after it: guaranteed where the kurtosis is bounded.
    static final class TwoStages extends StoppingInStages {
        private final TwoStage rule;
        private final boolean isChance;
        private boolean isKept;

        TwoStages(Recipe recipe, long first, double inflation, long most) {
            super(recipe, most);
            this.rule = new TwoStage(recipe.question().level(), first, inflation);
            this.isChance = recipe.asks().getFirst().estimand() instanceof Estimand.Probability;
        }

        @Override
        public long firstStage() {
            return rule.first() * perObservation;
        }

        @Override
        public void staged(Accumulator sums, long draws) {
            double deviation = Math.sqrt(sums.variance(component));
            var wanted = rule.second(deviation, tolerance).map(OptionalLong::of).orElse(OptionalLong.empty());
            found(sums, draws, false, OptionalDouble.of(rule.largestKurtosis()), wanted);
        }

        @Override
        public List<Answer> ended(List<Answer> answers) {
            isKept = isKept(answers.getFirst());
            return super.ended(answers);
        }

        @Override
        Interval own(Answer answer) {
            var interval = rule.of(answer.estimate(), tolerance);
            return isChance ? interval.within(0, 1) : interval;
        }

        @Override
        public Course course() {
            return new Course(
                    StopRule.TwoStage.WORD, isKept ? Judged.PROMISE : Judged.INTERVAL, OptionalLong.empty(), stage);
        }
    }

    /// A stage that the other draws are added to: exact for normal outcomes.
    static final class Growing extends StoppingInStages {
        private final double level;
        private final long first;

        Growing(Recipe recipe, long first, long most) {
            super(recipe, most);
            this.level = recipe.question().level();
            this.first = first;
        }

        /// The stage ends with the item that makes it long enough.
        @Override
        public Optional<String> merged(Accumulator total, long draws) {
            if (stage.isEmpty() && total.count() >= first) {
                double deviation = Math.sqrt(total.variance(component));
                double all = new Stein(level, total.count()).all(deviation, tolerance);
                found(
                        total,
                        draws,
                        true,
                        OptionalDouble.empty(),
                        deviation > 0 && all < Long.MAX_VALUE ? OptionalLong.of((long) all) : OptionalLong.empty());
            }
            return Optional.empty();
        }

        @Override
        Interval own(Answer answer) {
            var found = stage.orElseThrow();
            return new Stein(level, found.observations())
                    .of(answer.estimate(), found.standardDeviation(), answer.observations());
        }

        @Override
        public Course course() {
            return new Course(StopRule.Stein.WORD, Judged.INTERVAL, OptionalLong.empty(), stage);
        }
    }
}
