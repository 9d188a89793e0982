package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.model.Input.Role;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/// The question in words.
public final class Sentence {

    private static final int LONGEST_FORMULA = 120;

    private Sentence() {}

    /// As `The chance that tension > strength per year, with 7 inputs, to ±10 % at 95 %.`
    public static String of(Question question) {
        var sentence = new StringBuilder("The ");
        sentence.append(String.join(
                ", and the ",
                question.asks().stream().map(ask -> of(ask, question)).toList()));
        long random = question.inputs().stream()
                .filter(input -> input.role() instanceof Role.Random)
                .count();
        if (random > 0) {
            sentence.append(", with %d input%s".formatted(random, random == 1 ? "" : "s"));
        }
        question.tolerance().ifPresent(tolerance -> sentence.append(", to ").append(of(tolerance, question)));
        return sentence.append(" at ")
                .append(percent(question.confidence()))
                .append('.')
                .toString();
    }

    /// A part of one, as `95 %`.
    public static String percent(double part) {
        return BigDecimal.valueOf(part).movePointRight(2).stripTrailingZeros().toPlainString() + " %";
    }

    private static String of(Ask ask, Question question) {
        String formula = shortened(ask.formula());
        String unit = UnitWords.after(ask.unit());
        String in = unit.startsWith(" per ") || unit.isEmpty() ? unit : " in" + unit;
        return switch (ask.estimand()) {
            case Estimand.Mean _ -> "mean of " + formula + in;
            case Estimand.Probability _ -> "chance that " + formula + in;
            case Estimand.Integral _ -> "integral of " + formula + " over " + and(ranges(question)) + in;
        };
    }

    private static String of(Tolerance tolerance, Question question) {
        List<String> parts = new ArrayList<>();
        String unit = UnitWords.after(question.asks().getFirst().unit());
        tolerance.absolute().ifPresent(width -> parts.add("±" + number(width) + unit));
        tolerance.relative().ifPresent(part -> parts.add("±" + percent(part)));
        return String.join(tolerance.both() ? " and " : " or ", parts);
    }

    private static List<String> ranges(Question question) {
        return question.inputs().stream()
                .filter(input -> !(input.role() instanceof Role.Random))
                .map(Input::name)
                .toList();
    }

    private static String and(List<String> names) {
        int last = names.size() - 1;
        return last == 0 ? names.getFirst() : String.join(", ", names.subList(0, last)) + " and " + names.get(last);
    }

    private static String number(double value) {
        return new BigDecimal(value)
                .round(new MathContext(6))
                .stripTrailingZeros()
                .toString()
                .replace("E+", "e")
                .replace('E', 'e');
    }

    private static String shortened(String formula) {
        String line = formula.strip().replaceAll("\\s+", " ");
        return line.length() <= LONGEST_FORMULA ? line : line.substring(0, LONGEST_FORMULA - 1) + "…";
    }
}
