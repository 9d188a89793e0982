package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.EmpiricalBernstein;
import dev.leadline.interval.Hoeffding;
import dev.leadline.interval.SkewnessCorrected;
import dev.leadline.trace.Answer;
import java.util.Optional;
import java.util.Set;

/// Whether there are enough observations for a Student interval in spite of lopsided outcomes: n of at least 25 times
/// the squared skewness (Cochran's rule; common practice). A skewness within two standard errors of 0, as those of
/// normal values have them, is no doubt: below 25 observations that may be .8 and more.
final class Skewness {
    private static final double PER_SQUARE = 25;

    /// Kinds of intervals that allow for lopsided outcomes.
    private static final Set<String> SHAPELESS =
            Set.of(SkewnessCorrected.KIND, Hoeffding.KIND, EmpiricalBernstein.KIND);

    private Skewness() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var sums = evidence.total();
        int component = component(evidence, k);
        double skewness = sums.count() < 3 ? Double.NaN : sums.skewness(component);
        if (!isOfMeans(evidence.answers().get(k)) && !isJudgedByPasses(evidence, k)) {
            return Optional.empty();
        }
        if (Double.isNaN(skewness)) {
            return Double.isNaN(evidence.answers().get(k).interval().halfWidth()) || sums.count() < 3
                    ? Optional.empty()
                    : Optional.of(Ground.notDone(
                            "skewness",
                            evidence.of(k)
                                    + "whether the outcomes are too lopsided for the interval was not judged: their"
                                    + " cubes leave the range of numbers",
                            "Measure the outcome in a unit in which it is of moderate size"));
        }
        double wanted = wanted(skewness);
        String text = evidence.of(k)
                + "skewness %s asks for about %s; there are %s"
                        .formatted(
                                Numbers.ratio(skewness),
                                observations(Math.ceil(wanted), evidence.drawsPerObservation()),
                                Numbers.count(sums.count()));
        return Optional.of(
                isMet(sums, component)
                        ? Ground.shown("skewness", text)
                        : Ground.doubted(
                                "skewness",
                                Strength.CAUTION,
                                text,
                                (evidence.drawsPerObservation() > 1
                                                ? "Make more observations: more draws, or more replicates where these are"
                                                        + " the observations"
                                                : "Make more draws")
                                        + "; until then the interval misses more often than it says"));
    }

    /// Of an event whose hits are not counted; for rare ones the rule asks for 25 of them, as [Hits] does.
    private static boolean isJudgedByPasses(Evidence evidence, int k) {
        var scheme = evidence.trace().scheme();
        return evidence.answers().get(k).estimand() instanceof Estimand.Probability
                && scheme.allotted().isPresent()
                && !scheme.isWeighted()
                && !evidence.total().constant(evidence.component(k));
    }

    /// Whether the interval takes means for nearly normal.
    private static boolean isOfMeans(Answer answer) {
        return !SHAPELESS.contains(answer.interval().kind())
                && switch (answer.estimand()) {
                    case Estimand.Mean _,
                            Estimand.Integral _,
                            Estimand.Distribution _,
                            Estimand.TailMean _,
                            Estimand.Ratio _,
                            Estimand.StandardDeviation _ -> true;
                    case Estimand.Probability _, Estimand.Quantile _ -> false;
                };
    }

    /// The component that is judged: of a standard deviation the squares, of a ratio the more lopsided of both.
    private static int component(Evidence evidence, int k) {
        int first = evidence.component(k);
        return switch (evidence.answers().get(k).estimand()) {
            case Estimand.StandardDeviation _ -> first + 1;
            case Estimand.Ratio _ ->
                Math.abs(evidence.total().skewness(first + 1))
                                        > Math.abs(evidence.total().skewness(first))
                                || evidence.total().constant(first)
                        ? first + 1
                        : first;
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Quantile _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> first;
        };
    }

    private static String observations(double count, double draws) {
        return Numbers.about(count)
                + (count == 1 ? " observation" : " observations")
                + (draws > 1 ? " of %s draws each".formatted(Numbers.about(draws)) : "");
    }

    /// False where the skewness is not known.
    static boolean isMet(Accumulator sums, int k) {
        double skewness = sums.skewness(k);
        double n = sums.count();
        double error = Math.sqrt(6 * n * (n - 1) / ((n - 2) * (n + 1) * (n + 3)));
        return n >= wanted(skewness) || Math.abs(skewness) <= 2 * error;
    }

    private static double wanted(double skewness) {
        return PER_SQUARE * skewness * skewness;
    }
}
