package dev.leadline.formula;

import dev.leadline.numeric.Power;

/// What operators and functions mean for one draw, written a second time with plain Java comparisons.
final class OurWords {
    private OurWords() {}

    static double apply(String word, double... v) {
        return switch (word) {
            case "+" -> v[0] + v[1];
            case "-" -> v[0] - v[1];
            case "*" -> v[0] * v[1];
            case "/" -> v[0] / v[1];
            case "^" -> Power.pow(v[0], v[1]);
            case "<" -> unlessNaN(v[0] < v[1], v);
            case "<=" -> unlessNaN(v[0] <= v[1], v);
            case ">" -> unlessNaN(v[0] > v[1], v);
            case ">=" -> unlessNaN(v[0] >= v[1], v);
            case "==" -> unlessNaN(v[0] == v[1], v);
            case "!=" -> unlessNaN(v[0] != v[1], v);
            case "&" -> unlessNaN(v[0] != 0 && v[1] != 0, v);
            case "|" -> unlessNaN(v[0] != 0 || v[1] != 0, v);
            case "not" -> unlessNaN(v[0] == 0, v);
            case "if" -> Double.isNaN(v[0]) ? Double.NaN : v[0] != 0 ? v[1] : v[2];
            default ->
                Functions.operation(word).orElseThrow().of(v[0], v.length > 1 ? v[1] : 0, v.length > 2 ? v[2] : 0);
        };
    }

    private static double unlessNaN(boolean holds, double... values) {
        for (double value : values) {
            if (Double.isNaN(value)) return Double.NaN;
        }
        return holds ? 1 : 0;
    }
}
