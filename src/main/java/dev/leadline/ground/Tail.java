package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Outermost;
import dev.leadline.estimate.TailIndex;
import dev.leadline.ground.Ground.Strength;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/// Whether the largest outcomes, times their weights, behave as if their variance were infinite: the tail
/// index of the values and of the same with the other sign, the larger counts. A sum of squares cannot show
/// that, for it is finite always. Draws are looked at one by one, whatever layout combines them: no layout
/// makes an infinite variance finite.
///
/// It is an objection from 10,000 draws on; fewer do not tell. Of 10,000 normal, exponential or lognormal
/// (σ = 1) draws, or of Student's with 3 degrees of freedom, at most one run in 100 is doubted
/// (`FalseObjectionsTest`).
final class Tail {
    private static final String CODE = "tail";

    private static final double INFINITE_VARIANCE = .5;
    private static final double NO_MEAN = 1;
    private static final long ENOUGH = 10_000;

    /// Below so many draws there is no tail to look at.
    private static final long FEWEST = 25;

    private Tail() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        if (evidence.trace().outermost().isEmpty()) {
            return hasTail(evidence.answers().get(k).estimand())
                    ? Optional.of(Ground.notDone(
                            CODE,
                            evidence.of(k) + "whether rare, large outcomes make the variance infinite was not examined",
                            "Look at the largest outcomes by hand before signing"))
                    : Optional.empty();
        }
        List<Outermost.Component> components = evidence.outermost(k);
        if (components.isEmpty()) {
            return Optional.empty();
        }
        long draws = evidence.trace().outermost().get().draws();
        if (draws < FEWEST) {
            return Optional.of(Ground.notDone(
                    CODE,
                    evidence.of(k)
                            + "whether rare, large outcomes make the variance infinite shows from %d draws on"
                                    .formatted(FEWEST),
                    "Make more draws",
                    Action.MoreDraws.inAll(ENOUGH)));
        }
        var worst = components.stream()
                .max(Comparator.comparingDouble(
                        c -> c.tail().exists() ? c.tail().shape() : Double.NEGATIVE_INFINITY))
                .orElseThrow();
        boolean isLow = worst.tail() == worst.below() && worst.below().exists();
        String what = what(evidence, k);
        if (!worst.tail().exists()) {
            return Optional.of(Ground.shown(
                    CODE,
                    evidence.of(k)
                            + "the largest %s are equal, or take few values: they have no tail".formatted(what)));
        }
        String which = (isLow ? "lowest " : "largest ") + what;
        boolean isCorrected = !evidence.trace().scheme().controls().isEmpty();
        return Optional.of(judged(
                evidence.of(k),
                worst.tail(),
                draws,
                which + (isCorrected ? ", before control variates correct them," : ""),
                isCorrected ? Strength.CAUTION : Strength.OBJECTION,
                evidence.trace().scheme().isWeighted()));
    }

    /// Of the weights alone, where nothing bounds them. Where they enter an answer only with an outcome,
    /// which may be 0 wherever they are large, they are no objection.
    static Optional<Ground> judgeWeights(Evidence evidence) {
        var scheme = evidence.trace().scheme();
        return evidence.trace()
                .outermost()
                .filter(_ -> scheme.isWeighted() && scheme.nominalShare() == 0)
                .filter(seen -> seen.draws() >= FEWEST && seen.weights().above().exists())
                .map(seen -> judged(
                        "",
                        seen.weights().above(),
                        seen.draws(),
                        "largest weights",
                        evidence.isSelfNormalised() ? Strength.OBJECTION : Strength.CAUTION,
                        true));
    }

    private static Ground judged(
            String of, TailIndex tail, long draws, String which, Strength most, boolean isWeighted) {
        String text = of
                + "the %s %s have the tail index %s: they behave as if %s"
                        .formatted(
                                Numbers.count(tail.values()),
                                which,
                                Numbers.hundredths(tail.shape()),
                                tail.shape() >= NO_MEAN
                                        ? "they had no mean"
                                        : "their variance were "
                                                + (tail.shape() >= INFINITE_VARIANCE ? "infinite" : "finite"))
                + " up to these %s draws".formatted(Numbers.count(draws));
        if (tail.shape() < INFINITE_VARIANCE) {
            return Ground.shown(CODE, text);
        }
        if (draws < ENOUGH) {
            return Ground.doubted(
                    CODE,
                    Strength.CAUTION,
                    text,
                    "Make %s draws or more: so few hardly tell".formatted(Numbers.count(ENOUGH)),
                    Action.MoreDraws.inAll(ENOUGH));
        }
        return isWeighted
                ? Ground.doubted(
                        CODE,
                        most,
                        text,
                        "Draw from wider densities, or a greater share from the inputs' own; more draws alone do not mend it",
                        new Action.DrawWider())
                : Ground.doubted(
                        CODE,
                        most,
                        text,
                        "Draw such outcomes more often, in a lane of its own; more draws alone do not mend it. A mean up to a"
                                + " limit would exist, but it is another question, not a repair of this one",
                        new Action.DrawWider(),
                        new Action.AskAnother("the mean of outcomes up to a limit"));
    }

    private static boolean hasTail(Estimand estimand) {
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

    private static String what(Evidence evidence, int k) {
        boolean isWeighted = evidence.trace().scheme().isWeighted();
        return switch (evidence.answers().get(k).estimand()) {
            case Estimand.Mean _, Estimand.Ratio _, Estimand.Distribution _ ->
                isWeighted ? "outcomes times their weights" : "outcomes";
            case Estimand.Integral _ -> "values of the integrand";
            case Estimand.Probability _ -> "weights of hits";
            case Estimand.Quantile _ -> "weights beyond the quantile";
            case Estimand.TailMean _ -> isWeighted ? "excesses times their weights" : "excesses over the quantile";
            case Estimand.StandardDeviation _ ->
                isWeighted ? "squared deviations times their weights" : "squared deviations";
        };
    }
}
