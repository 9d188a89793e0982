package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.ClopperPearson;

/// Whether every evaluation gave a finite number. The mean over the rest answers another question.
final class FailedEvaluations {
    private FailedEvaluations() {}

    private static boolean isBracketed(Evidence evidence) {
        return evidence.answers().getFirst().interval().kind().equals(ClopperPearson.KIND);
    }

    static Ground judge(Evidence evidence) {
        long failed = evidence.total().excluded();
        if (failed == 0) {
            return Ground.shown("failed-evaluations", "every evaluation gave a finite number");
        }
        String first = evidence.trace().failures().isEmpty()
                ? ""
                : "; the first is draw "
                        + evidence.trace().failures().getFirst().draw();
        return Ground.doubted(
                "failed-evaluations",
                Strength.OBJECTION,
                "%s %s no finite number%s: the estimate is over finite evaluations only%s"
                        .formatted(
                                Numbers.count(failed),
                                failed == 1 ? "evaluation gave" : "evaluations gave",
                                first,
                                isBracketed(evidence) ? ", the interval counts them as hits and as misses" : ""),
                "Look at that draw, and say in the formula what such inputs are to count",
                evidence.trace().failures().stream()
                        .limit(1)
                        .map(failure -> new Action.LookAtDraw(failure.draw()))
                        .toArray(Action[]::new));
    }
}
