package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.interval.HitsRule;
import dev.leadline.model.Components;
import dev.leadline.model.StopRule;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Course;
import dev.leadline.trace.Course.Judged;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;

/// Stops at the draw with the last hit that is wanted: not at the end of the item of work that holds it,
/// which would make the interval hold in half of the runs.
final class StoppingAtHits implements Stopping {
    private final Recipe recipe;
    private final HitsRule rule;
    private final int component;
    private long seen;
    private boolean isReached;

    StoppingAtHits(Recipe recipe, long hits) {
        this.recipe = recipe;
        this.rule = new HitsRule(hits, recipe.question().level());
        this.component = Components.first(recipe.asks(), 0);
    }

    @Override
    public int within(ItemSums item) {
        long here = item.sums().hits(component).orElse(0);
        return seen + here < rule.hits()
                ? item.item().draws()
                : new Retrace(recipe).until(item.item(), rule.hits() - seen);
    }

    @Override
    public Optional<String> merged(Accumulator total, long draws) {
        seen = total.hits(component).orElse(0);
        isReached = seen == rule.hits();
        return isReached ? Optional.of(String.format(Locale.ROOT, "%,d hits seen", seen)) : Optional.empty();
    }

    @Override
    public String allMade(String usual) {
        return String.format(Locale.ROOT, usual + ", with %,d hits of %,d", seen, rule.hits());
    }

    /// With failed evaluations the limits of a fixed number of draws stay, which hold whatever those would
    /// have been.
    @Override
    public List<Answer> ended(List<Answer> answers) {
        Answer first = answers.getFirst();
        if (!isReached) {
            return answers;
        }
        long n = first.observations();
        double estimate = rule.estimate(n);
        double error = n > 2 && estimate < 1 ? Math.sqrt(estimate * (1 - estimate) / (n - 2)) : Double.NaN;
        return Stopping.first(
                answers, first.ended(estimate, error, first.nonFinite() > 0 ? first.interval() : rule.of(n)));
    }

    @Override
    public Course course() {
        boolean isPromised = isReached
                && StopRule.hits(recipe.question())
                        .filter(needed -> rule.hits() >= needed.hits())
                        .isPresent();
        return new Course(
                StopRule.Hits.WORD,
                isPromised ? Judged.PROMISE : Judged.INTERVAL,
                OptionalLong.of(rule.hits()),
                Optional.empty());
    }
}
