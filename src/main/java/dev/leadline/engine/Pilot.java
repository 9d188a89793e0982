package dev.leadline.engine;

import dev.leadline.estimate.Landmark;
import dev.leadline.formula.Program;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.Components;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Stretch;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/// Draws of a lane before its run: independent ones from what it draws from. They say where outcomes lie and enter no
/// answer.
final class Pilot {
    private Pilot() {}

    /// Of each thing asked.
    static List<Landmark> landmarks(Question question, Lane lane, long seed) {
        var scheme = lane.scheme();
        int asks = question.asks().size();
        if (scheme.points() instanceof Repetitions) {
            return Collections.nCopies(asks, Landmark.NONE);
        }
        var points = new Scheme(new Independent(), scheme.drawFrom(), List.of(), false, scheme.adapted());
        var recipe = Recipe.ofPilot(question, new Lane(lane.name(), points, lane.shares(), Optional.empty()), seed);
        int draws = question.asks().stream()
                .mapToInt(ask -> Landmark.pilotDraws(ask.estimand()))
                .max()
                .orElseThrow();
        double[][] outcomes = new double[recipe.program().outputs()][draws];
        double[] weights = new double[draws];
        draw(recipe, outcomes, weights);
        double[] ones = new double[draws];
        Arrays.fill(ones, 1);
        return IntStream.range(0, asks)
                .mapToObj(a -> {
                    int formula = Components.firstFormula(question.asks(), a);
                    boolean integral = recipe.isWhole(formula);
                    var found = Landmark.of(
                            question.asks().get(a).estimand(), outcomes[formula], integral ? ones : weights);
                    boolean isResampled = question.interval().kind() == IntervalKind.BOOTSTRAP_T;
                    return isResampled ? found.keepingAll() : found;
                })
                .toList();
    }

    private static void draw(Recipe recipe, double[][] outcomes, double[] weights) {
        var evaluation = new Evaluation(recipe);
        evaluation.open(new Stretch(0, 0, 0));
        for (int from = 0; from < weights.length; from += Program.BLOCK) {
            int rows = Math.min(Program.BLOCK, weights.length - from);
            evaluation.next(rows);
            for (int f = 0; f < outcomes.length; f++) {
                System.arraycopy(evaluation.outcomes()[f], 0, outcomes[f], from, rows);
            }
            if (evaluation.isWeighted()) {
                System.arraycopy(evaluation.weights(), 0, weights, from, rows);
            } else {
                Arrays.fill(weights, from, from + rows, 1);
            }
        }
    }
}
