package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the half-width of the first answer, or its farther limit where one is much farther than the other, is within
/// the numerical tolerance.
final class NumericalTolerance {
    private NumericalTolerance() {}

    static Optional<Ground> judge(Evidence evidence) {
        return evidence.question().tolerance().map(tolerance -> {
            var answer = evidence.answers().getFirst();
            double reach = answer.interval().reach(answer.estimate());
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
                                    answer.interval().lopsided(answer.estimate())
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
