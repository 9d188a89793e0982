package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.ClopperPearson;
import java.util.Optional;

/// How well the variance itself is known: its relative variance, `G2 / n + 2 / (n - 1)` with the excess
/// kurtosis G2 of the observations. Student's interval allows for the second part, that of normal ones; the
/// first must be small. A tenth of the whole is common practice.
final class VarianceOfVariance {
    private static final double MUCH = .1;

    /// Of fewer observations the kurtosis says nothing.
    private static final long FEWEST = 30;

    private VarianceOfVariance() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var answer = evidence.answers().get(k);
        var sums = evidence.total();
        if (!isMean(answer.estimand())
                || answer.interval().kind().equals(ClopperPearson.KIND)
                || sums.count() < FEWEST
                || !evidence.trace().scheme().controls().isEmpty()) {
            return Optional.empty();
        }
        double n = sums.count();
        double part = sums.excessKurtosis(evidence.component(k)) / n;
        if (Double.isNaN(part)) {
            return Optional.empty();
        }
        String text = evidence.of(k)
                + "the variance of the outcomes is known with a relative variance of %s"
                        .formatted(Numbers.value(part + 2 / (n - 1)));
        return Optional.of(
                part <= MUCH
                        ? Ground.shown("variance-of-variance", text)
                        : Ground.doubted(
                                "variance-of-variance",
                                Strength.CAUTION,
                                text + ", so that the interval may be much too short",
                                "Make more draws: at most %s is wanted".formatted(Numbers.value(MUCH)),
                                Action.MoreDraws.some()));
    }

    private static boolean isMean(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> true;
            case Estimand.Quantile _, Estimand.Ratio _, Estimand.StandardDeviation _ -> false;
        };
    }
}
