package dev.leadline.project;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Question;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.util.List;
import java.util.Optional;
import java.util.function.ToIntFunction;

/// Problems as the commands print them: `{"problems": [{"path", "primary", "detail", "hint", "from", "to"}]}`.
public final class ProblemsJson {

    private ProblemsJson() {}

    public static String of(List<Problem> problems) {
        return JsonWriter.pretty(json(problems).build());
    }

    /// Of a question that has none, with how its inputs are tied where some are.
    public static String none(Question question, List<Achieved> achieved) {
        var json = json(List.of());
        if (question.dependence().isPresent()) {
            json.put("dependence", DependenceJson.of(question, achieved));
        }
        return JsonWriter.pretty(json.build());
    }

    private static Json.Builder json(List<Problem> problems) {
        return Json.object()
                .put(
                        "problems",
                        Json.list(problems.stream().map(ProblemsJson::problem).toList()));
    }

    private static Json problem(Problem problem) {
        return Json.object()
                .put("path", problem.place().path())
                .put("primary", problem.primary())
                .put("detail", text(problem.detail()))
                .put("hint", text(problem.hint()))
                .put("from", end(problem, Span::from))
                .put("to", end(problem, Span::to))
                .build();
    }

    private static Json text(Optional<String> text) {
        return text.<Json>map(Json.Text::new).orElse(new Json.Null());
    }

    private static Json end(Problem problem, ToIntFunction<Span> end) {
        return problem.place()
                .span()
                .map(span -> Json.of((long) end.applyAsInt(span)))
                .orElse(new Json.Null());
    }
}
