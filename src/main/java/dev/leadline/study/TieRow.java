package dev.leadline.study;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Question;
import dev.leadline.numeric.Rounding;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.List;
import java.util.Locale;

/// Two tied inputs in words, the same in the window and in the commands.
///
/// @param of the inputs, as `w, hs`
/// @param target what was stated, as `spearman 0.75`; and what is drawn with where that is another, as
///     `spearman 0.9, nearest 0.7612`
/// @param isRepaired whether it is another
/// @param achieved as `0.7497 ± 0.0024`, or without an interval and why
public record TieRow(String of, String target, boolean isRepaired, String achieved) {

    /// Decimal places of what is drawn with.
    private static final int PLACES = 4;

    /// Decimal places of a correlation that has no interval.
    private static final int FEW_PLACES = 2;

    /// As `Tied by a Student copula, dof 4; achieved in 131,072 draws of their own, ± at 95 %:`
    public static String heading(Question question, List<Achieved> achieved) {
        var mixing = question.dependence().orElseThrow().copula().mixing();
        return String.format(
                Locale.ROOT,
                "Tied by a %s copula; correlations achieved in %,d draws of their own, ± at %s:",
                mixing.inWords(),
                Achieved.DRAWS,
                achieved.getFirst().interval().percent());
    }

    /// In the order in which they were stated.
    public static List<TieRow> of(Question question, List<Achieved> achieved) {
        return achieved.stream().map(a -> of(question, a)).toList();
    }

    private static TieRow of(Question question, Achieved achieved) {
        var tie = achieved.tie();
        String one = question.inputs().get(tie.one()).name();
        String other = question.inputs().get(tie.other()).name();
        String target =
                tie.measure().word() + " " + BigDecimal.valueOf(tie.target()).toPlainString();
        double taken = question.dependence().orElseThrow().taken(tie);
        String nearest = taken == tie.target()
                ? ""
                : ", nearest " + new BigDecimal(taken).setScale(PLACES, RoundingMode.HALF_EVEN);
        return new TieRow(one + ", " + other, target + nearest, taken != tie.target(), text(achieved));
    }

    private static String text(Achieved achieved) {
        if (Double.isNaN(achieved.value())) {
            return "cannot be seen: values hardly vary";
        }
        if (achieved.interval().note().isPresent() && Math.abs(achieved.value()) < 1) {
            return "%s, no ±: %s"
                    .formatted(
                            new BigDecimal(achieved.value()).setScale(FEW_PLACES, RoundingMode.HALF_EVEN),
                            achieved.interval().note().get());
        }
        Rounding rounding = Rounding.of(achieved.value(), achieved.interval().halfWidth());
        return rounding.value()
                + rounding.uncertainty().map(error -> " ± " + error).orElse("");
    }
}
