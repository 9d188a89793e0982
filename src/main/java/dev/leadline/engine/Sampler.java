package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Extremes;
import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import dev.leadline.trace.Failure;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;

/// Makes the draws of an item of work and accumulates them. Scratch of one worker, confined to it; what it returns
/// is a pure function of the recipe and the item.
public final class Sampler implements ItemWork {
    private final Recipe recipe;
    private final Program program;
    private final Program.Workspace workspace;
    private final Drawing drawing;
    private final double[][] columns;
    private final double[][] outcomes;
    private final double[] ranges;
    private final double[] logPdf;
    private final boolean isWeighted;
    private final Weights weights;
    private final Folding folding;
    private final Accumulator sums;
    private final Optional<Extremes> extremes;

    Sampler(Recipe recipe) {
        this(recipe, Folding.of(recipe));
    }

    /// @param folding what becomes of the draws
    Sampler(Recipe recipe, Folding folding) {
        this.recipe = recipe;
        this.program = recipe.program();
        this.workspace = program.workspace();
        boolean[] wanted = new boolean[recipe.question().inputs().size()];
        for (int j = 0; j < wanted.length; j++) {
            wanted[j] = program.uses(j)
                    || recipe.weighing().contains(j)
                    || recipe.proposal().containsKey(j);
        }
        this.drawing = new Drawing(recipe, wanted);
        this.columns = drawing.columns();
        this.outcomes = new double[recipe.components()][Program.BLOCK];
        this.ranges = new double[recipe.weighing().isEmpty() ? 0 : Program.BLOCK];
        this.logPdf = new double[ranges.length];
        this.isWeighted = recipe.lane().scheme().isWeighted();
        this.weights = new Weights(recipe);
        this.folding = folding;
        this.sums = new Accumulator(outcomes.length);
        this.extremes = isWeighted ? Optional.of(new Extremes(outcomes.length)) : Optional.empty();
    }

    @Override
    public Optional<ItemSums> compute(Item item, BooleanSupplier cancelled) {
        drawing.open(item.stretch());
        folding.open();
        sums.clear();
        extremes.ifPresent(Extremes::clear);
        var failures = new ArrayList<Failure>();
        for (int from = 0; from < item.draws(); from += Program.BLOCK) {
            if (cancelled.getAsBoolean()) {
                return Optional.empty();
            }
            int rows = Math.min(Program.BLOCK, item.draws() - from);
            drawing.next(rows);
            program.evaluate(columns, rows, outcomes, workspace);
            observe(rows);
            extremes.ifPresent(seen -> seen.add(folding.counted(outcomes, rows), rows));
            if (!folding.addTo(sums, outcomes, rows)) {
                keepFailures(item.firstDraw() + from, rows, failures);
            }
        }
        return Optional.of(new ItemSums(item, sums.copy(), extremes.map(Extremes::copy), List.copyOf(failures)));
    }

    /// Turns what the formulas give into components of observations: integrals count the length of their ranges,
    /// control variates what they are more than their mean; an event is 1 or 0 as it is. All count their weight.
    private void observe(int rows) {
        if (isWeighted) {
            weights.fill(columns, drawing.weights(), outcomes[outcomes.length - 1], rows);
        }
        weighRanges(rows);
        for (int k = 0; k < recipe.asks().size(); k++) {
            switch (recipe.asks().get(k).estimand()) {
                case Estimand.Mean _, Estimand.Probability _ -> weigh(outcomes[k], rows);
                case Estimand.Integral _ -> multiply(outcomes[k], rows);
            }
        }
        for (int c = 0; c < recipe.controls().size(); c++) {
            double[] control = outcomes[recipe.asks().size() + c];
            double mean = recipe.controls().get(c).mean();
            for (int i = 0; i < rows; i++) {
                control[i] -= mean;
            }
            weigh(control, rows);
        }
    }

    /// `1 / pdf`, and 0 for a draw beyond its range, which the density drawn from may reach; times the weight.
    private void weighRanges(int rows) {
        if (ranges.length == 0) {
            return;
        }
        Arrays.fill(ranges, 0, rows, 0);
        for (int j : recipe.weighing()) {
            double[] x = columns[j];
            double low = recipe.range(j).low();
            double high = recipe.range(j).high();
            recipe.drawn(j).logPdf(x, logPdf, rows);
            for (int i = 0; i < rows; i++) {
                ranges[i] -= x[i] >= low && x[i] <= high ? logPdf[i] : Double.POSITIVE_INFINITY;
            }
        }
        if (isWeighted) {
            weights.addLogs(ranges, rows);
        }
        Exp.exp(ranges, ranges, rows);
    }

    private void multiply(double[] outcome, int rows) {
        double volume = recipe.volume();
        if (ranges.length == 0) {
            for (int i = 0; i < rows; i++) {
                outcome[i] *= volume;
            }
            weigh(outcome, rows);
        } else {
            for (int i = 0; i < rows; i++) {
                // Beyond the range the formula need not have a value.
                outcome[i] = ranges[i] == 0 ? 0 : outcome[i] * (volume * ranges[i]);
            }
        }
    }

    /// A draw that the inputs cannot have counts nothing, whatever its outcome.
    private void weigh(double[] outcome, int rows) {
        if (!isWeighted) {
            return;
        }
        double[] weight = outcomes[outcomes.length - 1];
        for (int i = 0; i < rows; i++) {
            outcome[i] = weight[i] == 0 ? 0 : outcome[i] * weight[i];
        }
    }

    private void keepFailures(long firstDraw, int rows, List<Failure> failures) {
        for (int i = 0; i < rows && failures.size() < ItemSums.KEPT; i++) {
            if (!finite(i)) {
                failures.add(new Failure(firstDraw + i, row(i)));
            }
        }
    }

    private boolean finite(int row) {
        for (double[] outcome : outcomes) {
            if (!Double.isFinite(outcome[row])) {
                return false;
            }
        }
        return true;
    }

    private List<Double> row(int row) {
        return Arrays.stream(columns)
                .map(column -> column == null ? Double.NaN : column[row])
                .toList();
    }
}
