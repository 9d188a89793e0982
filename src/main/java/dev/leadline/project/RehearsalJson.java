package dev.leadline.project;

import dev.leadline.interval.Interval;
import dev.leadline.model.Project;
import dev.leadline.model.Sentence;
import dev.leadline.study.RehearsalPlan;
import dev.leadline.study.RehearsalState;
import dev.leadline.study.RehearsalText;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Sought;
import java.util.List;

/// A rehearsal as the command `rehearse` prints it: `rehearsal` is that of the first answer at the last
/// number of draws, `rehearsals` has all. Nothing in it depends on a clock.
public final class RehearsalJson {
    private static final double USUAL = .95;

    private RehearsalJson() {}

    /// @param name what to call the project where it has no title
    public static String of(String name, Project project, RehearsalPlan plan, RehearsalState state) {
        var question = project.question();
        var last = state.rehearsals().getLast();
        return JsonWriter.pretty(Json.object()
                .put("project", question.title().isEmpty() ? name : question.title())
                .put("question", Sentence.of(project.draft()).text())
                .put("seed", Json.of(plan.seed()))
                .put("version", Version.text())
                .put("fingerprint", Fingerprint.of(project))
                .put("lane", last.lane())
                .put("scheme", last.scheme())
                .put("rehearsal", answer(last, last.answers().getFirst()).build())
                .put(
                        "rehearsals",
                        Json.list(state.rehearsals().stream()
                                .map(RehearsalJson::rehearsal)
                                .toList()))
                .build());
    }

    private static Json rehearsal(Rehearsal rehearsal) {
        var json = Json.object()
                .put("draws", Json.of(rehearsal.draws()))
                .put("meanDraws", Json.of(rehearsal.meanDraws()))
                .put("repetitions", Json.of(rehearsal.repetitions()));
        rehearsal
                .near()
                .ifPresent(near -> json.put("met", Json.of(rehearsal.met())).put("withinTolerance", Json.of(near)));
        rehearsal.heldTogether().ifPresent(held -> json.put("heldTogether", Json.of(held)));
        return json.put(
                        "answers",
                        Json.list(rehearsal.answers().stream()
                                .map(answer -> answer(rehearsal, answer).build())
                                .toList()))
                .build();
    }

    private static Json.Builder answer(Rehearsal rehearsal, Rehearsed answer) {
        var json = Json.object()
                .put("ask", answer.ask().estimand().word())
                .putUnlessEmpty("unit", answer.ask().unit())
                .putUnlessEmpty("label", answer.ask().label())
                .put("rate", Json.orNull(answer.rate()))
                .put("repetitions", Json.of(answer.repetitions().size()))
                .put("mcse", Json.orNull(answer.mcse() > 0 ? answer.mcse() : Double.NaN));
        json.put("rateInterval", answer.bounded() == 0 ? new Json.Null() : limits(answer.rateInterval(USUAL)))
                .put("missedLow", Json.of(answer.missedLow()))
                .put("missedHigh", Json.of(answer.missedHigh()))
                .put("withoutInterval", Json.of(answer.unbounded()))
                .put("confidence", Json.of(answer.level()))
                .put("intervalKind", answer.kind())
                .put("verdict", word(answer.verdict()))
                .put("sentence", RehearsalText.meaning(rehearsal, answer))
                .put("sought", sought(answer.sought()))
                .put("bias", Json.orNull(answer.bias()))
                .put("biasMcse", Json.orNull(answer.biasMcse()))
                .put("empiricalError", Json.orNull(answer.empiricalError()))
                .put("empiricalMcse", Json.orNull(answer.empiricalMcse()))
                .put("reportedError", Json.orNull(answer.reportedError()))
                .put("reportedMcse", Json.orNull(answer.reportedMcse()))
                .put("meanHalfWidth", Json.orNull(answer.meanHalfWidth()));
        return json;
    }

    private static String word(Rehearsed.Verdict verdict) {
        return switch (verdict) {
            case HOLDS -> "holds";
            case FALLS_SHORT -> "falls-short";
            case MORE_THAN_STATED -> "more-than-stated";
            case NOTHING -> "nothing";
        };
    }

    private static Json limits(Interval interval) {
        return Json.list(List.of(Json.orNull(interval.low()), Json.orNull(interval.high())));
    }

    private static Json sought(Sought sought) {
        return Json.object()
                .put("value", Json.of(sought.value()))
                .put("error", Json.of(sought.error()))
                .put("source", sought.source())
                .put("draws", sought.draws() > 0 ? Json.of(sought.draws()) : new Json.Null())
                .build();
    }
}
