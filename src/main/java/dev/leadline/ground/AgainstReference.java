package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.Student;
import dev.leadline.numeric.Rounding;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.trace.Answer;

/// Whether the first answer agrees with the reference value, where chance is no explanation.
///
/// What the reference may be off is allowed for: a standard uncertainty as one more standard error, a bound by taking
/// it
/// off the distance.
///
/// A chance is judged by the exact interval of its hits. A mean, or an integral, by its distance in standard errors:
/// beyond four it is doubted. It is an objection only where the draws are many for the skewness of their outcomes, or
/// beyond ten: of 30 draws of a lognormal density (σ = 1), 2 % of the runs lie four standard errors off, .01 % ten; of
/// 100 draws of an exponential density, .1 % and none in 100,000.
final class AgainstReference {
    private static final double LIMIT = 4;

    private static final double OF_FEW = 10;

    /// Error of a reference, in standard errors of the answer, that is told.
    private static final double NOTABLE = 0.05;

    private static final long MANY = 500;

    /// `2 Φ(-4)`.
    private static final double BEYOND_LIMIT = 6.334248366623985e-5;

    /// Where ten standard errors of very few observations, two replicates perhaps, would be no surprise.
    private static final double BEYOND_TEN = 1e-6;

    private static final String REMEDY = "Check formula, densities and units, and where the reference value comes from";

    private AgainstReference() {}

    static Ground judge(Evidence evidence) {
        return evidence.trace()
                .reference()
                .or(() -> ReferenceValue.of(evidence.question()))
                .map(reference -> switch (reference) {
                    case Known known -> judge(evidence, known);
                    case ReferenceValue.Sought _ ->
                        Ground.notDone(
                                "reference", "The reference value is being computed by quadrature", "Wait for it");
                    case ReferenceValue.Unknown(var reason) ->
                        Ground.notDone(
                                "reference",
                                "Quadrature found no reference value: " + reason,
                                "Give a value from a closed form, a finer method or an earlier study");
                })
                .orElseGet(() -> Ground.notDone(
                        "reference",
                        "There is no reference value to compare with",
                        "Add a value from a closed form, a finer method or an earlier study, or have it integrated"));
    }

    private static Ground judge(Evidence evidence, Known reference) {
        var answer = evidence.answers().getFirst();
        return switch (answer.estimand()) {
            case Estimand.Probability _
            when answer.interval().kind().equals(ClopperPearson.KIND) -> chance(answer, reference);
            case Estimand.Quantile _ -> QuantileReference.judge(answer, reference.value(), reference.error());
            case Estimand.Probability _,
                    Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> mean(evidence, answer, reference);
        };
    }

    private static Ground chance(Answer answer, Known reference) {
        long hits = answer.hits().orElseThrow();
        long n = answer.observations();
        var left = ClopperPearson.of(hits, n, answer.nonFinite(), 1 - BEYOND_LIMIT);
        if (Double.isNaN(left.halfWidth())) {
            return notYet();
        }
        double reach = isBound(reference) ? reference.error() : LIMIT * reference.error();
        var rounding = Rounding.of(answer.estimate(), left.halfWidth());
        boolean above = reference.value() - reach > left.high();
        boolean below = reference.value() + reach < left.low();
        String text = "%s in %s draws leave %s to %s possible at %s, and the reference value %s is %s"
                .formatted(
                        Numbers.count(hits) + (hits == 1 ? " hit" : " hits"),
                        Numbers.count(n),
                        left.low() == 0 ? "0" : rounding.down(left.low()),
                        left.high() == 1 ? "1" : rounding.up(left.high()),
                        left.percent(),
                        Numbers.value(reference.value()),
                        above ? "above that" : below ? "below that" : "within that");
        return above || below
                ? Ground.doubted("reference", Strength.OBJECTION, text, REMEDY)
                : Ground.shown("reference", text);
    }

    private static Ground mean(Evidence evidence, Answer answer, Known reference) {
        double error = isBound(reference)
                ? answer.standardError()
                : StrictMath.hypot(answer.standardError(), reference.error());
        double apart = answer.estimate() - reference.value();
        double distance = isBound(reference) ? Math.max(Math.abs(apart) - reference.error(), 0) : Math.abs(apart);
        double z = Math.copySign(distance / error, apart);
        if (Double.isNaN(z) || Double.isInfinite(error)) {
            return notYet();
        }
        String text = "%s standard errors %s the reference value%s"
                .formatted(Numbers.ratio(Math.abs(z)), apart < 0 ? "below" : "above", how(reference, answer));
        long n = evidence.total().count();
        if (Math.abs(z) <= Math.max(LIMIT, Student.quantile(n - 1, 1 - BEYOND_LIMIT))) {
            return Ground.shown("reference", text);
        }
        boolean many = evidence.total().count() >= MANY && Skewness.isMet(evidence.total(), 0);
        return Math.abs(z) > (many ? LIMIT : Math.max(OF_FEW, Student.quantile(n - 1, 1 - BEYOND_TEN)))
                ? Ground.doubted("reference", Strength.OBJECTION, text, REMEDY)
                : Ground.doubted(
                        "reference",
                        Strength.CAUTION,
                        text + "; with so few observations chance may do that",
                        "Make more draws; if it stays, check formula, densities and units");
    }

    /// Whether the error is a bound, which chance does not exceed.
    private static boolean isBound(Known reference) {
        return switch (reference.kind()) {
            case STATED -> false;
            case CLOSED_FORM, QUADRATURE -> true;
        };
    }

    private static String how(Known reference, Answer answer) {
        String how = switch (reference.kind()) {
            case STATED -> "";
            case CLOSED_FORM -> " in closed form";
            case QUADRATURE -> " by quadrature";
        };
        return isBound(reference) && reference.error() > NOTABLE * answer.standardError()
                ? "%s, beyond its own error of %s at most".formatted(how, Numbers.value(reference.error()))
                : how;
    }

    private static Ground notYet() {
        return Ground.notDone(
                "reference",
                "The reference value cannot be compared yet: the estimate has no standard error",
                "Make more draws");
    }
}
