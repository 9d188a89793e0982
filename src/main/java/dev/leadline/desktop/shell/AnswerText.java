package dev.leadline.desktop.shell;

import dev.leadline.desktop.style.Figures;
import dev.leadline.estimate.Estimand;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.trace.Answer;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/// An answer exactly as it is pasted: `1.26e-5 ± .03e-5 per year (95 %, lane B; 1 in 79,600)`.
final class AnswerText {
    private AnswerText() {}

    static String of(Answer answer, String lane) {
        String unit = UnitWords.after(answer.unit()).strip();
        String in = unit.isEmpty() ? "" : " " + unit;
        String level = level(answer);
        String finite = answer.nonFinite() > 0 ? "; over finite evaluations only" : "";
        double half = answer.interval().halfWidth();
        boolean probability = answer.estimand() instanceof Estimand.Probability;
        if (!Double.isFinite(answer.estimate())) {
            return "cannot say yet (lane " + lane + ", " + Figures.count(answer.observations()) + " draws)";
        }
        if (probability && answer.hits().isPresent() && answer.hits().getAsLong() == 0) {
            double limit = answer.interval().high();
            return Double.isFinite(limit)
                    ? "at most " + up(limit) + in + " (" + level + ", lane " + lane + "; no hit in "
                            + Figures.count(answer.observations()) + " draws" + finite + ")"
                    : "cannot say yet (lane " + lane + "; no hit in " + Figures.count(answer.observations())
                            + " draws)";
        }
        if (!(half > 0 && Double.isFinite(half))) {
            return Figures.number(answer.estimate()) + in + " (no interval can be said yet, lane " + lane + finite
                    + ")";
        }
        var text = Rounding.of(answer.estimate(), half);
        String oneIn = probability ? oneIn(answer.estimate()) : "";
        if (answer.interval().lopsided(answer.estimate())) {
            String low = text.down(answer.interval().low());
            String limits = answer.estimate() == answer.interval().high()
                    ? "at least " + low
                    : text.value() + ", between " + low + " and "
                            + text.up(answer.interval().high());
            return limits + in + " (" + level + ", lane " + lane + oneIn + finite + ")";
        }
        return text.value() + " \u00b1 " + text.uncertainty().orElse("") + in + " (" + level + ", lane " + lane + oneIn
                + finite + ")";
    }

    private static String level(Answer answer) {
        return answer.interval().percent();
    }

    /// Small chances as people say them; three digits, since the interval stands beside it.
    private static String oneIn(double p) {
        if (!(p > 0 && p < .5)) {
            return "";
        }
        var n = new BigDecimal(1 / p).round(new MathContext(3));
        return "; 1 in " + String.format(Locale.ROOT, "%,d", n.toBigInteger());
    }

    /// Two digits, away from zero, so that the limit still holds.
    private static String up(double limit) {
        return Rounding.of(limit, limit).up(limit);
    }
}
