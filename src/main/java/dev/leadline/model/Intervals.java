package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Bounds;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/// Makes the interval that is wanted of its draft.
final class Intervals {
    private Intervals() {}

    static IntervalWish of(IntervalDraft draft, Findings findings) {
        draft.bounds().ifPresent(bounds -> check(bounds, findings));
        IntervalKind kind = draft.kind().map(word -> kind(word, findings)).orElse(IntervalKind.AUTO);
        if (isBounded(kind) && draft.bounds().isEmpty()) {
            findings.add(
                    "$.interval",
                    "the interval \"%s\" needs bounds".formatted(kind.word()),
                    "It holds for outcomes that lie between two numbers, whatever else they are.",
                    "Add \"bounds\": [least, greatest].");
        }
        return new IntervalWish(kind, draft.bounds());
    }

    private static boolean isBounded(IntervalKind kind) {
        return switch (kind) {
            case HOEFFDING, EMPIRICAL_BERNSTEIN -> true;
            case AUTO, STUDENT, SKEWNESS_CORRECTED, CLOPPER_PEARSON, WILSON, BOOTSTRAP_T -> false;
        };
    }

    private static boolean isUnbounded(IntervalWish wish, List<Ask> asks, List<Input> inputs) {
        return wish.bounds()
                .map(stated -> asks.stream()
                        .anyMatch(ask -> ObservedBounds.of(stated, ask.estimand(), inputs)
                                .isEmpty()))
                .orElse(false);
    }

    /// Whether the kind suits every answer and every lane.
    static void check(IntervalWish wish, List<Ask> asks, List<Input> inputs, List<Lane> lanes, Findings findings) {
        if (wish.kind() == IntervalKind.AUTO) {
            return;
        }
        String kind = wish.kind().word();
        for (Ask ask : asks) {
            boolean chance = ask.estimand() instanceof Estimand.Probability;
            boolean mean = ask.estimand() instanceof Estimand.Mean || ask.estimand() instanceof Estimand.Integral;
            boolean ofHits = wish.kind() == IntervalKind.CLOPPER_PEARSON || wish.kind() == IntervalKind.WILSON;
            if (ofHits ? !chance : !mean) {
                findings.add(
                        "$.interval",
                        "the interval \"%s\" is not for a %s"
                                .formatted(
                                        kind,
                                        Draft.AskDraft.words(ask.estimand().word())),
                        ofHits
                                ? "It counts the hits of an event."
                                : chance
                                        ? "It is made for means: a chance has intervals of its own, which hold where"
                                                + " hits are few."
                                        : "It is made for means: other answers have intervals of their own.",
                        "Leave it out: each answer then gets the interval that suits it.");
                return;
            }
        }
        if (isBounded(wish.kind()) && isUnbounded(wish, asks, inputs)) {
            findings.add(
                    "$.interval",
                    "the interval \"%s\" is not for an integral over an unbounded range".formatted(kind),
                    "A draw of it counts one over the density drawn from, so that it has no bounds.",
                    "Leave it out, or give the integral a bounded range.");
            return;
        }
        for (Lane lane : lanes) {
            if (!suits(wish.kind(), lane.scheme())) {
                findings.add(
                        "$.interval",
                        "the interval \"%s\" is not for lane %s".formatted(kind, lane.name()),
                        "It needs %s; the lane is %s."
                                .formatted(needed(wish.kind()), lane.scheme().inWords()),
                        "Leave it out, or take a lane that has them.");
                return;
            }
        }
    }

    private static boolean suits(IntervalKind kind, Scheme scheme) {
        return switch (kind) {
            case AUTO, STUDENT -> true;
            case CLOPPER_PEARSON, WILSON, BOOTSTRAP_T -> scheme.isPlain();
            case SKEWNESS_CORRECTED ->
                scheme.controls().isEmpty()
                        && scheme.drawFrom().filter(Proposal::selfNormalised).isEmpty();
            case HOEFFDING, EMPIRICAL_BERNSTEIN -> scheme.controls().isEmpty() && !scheme.isWeighted();
        };
    }

    private static String needed(IntervalKind kind) {
        return switch (kind) {
            case AUTO, STUDENT -> "nothing";
            case CLOPPER_PEARSON, WILSON, BOOTSTRAP_T -> "independent draws that count 1 each";
            case SKEWNESS_CORRECTED -> "a plain mean of observations";
            case HOEFFDING, EMPIRICAL_BERNSTEIN ->
                "observations within the bounds, which weights and control variates leave";
        };
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
