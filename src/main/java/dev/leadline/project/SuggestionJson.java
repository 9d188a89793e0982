package dev.leadline.project;

import dev.leadline.model.LaneDraft;
import dev.leadline.study.Suggestion;

/// Schemes tried, as the command `suggest` prints them, and the recommended lane as a project has it.
public final class SuggestionJson {
    private SuggestionJson() {}

    public static String of(Suggestion suggestion) {
        return JsonWriter.pretty(Json.object()
                .put("draws", Json.of(suggestion.draws()))
                .put(
                        "suggestions",
                        Json.list(suggestion.rows().stream()
                                .map(SuggestionJson::row)
                                .toList()))
                .put("recommended", LaneWriter.lane(suggestion.recommended().lane()))
                .build());
    }

    private static Json row(Suggestion.Row row) {
        return Json.object()
                .put("lane", LaneWriter.lane(row.lane()))
                .put("scheme", row.scheme())
                .put("varianceRatio", ComparisonJson.ratio(row.varianceRatio()))
                .put("timeRatio", ComparisonJson.ratio(row.timeRatio()))
                .put("efficiencyRatio", ComparisonJson.ratio(row.efficiencyRatio()))
                .put("reason", row.reason())
                .build();
    }

    /// A lane to be written into a project.
    public static String lane(LaneDraft lane) {
        return JsonWriter.pretty(LaneWriter.lane(lane));
    }
}
