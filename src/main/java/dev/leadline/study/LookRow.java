package dev.leadline.study;

import dev.leadline.engine.Look;
import dev.leadline.model.Components;
import dev.leadline.model.Question;
import dev.leadline.model.UnitWords;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/// A line of a draw that is looked at, the same in the window and in the commands.
///
/// @param kind `input`, `step`, `weight` or `outcome`
/// @param value to eight significant digits
/// @param remark unit of an input, comment of a step
public record LookRow(String kind, String name, String value, String remark) {

    private static final MathContext DIGITS = new MathContext(8);

    /// Whole numbers of so many digits are written out.
    private static final int WRITTEN_OUT = 12;

    /// Inputs, steps, the weight where there is one, and outcomes, in the order of the question.
    public static List<LookRow> of(Question question, Look look) {
        List<LookRow> rows = new ArrayList<>();
        for (int i = 0; i < question.inputs().size(); i++) {
            var input = question.inputs().get(i);
            rows.add(new LookRow(
                    "input",
                    input.name(),
                    text(look.inputs().get(i)),
                    UnitWords.after(input.unit()).strip()));
        }
        for (int i = 0; i < question.working().steps().size(); i++) {
            var step = question.working().steps().get(i);
            rows.add(new LookRow("step", step.name(), text(look.steps().get(i)), step.comment()));
        }
        if (look.weight() != 1) {
            rows.add(new LookRow("weight", "weight", text(look.weight()), ""));
        }
        for (int k = 0; k < question.asks().size(); k++) {
            var ask = question.asks().get(k);
            int first = Components.firstFormula(question.asks(), k);
            for (int i = 0; i < ask.formulas().size(); i++) {
                boolean named = ask.formulas().size() == 1 && !ask.label().isBlank();
                String name = named ? ask.label() : ask.formulas().get(i);
                rows.add(new LookRow("outcome", name, text(look.outcomes().get(first + i)), ""));
            }
        }
        return rows;
    }

    private static String text(double value) {
        if (!Double.isFinite(value)) {
            return Double.isNaN(value) ? "not a number" : value > 0 ? "∞" : "−∞";
        }
        BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
        return rounded.scale() < 0 && rounded.precision() - rounded.scale() <= WRITTEN_OUT
                ? rounded.toPlainString()
                : rounded.toString().replace("E+", "e").replace('E', 'e');
    }
}
