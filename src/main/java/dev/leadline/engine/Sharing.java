package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Regression;
import dev.leadline.model.Components;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Allocation;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Stratified;
import dev.leadline.scheme.Stretch;
import dev.leadline.stream.Purpose;

/// Shares the draws of a pass among its cells, by a pilot that draws from each cell alike: as the lane draws,
/// so that weights count, and what control variates explain does not. Its draws enter no answer.
///
/// @param points whose allocation is to be found
record Sharing(Question question, Lane lane, Stratified points, long seed) {
    private static final int DRAWS = 65_536;
    private static final int FEWEST_OF_CELL = 16;
    private static final int MOST_OF_CELL = 1024;

    /// The lane with what was found for it; the lane itself where it shares nothing.
    static Lane found(Question question, Lane lane, long seed) {
        return lane.scheme().points() instanceof Stratified points && points.allocation() instanceof Allocation.Neyman
                ? lane.with(lane.scheme().with(new Sharing(question, lane, points, seed).found()))
                : lane;
    }

    private Stratified found() {
        int turns = lane.scheme().turns();
        int cells = points.cellsInAll();
        int each = Math.max(2, Math.ceilDiv(Math.clamp(DRAWS / cells, FEWEST_OF_CELL, MOST_OF_CELL), turns));
        var even = new Stratified(points.cells(), Allocation.Found.even(cells, each));
        var recipe = Recipe.of(question, lane.with(lane.scheme().with(even)), seed, Purpose.ALLOCATION);
        double[] outcome = new double[recipe.components()];
        outcome[0] = 1;
        var spreads = new CellSpreads(cells, each, outcome);
        var item = new Item(new Stretch(0, 0, 0), 0, turns * cells * each);
        var sums = sums(recipe, spreads, item);
        double[] corrected = corrected(spreads, sums);
        if (corrected.length > 1) {
            spreads = new CellSpreads(cells, each, corrected);
            sums(recipe, spreads, item);
        }
        return points.shared(spreads.deviations(), item.draws());
    }

    private static Accumulator sums(Recipe recipe, CellSpreads spreads, Item item) {
        return new Sampler(recipe, spreads)
                .compute(item, () -> false)
                .orElseThrow()
                .sums();
    }

    /// Coefficients of the components in what the error of the first answer is made of.
    private double[] corrected(CellSpreads spreads, Accumulator sums) {
        double[] coefficients = new double[sums.components()];
        coefficients[0] = 1;
        int controls = lane.scheme().controls().size();
        int first = Components.asked(question.asks());
        double[] explained =
                controls == 0 ? new double[0] : new Regression(spreads.within(), 0, first, controls).coefficients();
        for (int c = 0; c < controls; c++) {
            coefficients[first + c] = -explained[c];
        }
        if (lane.scheme().drawFrom().filter(Proposal::selfNormalised).isPresent()) {
            coefficients[coefficients.length - 1] = -sums.mean(0) / sums.mean(coefficients.length - 1);
        }
        return coefficients;
    }
}
