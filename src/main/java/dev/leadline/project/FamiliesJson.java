package dev.leadline.project;

import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import java.util.List;

/// The families as the command `families` prints them: `{"families": [{"family", "parameters", "use"}]}`, parameters
/// as a list for each way to enter a member.
public final class FamiliesJson {

    private FamiliesJson() {}

    public static String of(List<Family> families) {
        return JsonWriter.pretty(Json.object()
                .put(
                        "families",
                        Json.list(families.stream().map(FamiliesJson::family).toList()))
                .build());
    }

    private static Json family(Family family) {
        return Json.object()
                .put("family", family.name())
                .put(
                        "parameters",
                        Json.list(family.entries().stream()
                                .map(entry -> Json.list(entry.stream()
                                        .map(FamiliesJson::parameter)
                                        .toList()))
                                .toList()))
                .put("use", family.use())
                .build();
    }

    private static Json parameter(Parameter parameter) {
        return Json.object()
                .put("name", parameter.name())
                .put("rule", parameter.rule())
                .put("optional", Json.of(parameter.optional()))
                .put("use", parameter.use())
                .build();
    }
}
