package dev.leadline.project;

import dev.leadline.interval.Ratio;
import dev.leadline.model.Plan;
import dev.leadline.model.Project;
import dev.leadline.model.Sentence;
import dev.leadline.study.LanePlan;
import dev.leadline.study.Need;
import dev.leadline.study.Planning;
import java.util.Optional;
import java.util.OptionalLong;

/// How many draws each lane needs, as the command `plan` prints it. `draws` and `seconds` are those of the rule in
/// force; nothing but the seconds depends on a clock.
public final class PlanJson {
    private PlanJson() {}

    /// @param name what to call the project where it has no title
    public static String of(String name, Project project, Plan plan, Planning planning) {
        var question = project.question();
        return JsonWriter.pretty(Json.object()
                .put("project", question.title().isEmpty() ? name : question.title())
                .put("question", Sentence.of(project.draft()).text())
                .put("seed", Json.of(plan.seed()))
                .put("version", Version.text())
                .put("fingerprint", Fingerprint.of(project))
                .put("pilotDraws", Json.of(planning.draws()))
                .put(
                        "plan",
                        Json.list(planning.lanes().stream().map(PlanJson::lane).toList()))
                .build());
    }

    private static Json lane(LanePlan lane) {
        return Json.object()
                .put("lane", lane.lane())
                .put("scheme", lane.scheme())
                .put("seen", Json.of(lane.seen()))
                .put("rule", lane.rule())
                .put("draws", ComparisonJson.ratio(lane.inForce().map(Need::draws)))
                .put("seconds", seconds(lane.inForce()))
                .put("fixed", lane.fixed().map(PlanJson::need).orElse(new Json.Null()))
                .put("anyTime", lane.anyTime().map(PlanJson::need).orElse(new Json.Null()))
                .put("hits", whole(lane.hits()))
                .put("drawsForLimits", whole(lane.limits()))
                .put("cannotTell", lane.lack().map(Json::of).orElse(new Json.Null()))
                .put("notes", Json.list(lane.notes().stream().map(Json::of).toList()))
                .build();
    }

    private static Json need(Need need) {
        return Json.object()
                .put("draws", ComparisonJson.ratio(Optional.of(need.draws())))
                .put("seconds", seconds(Optional.of(need)))
                .put("secondsInterval", ComparisonJson.ratio(need.seconds()))
                .put("basis", need.basis())
                .build();
    }

    private static Json seconds(Optional<Need> need) {
        return need.flatMap(Need::seconds).map(Ratio::value).map(Json::of).orElse(new Json.Null());
    }

    private static Json whole(OptionalLong number) {
        return number.isPresent() ? Json.of(number.getAsLong()) : new Json.Null();
    }
}
