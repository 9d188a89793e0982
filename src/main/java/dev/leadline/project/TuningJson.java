package dev.leadline.project;

import dev.leadline.model.Question;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import java.util.Arrays;

/// A density that was found before the run, with the stages of the search: all its numbers, so that it stands in a
/// record of the run.
final class TuningJson {
    private TuningJson() {}

    static Json of(Question question, Tuned tuned) {
        return Json.object()
                .put("adapt", tuned.wish().way().word())
                .put("shares", Json.of(tuned.of()))
                .put("nominal", Json.of(tuned.nominal()))
                .put(
                        "stages",
                        Json.list(tuned.stages().stream().map(TuningJson::stage).toList()))
                .put(
                        "parts",
                        Json.list(tuned.parts().stream()
                                .map(part -> part(question, part))
                                .toList()))
                .build();
    }

    private static Json stage(Tuned.Stage stage) {
        return Json.object()
                .put("draws", Json.of(stage.draws()))
                .put("level", Json.orNull(stage.level()))
                .put("hits", Json.of(stage.hits()))
                .put("estimate", Json.orNull(stage.estimate()))
                .put("standardError", Json.orNull(stage.standardError()))
                .build();
    }

    private static Json part(Question question, Tuned.Part part) {
        var inputs = Json.object();
        part.warps().forEach((coordinate, warp) -> inputs.put(name(question, coordinate), warp(warp)));
        return Json.object()
                .put("share", Json.of(part.share()))
                .put("inputs", inputs.build())
                .build();
    }

    /// A coordinate behind the inputs mixes a copula.
    private static String name(Question question, int coordinate) {
        return coordinate < question.inputs().size()
                ? question.inputs().get(coordinate).name()
                : "*";
    }

    private static Json warp(Warp warp) {
        return switch (warp) {
            case Warp.OfScores(double mean, double sd) ->
                Json.object()
                        .put("scoreMean", Json.orNull(mean))
                        .put("scoreSd", Json.orNull(sd))
                        .build();
            case Warp.Steps(double[] edges) ->
                Json.object()
                        .put(
                                "edges",
                                Json.list(Arrays.stream(edges)
                                        .mapToObj(Json::orNull)
                                        .toList()))
                        .build();
        };
    }
}
