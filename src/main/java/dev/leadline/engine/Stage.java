package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Program;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.numeric.Exp;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Stretch;
import dev.leadline.scheme.Tuned;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// Draws of a stage of tuning: where their points lay, what they count, and what the first answer made of them.
///
/// @param points one array for each coordinate, `null` for one that the first answer does not depend on
/// @param weights of the draws
/// @param outcomes of the first answer, with the lengths of ranges but without the weights
/// @param scores how far each draw is from the event, above 0 where it happens; empty where no event is asked for, or
///     one that does not say
record Stage(double[][] points, double[] weights, double[] outcomes, Optional<double[]> scores) {
    /// The draws of one stage from what the stages before have found.
    static Stage of(Question question, Lane lane, Tuned found, long seed, int stage, int draws) {
        var scheme = Scheme.of(new Independent()).with(found);
        var plain = new Lane(lane.name(), scheme, lane.shares(), Optional.empty());
        var recipe = Recipe.ofStage(question, plain, seed, stage);
        var score = score(question);
        var program = score.orElse(recipe.program());
        return new Drawn(recipe, program, score.isPresent(), draws).stage();
    }

    private static Optional<Program> score(Question question) {
        if (!(question.asks().getFirst().estimand() instanceof Estimand.Probability)) {
            return Optional.empty();
        }
        try {
            return Optional.of(question.working().score(0));
        } catch (Refusal _) {
            return Optional.empty();
        }
    }

    int draws() {
        return weights.length;
    }

    /// The sums of what the draws of this stage alone say of the answer.
    Accumulator sums() {
        double[] weighted = new double[draws()];
        for (int i = 0; i < weighted.length; i++) {
            weighted[i] = outcomes[i] == 0 ? 0 : outcomes[i] * weights[i];
        }
        var sums = new Accumulator(1);
        sums.add(new double[][] {weighted}, 0, weighted.length);
        return sums;
    }

    long hits() {
        return Arrays.stream(outcomes).filter(h -> h != 0 && !Double.isNaN(h)).count();
    }

    private static final class Drawn {
        private final Recipe recipe;
        private final Program program;
        private final boolean isEvent;
        private final int draws;

        Drawn(Recipe recipe, Program program, boolean isEvent, int draws) {
            this.recipe = recipe;
            this.program = program;
            this.isEvent = isEvent;
            this.draws = draws;
        }

        Stage stage() {
            boolean[] wanted = new boolean[recipe.question().inputs().size()];
            for (int j = 0; j < wanted.length; j++) {
                wanted[j] = program.uses(j) || recipe.weighing().contains(j);
            }
            var drawing = new Drawing(recipe, wanted);
            var workspace = program.workspace();
            double[][] results = new double[program.outputs()][Program.BLOCK];
            double[][] points = null;
            double[] weights = new double[draws];
            double[] outcomes = new double[draws];
            double[] ranges = new double[Program.BLOCK];
            drawing.open(new Stretch(0, 0, 0));
            for (int from = 0; from < draws; from += Program.BLOCK) {
                int rows = Math.min(Program.BLOCK, draws - from);
                double[][] placed = drawing.place(rows);
                points = points == null ? like(placed, draws) : points;
                for (int j = 0; j < placed.length; j++) {
                    if (placed[j] != null) {
                        System.arraycopy(placed[j], 0, points[j], from, rows);
                    }
                }
                System.arraycopy(drawing.weights().orElseThrow(), 0, weights, from, rows);
                drawing.fill(rows);
                program.evaluate(drawing.columns(), rows, results, workspace);
                weighRanges(drawing.columns(), ranges, rows);
                for (int i = 0; i < rows; i++) {
                    outcomes[from + i] = ranges[i] == 0 ? 0 : results[0][i] * ranges[i];
                }
            }
            if (!isEvent) {
                return new Stage(points, weights, outcomes, Optional.empty());
            }
            double[] hits =
                    Arrays.stream(outcomes).map(score -> score > 0 ? 1 : 0).toArray();
            return new Stage(points, weights, hits, Optional.of(outcomes));
        }

        private static double[][] like(double[][] placed, int draws) {
            return Arrays.stream(placed)
                    .map(column -> column == null ? null : new double[draws])
                    .toArray(double[][]::new);
        }

        /// As [Sampler] weighs them.
        private void weighRanges(double[][] columns, double[] ranges, int rows) {
            Arrays.fill(ranges, 0, rows, recipe.volume());
            List<Integer> weighing = recipe.weighing();
            for (int j : weighing) {
                var range = recipe.range(j);
                for (int i = 0; i < rows; i++) {
                    double x = columns[j][i];
                    ranges[i] *= x >= range.low() && x <= range.high()
                            ? Exp.exp(-recipe.drawn(j).logPdf(x))
                            : 0;
                }
            }
        }
    }
}
