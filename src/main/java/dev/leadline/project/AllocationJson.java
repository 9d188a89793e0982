package dev.leadline.project;

import dev.leadline.model.Input;
import dev.leadline.model.Question;
import dev.leadline.scheme.Allocation;
import dev.leadline.scheme.Stratified;

/// How the draws of a pass were shared among its cells before the run: all its numbers, so that it stands in
/// a record of the run. Cells are listed with the first input that has several running fastest.
final class AllocationJson {
    private AllocationJson() {}

    static Json of(Question question, Stratified points, Allocation.Found found) {
        var cells = Json.object();
        question.inputs().stream()
                .map(Input::name)
                .filter(points.cells()::containsKey)
                .forEach(
                        name -> cells.put(name, Json.of(points.cells().get(name).longValue())));
        return Json.object()
                .put("cells", cells.build())
                .put("pilotDraws", Json.of(found.pilot()))
                .put("drawsPerPass", Json.of(points.drawsPerObservation()))
                .put(
                        "standardDeviations",
                        Json.list(found.deviations().stream().map(Json::orNull).toList()))
                .put("draws", Json.list(found.draws().stream().map(Json::of).toList()))
                .build();
    }
}
