package dev.leadline.model;

import dev.leadline.interval.Bounds;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.util.Arrays;
import java.util.stream.Collectors;

/// Makes the interval that is wanted of its draft.
final class Intervals {
    private Intervals() {}

    static IntervalWish of(IntervalDraft draft, Findings findings) {
        draft.bounds().ifPresent(bounds -> check(bounds, findings));
        IntervalKind kind = draft.kind().map(word -> kind(word, findings)).orElse(IntervalKind.AUTO);
        boolean isBounded = switch (kind) {
            case HOEFFDING, EMPIRICAL_BERNSTEIN -> true;
            case AUTO, STUDENT, SKEWNESS_CORRECTED, CLOPPER_PEARSON, WILSON, BOOTSTRAP_T -> false;
        };
        if (isBounded && draft.bounds().isEmpty()) {
            findings.add(
                    "$.interval",
                    "the interval \"%s\" needs bounds".formatted(kind.word()),
                    "It holds for outcomes that lie between two numbers, whatever else they are.",
                    "Add \"bounds\": [least, greatest].");
        }
        return new IntervalWish(kind, draft.bounds());
    }

    private static IntervalKind kind(String word, Findings findings) {
        return IntervalKind.of(word).orElseGet(() -> {
            var words =
                    Arrays.stream(IntervalKind.values()).map(IntervalKind::word).collect(Collectors.toSet());
            String all =
                    Arrays.stream(IntervalKind.values()).map(IntervalKind::word).collect(Collectors.joining(", "));
            Problem problem = Problem.of("the interval \"%s\" is not available".formatted(word))
                    .because("It is one of %s.".formatted(all));
            findings.add(
                    "$.interval",
                    Nearest.to(word, words)
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem.tryThis(
                                    "Leave it out: each answer then gets the interval that suits it.")));
            return IntervalKind.AUTO;
        });
    }

    private static void check(Bounds bounds, Findings findings) {
        if (!(Double.isFinite(bounds.low()) && Double.isFinite(bounds.high()) && bounds.low() < bounds.high())) {
            findings.add(
                    "$.bounds",
                    "the bounds are %s and %s but must rise"
                            .formatted(Shortest.text(bounds.low()), Shortest.text(bounds.high())),
                    "Every outcome lies between them.",
                    "Write the least value first, as [0, 1].");
        }
    }
}
