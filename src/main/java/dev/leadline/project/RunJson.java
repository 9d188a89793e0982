package dev.leadline.project;

import dev.leadline.engine.Achieved;
import dev.leadline.estimate.Chance;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Outermost;
import dev.leadline.ground.Ground;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.Interval;
import dev.leadline.interval.NoHit;
import dev.leadline.model.Components;
import dev.leadline.model.Input;
import dev.leadline.model.Plan;
import dev.leadline.model.Project;
import dev.leadline.model.Sentence;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.scheme.Stratified;
import dev.leadline.study.Comparison;
import dev.leadline.study.LaneState;
import dev.leadline.study.StudyState;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Failure;
import dev.leadline.trace.FirstStage;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/// A finished run as the command `run` prints it. Nothing in it but `seconds` depends on a clock.
///
/// `null` stands for a number that does not exist.
public final class RunJson {

    private final Project project;

    private RunJson(Project project) {
        this.project = project;
    }

    /// @param name what to call the project where it has no title
    /// @param plan what was run
    /// @param achieved correlations of the inputs that are tied
    public static String of(String name, Project project, Plan plan, StudyState state, List<Achieved> achieved) {
        var question = project.question();
        var run = new RunJson(project);
        List<Comparison> comparisons = state.comparisons();
        var json = Json.object()
                .put("project", question.title().isEmpty() ? name : question.title())
                .put("question", Sentence.of(project.draft()).text())
                .put("seed", Json.of(plan.seed()))
                .put("version", Version.text())
                .put("fingerprint", Fingerprint.of(project))
                .put("dependence", DependenceJson.of(question, achieved))
                .put("lanes", Json.list(state.lanes().stream().map(run::lane).toList()))
                .put("reference", reference(state))
                .put("comparison", comparisons.isEmpty() ? new Json.Null() : ComparisonJson.of(comparisons.getFirst()));
        if (comparisons.size() > 1) {
            json.put(
                    "comparisons",
                    Json.list(comparisons.stream().map(ComparisonJson::of).toList()));
        }
        return JsonWriter.pretty(json.build());
    }

    private Json lane(LaneState lane) {
        var trace = lane.trace();
        Optional<Mark> last = trace.last();
        List<Answer> answers = last.map(Mark::answers).orElse(List.of());
        var json = Json.object()
                .put("lane", trace.lane())
                .put("scheme", trace.scheme().inWords())
                .put("draws", Json.of(last.map(Mark::draws).orElse(0L)))
                .put(
                        "observations",
                        Json.of(answers.isEmpty() ? 0 : answers.getFirst().observations()))
                .put(
                        "nonFinite",
                        Json.of(answers.isEmpty() ? 0 : answers.getFirst().nonFinite()))
                .put("seconds", Json.of(microseconds(last.map(Mark::seconds).orElse(0.0))))
                .put("stopRule", trace.course().rule())
                .put("stopReason", trace.stopReason().orElse(""))
                .put("answers", Json.list(answers.stream().map(RunJson::answer).toList()))
                .put(
                        "grounds",
                        Json.list(lane.grounds().stream().map(RunJson::ground).toList()));
        trace.audit().ifPresent(audit -> json.put("audit", audit(audit)));
        trace.course().firstStage().ifPresent(stage -> json.put("firstStage", firstStage(stage)));
        trace.scheme().tuned().ifPresent(tuned -> json.put("tuning", TuningJson.of(project.question(), tuned)));
        if (trace.scheme().points() instanceof Stratified points) {
            points.found()
                    .ifPresent(found -> json.put("allocation", AllocationJson.of(project.question(), points, found)));
        }
        trace.outermost()
                .filter(_ -> last.isPresent() && trace.scheme().isWeighted())
                .ifPresent(draws -> json.put("weights", weights(trace, draws)));
        if (!trace.failures().isEmpty()) {
            json.put(
                    "failures",
                    Json.list(trace.failures().stream().map(this::failure).toList()));
        }
        return json.build();
    }

    /// Draws from the inputs' own densities, which enter no answer of the lane.
    private static Json audit(Trace audit) {
        List<Answer> answers = audit.last().map(Mark::answers).orElse(List.of());
        return Json.object()
                .put("draws", Json.of(audit.last().map(Mark::draws).orElse(0L)))
                .put(
                        "nonFinite",
                        Json.of(answers.isEmpty() ? 0 : answers.getFirst().nonFinite()))
                .put("stopReason", audit.stopReason().orElse(""))
                .put("answers", Json.list(answers.stream().map(RunJson::answer).toList()))
                .build();
    }

    private static Json firstStage(FirstStage stage) {
        var json = Json.object()
                .put("draws", Json.of(stage.draws()))
                .put("observations", Json.of(stage.observations()))
                .put("inAnswer", Json.of(stage.inAnswer()))
                .put("standardDeviation", Json.orNull(stage.standardDeviation()))
                .put("kurtosis", Json.orNull(stage.kurtosis()));
        stage.largestKurtosis().ifPresent(most -> json.put("largestKurtosis", Json.orNull(most)));
        return json.put(
                        "wanted",
                        stage.wanted().isPresent() ? Json.of(stage.wanted().getAsLong()) : new Json.Null())
                .build();
    }

    /// @param draws of weights, the last component
    private Json weights(Trace trace, Outermost draws) {
        int w = draws.components().size() - 1;
        double[] greatest = draws.weights().greatest();
        var total = trace.total();
        return Json.object()
                .put("mean", Json.orNull(total.mean(w)))
                .put("standardError", Json.orNull(total.standardError(w)))
                .put("greatest", Json.orNull(greatest.length == 0 ? Double.NaN : greatest[0]))
                .put("effectiveDraws", Json.orNull(draws.weights().effective()))
                .put("largestShares", largestShares(trace, draws))
                .build();
    }

    /// Of each answer: what part of the sum its largest draw has.
    private Json largestShares(Trace trace, Outermost draws) {
        return Json.list(IntStream.range(0, trace.last().orElseThrow().answers().size())
                .map(k -> Components.first(project.question().asks(), k))
                .mapToObj(k -> Json.orNull(draws.of(k).largestShare()))
                .toList());
    }

    private static double microseconds(double seconds) {
        return Math.rint(seconds * 1e6) / 1e6;
    }

    private static Json answer(Answer answer) {
        var interval = answer.interval();
        var json = Json.object()
                .put("ask", answer.estimand().word())
                .putUnlessEmpty("unit", answer.unit())
                .putUnlessEmpty("label", answer.label())
                .put("estimate", Json.orNull(answer.estimate()))
                .put("standardError", Json.orNull(answer.standardError()))
                .put("halfWidth", Json.orNull(interval.halfWidth()))
                .put("interval", limits(interval))
                .put("confidence", Json.of(interval.level()))
                .put("intervalKind", interval.kind())
                .put("band", answer.band().map(RunJson::limits).orElse(new Json.Null()));
        interval.note().ifPresent(note -> json.put("intervalNote", note));
        answer.band().ifPresent(band -> {
            json.put("bandKind", band.kind());
            band.note().ifPresent(note -> json.put("bandNote", note));
        });
        answer.coverage()
                .ifPresent(found -> json.put("standardUncertainty", Json.orNull(found.standardUncertainty()))
                        .put("coverage", Json.of(found.coverage()))
                        .put("symmetric", limits(found.symmetricLow(), found.symmetricHigh()))
                        .put("shortest", limits(found.shortestLow(), found.shortestHigh())));
        if (answer.provisional()) {
            json.put("provisional", Json.of(true));
        }
        if (answer.estimand() instanceof Estimand.Probability) {
            answer.hits().ifPresent(hits -> {
                json.put("hits", Json.of(hits));
                if (interval.kind().equals(ClopperPearson.KIND)) {
                    json.put("oneSided", oneSided(answer, hits));
                }
            });
            if (interval.kind().equals(NoHit.KIND)) {
                json.put("oneSided", Json.orNull(interval.high()));
            }
            json.put("beta", Json.orNull(Chance.beta(answer.estimate())))
                    .put("oneIn", Json.orNull(Chance.oneIn(answer.estimate())));
        }
        return json.build();
    }

    private static Json limits(Interval interval) {
        return limits(interval.low(), interval.high());
    }

    private static Json limits(double low, double high) {
        return Json.list(List.of(Json.orNull(low), Json.orNull(high)));
    }

    /// The limit that the probability is not above, with the interval's confidence.
    private static Json oneSided(Answer answer, long hits) {
        long n = answer.observations();
        return n + answer.nonFinite() == 0
                ? new Json.Null()
                : Json.of(ClopperPearson.upperLimit(
                        hits, n, answer.nonFinite(), answer.interval().level()));
    }

    private static Json ground(Ground ground) {
        var json = Json.object()
                .put("code", ground.code())
                .put("status", ground.status().word());
        ground.strength().ifPresent(strength -> json.put("strength", strength.word()));
        json.put("text", ground.text());
        ground.remedy().ifPresent(remedy -> json.put("remedy", remedy));
        return json.build();
    }

    private Json failure(Failure failure) {
        var inputs = Json.object();
        List<Input> all = project.question().inputs();
        for (int i = 0; i < all.size(); i++) {
            inputs.put(all.get(i).name(), Json.of(failure.inputs().get(i).doubleValue()));
        }
        return Json.object()
                .put("draw", Json.of(failure.draw()))
                .put("inputs", inputs.build())
                .build();
    }

    private static Json reference(StudyState state) {
        return state.lanes().stream()
                .findFirst()
                .flatMap(lane -> lane.trace().reference())
                .map(RunJson::reference)
                .orElse(new Json.Null());
    }

    private static Json reference(ReferenceValue reference) {
        return switch (reference) {
            case ReferenceValue.Known known -> {
                var json = Json.object()
                        .put("value", Json.of(known.value()))
                        .put("error", Json.of(known.error()))
                        .put("source", known.source())
                        .put("kind", known.kind().word());
                known.evaluations().ifPresent(evaluations -> json.put("evaluations", Json.of(evaluations)));
                yield json.build();
            }
            case ReferenceValue.Sought _ -> without("it was not found yet");
            case ReferenceValue.Unknown(var reason) -> without(reason);
        };
    }

    private static Json without(String reason) {
        return Json.object()
                .put("value", new Json.Null())
                .put("error", new Json.Null())
                .put("source", ReferenceValue.Kind.QUADRATURE.word())
                .put("note", reason)
                .build();
    }
}
