package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Course;
import dev.leadline.trace.Mark;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// When a lane has enough, by its rule. It sees the merged prefix of items and nothing else, so that it stops
/// at the same draw on any number of threads. Confined to the thread that conducts the study.
interface Stopping {
    static Stopping of(Recipe recipe, Stop stop) {
        var question = recipe.question();
        return switch (stop.rule().within(question, recipe.lane().scheme())) {
            case StopRule.Fixed _ -> new Fixed();
            case StopRule.AnyTime rule -> new StoppingByWidth.ByBand(recipe, rule.guardDraws(), rule.guardHits());
            case StopRule.AsymptoticWidth rule ->
                new StoppingByWidth.ByInterval(recipe, rule.guardDraws(), rule.guardHits());
            case StopRule.Hits(long hits) -> new StoppingAtHits(recipe, hits);
            case StopRule.TwoStage(long first, double inflation) ->
                new StoppingInStages.TwoStages(recipe, first, inflation, stop.draws());
            case StopRule.Stein(long first) -> new StoppingInStages.Growing(recipe, first, stop.draws());
            case StopRule.Jcgm101(int digits) -> new StoppingBySettling(recipe, digits);
        };
    }

    /// Of a stage that comes before the run, from draws of its own: how many; 0 for none.
    default long firstStage() {
        return 0;
    }

    /// Takes in what that stage came to.
    default void staged(Accumulator sums, long draws) {}

    /// Draws to make in all, as far as that is known.
    ///
    /// @param budget the most there may be
    default long draws(long budget) {
        return budget;
    }

    /// How many draws of the next item belong to the run: fewer than it has where the rule ends within it.
    default int within(ItemSums item) {
        return item.item().draws();
    }

    /// Takes in the sums so far, and why they are enough; empty where they are not.
    default Optional<String> merged(Accumulator total, long draws) {
        return Optional.empty();
    }

    /// Whether it looks at marks on the way.
    default boolean looks() {
        return false;
    }

    /// Why a mark is enough; empty where it is not.
    default Optional<String> enough(Mark mark, Accumulator total) {
        return Optional.empty();
    }

    /// The last answers, with what the rule makes of the first one.
    default List<Answer> ended(List<Answer> answers) {
        return answers;
    }

    /// Why the lane ends where the budget is used up.
    ///
    /// @param usual what is said of a number of draws fixed beforehand
    default String allMade(String usual) {
        return usual;
    }

    Course course();

    /// A number of draws fixed beforehand.
    final class Fixed implements Stopping {
        @Override
        public Course course() {
            return Course.FIXED;
        }
    }

    /// Answers with another first one.
    static List<Answer> first(List<Answer> answers, Answer first) {
        var others = new ArrayList<>(answers);
        others.set(0, first);
        return List.copyOf(others);
    }
}
