package dev.leadline.engine;

import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import dev.leadline.scheme.Stretch;
import java.util.Arrays;

/// Evaluates the formulas of a recipe at its draws, block by block. Scratch of one worker, confined to it.
final class Evaluation {
    private final Recipe recipe;
    private final Program program;
    private final Program.Workspace workspace;
    private final Drawing drawing;
    private final double[][] outcomes;
    private final boolean[] whole;
    private final double[] ranges;
    private final double[] logPdf;
    private final double[] weight;
    private final Weights weights;

    Evaluation(Recipe recipe) {
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
        this.outcomes = new double[program.outputs()][Program.BLOCK];
        this.whole = new boolean[outcomes.length];
        for (int f = 0; f < whole.length; f++) {
            whole[f] = recipe.isWhole(f);
        }
        this.ranges = new double[recipe.weighing().isEmpty() ? 0 : Program.BLOCK];
        this.logPdf = new double[ranges.length];
        this.weight = new double[recipe.lane().scheme().isWeighted() ? Program.BLOCK : 0];
        this.weights = new Weights(recipe);
    }

    /// Goes to the first draw of an item.
    void open(Stretch stretch) {
        drawing.open(stretch);
    }

    /// The next draws of the item.
    void next(int rows) {
        drawing.next(rows);
        program.evaluate(drawing.columns(), rows, outcomes, workspace);
        if (isWeighted()) {
            weights.fill(drawing.columns(), drawing.weights(), weight, rows);
        }
        weighRanges(rows);
        for (int f = 0; f < outcomes.length; f++) {
            if (whole[f]) {
                multiply(outcomes[f], rows);
            }
        }
    }

    boolean isWeighted() {
        return weight.length > 0;
    }

    /// What each formula gives, control variates last; an event gives 1 or 0. Integrands count the length of their
    /// ranges
    /// and, unlike other outcomes, their weight. The arrays stay the same.
    double[][] outcomes() {
        return outcomes;
    }

    /// What each draw counts; no elements where all count 1.
    double[] weights() {
        return weight;
    }

    /// Values of each input; `null` for one that no formula reads.
    double[][] columns() {
        return drawing.columns();
    }

    /// A draw that the inputs cannot have counts nothing, whatever its outcome.
    void weigh(double[] outcome, double[] weighed, int rows) {
        for (int i = 0; i < rows; i++) {
            weighed[i] = weight[i] == 0 ? 0 : outcome[i] * weight[i];
        }
    }

    /// `1 / pdf`, and 0 for a draw beyond its range, which the density drawn from may reach; times the weight.
    private void weighRanges(int rows) {
        if (ranges.length == 0) {
            return;
        }
        Arrays.fill(ranges, 0, rows, 0);
        for (int j : recipe.weighing()) {
            double[] x = drawing.columns()[j];
            double low = recipe.range(j).low();
            double high = recipe.range(j).high();
            recipe.drawn(j).logPdf(x, logPdf, rows);
            for (int i = 0; i < rows; i++) {
                ranges[i] -= x[i] >= low && x[i] <= high ? logPdf[i] : Double.POSITIVE_INFINITY;
            }
        }
        if (isWeighted()) {
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
            if (isWeighted()) {
                weigh(outcome, outcome, rows);
            }
        } else {
            for (int i = 0; i < rows; i++) {
                // Beyond the range the formula need not have a value.
                outcome[i] = ranges[i] == 0 ? 0 : outcome[i] * (volume * ranges[i]);
            }
        }
    }
}
