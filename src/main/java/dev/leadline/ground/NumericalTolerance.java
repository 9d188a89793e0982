package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the half-width of the first answer is within the numerical tolerance.
final class NumericalTolerance {
    private NumericalTolerance() {}

    static Optional<Ground> judge(Evidence evidence) {
        return evidence.question().tolerance().map(tolerance -> {
            var answer = evidence.answers().getFirst();
            double halfWidth = answer.interval().halfWidth();
            double allowed = tolerance.allowed(answer.estimate());
            if (Double.isNaN(halfWidth) || allowed == 0) {
                return Ground.doubted(
                        "tolerance",
                        Strength.CAUTION,
                        "the numerical tolerance cannot be judged yet",
                        "Make more draws");
            }
            String text = evidence.of(0)
                    + "half-width %s, numerical tolerance %s"
                            .formatted(Numbers.value(halfWidth), Numbers.value(allowed));
            if (halfWidth <= allowed) {
                return Ground.shown("tolerance", text);
            }
            double times = halfWidth / allowed;
            double draws = answer.observations() * times * times;
            return Ground.doubted(
                    "tolerance",
                    Strength.CAUTION,
                    text + ": not met",
                    "Make about %s draws in all".formatted(Numbers.about(draws)));
        });
    }
}
