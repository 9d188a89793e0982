package dev.leadline.project;

import dev.leadline.interval.Ratio;
import dev.leadline.study.Comparison;
import dev.leadline.study.Need;
import java.util.List;
import java.util.Optional;

/// Two lanes compared, as the commands print it. Ratios are `[low, value, high]`, `null` where there is none.
final class ComparisonJson {
    private ComparisonJson() {}

    static Json of(Comparison comparison) {
        return Json.object()
                .put("of", Json.list(List.of(Json.of(comparison.a()), Json.of(comparison.b()))))
                .put("varianceRatio", ratio(comparison.varianceRatio()))
                .put("timeRatio", ratio(comparison.timeRatio()))
                .put("efficiencyRatio", ratio(comparison.efficiencyRatio()))
                .put("outcome", word(comparison.outcome()))
                .put("paired", Json.of(comparison.paired()))
                .put(
                        "toTolerance",
                        Json.list(comparison.needs().stream()
                                .map(ComparisonJson::need)
                                .toList()))
                .put("sentence", comparison.sentence())
                .put(
                        "notes",
                        Json.list(comparison.notes().stream().map(Json::of).toList()))
                .build();
    }

    private static String word(Comparison.Outcome outcome) {
        return switch (outcome) {
            case A_BETTER -> "first-better";
            case B_BETTER -> "second-better";
            case NO_DIFFERENCE -> "no-difference";
            case CANNOT_TELL -> "cannot-tell";
        };
    }

    private static Json need(Need need) {
        return Json.object()
                .put("lane", need.lane())
                .put("draws", ratio(Optional.of(need.draws())))
                .put("seconds", ratio(need.seconds()))
                .put("basis", need.basis())
                .build();
    }

    static Json ratio(Optional<Ratio> ratio) {
        return ratio.<Json>map(
                        r -> Json.list(List.of(Json.orNull(r.low()), Json.orNull(r.value()), Json.orNull(r.high()))))
                .orElse(new Json.Null());
    }
}
