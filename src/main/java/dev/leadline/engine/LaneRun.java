package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Extremes;
import dev.leadline.estimate.Extremes.Floor;
import dev.leadline.estimate.Outcomes;
import dev.leadline.model.Components;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Bands;
import dev.leadline.trace.Failure;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Spread;
import dev.leadline.trace.Trace;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Queue;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.Future;
import java.util.function.BooleanSupplier;
import java.util.stream.IntStream;

/// A lane on its way: items handed to workers, their sums merged in item order, marks set, the end found. Confined to
/// the thread that conducts the study.
///
/// Stopping looks at the merged prefix of items only; what workers computed beyond it is thrown away. Hence the same
/// bits for any number of workers.
public final class LaneRun {
    private static final double NEXT_MARK = 1.01;

    private final Recipe recipe;
    private final Stop stop;
    private final Stopping stopping;
    private final long budget;
    private final Items items;
    private final Crew crew;
    private final boolean watched;
    private final Queue<Future<Optional<ItemSums>>> ahead = new ArrayDeque<>();

    private final Tally tally;
    private final Optional<Extremes> extremes;
    private final long mostKept;
    private final List<Outcomes> outcomes;
    private final List<Mark> marks = new ArrayList<>();
    private final List<Failure> failures = new ArrayList<>();
    private long submitted;
    private long draws;
    private Optional<String> stopReason = Optional.empty();
    private final Bands bands;
    private Optional<Stage> stage;
    private Optional<SecondPass> pass = Optional.empty();

    public LaneRun(Recipe recipe, Stop stop, Crew crew) {
        this(recipe, stop, crew, Outcomes.MOST_KEPT);
    }

    /// @param mostKept outcomes kept one by one of each thing asked, beyond which a second pass finds what is sought
    LaneRun(Recipe recipe, Stop stop, Crew crew, long mostKept) {
        this(recipe, stop, crew, mostKept, true);
    }

    private LaneRun(Recipe recipe, Stop stop, Crew crew, long mostKept, boolean watched) {
        this.recipe = recipe;
        this.stop = stop;
        this.items = recipe.items();
        this.crew = crew;
        this.watched = watched;
        this.tally = Tally.of(items, recipe.components());
        this.extremes = watched ? recipe.extremes() : Optional.empty();
        this.budget = items.whole(stop.draws());
        this.mostKept = mostKept;
        this.outcomes = outcomes(recipe);
        this.bands = new Bands(
                recipe.question(), recipe.lane().scheme(), stop.draws() < Stop.MOST_DRAWS ? budget : Stop.MOST_DRAWS);
        this.stopping = Stopping.of(recipe, stop);
        this.stage = stopping.firstStage() > 0 ? Optional.of(new Stage()) : Optional.empty();
    }

    /// A run from its first draw to its end, on this thread; nobody looks at it before, and it has one mark.
    ///
    /// @return empty where cancelled
    public static Optional<Trace> alone(Recipe recipe, Stop stop, BooleanSupplier cancelled) {
        var run = new LaneRun(recipe, stop, new Alone(cancelled), Outcomes.MOST_KEPT, false);
        try {
            while (!run.finished() && !cancelled.getAsBoolean()) {
                run.advance(0);
            }
        } catch (ExecutionException | InterruptedException e) {
            throw new IllegalStateException("what one thread computes by itself neither waits nor fails later", e);
        }
        return cancelled.getAsBoolean() ? Optional.empty() : Optional.of(run.trace());
    }

    private List<Outcomes> outcomes(Recipe of) {
        return of.lane().scheme().points() instanceof Repetitions
                ? List.of()
                : IntStream.range(0, of.asks().size())
                        .mapToObj(a -> new Outcomes(
                                of.landmarks().get(a), of.isWeighed(Components.firstFormula(of.asks(), a)), mostKept))
                        .toList();
    }

    /// Merges the next item of work.
    ///
    /// @param seconds computed so far
    /// @return whether there is a new mark
    public boolean advance(double seconds) throws InterruptedException, ExecutionException {
        if (pass.isPresent()) {
            return pass.get().advance(seconds);
        }
        if (stage.isPresent()) {
            return stage.get().advance(seconds);
        }
        submitAhead();
        var sums = ahead.remove().get();
        if (sums.isEmpty()) {
            return end("stopped by hand", seconds);
        }
        merge(cut(sums.get()));
        Optional<String> enough = stopping.merged(tally.total(), draws);
        if (enough.isPresent()) {
            return end(enough.get(), seconds);
        }
        if (draws >= last()) {
            return endUnlessEnough(stopping.allMade(allMade()), seconds);
        }
        if (ahead.isEmpty() && items.within(submitted, last()).isEmpty()) {
            return endUnlessEnough(stopping.allMade("all repetitions made"), seconds);
        }
        if (isTimeUp(seconds)) {
            return endUnlessEnough("time used up", seconds);
        }
        if (!watched && !stopping.looks() || !tally.isWhole()) {
            return false;
        }
        var total = tally.total();
        if (marks.isEmpty() || draws >= NEXT_MARK * marks.getLast().draws() || bands.isDue(total.count())) {
            mark(seconds);
            stopping.enough(marks.getLast(), total).ifPresent(reason -> end(reason, seconds));
            return true;
        }
        return false;
    }

    /// Draws to make in all, as far as that is known.
    private long last() {
        return stopping.draws(budget);
    }

    private boolean isTimeUp(double seconds) {
        return stop.seconds().isPresent() && seconds >= stop.seconds().getAsDouble();
    }

    /// As much of an item as belongs to the run: the rule may end within it.
    private ItemSums cut(ItemSums made) {
        long left = last() - draws;
        ItemSums item = last() < budget && made.item().draws() > left
                ? again(made.item().first(left))
                : made;
        int belongs = stopping.within(item);
        return belongs < item.item().draws() ? again(item.item().first(belongs)) : item;
    }

    private ItemSums again(Item item) {
        return recipe.work().compute(item, floor(), () -> false).orElseThrow();
    }

    /// Ends because no more may be made; the last mark may still be enough.
    private boolean endUnlessEnough(String reason, double seconds) {
        if (!tally.isWhole()) {
            return end(reason, seconds);
        }
        mark(seconds);
        return end(stopping.enough(marks.getLast(), tally.total()).orElse(reason), seconds);
    }

    private String allMade() {
        return budget == stop.draws()
                ? "all draws made"
                : String.format(
                        Locale.ROOT,
                        "%s of %,d draws are %,d",
                        recipe.lane().scheme().points() instanceof Replicated ? "whole rounds" : "whole observations",
                        stop.draws(),
                        budget);
    }

    /// Ends with what has been merged.
    public void stop(double seconds) {
        if (stopReason.isEmpty()) {
            end("stopped by hand", seconds);
        }
        pass = Optional.empty();
    }

    public boolean finished() {
        return stopReason.isPresent() && pass.isEmpty();
    }

    public long draws() {
        return draws;
    }

    public Trace trace() {
        return new Trace(
                recipe.lane().name(),
                recipe.lane().scheme(),
                marks,
                tally.blocks(),
                extremes.map(Extremes::outermost),
                IntStream.range(0, outcomes.size()).mapToObj(this::spread).toList(),
                failures,
                stopping.course(),
                finished() ? stopReason : Optional.empty(),
                Optional.empty(),
                Optional.empty());
    }

    private Spread spread(int ask) {
        var seen = outcomes.get(ask);
        return new Spread(
                seen.landmark(),
                seen.histogram(),
                switch (recipe.asks().get(ask).estimand()) {
                    case Estimand.Quantile(double at) -> seen.jump(at);
                    case Estimand.TailMean(double at) -> seen.jump(at);
                    case Estimand.Mean _,
                            Estimand.Integral _,
                            Estimand.Probability _,
                            Estimand.Ratio _,
                            Estimand.StandardDeviation _,
                            Estimand.Distribution _ -> Optional.empty();
                });
    }

    private void submitAhead() {
        while (ahead.size() < crew.ahead()) {
            var item = items.within(submitted, last());
            if (item.isEmpty()) {
                return;
            }
            submitted++;
            ahead.add(crew.submit(recipe, item.get(), floor()));
        }
    }

    /// Which values of later draws can be among the outermost of all.
    private Floor floor() {
        return extremes.map(Extremes::floor).orElse(Floor.CLOSED);
    }

    private void merge(ItemSums item) {
        tally.add(item);
        bands.add(item.sums());
        extremes.ifPresent(all -> all.merge(item.extremes().orElseThrow()));
        for (int a = 0; a < outcomes.size(); a++) {
            outcomes.get(a).merge(item.outcomes().get(a));
        }
        draws += item.item().draws();
        for (var failure : item.failures()) {
            if (failures.size() < ItemSums.KEPT) {
                failures.add(whole(failure));
            }
        }
    }

    /// With the inputs, too, that no formula reads and that were not drawn.
    private Failure whole(Failure failure) {
        return failure.inputs().contains(Double.NaN)
                ? new Failure(
                        failure.draw(),
                        Arrays.stream(Drawing.single(recipe, failure.draw()).inputs())
                                .boxed()
                                .toList())
                : failure;
    }

    private boolean end(String reason, double seconds) {
        stopReason = Optional.of(reason);
        ahead.forEach(item -> item.cancel(false));
        ahead.clear();
        if (draws > 0 && tally.isWhole()) {
            outcomes.forEach(Outcomes::settle);
            extremes.ifPresent(Extremes::look);
            mark(seconds);
            lookAgain();
        }
        return true;
    }

    /// Where an answer lies between two outcomes and none is known, the same draws are made again, for these alone.
    private void lookAgain() {
        pass = outcomes.stream().anyMatch(Outcomes::isOpen) ? Optional.of(new SecondPass()) : Optional.empty();
    }

    /// A pass over the draws of all items that are merged, once more.
    private final class SecondPass {
        private final Recipe narrowed =
                recipe.narrowed(outcomes.stream().map(Outcomes::narrowed).toList());
        private final List<Outcomes> found = outcomes(narrowed);
        private final Queue<Future<Optional<ItemSums>>> again = new ArrayDeque<>();
        private long next;
        private long merged;

        boolean advance(double seconds) throws InterruptedException, ExecutionException {
            while (again.size() < crew.ahead()) {
                var item = items.within(next, draws);
                if (item.isEmpty()) {
                    break;
                }
                next++;
                again.add(crew.submit(narrowed, item.get(), Floor.CLOSED));
            }
            var sums = again.remove().get();
            if (sums.isEmpty()) {
                pass = Optional.empty();
                return true;
            }
            for (int a = 0; a < found.size(); a++) {
                found.get(a).merge(sums.get().outcomes().get(a));
            }
            merged += sums.get().item().draws();
            if (merged < draws) {
                return false;
            }
            for (int a = 0; a < found.size(); a++) {
                outcomes.get(a).refine(found.get(a));
            }
            mark(seconds);
            lookAgain();
            return true;
        }
    }

    /// The first stage of a rule that has one, from draws of its own.
    private final class Stage {
        private final Recipe own = recipe.firstStage();
        private final long size = items.whole(stopping.firstStage());
        private final Accumulator sums = new Accumulator(recipe.components());
        private final Queue<Future<Optional<ItemSums>>> under = new ArrayDeque<>();
        private long next;
        private long made;

        boolean advance(double seconds) throws InterruptedException, ExecutionException {
            while (under.size() < crew.ahead()) {
                var item = items.within(next, size);
                if (item.isEmpty()) {
                    break;
                }
                next++;
                under.add(crew.submit(own, item.get(), Floor.CLOSED));
            }
            var item = under.remove().get();
            if (item.isEmpty()) {
                return end("stopped by hand", seconds);
            }
            sums.merge(item.get().sums());
            made += item.get().item().draws();
            if (made >= size) {
                stopping.staged(sums, made);
                stage = Optional.empty();
                return true;
            }
            return isTimeUp(seconds) && end("time used up by the first stage", seconds);
        }
    }

    /// Sets a mark, in the place of one after as many draws.
    private void mark(double seconds) {
        extremes.ifPresent(Extremes::follow);
        if (!marks.isEmpty() && marks.getLast().draws() == draws) {
            marks.removeLast();
        }
        var total = tally.total();
        var blocks = tally.blocks();
        var answers = bands.around(
                Answers.of(recipe.question(), recipe.lane().scheme(), total, blocks, outcomes),
                total,
                blocks,
                outcomes,
                draws);
        marks.add(new Mark(draws, seconds, stopReason.isPresent() ? stopping.ended(answers) : answers));
    }
}
