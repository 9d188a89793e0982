package dev.leadline.engine;

import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Program;
import dev.leadline.model.Ask;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import java.util.Arrays;
import java.util.List;

/// One draw looked at again.
///
/// @param inputs values in the order of the question's inputs
/// @param steps values in the order of the steps
/// @param weight what outcomes are multiplied by: where the draw is from other densities, those of the inputs over
///     them; of integrals also the volume of bounded ranges, and one over the density drawn from on unbounded ones; 0
///     beyond a range; 1 where nothing weighs
/// @param outcomes one for each thing asked, before the weight
public record Look(List<Double> inputs, List<Double> steps, double weight, List<Double> outcomes) {
    public Look {
        inputs = List.copyOf(inputs);
        steps = List.copyOf(steps);
        outcomes = List.copyOf(outcomes);
    }

    /// The draw with index `draw` (from 0) of a lane, made again from its address.
    public static Look at(Question question, Lane lane, long seed, long draw) {
        var recipe = Recipe.of(question, lane, seed);
        var drawn = Drawing.single(recipe, draw);
        return of(question, drawn.inputs(), drawn.weight() * Weights.of(recipe, drawn.inputs()));
    }

    /// Every input at its median.
    public static Look nominal(Question question) {
        return of(
                question,
                question.inputs().stream()
                        .mapToDouble(input -> input.drawn().quantile(.5))
                        .toArray(),
                1);
    }

    /// @param counted what the draw counts because of the density it was drawn from
    private static Look of(Question question, double[] inputs, double counted) {
        Program program = question.working().everyStep();
        double[][] columns =
                Arrays.stream(inputs).mapToObj(x -> new double[] {x}).toArray(double[][]::new);
        double[][] results = new double[program.outputs()][1];
        program.evaluate(columns, 1, results, program.workspace());
        int steps = question.working().steps().size();
        return new Look(
                Arrays.stream(inputs).boxed().toList(),
                Arrays.stream(results).limit(steps).map(r -> r[0]).toList(),
                counted * weight(question, inputs),
                Arrays.stream(results).skip(steps).map(r -> r[0]).toList());
    }

    private static double weight(Question question, double[] inputs) {
        if (question.asks().stream().map(Ask::estimand).noneMatch(Estimand.Integral.class::isInstance)) {
            return 1;
        }
        double weight = 1;
        for (int j = 0; j < inputs.length; j++) {
            Input input = question.inputs().get(j);
            weight *= switch (input.role()) {
                case Role.Random _ -> 1;
                case Role.Range(double low, double high) -> high - low;
                case Role.UnboundedRange(double low, double high) ->
                    inputs[j] >= low && inputs[j] <= high ? 1 / input.drawn().pdf(inputs[j]) : 0;
            };
        }
        return weight;
    }
}
