package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether enough draws lie beyond the quantile for the mean of what lies there. That 25 are enough is the rule
/// for hits (common practice).
final class TailDraws {
    private static final long ENOUGH = 25;

    private TailDraws() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var answer = evidence.answers().get(k);
        var scheme = evidence.trace().scheme();
        if (!(answer.estimand() instanceof Estimand.TailMean(double at))
                || scheme.isWeighted()
                || scheme.allotted().isPresent()) {
            return Optional.empty();
        }
        double draws = evidence.total().count() * evidence.drawsPerObservation();
        long beyond = Math.round(draws * (1 - at));
        String text = evidence.of(k)
                + "%s%s %s beyond the quantile"
                        .formatted(
                                beyond < ENOUGH ? "only " : "",
                                Numbers.count(beyond),
                                beyond == 1 ? "draw lies" : "draws lie");
        return Optional.of(
                beyond >= ENOUGH
                        ? Ground.shown("tail-draws", text)
                        : Ground.doubted(
                                "tail-draws",
                                Strength.CAUTION,
                                text,
                                "Make about %s draws or more: %d beyond it are wanted"
                                        .formatted(Numbers.about(ENOUGH / (1 - at)), ENOUGH)));
    }
}
