package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.trace.Course.Judged;
import java.util.Optional;

/// Whether the first answer is within the numerical tolerance: by its interval where the number of draws was
/// fixed beforehand, by its any-time band where the lane was stopped for what it showed.
final class NumericalTolerance {
    private NumericalTolerance() {}

    static Optional<Ground> judge(Evidence evidence) {
        return evidence.question().tolerance().map(tolerance -> {
            var answer = evidence.answers().getFirst();
            var course = evidence.trace().course();
            if (course.judged() == Judged.PROMISE) {
                return Ground.shown(
                        "tolerance",
                        evidence.of(0)
                                + "the stop rule \"%s\" was satisfied, which promises the numerical tolerance with %s"
                                        .formatted(
                                                course.rule(), answer.interval().percent()));
            }
            boolean isBand = course.judged() == Judged.BAND;
            double reach = course.reach(answer);
            double allowed = tolerance.allowed(answer.estimate());
            if (Double.isNaN(reach) || allowed == 0) {
                return Ground.doubted(
                        "tolerance",
                        Strength.CAUTION,
                        "the numerical tolerance cannot be judged yet",
                        "Make more draws");
            }
            String text = evidence.of(0)
                    + "%s %s, numerical tolerance %s"
                            .formatted(
                                    isBand
                                            ? "the any-time band reaches"
                                            : answer.interval().lopsided(answer.estimate())
                                                    ? "distance of the farther limit"
                                                    : "half-width",
                                    Numbers.value(reach),
                                    Numbers.value(allowed));
            if (reach <= allowed) {
                return Ground.shown("tolerance", text);
            }
            double times = reach / allowed;
            double draws = evidence.draws() * times * times;
            return Ground.doubted(
                    "tolerance",
                    Strength.CAUTION,
                    text + ": not met",
                    (evidence.drawsPerObservation() > 1
                                    ? "Make more draws: at most about %s in all, fewer where errors fall faster than their square root"
                                    : "Make about %s draws in all")
                            .formatted(Numbers.about(draws)));
        });
    }
}
