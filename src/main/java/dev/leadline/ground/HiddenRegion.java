package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.numeric.Rounding;
import dev.leadline.scheme.Repetitions;
import java.util.Optional;

/// What no check can do: see what was not drawn. An event of probability p shows in n draws with the chance
/// `1 - (1 - p)^n`, which is 95 % for 3/n. Intervals of chances and quantiles allow for it, and those for
/// bounded outcomes.
final class HiddenRegion {
    private HiddenRegion() {}

    static Optional<Ground> judge(Evidence evidence) {
        var scheme = evidence.trace().scheme();
        boolean isOpen = evidence.answers().stream().anyMatch(answer -> isMean(answer.estimand()))
                && evidence.question().interval().bounds().isEmpty();
        if (!isOpen || scheme.points() instanceof Repetitions) {
            return Optional.empty();
        }
        double share = scheme.nominalShare();
        boolean isWeighted = scheme.isWeighted();
        double draws = isWeighted && share > 0 ? share * evidence.draws() : evidence.draws();
        return Optional.of(Ground.notDone(
                "hidden-region",
                "No check sees what was not drawn: a part of probability below %s%s may be unseen"
                        .formatted(
                                Rounding.atMost(Math.min(1, 3 / draws)),
                                isWeighted && share == 0 ? " under the densities drawn from" : ""),
                "Where outcomes are bounded, say so for an interval that allows for it; where an event could hide, draw"
                        + " there more often",
                new Action.DrawWider()));
    }

    private static boolean isMean(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> true;
            case Estimand.Probability _, Estimand.Quantile _ -> false;
        };
    }
}
