package dev.leadline.project;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Dependence;
import dev.leadline.model.Dependence.Repair;
import dev.leadline.model.Question;
import java.util.List;

/// How inputs are tied, as commands print it:
/// `{"copula", "dof", "pairs": [{"of", "measure", "target", "taken", "latent", "achieved", "interval"}], "repaired"}`.
///
/// `target` is what was stated, `taken` what is drawn with: another only where it was repaired; `latent` is the
/// correlation of the normals behind the two; `repaired` is `null`, or a list of what the nearest
/// possible correlations changed.
final class DependenceJson {

    private DependenceJson() {}

    /// `null` where no inputs are tied.
    static Json of(Question question, List<Achieved> achieved) {
        return question.dependence()
                .map(dependence -> of(question, dependence, achieved))
                .orElse(new Json.Null());
    }

    private static Json of(Question question, Dependence dependence, List<Achieved> achieved) {
        var mixing = dependence.copula().mixing();
        var json = Json.object().put("copula", mixing.word());
        mixing.degreesOfFreedom().ifPresent(dof -> json.put("dof", Json.of(dof)));
        return json.put(
                        "pairs",
                        Json.list(achieved.stream().map(a -> pair(question, a)).toList()))
                .put(
                        "repaired",
                        dependence.repairs().isEmpty()
                                ? new Json.Null()
                                : Json.list(dependence.repairs().stream()
                                        .map(repair -> repair(question, repair))
                                        .toList()))
                .build();
    }

    private static Json pair(Question question, Achieved achieved) {
        var tie = achieved.tie();
        var interval = achieved.interval();
        var json = Json.object()
                .put("of", names(question, tie.one(), tie.other()))
                .put("measure", tie.measure().word())
                .put("target", Json.of(tie.target()))
                .put("taken", Json.of(question.dependence().orElseThrow().taken(tie)))
                .put("latent", Json.of(tie.latent()))
                .put("achieved", Json.orNull(achieved.value()))
                .put("interval", Json.list(List.of(Json.orNull(interval.low()), Json.orNull(interval.high()))));
        interval.note().ifPresent(note -> json.put("intervalNote", note));
        return json.build();
    }

    private static Json repair(Question question, Repair repair) {
        return Json.object()
                .put("of", names(question, repair.one(), repair.other()))
                .put("measure", repair.measure().word())
                .put("from", Json.of(repair.from()))
                .put("to", Json.of(repair.to()))
                .build();
    }

    private static Json names(Question question, int one, int other) {
        return Json.list(List.of(
                Json.of(question.inputs().get(one).name()),
                Json.of(question.inputs().get(other).name())));
    }
}
