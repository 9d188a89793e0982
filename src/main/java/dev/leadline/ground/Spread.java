package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.EmpiricalBernstein;
import dev.leadline.interval.Hoeffding;
import dev.leadline.interval.Interval;
import java.util.Optional;

/// Whether a mean has a spread to build an interval from. There is none where it has not seen two different outcomes:
/// they may be constant, or what varies may not have been drawn yet. Nor where squares of the outcomes are no numbers.
final class Spread {
    private Spread() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var sums = evidence.total();
        int component = evidence.component(k);
        if (!isMean(evidence.answers().get(k).estimand()) || sums.count() == 0) {
            return Optional.empty();
        }
        if (!sums.constant(component) && !evidence.trace().scheme().controls().isEmpty()) {
            return Optional.empty();
        }
        if (!sums.constant(component)) {
            var interval = evidence.answers().get(k).interval();
            return interval.note()
                    .filter(_ -> Double.isNaN(interval.halfWidth()))
                    .map(note -> isBounded(interval)
                            ? doubted(evidence.of(k) + note, "State bounds that hold, or take another interval")
                            : doubted(
                                    evidence.of(k) + note,
                                    "Measure the outcome in a unit in which it is of moderate size"));
        }
        return Optional.of(Ground.doubted(
                "spread",
                Strength.OBJECTION,
                evidence.of(k) + "every outcome so far is " + Numbers.value(sums.min(component))
                        + ": how far the mean may be off cannot be said yet",
                "Look at a few draws; if the outcomes can differ, more draws are needed"));
    }

    private static boolean isMean(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _, Estimand.Integral _, Estimand.Distribution _ -> true;
            case Estimand.Probability _,
                    Estimand.Quantile _,
                    Estimand.TailMean _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _ -> false;
        };
    }

    private static boolean isBounded(Interval interval) {
        return interval.kind().equals(Hoeffding.KIND) || interval.kind().equals(EmpiricalBernstein.KIND);
    }

    private static Ground doubted(String text, String remedy) {
        return Ground.doubted("spread", Strength.OBJECTION, text, remedy);
    }
}
