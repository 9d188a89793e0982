package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.interval.FixedWidth;
import dev.leadline.interval.Guard;
import dev.leadline.interval.Interval;
import dev.leadline.interval.RunningIntersection;
import dev.leadline.interval.ToRounding;
import dev.leadline.model.Components;
import dev.leadline.model.StopRule;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Growing;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Course;
import dev.leadline.trace.Course.Judged;
import dev.leadline.trace.Mark;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.IntStream;

/// Stops once something around the first answer is within the tolerance, and a guard lets it look.
abstract class StoppingByWidth implements Stopping {
    final Recipe recipe;
    final Tolerance tolerance;
    private final Guard guard;
    private final boolean isGrowing;
    boolean isMet;

    private StoppingByWidth(Recipe recipe, OptionalLong draws, OptionalLong hits) {
        this.recipe = recipe;
        this.tolerance = recipe.question().tolerance().orElseThrow();
        this.guard = guard(recipe, draws, hits);
        this.isGrowing = recipe.lane().scheme().points() instanceof Growing;
    }

    /// The guard of a lane, with what a project says of it.
    private static Guard guard(Recipe recipe, OptionalLong draws, OptionalLong hits) {
        var scheme = recipe.lane().scheme();
        var usual = scheme.points() instanceof Growing && scheme.drawsPerObservation() > 1
                ? Guard.OF_OBSERVATIONS
                : Guard.OF_DRAWS;
        long least = draws.orElse(usual.draws());
        return new Guard(least, Math.min(least, usual.observations()), hits.orElse(usual.rarer()));
    }

    /// Looks at doublings are their own guard; exact bands wait for a number of draws only, as do outcomes that
    /// are equal by their weights: they have no spread to be misled by.
    private boolean mayLook(Mark mark, Accumulator total) {
        if (!isGrowing) {
            return true;
        }
        Answer first = mark.answers().getFirst();
        if (isSafe(first) || first.interval().kind().equals(ToRounding.KIND)) {
            return mark.draws() >= guard.draws();
        }
        int parts = Components.of(recipe.asks().getFirst().estimand());
        return IntStream.range(0, parts)
                .allMatch(k -> guard.lack(mark.draws(), total, k).isEmpty());
    }

    /// Whether what is looked at holds at all numbers of draws.
    boolean isSafe(Answer answer) {
        return false;
    }

    @Override
    public boolean looks() {
        return true;
    }

    @Override
    public Optional<String> enough(Mark mark, Accumulator total) {
        Answer first = mark.answers().getFirst();
        isMet = isWithin(first) && mayLook(mark, total);
        return isMet ? Optional.of(reason()) : Optional.empty();
    }

    @Override
    public String allMade(String usual) {
        return usual + ", the tolerance not met";
    }

    abstract boolean isWithin(Answer answer);

    abstract String reason();

    /// By the any-time band.
    static final class ByBand extends StoppingByWidth {
        private final Course course = new Course(StopRule.AnyTime.WORD, Judged.BAND);
        private final boolean isTold;

        ByBand(Recipe recipe, OptionalLong draws, OptionalLong hits) {
            super(recipe, draws, hits);
            this.isTold = hits.isPresent();
        }

        @Override
        boolean isWithin(Answer answer) {
            return course.isMet(tolerance, answer);
        }

        /// Where a project states a number of hits itself, it is waited for.
        @Override
        boolean isSafe(Answer answer) {
            return !isTold && answer.band().filter(RunningIntersection::isExact).isPresent();
        }

        @Override
        String reason() {
            return "the any-time band is within the tolerance";
        }

        @Override
        public Course course() {
            return course;
        }
    }

    /// By the interval for a fixed number of draws.
    static final class ByInterval extends StoppingByWidth {
        ByInterval(Recipe recipe, OptionalLong draws, OptionalLong hits) {
            super(recipe, draws, hits);
        }

        @Override
        boolean isWithin(Answer answer) {
            return tolerance.met(answer.estimate(), answer.interval().reach(answer.estimate()));
        }

        @Override
        String reason() {
            return "the interval is within the tolerance, which makes it hold in the limit only";
        }

        @Override
        public List<Answer> ended(List<Answer> answers) {
            if (!isMet) {
                return answers;
            }
            Answer first = answers.getFirst();
            Interval own = FixedWidth.looked(first.interval());
            return Stopping.first(answers, first.ended(first.estimate(), first.standardError(), own));
        }

        @Override
        public Course course() {
            return new Course(StopRule.AsymptoticWidth.WORD, Judged.INTERVAL);
        }
    }
}
