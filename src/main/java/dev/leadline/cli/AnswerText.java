package dev.leadline.cli;

import dev.leadline.estimate.Estimand;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.trace.Answer;
import java.math.BigDecimal;
import java.math.MathContext;

/// An answer in figures: digits follow the error.
final class AnswerText {

    private static final MathContext ROUND = new MathContext(3);

    private AnswerText() {}

    /// As `1.257e-5 ± 0.030e-5 per year`; what can be said where there is no such interval. The value alone where the
    /// interval below it is lopsided.
    static String value(Answer answer) {
        String unit = UnitWords.after(answer.unit());
        if (Double.isNaN(answer.estimate())) {
            return "cannot say yet";
        }
        if (answer.estimand() instanceof Estimand.Probability && answer.estimate() == 0) {
            double limit = answer.interval().high();
            return "at most " + Rounding.of(limit, limit).up(limit) + unit;
        }
        Rounding rounding = rounding(answer);
        if (answer.interval().lopsided(answer.estimate())) {
            return answer.estimate() == answer.interval().high()
                    ? "at least " + rounding.down(answer.interval().low()) + unit
                    : rounding.value() + unit;
        }
        return rounding.uncertainty()
                .map(error -> rounding.value() + " ± " + error + unit)
                .orElse(rounding.value() + unit + ", no interval yet");
    }

    /// As `95 % interval 1.22e-5 to 1.30e-5 (clopper-pearson)`, the limits rounded outwards.
    static String interval(Answer answer) {
        var interval = answer.interval();
        String level = interval.percent();
        Rounding rounding = rounding(answer);
        return rounding.uncertainty().isEmpty()
                ? "no %s interval yet (%s)".formatted(level, interval.kind())
                : "%s interval %s to %s (%s)"
                        .formatted(level, rounding.down(interval.low()), rounding.up(interval.high()), interval.kind());
    }

    /// A large number to three digits: `79,600`, `1.26e9`.
    static String count(double number) {
        BigDecimal rounded = new BigDecimal(number).round(ROUND);
        return number < 1e7
                ? "%,d".formatted(rounded.toBigInteger())
                : rounded.stripTrailingZeros().toString().replace("E+", "e");
    }

    private static Rounding rounding(Answer answer) {
        return Rounding.of(answer.estimate(), answer.interval().halfWidth());
    }
}
