package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Catch;
import dev.leadline.estimate.Extremes;
import dev.leadline.estimate.Extremes.Floor;
import dev.leadline.formula.Program;
import dev.leadline.model.Components;
import dev.leadline.trace.Failure;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.stream.IntStream;

/// Makes the draws of an item of work and accumulates them. Scratch of one worker, confined to it; what it returns
/// is a pure function of the recipe, the item and the floor.
public final class Sampler implements ItemWork {
    private final Recipe recipe;
    private final Evaluation evaluation;
    private final Observing observing;
    private final double[][] components;
    private final int[] formulas;
    private final Folding folding;
    private final Accumulator sums;
    private final Optional<Extremes> extremes;
    private final List<Catch> caught;
    private final double[] sizes;
    private final boolean[] weighed;
    private final boolean[] whole;

    Sampler(Recipe recipe) {
        this(recipe, Folding.of(recipe));
    }

    /// @param folding what becomes of the draws
    Sampler(Recipe recipe, Folding folding) {
        this.recipe = recipe;
        this.evaluation = new Evaluation(recipe);
        this.observing = new Observing(recipe, evaluation);
        this.components = observing.components();
        this.formulas = IntStream.range(0, recipe.asks().size())
                .map(a -> Components.firstFormula(recipe.asks(), a))
                .toArray();
        this.folding = folding;
        this.sums = new Accumulator(components.length);
        this.extremes = recipe.extremes();
        this.caught = IntStream.range(0, formulas.length)
                .mapToObj(a -> new Catch(recipe.landmarks().get(a), recipe.isWeighed(formulas[a]), Program.BLOCK))
                .toList();
        this.sizes = new double[Program.BLOCK];
        this.weighed = new boolean[formulas.length];
        this.whole = new boolean[formulas.length];
        for (int a = 0; a < formulas.length; a++) {
            weighed[a] = recipe.isWeighed(formulas[a]);
            whole[a] = recipe.isWhole(formulas[a]);
        }
    }

    @Override
    public Optional<ItemSums> compute(Item item, Floor floor, BooleanSupplier cancelled) {
        evaluation.open(item.stretch());
        folding.open();
        sums.clear();
        extremes.ifPresent(seen -> seen.clear(floor));
        caught.forEach(Catch::clear);
        var failures = new ArrayList<Failure>();
        for (int from = 0; from < item.draws(); from += Program.BLOCK) {
            if (cancelled.getAsBoolean()) {
                return Optional.empty();
            }
            int rows = Math.min(Program.BLOCK, item.draws() - from);
            evaluation.next(rows);
            take(rows, from, item);
            observing.observe(rows);
            if (extremes.isPresent() && !folding.isPlain()) {
                extremes.get().add(folding.counted(components, rows), rows);
            }
            if (!folding.addTo(sums, components, rows)) {
                keepFailures(item.firstDraw() + from, rows, failures);
            }
            if (extremes.isPresent() && folding.isPlain()) {
                extremes.get().add(components, rows, sums);
            }
        }
        return Optional.of(new ItemSums(
                item,
                sums.copy(),
                extremes.map(Extremes::copy),
                caught.stream().map(Catch::copy).toList(),
                List.copyOf(failures)));
    }

    private void take(int rows, int from, Item item) {
        for (int a = 0; a < formulas.length; a++) {
            if (weighed[a]) {
                size(a, rows);
            }
            caught.get(a).add(evaluation.outcomes()[formulas[a]], sizes, rows, from, item.draws());
        }
    }

    /// What each draw counts for the outcome of a thing asked.
    private void size(int ask, int rows) {
        if (evaluation.isWeighted() && !whole[ask]) {
            System.arraycopy(evaluation.weights(), 0, sizes, 0, rows);
        } else {
            Arrays.fill(sizes, 0, rows, 1);
        }
        folding.count(sizes, rows);
    }

    private void keepFailures(long firstDraw, int rows, List<Failure> failures) {
        for (int i = 0; i < rows && failures.size() < ItemSums.KEPT; i++) {
            if (!finite(i)) {
                failures.add(new Failure(firstDraw + i, row(i)));
            }
        }
    }

    private boolean finite(int row) {
        for (double[] component : components) {
            if (!Double.isFinite(component[row])) {
                return false;
            }
        }
        return true;
    }

    private List<Double> row(int row) {
        return Arrays.stream(evaluation.columns())
                .map(column -> column == null ? Double.NaN : column[row])
                .toList();
    }
}
