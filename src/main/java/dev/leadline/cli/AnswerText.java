package dev.leadline.cli;

import dev.leadline.estimate.Estimand;
import dev.leadline.model.Sentence;
import dev.leadline.model.UnitWords;
import dev.leadline.trace.Answer;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/// An answer in figures: digits follow the error.
final class AnswerText {

    private static final MathContext ERROR = new MathContext(2, RoundingMode.UP);
    private static final MathContext ALONE = new MathContext(6);
    private static final MathContext ROUND = new MathContext(3);

    /// Exponents from here to there are written out.
    private static final int LEAST_EXPONENT = -4;

    private static final int MOST_EXPONENT = 6;

    private AnswerText() {}

    /// As `1.26e-5 ± 0.03e-5 per year`; what can be said where there is no such interval.
    static String value(Answer answer) {
        String unit = UnitWords.after(answer.unit());
        double halfWidth = answer.interval().halfWidth();
        if (Double.isNaN(answer.estimate())) {
            return "cannot say yet";
        }
        if (answer.estimand() instanceof Estimand.Probability && answer.estimate() == 0) {
            return "at most " + text(new BigDecimal(answer.interval().high()).round(ERROR)) + unit;
        }
        if (!(halfWidth > 0 && Double.isFinite(halfWidth))) {
            return text(new BigDecimal(answer.estimate()).round(ALONE).stripTrailingZeros()) + unit
                    + ", no interval yet";
        }
        BigDecimal error = new BigDecimal(halfWidth).round(ERROR);
        BigDecimal value = new BigDecimal(answer.estimate()).setScale(error.scale(), RoundingMode.HALF_EVEN);
        int exponent = exponent(value.abs().max(error));
        return text(value, exponent) + " ± " + text(error, exponent) + unit;
    }

    /// As `95 % interval 1.22e-5 to 1.30e-5 (clopper-pearson)`, the limits rounded outwards.
    static String interval(Answer answer) {
        var interval = answer.interval();
        String level = Sentence.percent(interval.level());
        double halfWidth = interval.halfWidth();
        if (!(halfWidth > 0 && Double.isFinite(halfWidth))) {
            return "no %s interval yet (%s)".formatted(level, interval.kind());
        }
        int scale = new BigDecimal(halfWidth).round(ERROR).scale();
        BigDecimal low = new BigDecimal(interval.low()).setScale(scale, RoundingMode.FLOOR);
        BigDecimal high = new BigDecimal(interval.high()).setScale(scale, RoundingMode.CEILING);
        int exponent = exponent(low.abs().max(high.abs()));
        return "%s interval %s to %s (%s)".formatted(level, text(low, exponent), text(high, exponent), interval.kind());
    }

    /// A large number to three digits: `79,600`, `1.26e9`.
    static String count(double number) {
        return number < 1e7
                ? String.format(
                        Locale.ROOT, "%,d", new BigDecimal(number).round(ROUND).toBigInteger())
                : text(new BigDecimal(number).round(ROUND).stripTrailingZeros());
    }

    private static String text(BigDecimal value) {
        return text(value, exponent(value.abs()));
    }

    private static String text(BigDecimal value, int exponent) {
        if (value.signum() == 0) {
            return "0";
        }
        if (exponent >= LEAST_EXPONENT && exponent <= MOST_EXPONENT) {
            return value.scale() > 0 ? value.toPlainString() : String.format(Locale.ROOT, "%,d", value.toBigInteger());
        }
        return value.scaleByPowerOfTen(-exponent).toPlainString() + "e" + exponent;
    }

    private static int exponent(BigDecimal size) {
        return size.precision() - size.scale() - 1;
    }
}
