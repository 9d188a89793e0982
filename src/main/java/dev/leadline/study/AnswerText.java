package dev.leadline.study;

import dev.leadline.estimate.Chance;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.trace.Answer;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;
import java.util.Optional;
import java.util.StringJoiner;

/// An answer in words and figures, the same in the window, in the commands and where it is pasted. Digits follow the
/// error; where there is no error yet, nothing is rounded.
public final class AnswerText {

    private static final MathContext THREE_DIGITS = new MathContext(3);

    private AnswerText() {}

    /// Exactly as it is pasted: `1.26e-5 ± 0.03e-5 per year (95 %, lane B; 1 in 79,600)`.
    public static String of(Answer answer, String lane) {
        var facts = new StringJoiner("; ", " (", ")");
        facts.add((isBounded(answer) ? answer.interval().percent() + ", " : "") + "lane " + lane);
        if (answer.hits().orElse(1) == 0) {
            facts.add("no hit in " + draws(answer));
        } else if (!Double.isFinite(answer.estimate())) {
            facts.add(draws(answer));
        }
        oneIn(answer).ifPresent(facts::add);
        if (answer.nonFinite() > 0) {
            facts.add("over finite evaluations only");
        }
        return value(answer) + facts;
    }

    /// As `1.257e-5 ± 0.030e-5 per year`; both limits where the interval is lopsided, one where no more can be said.
    public static String value(Answer answer) {
        String unit = UnitWords.after(answer.unit());
        var interval = answer.interval();
        double estimate = answer.estimate();
        if (!Double.isFinite(estimate) || isNoHit(answer) && !isBounded(answer)) {
            return "cannot say yet";
        }
        if (isNoHit(answer)) {
            return "at most " + Rounding.atMost(interval.high()) + unit;
        }
        Rounding rounding = rounding(answer);
        if (!interval.lopsided(estimate)) {
            return rounding.value()
                    + rounding.uncertainty().map(error -> " ± " + error + unit).orElse(unit + ", no interval yet");
        }
        String low = rounding.down(interval.low());
        return estimate == interval.high()
                ? "at least " + low + unit
                : rounding.value() + ", between " + low + " and " + rounding.up(interval.high()) + unit;
    }

    /// As `95 % interval 1.22e-5 to 1.30e-5 (clopper-pearson)`, the limits rounded outwards.
    public static String interval(Answer answer) {
        var interval = answer.interval();
        Rounding rounding = rounding(answer);
        return rounding.uncertainty().isEmpty()
                ? "no %s interval yet (%s)".formatted(interval.percent(), interval.kind())
                : "%s interval %s to %s (%s)"
                        .formatted(
                                interval.percent(),
                                rounding.down(interval.low()),
                                rounding.up(interval.high()),
                                interval.kind());
    }

    /// As `band 1.20e-5 to 1.32e-5: it holds with 95 % however often one looks`.
    public static String band(Answer answer, Interval band) {
        if (Double.isNaN(band.low()) && Double.isNaN(band.high())) {
            return "no any-time band yet" + band.note().map(note -> ": " + note).orElse("");
        }
        Rounding rounding = Rounding.of(answer.estimate(), width(answer.estimate(), band));
        String limits = Double.isNaN(band.high())
                ? "from " + rounding.down(band.low())
                : Double.isNaN(band.low())
                        ? "up to " + rounding.up(band.high())
                        : rounding.down(band.low()) + " to " + rounding.up(band.high());
        return "any-time band %s: it holds with %s however often one looks".formatted(limits, band.percent());
    }

    private static double width(double estimate, Interval band) {
        return Double.isNaN(band.low())
                ? Math.abs(band.high() - estimate)
                : Double.isNaN(band.high()) ? Math.abs(estimate - band.low()) : band.halfWidth();
    }

    /// A chance below one half as people say it, as `1 in 79,600`; three digits, since the interval stands beside it.
    public static Optional<String> oneIn(Answer answer) {
        double oneIn = Chance.oneIn(answer.estimate());
        return answer.estimand() instanceof Estimand.Probability && oneIn > 2
                ? Optional.of("1 in " + threeDigits(oneIn))
                : Optional.empty();
    }

    private static String threeDigits(double number) {
        BigDecimal rounded = new BigDecimal(number).round(THREE_DIGITS);
        return number < 1e7
                ? String.format(Locale.ROOT, "%,d", rounded.toBigInteger())
                : rounded.stripTrailingZeros().toString().replace("E+", "e");
    }

    private static String draws(Answer answer) {
        long draws = answer.observations();
        return String.format(Locale.ROOT, "%,d draw%s", draws, draws == 1 ? "" : "s");
    }

    private static boolean isNoHit(Answer answer) {
        return answer.estimand() instanceof Estimand.Probability && answer.estimate() == 0;
    }

    /// Whether an interval of the stated level holds for the estimate.
    private static boolean isBounded(Answer answer) {
        double half = answer.interval().halfWidth();
        return Double.isFinite(answer.estimate()) && half > 0 && half < Double.POSITIVE_INFINITY;
    }

    private static Rounding rounding(Answer answer) {
        return Rounding.of(answer.estimate(), answer.interval().halfWidth());
    }
}
