package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the level of a quantile lies at a jump of the distribution function, as far as the draws tell.
/// The quantile is then one of a few values, however many draws are made, and the error of a tail mean has
/// no normal limit.
final class AtomAtQuantile {
    private AtomAtQuantile() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var outcomes = evidence.trace().outcomes();
        return k < outcomes.size()
                ? outcomes.get(k)
                        .jump()
                        .map(jump -> ground(
                                evidence.answers().get(k).estimand(),
                                evidence.of(k)
                                        + "outcomes about the quantile's rank are few values between %s and %s: its level lies at a jump of"
                                                .formatted(Numbers.value(jump.low()), Numbers.value(jump.high()))
                                        + " the distribution function, as far as these draws tell"))
                : Optional.empty();
    }

    private static Ground ground(Estimand estimand, String text) {
        return estimand instanceof Estimand.TailMean
                ? Ground.doubted(
                        "atom-at-quantile",
                        Strength.CAUTION,
                        text + ", and the error of a tail mean is not normal there",
                        "Make more draws; if it stays, ask for a level beside the jump, which is another question",
                        Action.MoreDraws.some(),
                        new Action.AskAnother("the tail mean at a level beside the jump"))
                : Ground.doubted(
                        "atom-at-quantile",
                        Strength.NOTE,
                        text,
                        "Make more draws, or ask for the probabilities of these values, which is another question",
                        Action.MoreDraws.some(),
                        new Action.AskAnother("the probability of exceeding one of these values"));
    }
}
