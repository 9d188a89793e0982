package dev.leadline.project;

import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Part;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.Function;

/// A draft as JSON, its fields in the order of the format. What is empty is left out, and so is a number that is not
/// finite: an unfinished draft can be saved, and says what it lacks when it is read.
final class DraftWriter {

    private DraftWriter() {}

    static Json write(Draft draft) {
        var whole = Json.object().put("leadline", Json.of(DraftReader.FORMAT));
        whole.putUnlessEmpty("title", draft.title()).putUnlessEmpty("notes", draft.notes());
        if (draft.safety()) {
            whole.put("safety", Json.of(true));
        }
        list(whole, "constants", draft.constants(), DraftWriter::constant);
        list(whole, "inputs", draft.inputs(), DraftWriter::input);
        draft.dependence().ifPresent(dependence -> whole.put("dependence", dependence(dependence)));
        list(whole, "steps", draft.steps(), Json::of);
        if (draft.asks().size() == 1) {
            whole.put("ask", ask(draft.asks().getFirst()));
        } else {
            list(whole, "ask", draft.asks(), DraftWriter::ask);
        }
        draft.reference().ifPresent(reference -> whole.put("reference", reference(reference)));
        number(whole, "confidence", draft.confidence());
        draft.tolerance().ifPresent(tolerance -> whole.put("tolerance", tolerance(tolerance)));
        draft.interval().ifPresent(interval -> {
            interval.kind().ifPresent(kind -> whole.put("interval", kind));
            interval.bounds()
                    .ifPresent(bounds ->
                            whole.put("bounds", Json.list(List.of(Json.of(bounds.low()), Json.of(bounds.high())))));
        });
        draft.stop().ifPresent(stop -> whole.put("stop", stop(stop)));
        draft.seed().ifPresent(seed -> whole.put("seed", Json.of(seed)));
        if (draft.commonRandomNumbers()) {
            whole.put("commonRandomNumbers", Json.of(true));
        }
        list(whole, "lanes", draft.lanes(), LaneWriter::lane);
        return whole.build();
    }

    private static Json constant(ConstantDraft constant) {
        var fields = Json.object().put("name", constant.name());
        number(fields, "value", constant.value());
        return fields.putUnlessEmpty("unit", constant.unit())
                .putUnlessEmpty("label", constant.label())
                .putUnlessEmpty("source", constant.source())
                .build();
    }

    private static Json input(InputDraft input) {
        var fields = Json.object()
                .put("name", input.name())
                .putUnlessEmpty("unit", input.unit())
                .putUnlessEmpty("label", input.label())
                .putUnlessEmpty("provenance", input.provenance());
        switch (input.from()) {
            case From.Density(var density) -> fields.put("density", density(density));
            case From.Range(double low, double high, var drawFrom) -> {
                fields.put("range", Json.list(List.of(end(low), end(high))));
                drawFrom.ifPresent(density -> fields.put("drawFrom", density(density)));
            }
        }
        return fields.build();
    }

    static Json end(double end) {
        if (Double.isInfinite(end)) {
            return Json.of(end < 0 ? "-inf" : "inf");
        }
        return Json.orNull(end);
    }

    static Json density(DensityDraft density) {
        return density(Json.object(), density);
    }

    private static Json density(Json.Builder fields, DensityDraft density) {
        of(fields, density.of());
        number(fields, "shift", density.shift());
        number(fields, "scale", density.scale());
        density.truncate()
                .ifPresent(ends -> fields.put("truncate", Json.list(List.of(end(ends.low()), end(ends.high())))));
        return fields.build();
    }

    private static void of(Json.Builder fields, DensityDraft.Of of) {
        switch (of) {
            case Member member -> member(fields, member);
            case Values(var values, var probabilities) ->
                fields.put("family", "table")
                        .put("values", numbers(values))
                        .put("probabilities", numbers(probabilities));
            case Mixture(var parts) ->
                fields.put(
                        "mixture",
                        Json.list(parts.stream().map(DraftWriter::part).toList()));
            case Typed(String formula, double from, double to, var breaks, boolean log) -> {
                fields.put("formula", formula).put("from", end(from)).put("to", end(to));
                if (!breaks.isEmpty()) {
                    fields.put("breaks", numbers(breaks));
                }
                if (log) {
                    fields.put("log", Json.of(true));
                }
            }
            case Data(String file, Column column, var kind, var bandwidth, var fitted) -> {
                fields.put("data", file);
                switch (column) {
                    case Column.Only _ -> {}
                    case Column.Named(String header) -> fields.put("column", header);
                    case Column.At(long index) -> fields.put("column", Json.of(index));
                }
                kind.ifPresent(word -> fields.put("kind", word));
                number(fields, "bandwidth", bandwidth);
                fitted.ifPresent(member -> fields.put("fitted", member(Json.object(), member)));
            }
        }
    }

    private static Json member(Json.Builder fields, Member member) {
        fields.put("family", member.family());
        member.parameters().forEach((name, value) -> number(fields, name, value));
        return fields.build();
    }

    private static Json part(Part part) {
        var fields = Json.object();
        number(fields, "weight", part.weight());
        return density(fields, part.density());
    }

    private static Json numbers(List<Double> values) {
        return Json.list(values.stream().map(Json::orNull).toList());
    }

    static Json dependence(DependenceDraft dependence) {
        var fields = Json.object().put("copula", dependence.copula());
        number(fields, "dof", dependence.dof());
        if (dependence.repair()) {
            fields.put("repair", Json.of(true));
        }
        return fields.put(
                        "pairs",
                        Json.list(dependence.pairs().stream()
                                .map(DraftWriter::pair)
                                .toList()))
                .build();
    }

    private static Json pair(PairDraft pair) {
        var fields = Json.object().put("of", Json.list(List.of(Json.of(pair.one()), Json.of(pair.other()))));
        number(fields, pair.measure(), pair.value());
        return fields.build();
    }

    private static Json ask(AskDraft ask) {
        var fields = Json.object();
        if (ask.formulas().size() == 1) {
            fields.put(ask.estimand(), ask.formula());
        } else {
            fields.put(
                    ask.estimand(),
                    Json.list(ask.formulas().stream().map(Json::of).toList()));
        }
        number(fields, "at", ask.at());
        number(fields, "coverage", ask.coverage());
        return fields.putUnlessEmpty("unit", ask.unit())
                .putUnlessEmpty("label", ask.label())
                .build();
    }

    private static Json reference(ReferenceDraft reference) {
        var fields = Json.object();
        return switch (reference) {
            case ReferenceDraft.Value(double value, var error, var source) -> {
                number(fields, "value", value);
                number(fields, "error", error);
                yield fields.putUnlessEmpty("source", source).build();
            }
            case ReferenceDraft.Formula(var formula) ->
                fields.put("formula", formula).build();
            case ReferenceDraft.Quadrature _ ->
                fields.put("quadrature", Json.of(true)).build();
        };
    }

    private static Json tolerance(ToleranceDraft tolerance) {
        var fields = Json.object();
        number(fields, "absolute", tolerance.absolute());
        number(fields, "relative", tolerance.relative());
        tolerance.when().ifPresent(when -> fields.put("when", when));
        return fields.build();
    }

    private static Json stop(StopDraft stop) {
        var fields = Json.object().putUnlessEmpty("rule", stop.rule());
        count(fields, "draws", stop.draws());
        number(fields, "seconds", stop.seconds());
        count(fields, "hits", stop.hits());
        stop.guard().ifPresent(guard -> {
            var least = Json.object();
            count(least, "draws", guard.draws());
            count(least, "hits", guard.hits());
            fields.put("guard", least.build());
        });
        count(fields, "first", stop.first());
        number(fields, "inflation", stop.inflation());
        count(fields, "digits", stop.digits());
        return fields.build();
    }

    private static <T> void list(Json.Builder fields, String name, List<T> parts, Function<T, Json> json) {
        if (!parts.isEmpty()) {
            fields.put(name, Json.list(parts.stream().map(json).toList()));
        }
    }

    private static void count(Json.Builder fields, String name, OptionalLong value) {
        value.ifPresent(count -> fields.put(name, Json.of(count)));
    }

    private static void number(Json.Builder fields, String name, OptionalDouble value) {
        value.ifPresent(number -> number(fields, name, number));
    }

    private static void number(Json.Builder fields, String name, double value) {
        if (Double.isFinite(value)) {
            fields.put(name, Json.of(value));
        }
    }
}
