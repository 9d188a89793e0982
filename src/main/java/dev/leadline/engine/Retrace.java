package dev.leadline.engine;

import dev.leadline.formula.Program;
import dev.leadline.model.Components;

/// Draws of items of work made again, one after the other, to find what sums do not say. Confined to the
/// thread that conducts the study.
final class Retrace {
    private final Recipe recipe;
    private final Evaluation evaluation;
    private final Observing observing;

    Retrace(Recipe recipe) {
        this.recipe = recipe;
        this.evaluation = new Evaluation(recipe);
        this.observing = new Observing(recipe, evaluation);
    }

    /// How many draws of an item it takes to see so many hits of the event that is asked for first, among
    /// observations that are finite. Each draw is an observation.
    int until(Item item, long hits) {
        double[] event = observing.components()[Components.first(recipe.asks(), 0)];
        long seen = 0;
        evaluation.open(item.stretch());
        for (int from = 0; from < item.draws(); from += Program.BLOCK) {
            int rows = Math.min(Program.BLOCK, item.draws() - from);
            evaluation.next(rows);
            observing.observe(rows);
            for (int i = 0; i < rows; i++) {
                if (event[i] == 1 && isFinite(i) && ++seen == hits) {
                    return from + i + 1;
                }
            }
        }
        throw new IllegalStateException(seen + " hits where " + hits + " were counted");
    }

    private boolean isFinite(int row) {
        for (double[] component : observing.components()) {
            if (!Double.isFinite(component[row])) {
                return false;
            }
        }
        return true;
    }

    /// The outcomes of the first formula in all draws of an item.
    double[] outcomes(Item item) {
        double[] all = new double[item.draws()];
        evaluation.open(item.stretch());
        for (int from = 0; from < item.draws(); from += Program.BLOCK) {
            int rows = Math.min(Program.BLOCK, item.draws() - from);
            evaluation.next(rows);
            System.arraycopy(evaluation.outcomes()[0], 0, all, from, rows);
        }
        return all;
    }
}
