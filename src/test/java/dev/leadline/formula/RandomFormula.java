package dev.leadline.formula;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;

/// A tree of operations made from a seed: written as a formula with as few brackets as precedence allows, written again
/// for exp4j, and evaluated by itself.
final class RandomFormula {
    static final List<String> INPUTS = List.of("x", "y2", "_z", "größe");
    private static final List<String> NUMBERS = List.of("0", "1", "2", "3", ".5", "0.25", "7.", "1.5e-3", "2E3", "10");

    private static final List<String> SIMPLE =
            List.of("exp", "log", "sqrt", "abs", "sign", "sin", "floor", "tanh", "cbrt");

    /// From weakest to strongest; a value stands alone.
    private static final Map<String, Integer> PRECEDENCE = Map.ofEntries(
            Map.entry("|", 1),
            Map.entry("&", 2),
            Map.entry("<", 3),
            Map.entry("<=", 3),
            Map.entry(">", 3),
            Map.entry(">=", 3),
            Map.entry("==", 3),
            Map.entry("!=", 3),
            Map.entry("+", 4),
            Map.entry("-", 4),
            Map.entry("*", 5),
            Map.entry("/", 5),
            Map.entry("neg", 6),
            Map.entry("^", 7));

    private static final List<String> ARITHMETIC = List.of("+", "-", "*", "/", "+", "-", "*", "/", "^");
    private static final List<String> COMPARISONS = List.of("<", "<=", ">", ">=", "==", "!=");

    /// @param word an operator, a function, a number, the name of an input, or `step`
    private record Part(String word, List<Part> parts) {
        int precedence() {
            return parts.isEmpty() || word.equals("step") ? 8 : PRECEDENCE.getOrDefault(word, 8);
        }
    }

    private final SplittableRandom random;
    private final List<Part> steps = new ArrayList<>();
    private final Part whole;

    RandomFormula(long seed) {
        random = new SplittableRandom(seed);
        whole = random.nextInt(4) == 0 ? condition(4) : number(5);
    }

    String formula() {
        return write(whole, true);
    }

    /// Lines, in an order that has nothing to do with who uses whom.
    List<String> steps() {
        List<String> lines = new ArrayList<>();
        for (int i = 0; i < steps.size(); i++) {
            lines.add("s" + i + " = " + write(steps.get(i).parts().getFirst(), true) + "  # step " + i);
        }
        Collections.shuffle(lines, new java.util.Random(random.nextLong()));
        return lines;
    }

    String forExp4j() {
        return write(whole, false);
    }

    double value(double[] inputs) {
        return value(whole, inputs);
    }

    private Part number(int depth) {
        int kind = depth == 0 ? random.nextInt(2) : random.nextInt(12);
        return switch (kind) {
            case 0 -> new Part(pick(NUMBERS), List.of());
            case 1 -> new Part(pick(INPUTS), List.of());
            case 2 -> new Part("neg", List.of(number(depth - 1)));
            case 3 -> new Part(pick(SIMPLE), List.of(number(depth - 1)));
            case 4 -> new Part("if", List.of(condition(depth - 1), number(depth - 1), number(depth - 1)));
            case 5 -> new Part("[", List.of(condition(depth - 1)));
            case 6 -> new Part(random.nextBoolean() ? "max" : "min", some(depth - 1));
            case 7 -> step(number(depth - 1));
            default -> new Part(pick(ARITHMETIC), List.of(number(depth - 1), number(depth - 1)));
        };
    }

    private Part condition(int depth) {
        int kind = depth <= 0 ? 9 : random.nextInt(10);
        return switch (kind) {
            case 0, 1 -> new Part("&", List.of(condition(depth - 1), condition(depth - 1)));
            case 2, 3 -> new Part("|", List.of(condition(depth - 1), condition(depth - 1)));
            case 4 -> new Part("not", List.of(condition(depth - 1)));
            case 5 -> step(condition(depth - 1));
            case 6 -> new Part("&", List.of(number(depth - 1), condition(depth - 1)));
            default ->
                new Part(pick(COMPARISONS), List.of(number(Math.max(0, depth - 1)), number(Math.max(0, depth - 1))));
        };
    }

    private Part step(Part body) {
        Part step = new Part("step", List.of(body));
        steps.add(step);
        return step;
    }

    private List<Part> some(int depth) {
        List<Part> parts = new ArrayList<>();
        int count = 2 + random.nextInt(3);
        for (int i = 0; i < count; i++) parts.add(number(depth));
        return parts;
    }

    private String pick(List<String> words) {
        return words.get(random.nextInt(words.size()));
    }

    /// Steps go by their names, or in brackets for exp4j, which has none.
    private String write(Part part, boolean ours) {
        String word = part.word();
        List<Part> parts = part.parts();
        if (parts.isEmpty()) return word;
        return switch (word) {
            case "step" -> ours ? "s" + indexOf(part) : "(" + write(parts.getFirst(), false) + ")";
            case "neg" -> "-" + inside(parts.getFirst(), 7, ours);
            case "[" -> "[" + write(parts.getFirst(), ours) + "]";
            case "^" -> inside(parts.get(0), 8, ours) + "^" + inside(parts.get(1), 6, ours);
            case "max", "min" -> ours ? call(part) : nested(part);
            default -> {
                Integer own = PRECEDENCE.get(word);
                if (own == null) yield callOf(part, ours);
                int left = own == 3 ? 4 : own;
                String right = inside(parts.get(1), own + 1, ours);
                boolean twoSigns = own == 4 && right.startsWith("-");
                yield inside(parts.get(0), left, ours) + " " + word
                        + (twoSigns ? " (" + right + ")" : right.isEmpty() ? "" : " " + right);
            }
        };
    }

    private String inside(Part part, int least, boolean ours) {
        String text = write(part, ours);
        return part.precedence() < least ? "(" + text + ")" : text;
    }

    private String call(Part part) {
        return callOf(part, true);
    }

    private String callOf(Part part, boolean ours) {
        return part.word() + "("
                + String.join(
                        ", ", part.parts().stream().map(p -> write(p, ours)).toList())
                + ")";
    }

    /// For exp4j, whose functions have a fixed number of arguments.
    private String nested(Part part) {
        return part.parts().stream()
                .map(p -> write(p, false))
                .reduce((a, b) -> part.word() + "(" + a + ", " + b + ")")
                .orElseThrow();
    }

    /// By identity: two equal steps are two steps.
    private int indexOf(Part step) {
        for (int i = 0; i < steps.size(); i++) {
            if (steps.get(i) == step) return i;
        }
        throw new IllegalArgumentException("no step");
    }

    private double value(Part part, double[] inputs) {
        String word = part.word();
        List<Part> parts = part.parts();
        if (parts.isEmpty()) {
            int input = INPUTS.indexOf(word);
            return input >= 0 ? inputs[input] : Double.parseDouble(word);
        }
        double[] values = parts.stream().mapToDouble(p -> value(p, inputs)).toArray();
        return switch (word) {
            case "step" -> values[0];
            case "neg" -> -values[0];
            case "[" -> Operation.TRUTH.of(values[0], 0, 0);
            case "max" -> java.util.Arrays.stream(values).reduce(Math::max).orElseThrow();
            case "min" -> java.util.Arrays.stream(values).reduce(Math::min).orElseThrow();
            default -> OurWords.apply(word, values);
        };
    }
}
