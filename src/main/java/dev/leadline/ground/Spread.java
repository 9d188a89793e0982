package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether a mean has seen two different outcomes at all. Without spread no interval can be said: the outcomes may be
/// constant, or what varies may not have been drawn yet.
final class Spread {
    private Spread() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var sums = evidence.total();
        if (evidence.answers().get(k).estimand() instanceof Estimand.Probability
                || sums.count() == 0
                || !sums.constant(k)) {
            return Optional.empty();
        }
        return Optional.of(Ground.doubted(
                "spread",
                Strength.OBJECTION,
                evidence.of(k) + "every outcome so far is " + Numbers.value(sums.min(k))
                        + ": how far the mean may be off cannot be said yet",
                "Look at a few draws; if the outcomes can differ, more draws are needed"));
    }
}
