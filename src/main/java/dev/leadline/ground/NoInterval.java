package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the interval of an answer that is no mean has both its limits: at few draws a quantile has none,
/// or one.
final class NoInterval {
    private NoInterval() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var answer = evidence.answers().get(k);
        var interval = answer.interval();
        if (!isJudged(answer.estimand()) || !Double.isNaN(interval.halfWidth()) || answer.observations() == 0) {
            return Optional.empty();
        }
        boolean isNone = Double.isNaN(interval.low()) && Double.isNaN(interval.high());
        return Optional.of(Ground.doubted(
                "no-interval",
                isNone ? Strength.OBJECTION : Strength.CAUTION,
                evidence.of(k) + interval.note().orElse("there is no interval at this number of draws"),
                "Make more draws",
                Action.MoreDraws.some()));
    }

    private static boolean isJudged(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Quantile _, Estimand.TailMean _, Estimand.Ratio _, Estimand.StandardDeviation _ -> true;
            case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _, Estimand.Distribution _ -> false;
        };
    }
}
