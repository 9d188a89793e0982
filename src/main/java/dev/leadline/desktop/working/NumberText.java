package dev.leadline.desktop.working;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.OptionalDouble;
import java.util.regex.Pattern;

/// Numbers as people type them in fields, and as fields show them.
public final class NumberText {
    private static final Pattern NUMBER = Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d{1,4})?");

    private NumberText() {}

    /// The number that stands there, infinities as `inf` and `-inf`; empty where it is none.
    public static OptionalDouble read(String text) {
        String t = text.strip().replace('\u2212', '-');
        if (t.equals("inf") || t.equals("+inf") || t.equals("\u221e")) {
            return OptionalDouble.of(Double.POSITIVE_INFINITY);
        }
        if (t.equals("-inf") || t.equals("-\u221e")) {
            return OptionalDouble.of(Double.NEGATIVE_INFINITY);
        }
        if (!NUMBER.matcher(t).matches()) {
            return OptionalDouble.empty();
        }
        double value = Double.parseDouble(t);
        return Double.isInfinite(value) ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    /// The shortest text that reads back as the same number, as `1180`, `0.07`, `1.2568e-5`.
    public static String show(double value) {
        if (Double.isInfinite(value)) {
            return value > 0 ? "inf" : "-inf";
        }
        return Shortest.text(value);
    }

    /// What to say about a text that is no number.
    ///
    /// @param what the field, as `scale of v`
    public static Problem problem(String what, String text) {
        String t = text.strip();
        if (t.isEmpty()) {
            return Problem.of(capital(what) + " is empty but must be a number");
        }
        var problem = Problem.of(capital(what) + " is \u201c" + t + "\u201d but must be a number");
        if (read(t.replace(',', '.')).isPresent()) {
            return problem.tryThis("Write the decimal sign as a point: " + t.replace(',', '.'));
        }
        return problem.tryThis("Write it as 2.6, 0.07 or 1.5e-3.");
    }

    private static String capital(String text) {
        return text.isEmpty() ? text : Character.toUpperCase(text.charAt(0)) + text.substring(1);
    }
}
