package dev.leadline.study;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Question;
import dev.leadline.numeric.Rounding;
import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;

/// Two tied inputs in words, the same in the window and in the commands.
///
/// @param of the inputs, as `w, hs`
/// @param target what was stated, as `spearman 0.75`
/// @param achieved as `0.7497 ± 0.0024`
public record TieRow(String of, String target, String achieved) {

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
        String target = BigDecimal.valueOf(tie.target()).toPlainString();
        return new TieRow(one + ", " + other, tie.measure().word() + " " + target, text(achieved));
    }

    private static String text(Achieved achieved) {
        if (Double.isNaN(achieved.value())) {
            return "cannot be seen: values hardly vary";
        }
        Rounding rounding = Rounding.of(achieved.value(), achieved.interval().halfWidth());
        return rounding.value()
                + rounding.uncertainty().map(error -> " ± " + error).orElse("");
    }
}
