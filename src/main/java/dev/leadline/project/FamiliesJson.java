package dev.leadline.project;

import dev.leadline.density.Family;
import dev.leadline.density.Knowledge;
import dev.leadline.density.Parameter;
import dev.leadline.density.Portrait;
import dev.leadline.density.Suggestion;
import dev.leadline.density.Support;
import dev.leadline.model.DensityDraft;
import java.util.List;

/// The families as the command `families` prints them: `{"families": [{"family", "parameters", "use"}]}`, parameters
/// as a list for each way to enter a member; a member has its `portrait` beside them.
public final class FamiliesJson {

    /// Of a curve.
    private static final int POINTS = 101;

    private FamiliesJson() {}

    public static String of(List<Family> families) {
        return whole(families.stream().map(f -> family(f).build()).toList());
    }

    /// @param portrait of a member of the family
    public static String of(Family family, Portrait portrait) {
        return whole(List.of(family(family).put("portrait", portrait(portrait)).build()));
    }

    /// @param portrait of the member that is suggested
    public static String of(Suggestion suggestion, Family family, Portrait portrait) {
        return JsonWriter.pretty(Json.object()
                .put("density", member(suggestion))
                .put("provenance", suggestion.provenance())
                .put(
                        "families",
                        Json.list(List.of(family(family)
                                .put("portrait", portrait(portrait))
                                .build())))
                .build());
    }

    /// As a project has it.
    public static String density(Suggestion suggestion) {
        return JsonWriter.pretty(member(suggestion)).strip();
    }

    /// The ways of knowing something about a quantity: `{"known": [{"word", "title", "parameters"}]}`.
    public static String ways(List<Knowledge> ways) {
        return JsonWriter.pretty(Json.object()
                .put(
                        "known",
                        Json.list(ways.stream()
                                .map(way -> Json.object()
                                        .put("word", way.word())
                                        .put("title", way.title())
                                        .put(
                                                "parameters",
                                                Json.list(way.parameters().stream()
                                                        .map(FamiliesJson::parameter)
                                                        .toList()))
                                        .build())
                                .toList()))
                .build());
    }

    private static Json member(Suggestion suggestion) {
        return DraftWriter.density(DensityDraft.of(suggestion.family(), suggestion.parameters()));
    }

    private static String whole(List<Json.Members> families) {
        return JsonWriter.pretty(
                Json.object().put("families", Json.list(families)).build());
    }

    private static Json.Builder family(Family family) {
        return Json.object()
                .put("family", family.name())
                .put(
                        "parameters",
                        Json.list(family.entries().stream()
                                .map(entry -> Json.list(entry.stream()
                                        .map(FamiliesJson::parameter)
                                        .toList()))
                                .toList()))
                .put("use", family.use());
    }

    private static Json portrait(Portrait portrait) {
        var json = Json.object()
                .put("support", interval(portrait.support()))
                .put("discrete", Json.of(portrait.isDiscrete()))
                .put("mean", Json.orNull(portrait.mean()))
                .put("sd", Json.orNull(portrait.sd()))
                .put("variance", Json.orNull(portrait.variance()))
                .put("skewness", Json.orNull(portrait.skewness()))
                .put("excessKurtosis", Json.orNull(portrait.excessKurtosis()))
                .put(
                        "quantiles",
                        Json.list(portrait.quantiles().stream()
                                .map(FamiliesJson::quantile)
                                .toList()))
                .put("tails", words(portrait.tails()))
                .put("warnings", words(portrait.warnings()));
        portrait.shown().ifPresent(shown -> {
            json.put("shown", interval(shown));
            if (portrait.isDiscrete()) {
                json.put(
                        "bars",
                        Json.list(
                                portrait.bars().stream().map(FamiliesJson::bar).toList()));
            } else {
                json.put(
                        "curve",
                        Json.list(portrait.points(shown, POINTS).stream()
                                .map(FamiliesJson::point)
                                .toList()));
            }
        });
        return json.build();
    }

    private static Json interval(Support support) {
        return Json.list(List.of(Json.of(support.low()), Json.of(support.high())));
    }

    private static Json quantile(Portrait.Quantile quantile) {
        return Json.object()
                .put("below", Json.of(quantile.below()))
                .put("above", Json.of(quantile.above()))
                .put("value", Json.of(quantile.value()))
                .build();
    }

    private static Json bar(Portrait.Bar bar) {
        return Json.object()
                .put("from", Json.of(bar.from()))
                .put("to", Json.of(bar.to()))
                .put("chance", Json.of(bar.chance()))
                .build();
    }

    private static Json point(Portrait.Point point) {
        return Json.object()
                .put("x", Json.of(point.x()))
                .put("pdf", Json.of(point.pdf()))
                .put("cdf", Json.of(point.below()))
                .put("survival", Json.of(point.above()))
                .build();
    }

    private static Json words(List<String> words) {
        return Json.list(words.stream().map(Json::of).toList());
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
