package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.scheme.Growing;

/// Makes observations of draws. Scratch of one worker.
sealed interface Folding permits Means, CellMeans, CellSpreads {
    static Folding of(Recipe recipe) {
        var scheme = recipe.lane().scheme();
        return scheme.allotted()
                .<Folding>map(found -> new CellMeans(found, scheme.turns(), recipe.components()))
                .orElseGet(() -> new Means(
                        scheme.points() instanceof Growing ? scheme.drawsPerObservation() : 1, recipe.components()));
    }

    /// Whether each draw is an observation.
    default boolean isPlain() {
        return false;
    }

    /// Goes to the first draw of an item.
    void open();

    /// Adds the observations that end in these draws. False where a draw is not finite.
    boolean addTo(Accumulator sums, double[][] components, int rows);

    /// The same draws, not added yet, each times what it counts in its observation beside the others; 1 on
    /// average.
    default double[][] counted(double[][] components, int rows) {
        return components;
    }

    /// Multiplies the weights of the same draws, not added yet, by what each counts in its observation.
    default void count(double[] weights, int rows) {}
}
