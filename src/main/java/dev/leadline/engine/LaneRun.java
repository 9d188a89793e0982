package dev.leadline.engine;

import dev.leadline.estimate.Extremes;
import dev.leadline.estimate.Outcomes;
import dev.leadline.model.Components;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Answers;
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
        this.extremes =
                recipe.lane().scheme().isWeighted() ? Optional.of(new Extremes(recipe.components())) : Optional.empty();
        this.budget = items.whole(stop.draws());
        this.mostKept = mostKept;
        this.outcomes = outcomes(recipe);
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
        submitAhead();
        var sums = ahead.remove().get();
        if (sums.isEmpty()) {
            return end("stopped by hand", seconds);
        }
        merge(sums.get());
        if (draws >= budget) {
            return end(allMade(), seconds);
        }
        if (ahead.isEmpty() && items.within(submitted, budget).isEmpty()) {
            return end("all repetitions made", seconds);
        }
        if (stop.seconds().isPresent() && seconds >= stop.seconds().getAsDouble()) {
            return end("time used up", seconds);
        }
        if (!watched || !tally.isWhole()) {
            return false;
        }
        if (marks.isEmpty() || draws >= NEXT_MARK * marks.getLast().draws()) {
            mark(seconds);
            return true;
        }
        return false;
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
                extremes.map(Extremes::copy),
                outcomes.stream()
                        .map(seen -> new Spread(seen.landmark(), seen.histogram()))
                        .toList(),
                failures,
                finished() ? stopReason : Optional.empty());
    }

    private void submitAhead() {
        while (ahead.size() < crew.ahead()) {
            var item = items.within(submitted, budget);
            if (item.isEmpty()) {
                return;
            }
            submitted++;
            ahead.add(crew.submit(recipe, item.get()));
        }
    }

    private void merge(ItemSums item) {
        tally.add(item);
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
            if (!marks.isEmpty() && marks.getLast().draws() == draws) {
                marks.removeLast();
            }
            outcomes.forEach(Outcomes::settle);
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
                again.add(crew.submit(narrowed, item.get()));
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
            marks.removeLast();
            mark(seconds);
            lookAgain();
            return true;
        }
    }

    private void mark(double seconds) {
        marks.add(new Mark(
                draws,
                seconds,
                Answers.of(recipe.question(), recipe.lane().scheme(), tally.total(), tally.blocks(), outcomes)));
    }
}
