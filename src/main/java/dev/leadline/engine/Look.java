package dev.leadline.engine;

import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Program;
import dev.leadline.model.Ask;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/// One draw looked at again.
///
/// @param inputs values in the order of the question's inputs
/// @param steps values in the order of the steps
/// @param weight what outcomes are multiplied by: where the draw is from other densities, those of the inputs
///     over them; where cells share the draws of a pass, what it counts among them; of integrals also the
///     volume of bounded ranges, and one over the density drawn from on unbounded ones; 0 beyond a range; 1
///     where nothing weighs
/// @param outcomes one for each formula asked, before the weight
public record Look(List<Double> inputs, List<Double> steps, double weight, List<Double> outcomes) {
    public Look {
        inputs = List.copyOf(inputs);
        steps = List.copyOf(steps);
        outcomes = List.copyOf(outcomes);
    }

    /// The draw with index `draw` (from 0) of a lane, made again from its address.
    ///
    /// @throws Refusal where the lane has no such draw
    public static Look at(Question question, Lane lane, long seed, long draw) {
        var recipe = Recipe.of(question, lane, seed);
        long most = recipe.items().whole(Stop.MOST_DRAWS);
        if (draw >= most) {
            throw new Refusal(
                    Problem.of(String.format(Locale.ROOT, "there is no draw %,d in lane %s", draw, lane.name()))
                            .because(String.format(
                                    Locale.ROOT, "Its points end with draw %,d; the first is draw 0.", most - 1)));
        }
        var drawn = Drawing.single(recipe, draw);
        double[] inputs = drawn.inputs();
        double weight = drawn.weight() * Weights.of(recipe, inputs);
        double log = isIntegral(question) ? Log.log(drawn.weight()) + Weights.logOf(recipe, inputs) : 0;
        return of(question, inputs, log, weight);
    }

    /// Every input at its median.
    public static Look nominal(Question question) {
        return of(
                question,
                question.inputs().stream()
                        .mapToDouble(input -> input.drawn().quantile(.5))
                        .toArray(),
                0,
                1);
    }

    /// @param counted what the draw counts because of the density it was drawn from
    /// @param log its logarithm
    private static Look of(Question question, double[] inputs, double log, double counted) {
        Program program = question.working().everyStep();
        double[][] columns =
                Arrays.stream(inputs).mapToObj(x -> new double[] {x}).toArray(double[][]::new);
        double[][] results = new double[program.outputs()][1];
        program.evaluate(columns, 1, results, program.workspace());
        int steps = question.working().steps().size();
        return new Look(
                Arrays.stream(inputs).boxed().toList(),
                Arrays.stream(results).limit(steps).map(r -> r[0]).toList(),
                isIntegral(question) ? weight(question, inputs, log) : counted,
                Arrays.stream(results).skip(steps).map(r -> r[0]).toList());
    }

    private static boolean isIntegral(Question question) {
        return question.asks().stream().map(Ask::estimand).anyMatch(Estimand.Integral.class::isInstance);
    }

    private static double weight(Question question, double[] inputs, double counted) {
        double volume = 1;
        double log = counted;
        for (int j = 0; j < inputs.length; j++) {
            Input input = question.inputs().get(j);
            switch (input.role()) {
                case Role.Random _ -> {}
                case Role.Range(double low, double high) -> volume *= high - low;
                case Role.UnboundedRange(double low, double high) ->
                    log -= inputs[j] >= low && inputs[j] <= high
                            ? input.drawn().logPdf(inputs[j])
                            : Double.POSITIVE_INFINITY;
            }
        }
        return volume * Exp.exp(log);
    }
}
