package dev.leadline.project;

import dev.leadline.engine.Look;
import dev.leadline.model.Ask;
import dev.leadline.model.Components;
import dev.leadline.model.Input;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.IntStream;

/// One draw as the command `look` prints it: inputs and steps by name, weight and outcome.
public final class LookJson {

    private LookJson() {}

    /// @param draw its index from 0; empty for the nominal draw
    public static String of(Question question, Plan plan, String lane, OptionalLong draw, Look look) {
        var json = Json.object().put("project", question.title());
        if (draw.isPresent()) {
            json.put("lane", lane).put("seed", Json.of(plan.seed())).put("draw", Json.of(draw.getAsLong()));
        } else {
            json.put("nominal", Json.of(true));
        }
        List<String> inputs = question.inputs().stream().map(Input::name).toList();
        List<String> steps =
                question.working().steps().stream().map(step -> step.name()).toList();
        return JsonWriter.pretty(json.put("inputs", named(inputs, look.inputs()))
                .put("steps", named(steps, look.steps()))
                .put("weight", Json.of(look.weight()))
                .put("outcome", Json.of(look.outcomes().getFirst()))
                .put("answers", answers(question.asks(), look.outcomes()))
                .build());
    }

    private static Json named(List<String> names, List<Double> values) {
        var json = Json.object();
        for (int i = 0; i < names.size(); i++) {
            json.put(names.get(i), Json.of(values.get(i).doubleValue()));
        }
        return json.build();
    }

    private static Json answers(List<Ask> asks, List<Double> outcomes) {
        return Json.list(IntStream.range(0, asks.size())
                .mapToObj(k -> Json.object()
                        .put("ask", asks.get(k).estimand().word())
                        .putUnlessEmpty("unit", asks.get(k).unit())
                        .putUnlessEmpty("label", asks.get(k).label())
                        .put("outcome", outcome(asks, k, outcomes))
                        .build())
                .toList());
    }

    /// A number; a list of them where several formulas are asked of.
    private static Json outcome(List<Ask> asks, int index, List<Double> outcomes) {
        int first = Components.firstFormula(asks, index);
        List<Json> values = outcomes
                .subList(first, first + asks.get(index).formulas().size())
                .stream()
                .map(value -> Json.of(value.doubleValue()))
                .toList();
        return values.size() == 1 ? values.getFirst() : Json.list(values);
    }
}
