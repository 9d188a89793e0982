package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Extremes.Floor;
import dev.leadline.formula.Program;
import dev.leadline.numeric.Normal;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.SplittingOutcome;
import dev.leadline.stream.Stream;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.stream.IntStream;

/// Makes repetitions of splitting. The particles climb in the normal scores of the coordinates; ties, densities and the
/// formula follow as for any point. Scratch of one worker, confined to it.
final class Climber implements ItemWork {
    private static final double SMALLEST = 0x1p-53;
    private static final double LARGEST = 1 - 0x1p-53;

    private final Recipe recipe;
    private final Repetitions repetitions;
    private final Program score;
    private final Program.Workspace workspace;
    private final Drawing drawing;
    private final double[][] points;

    /// Coordinates that the score depends on.
    private final int[] climbing;

    private final double[][] scores = new double[1][];

    Climber(Recipe recipe, Repetitions repetitions) {
        this.recipe = recipe;
        this.repetitions = repetitions;
        this.score = recipe.question().working().score(0);
        this.workspace = score.workspace();
        boolean[] wanted = new boolean[recipe.question().inputs().size()];
        for (int j = 0; j < wanted.length; j++) {
            wanted[j] = score.uses(j);
        }
        this.drawing = new Drawing(recipe, wanted);
        this.points = drawing.points();
        this.climbing =
                IntStream.range(0, points.length).filter(j -> points[j] != null).toArray();
    }

    @Override
    public Optional<ItemSums> compute(Item item, Floor floor, BooleanSupplier cancelled) {
        Stream numbers = recipe.numbers(item.stretch().item());
        return repetitions
                .splitting()
                .run(this::scoreAt, climbing.length, numbers, cancelled)
                .map(outcome -> sums(item, outcome));
    }

    private void scoreAt(double[][] z, int rows, double[] values) {
        for (int c = 0; c < climbing.length; c++) {
            double[] u = points[climbing[c]];
            Normal.cdf(z[c], u, rows);
            for (int i = 0; i < rows; i++) {
                u[i] = Math.min(Math.max(u[i], SMALLEST), LARGEST);
            }
        }
        drawing.fill(rows);
        scores[0] = values;
        score.evaluate(drawing.columns(), rows, scores, workspace);
    }

    private static ItemSums sums(Item item, SplittingOutcome outcome) {
        var sums = new Accumulator(Repetitions.COMPONENTS);
        double[][] observation = {
            {outcome.steps()},
            {outcome.tied()},
            {(double) outcome.drawnFailed() / outcome.drawn()},
            {outcome.end().ordinal()}
        };
        sums.add(observation, 0, 1);
        var made = new Item(item.stretch(), item.firstDraw(), (int) Math.min(outcome.evaluations(), Integer.MAX_VALUE));
        return new ItemSums(made, sums, Optional.empty(), List.of(), List.of());
    }
}
