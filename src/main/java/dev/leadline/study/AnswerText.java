package dev.leadline.study;

import dev.leadline.estimate.Chance;
import dev.leadline.estimate.Coverage;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.numeric.Significant;
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
    private static final String ONLY = "the interval contains only ";

    /// Of a value that is an outcome itself.
    private static final int ALL_DIGITS = 15;

    /// Of a value without any error.
    private static final int LONE_DIGITS = 6;

    private static final double MOST_WHOLE = 1e9;

    private AnswerText() {}

    /// Exactly as it is pasted: `1.26e-5 ± 0.03e-5 per year (95 %, lane B; 1 in 79,600)`.
    public static String of(Answer answer, String lane) {
        var facts = new StringJoiner("; ", " (", ")");
        if (isOneValue(answer)) {
            facts.add(ONLY + Significant.text(answer.estimate(), ALL_DIGITS));
        }
        boolean covers = answer.coverage().isPresent();
        facts.add((isBounded(answer) && !covers ? answer.interval().percent() + ", " : "") + "lane " + lane);
        if (covers && isBounded(answer)) {
            facts.add("mean " + mean(answer) + " at " + answer.interval().percent());
        }
        if (answer.hits().orElse(1) == 0) {
            facts.add("no hit in " + draws(answer));
        } else if (!Double.isFinite(answer.estimate())) {
            facts.add(draws(answer));
        }
        oneIn(answer).ifPresent(facts::add);
        if (lacksLimit(answer)) {
            answer.interval().note().ifPresent(facts::add);
        }
        if (answer.provisional()) {
            facts.add("provisional");
        }
        if (answer.nonFinite() > 0) {
            facts.add("over finite evaluations only");
        }
        return core(answer) + facts;
    }

    /// As `1.257e-5 ± 0.030e-5 per year`; both limits where the interval is lopsided, one where no more can be
    /// said. Of a distribution its standard uncertainty and where the outcomes lie, as `3.2 mm, u = 2.0 mm,
    /// 95 % of outcomes in [-0.9, 6.4] mm`; of a quantile whose limits are the value itself
    /// `16 (the interval contains only 16)`.
    public static String value(Answer answer) {
        return isOneValue(answer)
                ? core(answer) + " (" + ONLY + Significant.text(answer.estimate(), ALL_DIGITS) + ")"
                : core(answer);
    }

    private static String core(Answer answer) {
        if (!Double.isFinite(answer.estimate()) || isNoHit(answer) && !isBounded(answer)) {
            return "cannot say yet";
        }
        if (isNoHit(answer)) {
            return "at most " + Rounding.atMost(answer.interval().high()) + UnitWords.after(answer.unit());
        }
        if (answer.estimand() instanceof Estimand.Quantile) {
            return quantile(answer);
        }
        return answer.coverage()
                .map(coverage -> distribution(answer, coverage))
                .orElseGet(() -> mean(answer)
                        + (answer.estimand() instanceof Estimand.Distribution ? ", no coverage interval yet" : ""));
    }

    private static String mean(Answer answer) {
        String unit = UnitWords.after(answer.unit());
        var interval = answer.interval();
        double estimate = answer.estimate();
        Rounding rounding = rounding(answer);
        if (!interval.lopsided(estimate)) {
            return rounding.value()
                    + rounding.uncertainty().map(error -> " ± " + error + unit).orElse(unit + ", no interval yet");
        }
        String low = rounding.down(interval.low());
        return estimate == interval.high() && answer.estimand() instanceof Estimand.Probability
                ? "at least " + low + unit
                : rounding.value() + ", between " + low + " and " + rounding.up(interval.high()) + unit;
    }

    /// Its limits are outcomes: where they are whole numbers they are written so, and where they do not exist
    /// that is said.
    private static String quantile(Answer answer) {
        String unit = UnitWords.after(answer.unit());
        var interval = answer.interval();
        double estimate = answer.estimate();
        if (isOneValue(answer)) {
            return Significant.text(estimate, ALL_DIGITS) + unit;
        }
        if (lacksLimit(answer)) {
            Rounding rounding = rounding(answer);
            return Double.isFinite(interval.low())
                    ? rounding.value() + ", at least " + rounding.down(interval.low()) + unit
                    : Double.isFinite(interval.high())
                            ? rounding.value() + ", at most " + rounding.up(interval.high()) + unit
                            : Significant.text(estimate, LONE_DIGITS) + unit + ", no interval at this n";
        }
        return isWhole(estimate) && isWhole(interval.low()) && isWhole(interval.high())
                ? String.format(
                        Locale.ROOT, "%.0f, between %.0f and %.0f%s", estimate, interval.low(), interval.high(), unit)
                : mean(answer);
    }

    private static String distribution(Answer answer, Coverage coverage) {
        String unit = UnitWords.after(answer.unit());
        double u = coverage.standardUncertainty();
        if (!(u > 0)) {
            return Significant.text(answer.estimate(), LONE_DIGITS) + unit + ", no spread among outcomes";
        }
        Rounding rounding = Rounding.of(answer.estimate(), u);
        return rounding.value() + unit + ", u = " + rounding.uncertainty().orElseThrow() + unit + ", "
                + Interval.percent(coverage.coverage()) + " of outcomes in "
                + limits(rounding, coverage.symmetricLow(), coverage.symmetricHigh()) + unit;
    }

    /// Of a distribution both coverage intervals, as `95 % of outcomes: [-0.9, 6.4] with half of the rest on
    /// either side, [-0.8, 6.5] the shortest`; they are no intervals of the mean.
    public static Optional<String> coverage(Answer answer) {
        return answer.coverage()
                .filter(found -> found.standardUncertainty() > 0)
                .map(found -> {
                    var rounding = Rounding.of(answer.estimate(), found.standardUncertainty());
                    return Interval.percent(found.coverage()) + " of outcomes: "
                            + limits(rounding, found.symmetricLow(), found.symmetricHigh())
                            + " with half of the rest on either side, "
                            + limits(rounding, found.shortestLow(), found.shortestHigh()) + " the shortest";
                });
    }

    /// An answer in two columns of a table.
    ///
    /// @param plusMinus the half-width; both limits where one lies much farther off than the other; of a
    ///     distribution its standard uncertainty, as `u 2.0`
    public record Cells(String value, String plusMinus) {}

    public static Cells cells(Answer answer) {
        double estimate = answer.estimate();
        var interval = answer.interval();
        if (!Double.isFinite(estimate)) {
            return new Cells("none yet", "");
        }
        if (isOneValue(answer)) {
            return new Cells(Significant.text(estimate, ALL_DIGITS), "only this value");
        }
        var u = answer.coverage()
                .map(found -> Rounding.of(estimate, found.standardUncertainty()))
                .filter(rounding -> rounding.uncertainty().isPresent());
        if (u.isPresent()) {
            return new Cells(u.get().value(), "u " + u.get().uncertainty().orElseThrow());
        }
        Rounding rounding = rounding(answer);
        if (rounding.uncertainty().isEmpty()) {
            return new Cells(Significant.text(estimate, LONE_DIGITS), "");
        }
        String low = Double.isNaN(interval.low()) ? "" : rounding.down(interval.low());
        String high = Double.isNaN(interval.high()) ? "" : rounding.up(interval.high());
        return new Cells(
                rounding.value(),
                low.isEmpty()
                        ? "up to " + high
                        : high.isEmpty()
                                ? "from " + low
                                : interval.lopsided(estimate)
                                        ? low + " to " + high
                                        : rounding.uncertainty().orElseThrow());
    }

    private static String limits(Rounding rounding, double low, double high) {
        return "[" + rounding.down(low) + ", " + rounding.up(high) + "]";
    }

    /// As `95 % interval 1.22e-5 to 1.30e-5 (clopper-pearson)`, the limits rounded outwards.
    public static String interval(Answer answer) {
        var interval = answer.interval();
        String of = answer.estimand() instanceof Estimand.Distribution ? " of the mean" : "";
        if (isOneValue(answer)) {
            String only = Significant.text(answer.estimate(), ALL_DIGITS);
            return "%s interval %s to %s (%s)".formatted(interval.percent(), only, only, interval.kind());
        }
        Rounding rounding = rounding(answer);
        if (rounding.uncertainty().isEmpty()) {
            return "no %s interval%s yet (%s)".formatted(interval.percent(), of, interval.kind());
        }
        String low = Double.isNaN(interval.low()) ? "" : rounding.down(interval.low());
        String high = Double.isNaN(interval.high()) ? "" : rounding.up(interval.high());
        String limits = low.isEmpty() ? "up to " + high : high.isEmpty() ? "from " + low : low + " to " + high;
        return "%s interval%s %s (%s)".formatted(interval.percent(), of, limits, interval.kind());
    }

    /// As `band 1.20e-5 to 1.32e-5: it holds with 95 % however often one looks`.
    public static String band(Answer answer, Interval band) {
        if (Double.isNaN(band.low()) && Double.isNaN(band.high())) {
            return "no any-time band yet" + band.note().map(note -> ": " + note).orElse("");
        }
        Rounding rounding = Rounding.of(answer.estimate(), width(answer.estimate(), band));
        String only = Significant.text(band.low(), ALL_DIGITS);
        String limits = band.low() == band.high()
                ? only + " to " + only
                : Double.isNaN(band.high())
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
        return isOneValue(answer)
                || Double.isFinite(answer.estimate()) && half > 0 && half < Double.POSITIVE_INFINITY
                || lacksLimit(answer) && rounding(answer).uncertainty().isPresent();
    }

    /// Whether both limits of a quantile are the outcome that it is.
    private static boolean isOneValue(Answer answer) {
        var interval = answer.interval();
        return answer.estimand() instanceof Estimand.Quantile
                && interval.low() == interval.high()
                && interval.low() == answer.estimate();
    }

    /// Whether a limit of a quantile does not exist at this number of draws.
    private static boolean lacksLimit(Answer answer) {
        return answer.estimand() instanceof Estimand.Quantile
                && Double.isFinite(answer.estimate())
                && Double.isNaN(answer.interval().halfWidth());
    }

    private static boolean isWhole(double value) {
        return value == Math.rint(value) && Math.abs(value) < MOST_WHOLE;
    }

    /// Digits follow half the length of the interval; where a limit is missing, how far off the other is.
    private static Rounding rounding(Answer answer) {
        var interval = answer.interval();
        double one =
                Double.isNaN(interval.low()) ? interval.high() - answer.estimate() : answer.estimate() - interval.low();
        double half = interval.halfWidth();
        return Rounding.of(answer.estimate(), Double.isNaN(half) && one > 0 ? one : half);
    }
}
